import { placeWords } from "../../core/messages/index.ts";
import type { ScreenHeadProps } from "./ScreenHead.tsx";

const PLACES = ["cases", "bench", "medicines", "settings"] as const;
type Place = (typeof PLACES)[number];

/** The bench is a place to go to only while a case is open. */
export function screenPlaces(
  current: Place,
  show: (place: Place) => void,
  hasOpenCase: boolean,
): ScreenHeadProps["places"] {
  return PLACES.filter((id) => id !== "bench" || hasOpenCase).map((id) => ({
    id,
    word: placeWords[id],
    isCurrent: id === current,
    onGo: () => show(id),
  }));
}
