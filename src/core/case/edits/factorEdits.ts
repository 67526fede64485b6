import type { Case, Factor } from "../caseSchema.ts";

function withFactors(value: Case, factors: Factor[]): Case {
  return { ...value, patient: { ...value.patient, factors } };
}

function requireIndex({ patient: { factors } }: Case, index: number): void {
  if (!Number.isInteger(index) || index < 0 || index >= factors.length) {
    throw new RangeError(
      `index: ${index}; allowed: a factor's place, a whole number from 0 to below ${factors.length}`,
    );
  }
}

/** Edits of what happened to the patient. Factors keep the order in which they were entered: an index stays that of the same factor until one is removed. */
export const factorEdits = {
  factorAdd: (value: Case, { factor }: { factor: Factor }): Case =>
    withFactors(value, [...value.patient.factors, factor]),
  factorChange: (value: Case, { index, factor }: { index: number; factor: Factor }): Case => {
    requireIndex(value, index);
    return withFactors(value, value.patient.factors.with(index, factor));
  },
  factorRemove: (value: Case, { index }: { index: number }): Case => {
    requireIndex(value, index);
    return withFactors(value, value.patient.factors.toSpliced(index, 1));
  },
};
