import type { DoseMark, IndividualFit } from "../../core/analysis/index.ts";
import { type MedicineRecord, unverifiedFigures } from "../../core/medicine/index.ts";
import {
  listWords,
  NOT_RECORDED,
  summaryBannerWords,
  summaryDetailWords,
  summaryAssumptionWords as words,
} from "../../core/messages/index.ts";
import { instantMs } from "../../core/time/index.ts";
import { numberPrint } from "../../core/units/index.ts";
import { shownPatient } from "./shownPatient.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** Single doses are named on the first sheet up to this many; the details list them all. */
const NAMED_DOSES = 4;

export function assumptionsText(input: SummaryInput, print: SummaryPrint): readonly string[] {
  const { medicine } = input.case;
  const model = input.analysis.typical;
  const kind = words.kinds[model?.kind ?? "one-compartment"];
  const changes = model?.dispositions.slice(1) ?? [];
  const { crossCheck } = input.analysis;
  return [
    ...patientAssumptions(input, kind, print),
    ...(changes.length > 0
      ? [words.changes(changes.length, print.at(print.ms(changes.at(-1)!.from), "dayClock"))]
      : []),
    crossCheck === null
      ? words.crossCheck.none
      : crossCheck.isAgreed
        ? words.crossCheck.agreed
        : words.crossCheck.differs,
    words.record(medicine.name, medicine.recordVersion, reviewWords(medicine), unverifiedWords(medicine)),
    words.estimates[medicine.estimates.from],
    ...effectAssumptions(input, print),
    doseAssumption(input.analysis.given, print),
    words.kidney(kidneyWords(input, print)),
    words.now(print.at(instantMs(input.case.now), "full"), input.case.timeZone),
  ];
}

/** Whom the figures are of; for this patient how they were found and from which levels. */
function patientAssumptions(input: SummaryInput, kind: string, print: SummaryPrint): readonly string[] {
  const patient = shownPatient(input);
  if (patient.kind === "typical") return [words.typical(kind)];
  const { fit } = patient;
  const times = (ids: readonly string[]) =>
    listWords(
      input.analysis.levels.filter(({ id }) => ids.includes(id)).map(({ atH }) => print.at(print.ms(atH), "dayClock")),
    );
  return [words.individual(kind), words.levels(times(fit.levelsUsed), times(fit.levelsLeftOut)), fitMethodWords(fit)];
}

/** "normal residuals; importance sampling, seed 1, 2,048 draws, effective size 1,728, Pareto k 0.12 (trusted to 0.7)" */
export function fitMethodWords(fit: IndividualFit): string {
  const { residualModel, method, seed, draws, effectiveSize, paretoK, rHat } = fit;
  const two = (value: number) => numberPrint(value, { decimals: 2 });
  return words.method({
    residuals: words.residuals[residualModel],
    method: words.methods[method],
    seed: String(seed),
    draws: numberPrint(draws),
    effective: numberPrint(effectiveSize, { decimals: 0 }),
    paretoK: paretoK === null ? null : two(paretoK),
    rHat: rHat === null ? null : two(rHat),
  });
}

/** What events do to the kinetics, with where each factor came from: it is in every figure. */
function effectAssumptions({ case: { patient } }: SummaryInput, print: SummaryPrint): readonly string[] {
  const percent = (share: number) => numberPrint(share * 100, { significant: 3 });
  return patient.factors.flatMap(({ effect, detail, from }) =>
    effect === undefined
      ? []
      : [
          words.effect(
            detail,
            print.at(instantMs(from), "dayClock"),
            percent(effect.clearance),
            effect.volume === undefined ? null : percent(effect.volume),
            effect.source ?? words.ownFigure,
          ),
        ],
  );
}

function reviewWords({ review }: MedicineRecord): string {
  return review.status === "reviewed"
    ? words.reviewed(review.by ?? NOT_RECORDED, review.on ?? NOT_RECORDED)
    : words.notReviewed;
}

/** Figures nobody has read in their source: recalled, rules of thumb, and made up. */
export function unverifiedWords(record: MedicineRecord): string {
  const { unverified, total } = unverifiedFigures(record);
  return summaryBannerWords.unverified(unverified, total);
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
