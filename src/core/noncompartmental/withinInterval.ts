import { fail, type Issue, issue, type Result, succeed } from "../result/index.ts";
import { type AreaMethod, areaOver, levelBetween } from "./areaUnderCurve.ts";
import type { LevelPoint } from "./levelPoints.ts";
import { logLineAt } from "./logLine.ts";
import {
  type EndLevel,
  EXTRAPOLATED_LIMIT,
  type ObservedFigures,
  type WithinInterval,
} from "./noncompartmentalTypes.ts";
import type { TerminalLine } from "./terminalLine.ts";

interface End {
  readonly level: number;
  readonly from: EndLevel;
}

/**
 * The figures of one steady-state interval; formulas at noncompartmental. At steady state the interval ends at the level it began with:
 * an end that was not drawn takes the other's, or the end is on the terminal line. Points beyond the interval count up to its end.
 */
export function withinInterval(
  points: readonly LevelPoint[],
  figures: ObservedFigures,
  line: Result<TerminalLine>,
  dose: number,
  tau: number,
): Result<WithinInterval> {
  const { method } = figures;
  const inside = points.filter(({ time }) => time <= tau);
  if (inside.length === 0) return fail(issue("nca-interval-empty", { tau, first: figures.firstTime }, ["tau"]));
  if (figures.tmax > tau) return fail(issue("nca-peak-beyond-interval", { tau, peakTime: figures.tmax }, ["tau"]));
  const end = endLevel(points, line, tau, method);
  if (!end.ok) return end;
  const first = inside[0]!;
  const last = inside.at(-1)!;
  const start: End =
    first.time === 0 ? { level: first.value, from: "measured" } : { level: end.value.level, from: "other-end" };
  const begin = { time: 0, value: start.level };
  const finish = { time: tau, value: end.value.level };
  const whole = [...(first.time === 0 ? [] : [begin]), ...inside, ...(last.time === tau ? [] : [finish])];
  const { auc } = areaOver(whole, method);
  const beyond = end.value.from === "between" ? 0 : areaOver([last, finish], method).auc;
  const before = areaOver([begin, first], method).auc;
  const extrapolatedShare = (before + beyond) / auc;
  const terminal = line.ok ? line.value : null;
  const clearance = dose / auc;
  return succeed({
    kind: "interval",
    ...figures,
    terminal,
    terminalIssues: line.ok ? [] : line.issues,
    halfLife: terminal && Math.LN2 / terminal.rate,
    interval: {
      tau,
      startLevel: start.level,
      startFrom: start.from,
      endLevel: end.value.level,
      endFrom: end.value.from,
      auc,
      extrapolatedShare,
      average: auc / tau,
      clearance,
      volume: terminal && clearance / terminal.rate,
    },
    flags: flags(extrapolatedShare, start, end.value),
  });
}

function endLevel(
  points: readonly LevelPoint[],
  line: Result<TerminalLine>,
  tau: number,
  method: AreaMethod,
): Result<End> {
  const after = points.findIndex(({ time }) => time >= tau);
  const point = points[after];
  if (point && point.time === tau) return succeed({ level: point.value, from: "measured" });
  if (point) return succeed({ level: levelBetween(points[after - 1]!, point, tau, method), from: "between" });
  const first = points[0]!;
  if (first.time === 0) return succeed({ level: first.value, from: "other-end" });
  return line.ok ? succeed({ level: logLineAt(line.value, tau), from: "line" }) : line;
}

function flags(share: number, start: End, end: End): Issue[] {
  const found: Issue[] = [];
  if (share > EXTRAPOLATED_LIMIT) found.push(issue("nca-extrapolated-much", { share, limit: EXTRAPOLATED_LIMIT }));
  if (start.from === "other-end") found.push(issue("nca-start-from-end", { level: start.level }));
  if (end.from === "other-end") found.push(issue("nca-end-from-start", { level: end.level }));
  if (end.from === "line") found.push(issue("nca-end-from-line", { level: end.level }));
  return found;
}
