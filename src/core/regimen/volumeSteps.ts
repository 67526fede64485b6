/** What is told apart on an oral measure of 5 to 10 mL: common practice. mL */
export const VOLUME_STEP_ML = 0.5;

/**
 * The nearest volumes below and above one, on half millilitres. Example: 15 mL: 14.5 and 15.5; 2.2 mL: 2 and 2.5; 0.5 mL: none and 1.
 *
 * @param volumeMl mL, 0 or more; need not be on a step itself
 * @returns mL, never below one step: null there. Exact
 */
export function volumeSteps(volumeMl: number): { readonly down: number | null; readonly up: number } {
  if (!(volumeMl >= 0) || !Number.isFinite(volumeMl)) {
    throw new RangeError(`volumeMl: ${volumeMl} mL; allowed 0 or more`);
  }
  const position = volumeMl / VOLUME_STEP_ML;
  const down = (Math.ceil(position) - 1) * VOLUME_STEP_ML;
  return { down: down > 0 ? down : null, up: (Math.floor(position) + 1) * VOLUME_STEP_ML };
}
