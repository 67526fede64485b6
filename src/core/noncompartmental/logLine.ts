import type { LevelPoint } from "./levelPoints.ts";

/** ln(level) = intercept − rate·time */
export interface LogLine {
  /** 1/h; above 0 when the line falls */
  readonly rate: number;
  /** ln of mg/L at time 0 */
  readonly intercept: number;
  /** 0 to 1; 0 when all levels are equal, as there is nothing for a line to explain */
  readonly rSquared: number;
}

/**
 * The straight line through the logarithms of levels by ordinary least squares.
 *
 * Formula: rate = −Sxy/Sxx, intercept = mean(ln c) + rate·mean(t), R² = Sxy²/(Sxx·Syy), sums of squares about the means.
 * @param points two or more, h at different times, mg/L above 0
 * @returns see LogLine
 * Outside: fewer than two points or a level of 0 or below throws RangeError.
 * Accuracy: relative 1e-13 in rate for levels that differ (tests/core/noncompartmental/terminalLine.test.ts).
 * Source: ordinary least squares.
 * @example logLineFit([{ time: 0, value: 4 }, { time: 1, value: 2 }, { time: 2, value: 1 }]).rate // 0.693147180559945 = ln 2
 */
export function logLineFit(points: readonly LevelPoint[]): LogLine {
  const [first] = points;
  if (!first || points.length < 2) throw new RangeError(`points: ${points.length}; allowed: 2 or more`);
  // Differences from the first point, so that equal levels leave exactly nothing.
  const origin = logOf(first);
  const x = points.map((point) => point.time - first.time);
  const y = points.map((point) => logOf(point) - origin);
  const meanX = mean(x);
  const meanY = mean(y);
  let xx = 0;
  let xy = 0;
  let yy = 0;
  for (const [i, xi] of x.entries()) {
    const dx = xi - meanX;
    const dy = y[i]! - meanY;
    xx += dx * dx;
    xy += dx * dy;
    yy += dy * dy;
  }
  const slope = xy / xx;
  return {
    rate: slope === 0 ? 0 : -slope,
    intercept: origin + meanY - slope * (first.time + meanX),
    rSquared: yy === 0 ? 0 : Math.min(1, (slope * xy) / yy),
  };
}

export function logLineAt(line: LogLine, time: number): number {
  return Math.exp(line.intercept - line.rate * time);
}

function logOf({ time, value }: LevelPoint): number {
  if (!(value > 0)) throw new RangeError(`value at ${time} h is ${value} mg/L; allowed: above 0`);
  return Math.log(value);
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, each) => sum + each, 0) / values.length;
}
