import type { Case, Level } from "../caseSchema.ts";
import { timedAdd, timedChange, timedRemove } from "./timedList.ts";

/** Edits of measured levels. */
export const levelEdits = {
  levelAdd: (value: Case, { level }: { level: Level }): Case => ({
    ...value,
    levels: timedAdd(value.levels, level, "level"),
  }),
  levelChange: (value: Case, { level }: { level: Level }): Case => ({
    ...value,
    levels: timedChange(value.levels, level, "level"),
  }),
  levelRemove: (value: Case, { id }: { id: string }): Case => ({
    ...value,
    levels: timedRemove(value.levels, id, "level"),
  }),
  /** Leaves a level out of the prediction with a reason, or takes it back in (null). It stays in the case either way. */
  levelExclude: (value: Case, { id, reason }: { id: string; reason: string | null }): Case => {
    const level = value.levels.find((each) => each.id === id);
    if (!level) throw new RangeError(`id: no level "${id}"`);
    const { excluded: _, ...rest } = level;
    const changed: Level = reason === null ? rest : { ...level, excluded: reason };
    return { ...value, levels: value.levels.map((each) => (each.id === id ? changed : each)) };
  },
};
