import { placeWords } from "../../core/messages/index.ts";
import type { ScreenHeadProps } from "./ScreenHead.tsx";

const PLACES = ["cases", "medicines", "settings"] as const;
type Place = (typeof PLACES)[number];

export function screenPlaces(current: Place, show: (place: Place) => void): ScreenHeadProps["places"] {
  return PLACES.map((id) => ({ id, word: placeWords[id], isCurrent: id === current, onGo: () => show(id) }));
}
