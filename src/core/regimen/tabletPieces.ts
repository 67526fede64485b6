/** A whole or half tablet as a count of a common step, all exact integers. */
export interface TabletPiece {
  readonly strengthMg: number;
  readonly isHalf: boolean;
  readonly steps: number;
}

export interface PieceGrid {
  readonly pieces: readonly TabletPiece[];
  /** Size of the common step, half nanograms. */
  readonly stepHalfNg: number;
}

/** Amounts are compared in half nanograms, so that half a 62.5 microgram tablet is still a whole number. */
const HALF_NG_PER_MG = 2_000_000;

/** mg as half nanograms; null when it is not a whole number of nanograms. */
export function halfNanograms(mg: number): number | null {
  if (!Number.isFinite(mg)) return null;
  const scaled = Number((mg * (HALF_NG_PER_MG / 2)).toPrecision(15));
  return Number.isSafeInteger(scaled) ? scaled * 2 : null;
}

export function milligrams(halfNg: number): number {
  return Number((halfNg / HALF_NG_PER_MG).toPrecision(15));
}

/** The pieces a product gives: whole tablets, strongest first, then their halves when `halves`. */
export function tabletPieces(strengthsMg: readonly number[], halves: boolean): PieceGrid {
  const strengths = [...new Set(strengthsMg)].sort((a, b) => b - a);
  const sized = strengths.flatMap((strengthMg) => {
    const whole = halfNanograms(strengthMg);
    if (whole === null || whole <= 0)
      throw new RangeError(`strengthsMg: ${strengthMg} mg; allowed above 0, in whole nanograms`);
    return halves
      ? [
          { strengthMg, isHalf: false, size: whole },
          { strengthMg, isHalf: true, size: whole / 2 },
        ]
      : [{ strengthMg, isHalf: false, size: whole }];
  });
  const stepHalfNg = sized.reduce((step, { size }) => greatestCommonDivisor(step, size), 0);
  return { stepHalfNg, pieces: sized.map(({ size, ...piece }) => ({ ...piece, steps: size / stepHalfNg })) };
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b);
}
