import { argumentRefuse } from "../argumentCheck.ts";
import { timesCheck } from "../historyProfile.ts";

/** Between these every product and power the models form stays a normal double; far beyond any medicine either way. */
const LEAST = 1e-30;
const MOST = 1e30;

export function modelPositive(name: string, value: number, unit: string): void {
  if (!(value >= LEAST && value <= MOST)) argumentRefuse(name, value, unit, `above 0, ${LEAST} to ${MOST}`);
}

export const isModelAmount = (value: number) => value === 0 || (value >= LEAST && value <= MOST);

export function modelAmount(name: string, value: number): void {
  if (!isModelAmount(value)) argumentRefuse(name, value, "mg", `0, or ${LEAST} to ${MOST}`);
}

export const isModelTime = (value: number) => Math.abs(value) <= MOST;

export function modelTime(name: string, value: number): void {
  if (!isModelTime(value)) argumentRefuse(name, value, "h", `-${MOST} to ${MOST}`);
}

/** h, 0 or more. */
export function modelDelay(name: string, value: number): void {
  if (!(value >= 0 && value <= MOST)) argumentRefuse(name, value, "h", `0 to ${MOST}`);
}

/** Ascending and within the same bounds, as a typed array. */
export function modelTimes(times: ArrayLike<number>): Float64Array {
  const checked = timesCheck(times);
  if (checked.length > 0) {
    modelTime("times[0]", checked[0]!);
    modelTime(`times[${checked.length - 1}]`, checked[checked.length - 1]!);
  }
  return checked;
}
