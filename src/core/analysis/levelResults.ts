import type { Case, Level } from "../case/index.ts";
import { modelProfile } from "../kinetics/index.ts";
import type { MedicineRecord } from "../medicine/index.ts";
import { instantMs } from "../time/index.ts";
import { quantityConvert } from "../units/index.ts";
import type { DoseMark, LevelResult, Model } from "./analysisTypes.ts";
import { countedByProduct } from "./caseDoses.ts";
import { modelHistory } from "./modelInputs.ts";

const HOUR_MS = 3_600_000;

/** A level in mg/L, whatever unit it was reported in. */
export function levelMgPerL(level: Level, record: MedicineRecord): number {
  return quantityConvert(level.quantity, "mg/L", record.molarMass.value);
}

/**
 * One residual standard deviation about a concentration, mg/L: sqrt(a² + (b·c)²) with the record's additive part a (mg/L)
 * and proportional part b (fraction); null when the record has neither. It covers assay and timing error together.
 */
export function residualSd(record: MedicineRecord, concentration: number): number | null {
  const { residualAdditive, residualProportional } = record.variability;
  if (!residualAdditive && !residualProportional) return null;
  const additive = residualAdditive?.value ?? 0;
  const share = residualProportional ? residualProportional.value / (residualProportional.unit === "%" ? 100 : 1) : 0;
  return Math.hypot(additive, share * concentration);
}

/** Each level beside what the doses given before it predict. Doses of an option never count towards a level. */
export function levelResults(
  value: Case,
  given: readonly DoseMark[],
  model: Model | null,
  originMs: number,
): LevelResult[] {
  const atH = (level: Level) => (instantMs(level.at) - originMs) / HOUR_MS;
  const ordered = [...value.levels].sort((a, b) => atH(a) - atH(b));
  const counted = given.filter((mark) => mark.countedMg > 0);
  const predicted = model ? modelProfile(modelHistory(model, countedByProduct(given)), ordered.map(atH)) : null;
  return ordered.map((level, i) => {
    const measured = levelMgPerL(level, value.medicine);
    const before = counted.filter((mark) => mark.atH < atH(level)).at(-1);
    const expected = predicted ? predicted[i]! : null;
    return {
      id: level.id,
      atH: atH(level),
      measured,
      assaySd: residualSd(value.medicine, measured),
      predicted: expected,
      difference: expected === null || level.kind === "below-limit" ? null : measured - expected,
      afterDoseH: before ? atH(level) - before.atH : null,
      excluded: level.excluded ?? null,
      belowLimit: level.kind === "below-limit",
      fit: null,
    };
  });
}
