import type { UnitCode } from "../units/index.ts";
import type { Figure } from "./figureSchema.ts";

/** A fault found across fields, where the shape alone is right. */
export interface RecordFault {
  readonly code: string;
  readonly path: readonly (string | number)[];
  readonly data: Readonly<Record<string, unknown>>;
}

export type FaultPath = RecordFault["path"];

/** What a figure must be: in this unit (one of these), and in this range. */
export interface Bounds {
  readonly unit: UnitCode | readonly UnitCode[];
  readonly above?: number;
  readonly below?: number;
  readonly least?: number;
  readonly most?: number;
}

export function boundsFaults(
  figure: Pick<Figure, "value" | "unit"> | undefined,
  bounds: Bounds,
  path: FaultPath,
): RecordFault[] {
  if (!figure) return [];
  const { value, unit } = figure;
  const allowed: readonly UnitCode[] = typeof bounds.unit === "string" ? [bounds.unit] : bounds.unit;
  if (!allowed.includes(unit)) {
    return [{ code: "record-unit", path: [...path, "unit"], data: { found: unit, allowed } }];
  }
  const isAbove = bounds.above === undefined || value > bounds.above;
  const isBelow = bounds.below === undefined || value < bounds.below;
  const isInside = value >= (bounds.least ?? value) && value <= (bounds.most ?? value);
  if (isAbove && isBelow && isInside) return [];
  return [{ code: "record-range", path: [...path, "value"], data: { found: value, ...bounds, unit } }];
}

/** One fault for every entry whose key an earlier one already has. */
export function duplicateFaults<T>(list: readonly T[], path: FaultPath, key: (each: T) => string): RecordFault[] {
  const seen = new Set<string>();
  const faults: RecordFault[] = [];
  list.forEach((each, i) => {
    if (seen.has(key(each))) faults.push({ code: "record-duplicate", path: [...path, i], data: { found: key(each) } });
    seen.add(key(each));
  });
  return faults;
}
