import {
  type AreaMethod,
  type Noncompartmental,
  noncompartmental,
  type PointChoice,
  type ResidualsReading,
  residualsMethod,
  type WagnerNelson,
  wagnerNelson,
} from "../../core/noncompartmental/index.ts";
import type { Issue, Result } from "../../core/result/index.ts";
import type { RichOccasion } from "./richOccasions.ts";

export interface RichReading {
  readonly result: Result<Noncompartmental>;
  /** Only after one dose, where there is a terminal line and elimination does not saturate. */
  readonly residuals: ResidualsReading | null;
  /** The same; with the terminal rate as elimination rate. */
  readonly absorbed: WagnerNelson | null;
}

/** Everything the panel shows of one dose's levels. */
export function richReading(occasion: RichOccasion, method: AreaMethod, terminal?: PointChoice): RichReading {
  const { points, doseMg, tau } = occasion;
  const picked = terminal === undefined ? {} : { terminal };
  const result: Result<Noncompartmental> =
    tau === null
      ? noncompartmental(points, { dose: doseMg, method, ...picked })
      : noncompartmental(points, { dose: doseMg, method, tau, ...picked });
  const isFirstOrder = !occasion.saturates;
  if (!result.ok || result.value.kind !== "one-dose" || !isFirstOrder)
    return { result, residuals: null, absorbed: null };
  const residuals = residualsMethod(points, picked);
  const absorbed = wagnerNelson(points, result.value.terminal.rate, method);
  return {
    result,
    residuals: residuals.ok ? residuals.value : null,
    absorbed: absorbed.ok ? absorbed.value : null,
  };
}

/** Why there is no terminal line; empty when there is one. */
export function richLineIssues({ result }: RichReading): readonly Issue[] {
  if (!result.ok) return result.issues;
  return result.value.kind === "interval" ? result.value.terminalIssues : [];
}

/** Which points lie on the terminal line. */
export function richLineIndices({ result }: RichReading): readonly number[] {
  return (result.ok && result.value.terminal?.indices) || [];
}

/** Everything that wants a look, each sentence once. */
export function richFlags(occasion: RichOccasion, { result, residuals }: RichReading): readonly Issue[] {
  if (!result.ok) return occasion.cautions;
  const lineIssues = result.value.kind === "interval" ? result.value.terminalIssues : [];
  const all = [...occasion.cautions, ...lineIssues, ...result.value.flags, ...(residuals?.flags ?? [])];
  return all.filter((each, i) => all.findIndex((other) => other.code === each.code) === i);
}
