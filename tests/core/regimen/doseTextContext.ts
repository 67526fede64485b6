import type { DoseProduct, DoseTextContext } from "../../../src/core/regimen/index.ts";

/** Invented products: a modified-release tablet (the one meant when none is named), a plain tablet and a liquid. */
export const PRODUCTS: readonly DoseProduct[] = [
  { id: "mr", name: "12-hour modified-release tablet", form: "tablet", strengths: [200, 300] },
  { id: "ir", name: "tablet", form: "tablet", strengths: [100] },
  { id: "cap", name: "capsule", form: "capsule", strengths: [50] },
  { id: "solution", name: "oral solution", form: "liquid", strengths: [], concentrationMgPerMl: 50 },
];

/** Now: Wednesday 4 March 2026, 09:00, in London. */
export function doseTextContext(rest: Partial<DoseTextContext> = {}): DoseTextContext {
  let made = 0;
  return {
    zone: "Europe/London",
    nowIso: "2026-03-04T09:00:00+00:00",
    lane: "option",
    products: PRODUCTS,
    defaultProduct: "mr",
    newId: () => {
      made += 1;
      return `L${made}`;
    },
    ...rest,
  };
}
