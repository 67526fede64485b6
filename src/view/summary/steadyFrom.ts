import { MS_PER_HOUR } from "../../core/time/index.ts";
import { shownPatient } from "./shownPatient.ts";
import { shownReadings } from "./shownReadings.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** From when the chosen option counts as steady, and whose figure that is. */
export interface SteadyFrom {
  readonly ms: number;
  /** What the wait counts from: the first dose of the pattern, or the last of a lead-in that goes on beyond it. */
  readonly startMs: number;
  /** This patient may take longer than the typical one: upper end of the 90 % interval, h; null where the typical patient's time holds. */
  readonly longerH: number | null;
  readonly typicalH: number;
  /** This patient's upper end, h; null without a fit. */
  readonly ownH: number | null;
}

/** The typical patient's 90 % of steady state, or this patient's where it may come later; null when the option has none. */
export function steadyFrom(input: SummaryInput, print: SummaryPrint): SteadyFrom | null {
  const steady = shownReadings(input)?.readings.steadyState;
  if (!steady) return null;
  const patient = shownPatient(input);
  const own = patient.kind === "individual" ? (patient.readings?.steadyState?.timeTo90H.q95 ?? null) : null;
  const longerH = own !== null && own > steady.timeTo90H ? own : null;
  const startMs = print.ms(steady.steady90AtH - steady.timeTo90H);
  return {
    ms: startMs + (longerH ?? steady.timeTo90H) * MS_PER_HOUR,
    startMs,
    longerH,
    typicalH: steady.timeTo90H,
    ownH: own,
  };
}
