import type { IndividualReadings } from "../analysis/index.ts";
import type { TargetWindow } from "../case/index.ts";
import { chanceWords } from "./fitWords.ts";

type Settled = Pick<IndividualReadings, "steadyState" | "shareNeverSteady">;

/** Why an option that repeats has no steady-state figure of this patient; null where it has them, or does not repeat. */
export function steadyWithheldWords({ steadyState, shareNeverSteady }: Settled): string | null {
  return steadyState === null && shareNeverSteady > 0
    ? `In ${chanceWords(shareNeverSteady)} of what the levels leave possible the level never settles under this dose: no steady-state figures are given.`
    : null;
}

/** What becomes of draws that never settle, in the figures and, where there is one, in the chance at steady state; null where all settle. */
export function neverSteadyWords({ steadyState, shareNeverSteady, steadyChance }: IndividualReadings): string | null {
  const kept = [
    ...(steadyState ? ["left out of the steady-state figures"] : []),
    ...(steadyChance ? ["counted as above in the chance at steady state"] : []),
  ];
  return shareNeverSteady > 0 && kept.length > 0
    ? `With a chance of ${chanceWords(shareNeverSteady)} a steady state is never reached: ${kept.join(", ")}.`
    : null;
}

/** Share of the draws from which the lowest of a span is said to come before the option acts. Our choice. */
const MOSTLY = 0.5;

/** That a chance of the lowest of a span is about the level the option found there, which it can't change; null where it is not. */
export function lowestBeforeWords(
  quantity: TargetWindow["quantity"],
  { chance, lowestBeforeOption }: Pick<IndividualReadings["span"], "chance" | "lowestBeforeOption">,
): string | null {
  const isOfLowest = quantity === "trough" || quantity === "lowest-and-highest";
  if (!isOfLowest || !chance || chance.below === 0 || (lowestBeforeOption ?? 0) < MOSTLY) return null;
  return `In ${chanceWords(lowestBeforeOption ?? 0)} of what the levels leave possible the lowest of these days comes before the option's first dose acts: the option can't change it.`;
}
