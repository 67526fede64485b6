import { type Issue, issue, type Result, succeed } from "../result/index.ts";
import { logLineAt } from "./logLine.ts";
import {
  type AfterOneDose,
  EXTRAPOLATED_LIMIT,
  type ObservedFigures,
  type ToInfinity,
} from "./noncompartmentalTypes.ts";
import type { TerminalLine } from "./terminalLine.ts";

/** The figures of one single dose; formulas at noncompartmental. */
export function afterOneDose(figures: ObservedFigures, line: Result<TerminalLine>, dose: number): Result<AfterOneDose> {
  if (!line.ok) return line;
  const terminal = line.value;
  const clastPredicted = logLineAt(terminal, figures.tlast);
  const observed = toInfinity(figures, figures.clast, terminal.rate, dose);
  return succeed({
    kind: "one-dose",
    ...figures,
    terminal,
    halfLife: Math.LN2 / terminal.rate,
    clastPredicted,
    observed,
    predicted: toInfinity(figures, clastPredicted, terminal.rate, dose),
    flags: flags(figures, observed),
  });
}

function toInfinity(
  { auc, aumc, method, tlast }: ObservedFigures,
  last: number,
  rate: number,
  dose: number,
): ToInfinity {
  const beyond = last / rate;
  const whole = auc[method] + beyond;
  const moment = aumc[method] + tlast * beyond + beyond / rate;
  const clearance = dose / whole;
  return {
    auc: whole,
    extrapolatedShare: beyond / whole,
    aumc: moment,
    mrt: moment / whole,
    clearance,
    volume: clearance / rate,
  };
}

function flags({ firstTime, firstLevel }: ObservedFigures, { extrapolatedShare }: ToInfinity): Issue[] {
  const found: Issue[] = [];
  if (extrapolatedShare > EXTRAPOLATED_LIMIT) {
    found.push(issue("nca-extrapolated-much", { share: extrapolatedShare, limit: EXTRAPOLATED_LIMIT }));
  }
  if (firstTime > 0) found.push(issue("nca-area-begins-late", { time: firstTime }));
  else if (firstLevel > 0) found.push(issue("nca-level-at-dose", { value: firstLevel }));
  return found;
}
