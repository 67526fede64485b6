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
  /** Only when it was drawn. */
  levelMove: (value: Case, { id, at }: { id: string; at: string }): Case => {
    const level = levelOf(value, id);
    return level.at === at ? value : { ...value, levels: timedChange(value.levels, { ...level, at }, "level") };
  },
  /** Only its number, in its own unit. What was confirmed of the number before does not hold for this one. */
  levelRevalue: (value: Case, { id, number }: { id: string; number: number }): Case => {
    const level = levelOf(value, id);
    if (level.quantity.value === number) return value;
    const { confirmed: _, ...rest } = level;
    const changed: Level = { ...rest, quantity: { ...level.quantity, value: number } };
    return { ...value, levels: value.levels.map((each) => (each.id === id ? changed : each)) };
  },
  levelRemove: (value: Case, { id }: { id: string }): Case => ({
    ...value,
    levels: timedRemove(value.levels, id, "level"),
  }),
  /** Leaves a level out of the prediction with a reason, or takes it back in (null). It stays in the case either way. */
  levelExclude: (value: Case, { id, reason }: { id: string; reason: string | null }): Case => {
    const level = levelOf(value, id);
    const { excluded: _, ...rest } = level;
    const changed: Level = reason === null ? rest : { ...level, excluded: reason };
    return { ...value, levels: value.levels.map((each) => (each.id === id ? changed : each)) };
  },
};

function levelOf({ levels }: Case, id: string): Level {
  const level = levels.find((each) => each.id === id);
  if (!level) throw new RangeError(`id: no level "${id}"`);
  return level;
}
