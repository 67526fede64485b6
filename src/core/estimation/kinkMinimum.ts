import { type MinimiseOptions, type Minimum, minimise } from "../numerics/index.ts";
import type { EstimationObjective } from "./estimationObjective.ts";

/** How far to either side the objective must have risen, in ω (at most 1). */
const STEPS = [1e-5, 1e-3] as const;

/**
 * A lowest point at a kink: where the most likely ka lets a part that is absorbed at a constant rate end at the very instant of a level,
 * the objective's derivative by ka jumps from falling to rising. A search for a smooth minimum stops there without having found one.
 *
 * Formula: ka is held where the search stopped and the others are brought to their minimum; the point is taken if the objective has risen
 * 1e-5 and 1e-3 ω away to both sides along every parameter.
 * @param objective see EstimationObjective
 * @param stopped where a search ended with "no-descent"
 * @param options of that search
 * @returns the minimum, its gradient that of the other parameters and its Hessian the expected one; null where there is none
 */
export function kinkMinimum(
  objective: EstimationObjective,
  stopped: Minimum,
  options: MinimiseOptions & { readonly scale: readonly number[] },
): Minimum | null {
  const kink = objective.problem.random.findIndex(({ name }) => name === "ka");
  if (stopped.end !== "no-descent" || kink < 0) return null;
  const held = stopped.x[kink]!;
  const whole = (others: readonly number[]) => [...others.slice(0, kink), held, ...others.slice(kink)];
  const others = (eta: readonly number[]) => eta.filter((_, i) => i !== kink);
  const found =
    stopped.x.length === 1
      ? { ...stopped, status: "converged" as const, x: [], gradientNorm: 0 }
      : minimise({
          value: (eta) => objective.value(whole(eta)),
          gradient: (eta) => others(objective.gradient(whole(eta))),
          start: others(stopped.x),
          options: { ...options, scale: others(options.scale) },
        });
  if (found.status !== "converged") return null;
  const x = whole(found.x);
  const least = objective.value(x);
  const isLowest = x.every((_, i) =>
    STEPS.every((step) =>
      [-step, step].every(
        (way) => objective.value(x.map((each, j) => (j === i ? each + way * options.scale[i]! : each))) > least,
      ),
    ),
  );
  if (!isLowest) return null;
  return { ...found, end: "minimum", x, value: least, hessian: objective.expectedHessian(x) };
}
