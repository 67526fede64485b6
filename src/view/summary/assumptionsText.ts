import type { DoseMark } from "../../core/analysis/index.ts";
import { type MedicineRecord, unverifiedFigures } from "../../core/medicine/index.ts";
import {
  listWords,
  NOT_RECORDED,
  summaryBannerWords,
  summaryDetailWords,
  summaryAssumptionWords as words,
} from "../../core/messages/index.ts";
import { instantMs } from "../../core/time/index.ts";
import { shownModel } from "./kineticsText.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** Single doses are named on the first sheet up to this many; the details list them all. */
const NAMED_DOSES = 4;

export function assumptionsText(input: SummaryInput, print: SummaryPrint): readonly string[] {
  const { medicine } = input.case;
  const model = shownModel(input)?.model;
  const kind = words.kinds[model?.kind ?? "one-compartment"];
  const changes = model?.dispositions.slice(1) ?? [];
  const { crossCheck } = input.analysis;
  return [
    words.typical(kind),
    ...(changes.length > 0
      ? [words.changes(changes.length, print.at(print.ms(changes.at(-1)!.from), "dayClock"))]
      : []),
    crossCheck === null
      ? words.crossCheck.none
      : crossCheck.isAgreed
        ? words.crossCheck.agreed
        : words.crossCheck.differs,
    words.record(medicine.name, medicine.recordVersion, reviewWords(medicine), unverifiedWords(medicine)),
    doseAssumption(input.analysis.given, print),
    words.kidney(kidneyWords(input, print)),
    words.now(print.at(instantMs(input.case.now), "full"), input.case.timeZone),
  ];
}

function reviewWords({ review }: MedicineRecord): string {
  return review.status === "reviewed"
    ? words.reviewed(review.by ?? NOT_RECORDED, review.on ?? NOT_RECORDED)
    : words.notReviewed;
}

/** Figures nobody has read in their source: recalled, rules of thumb, and made up. */
export function unverifiedWords(record: MedicineRecord): string {
  const { memory, commonPractice, invented, total } = unverifiedFigures(record);
  return summaryBannerWords.unverified(memory + commonPractice + invented, total);
}

function doseAssumption(given: readonly DoseMark[], print: SummaryPrint): string {
  if (given.length === 0) return words.noDoses;
  const when = (hours: number) => print.at(print.ms(hours), "dayClock");
  const missed = given.filter(({ status }) => status === "missed").map(({ scheduledH }) => when(scheduledH));
  const late = given
    .filter((mark) => mark.countedMg > 0 && mark.atH !== mark.scheduledH)
    .map((mark) => words.late(when(mark.scheduledH), when(mark.atH)));
  const named = (list: readonly string[]) =>
    list.length <= NAMED_DOSES
      ? listWords(list)
      : words.many(listWords(list.slice(0, NAMED_DOSES)), list.length - NAMED_DOSES);
  return words.doses(
    given.filter(({ countedMg }) => countedMg > 0).length,
    missed.length > 0 ? words.missed(named(missed)) : "",
    late.length > 0 ? words.lateAll(named(late)) : "",
  );
}

export function kidneyWords({ analysis }: SummaryInput, print: SummaryPrint): string {
  const { creatinineClearance, clearanceWeight } = analysis.patient;
  return creatinineClearance && clearanceWeight
    ? words.kidneyBy(
        print.quantity(creatinineClearance.value, creatinineClearance.unit),
        summaryDetailWords.cockcroftGault,
        clearanceWeight,
      )
    : NOT_RECORDED;
}
