import type { DoseLine } from "../../regimen/index.ts";
import type { Case } from "../caseSchema.ts";

/** "given", or the id of an option. */
export type Lane = string;

export function laneLines(value: Case, lane: Lane): readonly DoseLine[] {
  if (lane === "given") return value.given;
  const option = value.options.find((each) => each.id === lane);
  if (!option) throw new RangeError(`lane: no lane "${lane}"; allowed: "given" or an option's id`);
  return option.lines;
}

export function laneWith(value: Case, lane: Lane, lines: DoseLine[]): Case {
  laneLines(value, lane);
  if (lane === "given") return { ...value, given: lines };
  return { ...value, options: value.options.map((each) => (each.id === lane ? { ...each, lines } : each)) };
}

export function laneLine(value: Case, lane: Lane, id: string): DoseLine {
  const line = laneLines(value, lane).find((each) => each.id === id);
  if (!line) throw new RangeError(`id: no dose line "${id}" in lane "${lane}"`);
  return line;
}

export function laneWithLine(value: Case, lane: Lane, line: DoseLine): Case {
  laneLine(value, lane, line.id);
  return laneWith(
    value,
    lane,
    laneLines(value, lane).map((each) => (each.id === line.id ? line : each)),
  );
}
