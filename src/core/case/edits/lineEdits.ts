import type { DoseLine } from "../../regimen/index.ts";
import type { Case } from "../caseSchema.ts";
import { type Lane, laneLine, laneLines, laneWith, laneWithLine } from "./lane.ts";

function requireNewIds(present: readonly DoseLine[], added: readonly DoseLine[]): void {
  const ids = new Set(present.map((each) => each.id));
  for (const { id } of added) {
    if (ids.has(id)) throw new RangeError(`id: there is already a dose line "${id}" in this lane`);
    ids.add(id);
  }
}

/** Edits of whole dose lines. */
export const lineEdits = {
  linesAdd: (value: Case, { lane, lines }: { lane: Lane; lines: readonly DoseLine[] }): Case => {
    requireNewIds(laneLines(value, lane), lines);
    return laneWith(value, lane, [...laneLines(value, lane), ...lines]);
  },
  lineChange: (value: Case, { lane, line }: { lane: Lane; line: DoseLine }): Case => laneWithLine(value, lane, line),
  /** What was typed anew may be several lines; they stand where the old one stood. */
  lineReplace: (value: Case, { lane, id, lines }: { lane: Lane; id: string; lines: readonly DoseLine[] }): Case => {
    laneLine(value, lane, id);
    const present = laneLines(value, lane);
    requireNewIds(
      present.filter((each) => each.id !== id),
      lines,
    );
    return laneWith(
      value,
      lane,
      present.flatMap((each) => (each.id === id ? lines : [each])),
    );
  },
  lineRemove: (value: Case, { lane, id }: { lane: Lane; id: string }): Case => {
    laneLine(value, lane, id);
    return laneWith(
      value,
      lane,
      laneLines(value, lane).filter((each) => each.id !== id),
    );
  },
};
