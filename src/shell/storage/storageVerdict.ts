import type { Probe } from "./databaseProbe.ts";
import type { Marker } from "./lossMarker.ts";
import { STORAGE_SCHEMA } from "./storageSchema.ts";
import type { LostState } from "./storageState.ts";

export type Loss = Omit<LostState, "kind" | "recoverable">;

export type Verdict =
  | { readonly kind: "unavailable"; readonly detail: string }
  | { readonly kind: "newer"; readonly found: number; readonly readable: boolean }
  | { readonly kind: "lost"; readonly loss: Loss }
  /** Nothing speaks against it before the rows are looked at. */
  | { readonly kind: "good" };

/** Sets what the database says of itself against what was noted outside it. `copied`: how many second copies there are when there is no marker. */
export function storageVerdict(probe: Probe, marker: Marker | null, copied: number): Verdict {
  if (probe.kind === "unavailable") return probe;
  const lost = (detail: string): Verdict => {
    const cases = marker ? marker.heads.size : copied > 0 ? copied : null;
    return { kind: "lost", loss: { extent: "all", cases, lastSavedAt: marker?.lastSavedAt ?? null, detail } };
  };
  const hadWork = copied > 0 || (marker !== null && marker.heads.size > 0);
  if (probe.kind === "absent") {
    if (probe.dataLoss) return lost(probe.dataLoss);
    if (marker?.loss) return lost(marker.loss);
    return hadWork ? lost("the database is not there") : { kind: "good" };
  }
  const { meta } = probe;
  if (meta && meta.schema > STORAGE_SCHEMA)
    return { kind: "newer", found: meta.schema, readable: meta.minReader <= STORAGE_SCHEMA };
  if (marker?.loss) return lost(marker.loss);
  if (marker && hadWork && marker.database !== meta?.id) return lost("the database is another one");
  return { kind: "good" };
}

/** Cases noted outside the database that it does not hold, or holds at an earlier save. Both: saves counted, by case id. */
export function casesBehind(noted: ReadonlyMap<string, number>, stored: ReadonlyMap<string, number>): string[] {
  return [...noted].filter(([id, revision]) => (stored.get(id) ?? -1) < revision).map(([id]) => id);
}
