import { type KineticsParameter, type ModelHistory, modelLevelsOfDraws } from "../kinetics/index.ts";

/** Equally weighted draws of what differs from the typical patient. */
export interface DrawnPatients {
  readonly names: readonly KineticsParameter[];
  readonly count: number;
  /** η of each draw, one array a name. */
  readonly eta: readonly Float64Array[];
}

/** Draws worked out between two looks at what else waits. */
const AT_A_TIME = 8;

/** The levels of all draws at given times, a few draws at a time: how many the first of them is, and for each time a level a draw. */
export function* drawnLevels(
  history: ModelHistory,
  { names, count, eta }: DrawnPatients,
  times: Float64Array,
): Generator<{ readonly first: number; readonly levels: readonly Float64Array[] }> {
  for (let first = 0; first < count; first += AT_A_TIME) {
    const few = eta.map((column) => column.subarray(first, Math.min(first + AT_A_TIME, count)));
    yield { first, levels: modelLevelsOfDraws(history, names, few, times) };
  }
}
