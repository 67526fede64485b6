import { scaleLinear, scaleLog } from "d3-scale";
import { line } from "d3-shape";

/** Levels over the hours after a dose on a log scale, with the terminal line: pure data for a painter. Concentrations come in mg/L. */
export interface TerminalInput {
  readonly width: number;
  readonly height: number;
  readonly margin: { readonly top: number; readonly right: number; readonly bottom: number; readonly left: number };
  /** Turns mg/L into the unit shown. */
  readonly factor: number;
  readonly points: readonly { readonly time: number; readonly value: number; readonly isOnLine: boolean }[];
  /** ln(mg/L) = intercept − rate·time, fitted from one hour to another. */
  readonly line: {
    readonly rate: number;
    readonly intercept: number;
    readonly fromTime: number;
    readonly toTime: number;
  } | null;
  /** h; drawn at least up to here (the end of an interval). */
  readonly untilH: number;
}

export interface TerminalScene {
  readonly width: number;
  readonly height: number;
  readonly plot: { readonly left: number; readonly right: number; readonly top: number; readonly bottom: number };
  readonly points: readonly {
    readonly time: number;
    readonly x: number;
    readonly y: number;
    readonly isOnLine: boolean;
  }[];
  /** How many levels are 0 and have no place on a log scale. */
  readonly notDrawn: number;
  readonly course: string;
  readonly fitted: TerminalStroke | null;
  /** The line carried on beyond the last level. */
  readonly carriedOn: TerminalStroke | null;
  readonly hourTicks: readonly { readonly value: number; readonly x: number }[];
  readonly levelTicks: readonly { readonly value: number; readonly y: number }[];
}

interface TerminalStroke {
  readonly x1: number;
  readonly y1: number;
  readonly x2: number;
  readonly y2: number;
}

/** Beyond the last level, as a part of the hours drawn: room for the line carried on. */
const ROOM_AFTER = 0.12;
/** Above the highest and below the lowest level, as a factor. */
const ROOM_ABOVE = 1.4;

const rounded = (value: number) => Math.round(value * 100) / 100;

export function terminalScene(input: TerminalInput): TerminalScene {
  const { width, height, margin, factor } = input;
  const plot = { left: margin.left, right: width - margin.right, top: margin.top, bottom: height - margin.bottom };
  const lastH = Math.max(input.untilH, ...input.points.map((point) => point.time));
  const endH = lastH > 0 ? lastH * (1 + ROOM_AFTER) : 1;
  const drawn = input.points.filter((point) => point.value > 0);
  const fit = input.line;
  const onLine = (time: number) => (fit ? Math.exp(fit.intercept - fit.rate * time) : 0);
  const shown = [
    ...drawn.map((point) => point.value),
    ...(fit ? [onLine(fit.fromTime), onLine(endH)].filter((value) => value > 0) : []),
  ].map((value) => value * factor);
  const high = shown.length > 0 ? Math.max(...shown) * ROOM_ABOVE : 10;
  const low = shown.length > 0 ? Math.min(...shown) / ROOM_ABOVE : 1;
  const hours = scaleLinear([0, endH], [plot.left, plot.right]);
  const level = scaleLog([low, high], [plot.bottom, plot.top]).clamp(true);
  const x = (time: number) => rounded(hours(time));
  const y = (value: number) => rounded(level(value * factor));
  const stroke = (from: number, to: number): TerminalStroke | null =>
    fit && to > from ? { x1: x(from), y1: y(onLine(from)), x2: x(to), y2: y(onLine(to)) } : null;
  return {
    width,
    height,
    plot,
    points: drawn.map((point) => ({
      time: point.time,
      x: x(point.time),
      y: y(point.value),
      isOnLine: point.isOnLine,
    })),
    notDrawn: input.points.length - drawn.length,
    course:
      line<{ time: number; value: number }>()
        .x((point) => x(point.time))
        .y((point) => y(point.value))(drawn) ?? "",
    fitted: fit && stroke(fit.fromTime, fit.toTime),
    carriedOn: fit && stroke(fit.toTime, endH),
    hourTicks: hours.ticks(8).map((value) => ({ value, x: x(value) })),
    levelTicks: levelTicks(level.ticks(), level),
  };
}

/** Ticks at 1, 2 and 5 of each decade; all of them where those are too few to read from. */
function levelTicks(ticks: readonly number[], scale: (value: number) => number): { value: number; y: number }[] {
  const plain = ticks.filter((value) => /^[125]/.test(value.toExponential()));
  return (plain.length < 2 ? ticks : plain).map((value) => ({ value, y: rounded(scale(value)) }));
}
