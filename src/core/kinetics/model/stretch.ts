/** What flows into the body in a stretch without an event. Amounts mg, times h. */
export interface Inflow {
  /** 1/h, one a depot that holds anything. */
  readonly ka: readonly number[];
  /** mg in each depot at the start of the stretch. */
  readonly gut: readonly number[];
  /** mg/h at a constant rate. */
  readonly rate: number;
}

/** mg/h that flow in u h after the start. */
export function inflowAt({ ka, gut, rate }: Inflow, u: number): number {
  let input = rate;
  for (let i = 0; i < ka.length; i++) input += gut[i]! * ka[i]! * Math.exp(-ka[i]! * u);
  return input;
}

/** At this many times the slowest time constant every decay is below 1e-260: what is left has no turn. */
const NOTHING_LEFT = 600;

/** How far on a decaying curve still has a slope to speak of, h: the stretch's length or less. */
export function stretchReach(length: number, slowest: number): number {
  return Math.min(length, NOTHING_LEFT / slowest);
}

/** How fast the inflow changes, mg/h², 0 or less: within a stretch it only falls. */
export function inflowSlopeAt({ ka, gut }: Inflow, u: number): number {
  let slope = 0;
  for (let i = 0; i < ka.length; i++) slope -= gut[i]! * ka[i]! * (ka[i]! * Math.exp(-ka[i]! * u));
  return slope;
}

/**
 * The body over a stretch between two events: nothing is given, started, stopped or changed within it. u is h from its start,
 * 0 or more; levels mg/L, amounts mg.
 */
export interface Stretch {
  levelAt(u: number): number;
  /** mg/L per h. */
  slopeAt(u: number): number;
  /** Where the level turns from rising to falling or back, strictly within the next `length` h, ascending. */
  turns(length: number): readonly number[];
  /** mg·h/L under the level over the first u h. */
  areaTo(u: number): number;
  /** mg in each compartment, the central one first. */
  bodyAt(u: number): Float64Array;
  /** mg eliminated over the first u h. */
  eliminatedTo(u: number): number;
}
