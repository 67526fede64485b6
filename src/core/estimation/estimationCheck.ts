import { kineticsParametersCheck } from "../kinetics/index.ts";
import type { EstimationLevel, EstimationProblem, RandomParameter, Residual } from "./estimationTypes.ts";

/** Throws the one kind of error a wrong argument gets: name, value, unit, what is allowed. */
export function estimationRefuse(name: string, value: unknown, unit: string, allowed: string): never {
  throw new RangeError(`${name} is ${String(value)}${unit === "" ? "" : ` ${unit}`}; allowed: ${allowed}`);
}

export function estimationCount(name: string, value: number, least: number, most: number): void {
  if (!(Number.isInteger(value) && value >= least && value <= most)) {
    estimationRefuse(name, value, "", `a whole number, ${least} to ${most}`);
  }
}

function randomCheck(random: readonly RandomParameter[]): void {
  if (random.length === 0)
    estimationRefuse("problem.random.length", 0, "", "1 or more: nothing differs between patients");
  for (const [i, { name, omega }] of random.entries()) {
    if (!(omega > 0 && omega < Infinity)) {
      estimationRefuse(`problem.random[${i}].omega (${name})`, omega, "", "a finite number above 0");
    }
  }
}

function residualCheck({ additive, proportional }: Residual): void {
  if (!(additive >= 0 && additive < Infinity)) {
    estimationRefuse("problem.residual.additive", additive, "mg/L", "a finite number, 0 or more");
  }
  if (!(proportional >= 0 && proportional < Infinity)) {
    estimationRefuse("problem.residual.proportional", proportional, "", "a finite number, 0 or more");
  }
  if (additive === 0 && proportional === 0) {
    estimationRefuse("problem.residual", "0 mg/L and 0 of the prediction", "", "one of the two above 0");
  }
}

function levelsCheck(levels: readonly EstimationLevel[], residual: Residual): void {
  for (const [i, { time, value, kind }] of levels.entries()) {
    const name = `problem.levels[${i}]`;
    if (!Number.isFinite(time)) estimationRefuse(`${name}.time`, time, "h", "any finite number");
    if (kind !== "measured" && kind !== "below-limit") {
      estimationRefuse(`${name}.kind`, kind, "", "measured or below-limit");
    }
    const isFromZero = kind === "measured" && residual.additive > 0;
    if (!(value < Infinity && (value > 0 || (isFromZero && value === 0)))) {
      // A proportional error of 0 explains a level of 0 without limit.
      estimationRefuse(
        `${name}.value`,
        value,
        "mg/L",
        isFromZero ? "a finite number, 0 or more" : "a finite number above 0",
      );
    }
  }
}

/** Throws a RangeError for a problem that is not as its type says; no levels are allowed, they teach nothing. */
export function estimationCheck(problem: EstimationProblem): void {
  const { history, random, correlation, residual, levels, residualModel } = problem;
  randomCheck(random);
  kineticsParametersCheck(
    history,
    random.map(({ name }) => name),
  );
  residualCheck(residual);
  levelsCheck(levels, residual);
  if (residualModel !== "normal" && residualModel !== "robust") {
    estimationRefuse("problem.residualModel", residualModel, "", "normal or robust");
  }
  if (correlation !== undefined && correlation.length !== random.length) {
    estimationRefuse("problem.correlation.length", correlation.length, "", `that of random, ${random.length}`);
  }
}
