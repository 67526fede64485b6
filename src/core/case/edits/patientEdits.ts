import type { Case, Patient } from "../caseSchema.ts";

/** Sets an optional field, or takes it away for null: the file never holds an empty one. */
function patientWith<K extends "sex" | "age" | "height">(value: Case, key: K, to: Patient[K] | null): Case {
  const { [key]: _, ...rest } = value.patient;
  return { ...value, patient: (to === null ? rest : { ...value.patient, [key]: to }) as Patient };
}

/** Edits of the patient's fixed traits. */
export const patientEdits = {
  sexSet: (value: Case, { sex }: { sex: "female" | "male" | null }): Case => patientWith(value, "sex", sex),
  ageSet: (value: Case, { age }: { age: NonNullable<Patient["age"]> | null }): Case => patientWith(value, "age", age),
  heightSet: (value: Case, { height }: { height: NonNullable<Patient["height"]> | null }): Case =>
    patientWith(value, "height", height),
};
