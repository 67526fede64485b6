import type { Case, Observation } from "../caseSchema.ts";
import { timedAdd, timedChange, timedRemove } from "./timedList.ts";

function withObservations(value: Case, observations: Observation[]): Case {
  return { ...value, patient: { ...value.patient, observations } };
}

/** Edits of what was measured on the patient. */
export const observationEdits = {
  observationAdd: (value: Case, { observation }: { observation: Observation }): Case =>
    withObservations(value, timedAdd(value.patient.observations, observation, "observation")),
  observationChange: (value: Case, { observation }: { observation: Observation }): Case =>
    withObservations(value, timedChange(value.patient.observations, observation, "observation")),
  observationRemove: (value: Case, { id }: { id: string }): Case =>
    withObservations(value, timedRemove(value.patient.observations, id, "observation")),
};
