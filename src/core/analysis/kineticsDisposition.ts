import type { ModelDisposition } from "../kinetics/index.ts";
import type { MedicineRecord } from "../medicine/index.ts";

/** What the record's formulas gave, by the name they stand under in the record. */
export type KineticsValues = Readonly<Record<string, number>>;

/** Factors an event puts on the kinetics while it lasts; 1 leaves them alone. */
export interface KineticsFactors {
  readonly clearance: number;
  readonly volume: number;
}

const NO_FACTORS: KineticsFactors = { clearance: 1, volume: 1 };

/**
 * A record's kinetics as the kinetics core takes them; one case a kind.
 * A factor on clearance acts on Vmax where elimination is saturable; one on volume acts on the central volume.
 */
export function kineticsDisposition(
  record: MedicineRecord,
  values: KineticsValues,
  factors: KineticsFactors = NO_FACTORS,
): ModelDisposition {
  const of = (name: string): number => {
    const value = values[name];
    if (value === undefined) throw new RangeError(`${name}: no value for the kinetics of "${record.id}"`);
    return value;
  };
  switch (record.kinetics.kind) {
    case "one-compartment-oral":
      return {
        kind: "one-compartment",
        clearance: of("clearance") * factors.clearance,
        volume: of("volume") * factors.volume,
      };
    case "two-compartment-oral":
      return {
        kind: "two-compartment",
        clearance: of("clearance") * factors.clearance,
        volume: of("volume") * factors.volume,
        exchange: of("exchange"),
        peripheralVolume: of("peripheralVolume"),
      };
    case "saturable-oral":
      return {
        kind: "saturable",
        vmax: of("maximumRate") * factors.clearance,
        km: of("halfMaximum"),
        volume: of("volume") * factors.volume,
      };
  }
}
