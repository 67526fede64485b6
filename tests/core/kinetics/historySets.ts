import { readFileSync } from "node:fs";
import type { Dose, OralKinetics } from "../../../src/core/kinetics/index.ts";

/** One history of tests/fixtures/histories_public.json (see tests/fixtures/README.md). */
export interface HistorySet {
  readonly id: string;
  readonly kinetics: OralKinetics;
  readonly doses: readonly Dose[];
  readonly times: readonly number[];
  readonly levels: readonly number[];
}

interface RawHistory {
  readonly id: string;
  readonly inputs: Readonly<Record<"F" | "V_L" | "ka_per_h" | "ke_per_h" | "tlag_h", string>> & {
    readonly doses: readonly { readonly t_h: string; readonly dose_mg: string }[];
  };
  readonly points: readonly { readonly t_h: string; readonly C: string }[];
}

/** All 15 histories. */
export function historySets(): HistorySet[] {
  const file = new URL("../../fixtures/histories_public.json", import.meta.url);
  const { histories } = JSON.parse(readFileSync(file, "utf8")) as { histories: RawHistory[] };
  return histories.map(({ id, inputs, points }) => ({
    id,
    kinetics: {
      ka: Number(inputs.ka_per_h),
      ke: Number(inputs.ke_per_h),
      volume: Number(inputs.V_L),
      bioavailability: Number(inputs.F),
      lag: Number(inputs.tlag_h),
    },
    doses: inputs.doses.map((dose) => ({ time: Number(dose.t_h), amount: Number(dose.dose_mg) })),
    times: points.map((point) => Number(point.t_h)),
    levels: points.map((point) => Number(point.C)),
  }));
}
