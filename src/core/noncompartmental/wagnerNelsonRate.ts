import { fail, issue, type Result, succeed } from "../result/index.ts";
import { type LogLine, logLineFit } from "./logLine.ts";
import type { WagnerNelson } from "./wagnerNelson.ts";

/**
 * The absorption rate from the fraction that remains to be absorbed, if it is absorbed at a first-order rate.
 *
 * Formula: ln(remaining) = intercept − ka·t by least squares over the points from one hour to another, both included.
 * @param absorbed from wagnerNelson
 * @param from h
 * @param to h
 * @returns rate (ka) in 1/h, intercept without a unit
 * Outside: an issue for fewer than two points, nothing remaining at one of them (the last point always), or a line that does not fall.
 * Accuracy: relative 1e-12 against least squares in R (tests/outside/wagnerNelsonExamples.test.ts).
 * Source: as wagnerNelson.
 * @example W07 of tests/fixtures/worked_examples.json from 1 to 10 h: ka 0.34267
 */
export function wagnerNelsonRate(absorbed: WagnerNelson, from: number, to: number): Result<LogLine> {
  const chosen = absorbed.points.filter(({ time }) => time >= from && time <= to);
  if (chosen.length < 2) return fail(issue("nca-remaining-few", { found: chosen.length, needed: 2 }));
  const used = chosen.find(({ remaining }) => remaining <= 0);
  if (used) return fail(issue("nca-remaining-none", { time: used.time }));
  const line = logLineFit(chosen.map(({ time, remaining }) => ({ time, value: remaining })));
  return line.rate > 0 ? succeed(line) : fail(issue("nca-remaining-rises", { count: chosen.length }));
}
