import { fail, issue, type Result, succeed } from "../result/index.ts";
import type { LevelPoint } from "./levelPoints.ts";

/** Points picked by the user: all from one hour to another, both included, or by their places. */
export type PointChoice = { readonly from: number; readonly to: number } | readonly number[];

const isPlaces = (choice: PointChoice): choice is readonly number[] => Array.isArray(choice);

/** The places picked, in order of time, each once. `name` is the argument's, for the path of an issue. */
export function pointChoiceIndices(
  points: readonly LevelPoint[],
  choice: PointChoice,
  name: string,
): Result<readonly number[]> {
  if (!isPlaces(choice)) {
    return succeed(points.flatMap(({ time }, i) => (time >= choice.from && time <= choice.to ? [i] : [])));
  }
  if (choice.some((index) => points[index] === undefined)) {
    return fail(issue("nca-point-unknown", { count: points.length }, [name]));
  }
  return succeed([...new Set(choice)].sort((a, b) => a - b));
}
