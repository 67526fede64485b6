import { describe, expect, it } from "vitest";
import {
  type Covariates,
  type KineticsFormulaName,
  kineticsFormulas,
  type MedicineRecord,
} from "../../../src/core/medicine/index.ts";
import type { DoseAmount } from "../../../src/core/regimen/index.ts";
import { quantityConvert, type UnitCode } from "../../../src/core/units/index.ts";
import { recordOf } from "../../core/medicine/recordOf.ts";
import { expectWithin } from "./expectFigure.ts";
import { recordAverage, recordHalfLife, recordValue, recordWindow } from "./recordFigure.ts";

/** What published figures say a record must give; where each was read stands beside it. */
export interface RecordClaims {
  readonly record: string;
  /** The typical patient of the checks. */
  readonly patient: Covariates;
  readonly averages: readonly AverageClaim[];
  /** Typical values, each inside what was published. */
  readonly spans: readonly SpanClaim[];
  /** The record's own windows and limits in the other kind of unit. */
  readonly windows: readonly WindowClaim[];
}

interface AverageClaim {
  readonly what: string;
  readonly product: string;
  readonly dose: DoseAmount;
  readonly everyH: number;
  /** An interaction of the record that is in force. */
  readonly interaction?: string;
  readonly patient?: Covariates;
  readonly wanted: number;
  /** A concentration: the average at steady state. mg.h/L: the AUC of one interval. */
  readonly unit: UnitCode;
}

interface SpanClaim {
  readonly of: KineticsFormulaName | "halfLife";
  readonly low: number;
  readonly high: number;
  readonly source: string;
}

interface WindowClaim {
  /** id of a window, or toxicFrom. */
  readonly window: string;
  readonly low: number;
  readonly high?: number;
  readonly unit: UnitCode;
}

const AVERAGE_TOLERANCE = 0.02;
/** The figures compared with are printed to three digits, which alone is up to 0.5 % of a number that begins with 1. */
const WINDOW_TOLERANCE = 0.005;

/** The record as it is for a patient in whom an interaction is in force: its factor is written into the formula. */
function recordInteracting(record: MedicineRecord, id: string | undefined): MedicineRecord {
  if (id === undefined) return record;
  const inForce = record.interactions.find((each) => each.id === id);
  const changed = kineticsFormulas(record).find(({ name }) => name === inForce?.parameter);
  if (!inForce || !changed) throw new RangeError(`id: "${id}" is no interaction of ${record.id}`);
  const formula = { ...changed.formula, formula: `(${changed.formula.formula}) * ${inForce.factor.value}` };
  return { ...record, kinetics: { ...record.kinetics, [changed.name]: formula } };
}

function foundLevel(record: MedicineRecord, patient: Covariates, claim: AverageClaim): number {
  const changed = recordInteracting(record, claim.interaction);
  const covariates = claim.patient ?? patient;
  if (claim.unit === "mg.h/L") return recordAverage(changed, covariates, claim) * claim.everyH;
  return recordAverage(changed, covariates, claim, claim.unit);
}

export function recordClaims({ record: id, patient, averages, spans, windows }: RecordClaims): void {
  describe(`the ${id} record`, () => {
    const record = recordOf(id);

    it.each(averages)("$what: $wanted $unit within 2 %", (claim) => {
      expectWithin(foundLevel(record, patient, claim), claim.wanted, AVERAGE_TOLERANCE);
    });

    it.each(spans)("typical $of from $low to $high ($source)", ({ of, low, high }) => {
      const found = of === "halfLife" ? recordHalfLife(record, patient) : recordValue(record, of, patient);
      expect(found).toBeGreaterThanOrEqual(low);
      expect(found).toBeLessThanOrEqual(high);
    });

    it.each(windows)("$window from $low to $high $unit within 0.5 %", ({ window, low, high, unit }) => {
      const found = window === "toxicFrom" ? toxicFrom(record, unit) : recordWindow(record, window, unit);
      const wanted = high === undefined ? [low] : [low, high];
      expect(found.length).toBe(wanted.length);
      wanted.forEach((each, i) => {
        // A window from 0 on: there is nothing to take a ratio of.
        if (each === 0) expect(found[i]).toBe(0);
        else expectWithin(found[i] ?? Number.NaN, each, WINDOW_TOLERANCE);
      });
    });
  });
}

function toxicFrom(record: MedicineRecord, unit: UnitCode): readonly number[] {
  if (!record.toxicFrom) throw new RangeError(`record: "${record.id}" has no toxic limit`);
  return [quantityConvert(record.toxicFrom, unit, record.molarMass.value)];
}
