import { halfNanograms, type TabletPiece, tabletPieces } from "./tabletPieces.ts";

export type Divisible = "whole" | "half" | "unknown";

export interface TabletCount {
  readonly strengthMg: number;
  /** Tablets or capsules of this strength, in halves. */
  readonly count: number;
}

/** An amount that needs more steps than this (a 5 g dose in steps of 0.05 mg) is not made up from tablets. */
const MOST_STEPS = 100_000;
/** Costs of the search: any number of whole tablets before one half. */
const HALF_COST = 1_000_000;

/**
 * The fewest tablets that make an amount exactly: whole ones if they can, else with the fewest halves where the product may be halved.
 * Among as few, those of a single strength come first, then the strongest.
 *
 * @param amountMg mg, above 0
 * @param strengthsMg content of one tablet, mg, each above 0; none for a liquid
 * @param divisible "half" allows halves; "whole" and "unknown" do not
 * @returns tablets by strength, strongest first, or null when the amount can't be made (always null without strengths)
 *
 * Outside: throws RangeError for a strength that is not above 0. Exact: amounts are compared as whole numbers.
 * Example: 300 mg from 200 mg and 100 mg: one of each; 300 mg from 200 mg that may be halved: 1.5.
 */
export function tabletsFor(
  amountMg: number,
  strengthsMg: readonly number[],
  divisible: Divisible,
): readonly TabletCount[] | null {
  const whole = fewestPieces(amountMg, strengthsMg, false);
  if (whole) return oneStrength(amountMg, strengthsMg, whole) ?? whole;
  return divisible === "half" ? fewestPieces(amountMg, strengthsMg, true) : null;
}

/** As many tablets of a single strength, if one makes the amount: 2 of 300 mg rather than 500 mg and 100 mg. */
function oneStrength(
  amountMg: number,
  strengthsMg: readonly number[],
  found: readonly TabletCount[],
): readonly TabletCount[] | null {
  const count = found.reduce((sum, each) => sum + each.count, 0);
  const target = halfNanograms(amountMg);
  const strengthMg = strengthsMg.find((mg) => (halfNanograms(mg) ?? 0) * count === target);
  return strengthMg === undefined ? null : [{ strengthMg, count }];
}

function fewestPieces(
  amountMg: number,
  strengthsMg: readonly number[],
  halves: boolean,
): readonly TabletCount[] | null {
  const target = halfNanograms(amountMg);
  if (target === null || target <= 0 || strengthsMg.length === 0) return null;
  const { pieces, stepHalfNg } = tabletPieces(strengthsMg, halves);
  const steps = target / stepHalfNg;
  if (!Number.isInteger(steps) || steps > MOST_STEPS) return null;

  // cost[s]: cheapest way to make s steps; last[s]: the piece it ends with.
  const cost = new Float64Array(steps + 1).fill(Number.POSITIVE_INFINITY);
  const last = new Int32Array(steps + 1).fill(-1);
  cost[0] = 0;
  for (let made = 1; made <= steps; made += 1) {
    pieces.forEach((piece, at) => {
      const before = cost[made - piece.steps];
      if (before === undefined) return;
      const total = before + (piece.isHalf ? HALF_COST : 1);
      if (total < cost[made]!) {
        cost[made] = total;
        last[made] = at;
      }
    });
  }
  return cost[steps] === Number.POSITIVE_INFINITY ? null : countPieces(steps, pieces, last);
}

function countPieces(steps: number, pieces: readonly TabletPiece[], last: Int32Array): readonly TabletCount[] {
  const counts = new Map<number, number>();
  for (let left = steps; left > 0; ) {
    const piece = pieces[last[left]!]!;
    counts.set(piece.strengthMg, (counts.get(piece.strengthMg) ?? 0) + (piece.isHalf ? 0.5 : 1));
    left -= piece.steps;
  }
  return [...counts].sort(([a], [b]) => b - a).map(([strengthMg, count]) => ({ strengthMg, count }));
}
