import type { Case, Option } from "../caseSchema.ts";

function optionOf(value: Case, id: string): Option {
  const option = value.options.find((each) => each.id === id);
  if (!option) throw new RangeError(`id: no option "${id}"`);
  return option;
}

function requireNewId(value: Case, id: string): void {
  if (id === "given") throw new RangeError('id: "given" is the name of the given lane; an option needs another');
  if (value.options.some((each) => each.id === id)) throw new RangeError(`id: there is already an option "${id}"`);
}

/** Edits of the options. */
export const optionEdits = {
  optionAdd: (value: Case, { id, label }: { id: string; label: string }): Case => {
    requireNewId(value, id);
    return { ...value, options: [...value.options, { id, label, lines: [], chosen: false }] };
  },
  /** The copy stands right after the original and is not chosen. */
  optionDuplicate: (value: Case, { id, newId, label }: { id: string; newId: string; label: string }): Case => {
    requireNewId(value, newId);
    const original = optionOf(value, id);
    const copy: Option = { ...original, id: newId, label, chosen: false };
    return { ...value, options: value.options.flatMap((each) => (each.id === id ? [each, copy] : [each])) };
  },
  optionRename: (value: Case, { id, label }: { id: string; label: string }): Case => {
    optionOf(value, id);
    return { ...value, options: value.options.map((each) => (each.id === id ? { ...each, label } : each)) };
  },
  optionRemove: (value: Case, { id }: { id: string }): Case => {
    optionOf(value, id);
    return { ...value, options: value.options.filter((each) => each.id !== id) };
  },
  /** At most one is chosen; null: none. */
  optionChoose: (value: Case, { id }: { id: string | null }): Case => {
    if (id !== null) optionOf(value, id);
    return {
      ...value,
      options: value.options.map((each) =>
        each.chosen === (each.id === id) ? each : { ...each, chosen: each.id === id },
      ),
    };
  },
};

/** The first free id in A, B, C … Z, AA, AB …, as the end label of a curve reads it. */
export function optionNextId(value: Case): string {
  for (let n = 0; ; n++) {
    const last = String.fromCharCode(65 + (n % 26));
    const id = n < 26 ? last : String.fromCharCode(64 + Math.floor(n / 26)) + last;
    if (!value.options.some((each) => each.id === id)) return id;
  }
}
