/** What regimen needs to know of a product of the medicine record. */
export interface DoseProduct {
  readonly id: string;
  readonly name: string;
  readonly form: "tablet" | "capsule" | "liquid";
  /** mg in one tablet or capsule; empty for a liquid. */
  readonly strengths: readonly number[];
  /** mg/mL, of a liquid. */
  readonly concentrationMgPerMl?: number;
}
