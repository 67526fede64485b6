import { argumentFinite, argumentRefuse } from "../argumentCheck.ts";
import type { KineticsParameter } from "./kineticsParameter.ts";
import { type ModelHistory, modelKindOf } from "./modelHistory.ts";

/** What every kind has, besides the figures of its disposition. */
const OF_EVERY_KIND: readonly KineticsParameter[] = ["ka", "bioavailability"];

/** What an individual can differ in under this kind of disposition. */
export function kineticsParametersOf(history: ModelHistory): readonly KineticsParameter[] {
  const first = history.dispositions[0];
  if (first === undefined) argumentRefuse("history.dispositions.length", 0, "", "1 or more");
  return [...modelKindOf("history.dispositions[0].disposition", first.disposition).figures, ...OF_EVERY_KIND];
}

/** Throws a RangeError for names that the history's kind has not, or that come twice. */
export function kineticsParametersCheck(history: ModelHistory, names: readonly KineticsParameter[]): void {
  const known = kineticsParametersOf(history);
  for (const [i, name] of names.entries()) {
    if (!known.includes(name)) argumentRefuse(`names[${i}]`, name, "", known.join(", "));
    if (names.indexOf(name) !== i) argumentRefuse(`names[${i}]`, name, "", "each name once");
  }
}

/** Throws a RangeError unless there is one finite η a name. */
export function kineticsEtaCheck(names: readonly KineticsParameter[], eta: ArrayLike<number>): void {
  if (eta.length !== names.length) argumentRefuse("eta.length", eta.length, "", `that of names, ${names.length}`);
  // The name is made only where it is needed: this is asked for every patient.
  for (let i = 0; i < eta.length; i++) if (!Number.isFinite(eta[i]!)) argumentFinite(`eta[${i}]`, eta[i]!, "");
}
