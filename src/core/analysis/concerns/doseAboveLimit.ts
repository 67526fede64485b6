import type { Figure } from "../../medicine/index.ts";
import { localMidnight } from "../../time/index.ts";
import { quantityConvert } from "../../units/index.ts";
import type { Concern, DoseMark } from "../analysisTypes.ts";
import { type ConcernContext, type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { labelledDose } from "../labelledDose.ts";
import { sourceText } from "../typicalModel.ts";

/** Equal but for the rounding of a salt factor taken off again. */
const ROUNDING = 1 + 1e-9;

/** A dose, or the doses of one calendar day, above the record's maximum as labelled; of doses already given it is only a note. */
export const doseAboveLimit: ConcernRule = (context) => {
  const { maximumSingleDose, maximumDailyDose } = context.case.medicine.limits;
  const given = context.given.filter((mark) => mark.countedMg > 0);
  return [
    ...laneConcerns(context, { kind: "given" }, given, maximumSingleDose, maximumDailyDose),
    ...context.options.flatMap((option) => {
      const own = option.doses.filter((mark) => mark.countedMg > 0);
      const about = { kind: "option", id: option.id } as const;
      const daysOf = new Set(own.map((mark) => dayOf(context, mark.atH)));
      // On the day of the change the doses given that morning count too.
      const thatDay = given.filter((mark) => daysOf.has(dayOf(context, mark.atH)));
      return [
        ...laneConcerns(context, about, own, maximumSingleDose, undefined),
        ...laneConcerns(context, about, [...thatDay, ...own], undefined, maximumDailyDose),
      ];
    }),
  ];
};

function laneConcerns(
  context: ConcernContext,
  about: Concern["about"],
  marks: readonly DoseMark[],
  single: Figure | undefined,
  daily: Figure | undefined,
): Concern[] {
  const record = context.case.medicine;
  const gravity = about.kind === "given" ? "note" : "check";
  const found: Concern[] = [];
  const add = (code: string, limit: Figure, mg: number, atH: number) => {
    const limitMg = quantityConvert(limit, "mg");
    if (mg <= limitMg * ROUNDING) return;
    const at = { atMs: clockMs(context, atH), zone: context.case.timeZone };
    const data = {
      option: about.id ?? null,
      mg,
      limitMg,
      source: sourceText(record, limit.source),
      basis: limit.basis,
    };
    found.push(concern(code, gravity, about, { ...data, ...at }));
  };
  if (single) {
    const highest = greatest(marks.map((mark) => ({ mg: labelledDose(record, mark), atH: mark.atH })));
    if (highest) add("dose-above-single", single, highest.mg, highest.atH);
  }
  if (daily) {
    const days = new Map<number, { mg: number; readonly atH: number }>();
    for (const mark of marks) {
      const day = days.get(dayOf(context, mark.atH)) ?? { mg: 0, atH: mark.atH };
      day.mg += labelledDose(record, mark);
      days.set(dayOf(context, mark.atH), day);
    }
    const highest = greatest([...days.values()]);
    if (highest) add("dose-above-daily", daily, highest.mg, highest.atH);
  }
  return found;
}

function greatest<T extends { readonly mg: number }>(amounts: readonly T[]): T | null {
  return amounts.reduce<T | null>((most, each) => (most === null || each.mg > most.mg * ROUNDING ? each : most), null);
}

/** The local day an hour of the clock lies in, also long before the span shown: its midnight in epoch milliseconds. */
function dayOf(context: ConcernContext, atH: number): number {
  return localMidnight(clockMs(context, atH), context.case.timeZone);
}
