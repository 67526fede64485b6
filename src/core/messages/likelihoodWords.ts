/** Chances from which what may happen is said to be likely, and almost certain. Our choice. */
export const LIKELY_FROM = 0.5;
export const ALMOST_CERTAIN_FROM = 0.95;

/** Of three ways to say it, the one a chance deserves: a title must not understate. */
export function likelihoodWords(
  chance: number,
  ways: { readonly may: string; readonly likely: string; readonly almostCertain: string },
): string {
  return chance >= ALMOST_CERTAIN_FROM ? ways.almostCertain : chance >= LIKELY_FROM ? ways.likely : ways.may;
}
