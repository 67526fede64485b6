import type { Factor, Observation } from "../../core/case/index.ts";
import { eventLine, eventWords, isEventMoment } from "../../core/messages/index.ts";
import { instantMs, instantText, MS_PER_HOUR } from "../../core/time/index.ts";
import { quantityPrint } from "../../core/units/index.ts";
import type { ClockScale } from "../chart/clockScale.ts";

/** An event as a bar on the clock. */
export interface EventBar {
  /** Its place among the case's factors. */
  readonly index: number;
  readonly from: number;
  readonly to: number;
  /** Where the effect is fully there; equal to `from` without an onset. May lie beyond `to`. */
  readonly full: number;
  readonly isMoment: boolean;
  readonly beginsBefore: boolean;
  readonly goesOn: boolean;
  readonly hasEffect: boolean;
  readonly label: string;
  readonly labelX: number;
  readonly anchor: "start" | "end";
  /** Top of its row, px. */
  readonly top: number;
}

/** Something measured as a mark on the clock. */
export interface EventMark {
  readonly id: string;
  readonly x: number;
  readonly words: string;
  /** Empty where there is no room. */
  readonly label: string;
  readonly labelX: number;
  readonly anchor: "start" | "end";
  readonly top: number;
}

export interface EventsScene {
  readonly marks: readonly EventMark[];
  readonly bars: readonly EventBar[];
  /** Where the kinetics change. */
  readonly changes: readonly number[];
  readonly height: number;
}

interface EventsInput {
  readonly factors: readonly Factor[];
  readonly observations: readonly Observation[];
  /** Elapsed hours at which the kinetics change. */
  readonly changesH: readonly number[];
  readonly scale: ClockScale;
  readonly originMs: number;
  readonly zone: string;
}

export const MARK_ROW = 24;
export const BAR_ROW = 38;
const PAD = 10;
const SHORTEST_LANE = 62;
/** A letter of the labels, px: wide for the typeface, so that rows rather part than touch. */
const LETTER = 6.8;
const GAP = 12;
const MARK_TO_LABEL = 9;
/** A point without length, with room to press. */
const MOMENT_WIDTH = 10;
/** Measured values often come many to a day: more rows of names than this would hide the events. */
const MOST_MARK_ROWS = 3;
const DAY_H = 24;

/** Events and measured values of a case as geometry: bars stacked in as many rows as their overlap needs, marks above them. */
export function eventsScene({ factors, observations, changesH, scale, originMs, zone }: EventsInput): EventsScene {
  const hours = (iso: string) => (instantMs(iso) - originMs) / MS_PER_HOUR;
  const clamp = (x: number) => Math.min(Math.max(x, scale.left), scale.right);
  const isShown = (at: number) => at >= scale.fromH && at <= scale.toH;

  const markRows: number[] = [];
  const marks = observations
    .map((observation) => ({ observation, at: hours(observation.at) }))
    .filter(({ at }) => isShown(at))
    .sort((a, b) => a.at - b.at)
    .map(({ observation, at }): EventMark => {
      const x = scale.x(at);
      const text = `${eventWords[observation.kind === "serumCreatinine" ? "creatinine" : observation.kind]} ${quantityPrint(observation.quantity, { style: "screen" })}`;
      const place = labelPlace(x + MARK_TO_LABEL, x - MARK_TO_LABEL, text, scale.right);
      const row = freeRow(markRows, Math.min(x - 6, place.from), MOST_MARK_ROWS);
      const label = row === null ? "" : text;
      if (row !== null) markRows[row] = Math.max(x + 6, place.to) + GAP;
      return {
        id: observation.id,
        x,
        words: `${text}, ${instantText(instantMs(observation.at), zone, "dayClock")}`,
        label,
        labelX: place.x,
        anchor: place.anchor,
        top: PAD + (row ?? MOST_MARK_ROWS - 1) * MARK_ROW,
      };
    });
  const barsTop = PAD + markRows.length * MARK_ROW;

  const barRows: number[] = [];
  const bars = factors
    .map((factor, index) => ({ factor, index, fromH: hours(factor.from), toH: endOf(factor, hours) }))
    .filter(({ fromH, toH }) => fromH <= scale.toH && toH >= scale.fromH)
    .sort((a, b) => a.fromH - b.fromH || a.index - b.index)
    .map(({ factor, index, fromH, toH }): EventBar => {
      const isMoment = isEventMoment(factor);
      const from = clamp(scale.x(fromH));
      const to = isMoment ? Math.min(from + MOMENT_WIDTH, scale.right) : clamp(scale.x(Math.min(toH, scale.toH)));
      const onsetH = (factor.effect?.onset?.value ?? 0) * DAY_H;
      const label = eventLine(factor, zone);
      const place = labelPlace(from, scale.right, label, scale.right);
      const row = freeRow(barRows, Math.min(from, place.from), Number.POSITIVE_INFINITY) ?? 0;
      barRows[row] = Math.max(to, place.to) + GAP;
      return {
        index,
        from,
        to,
        full: scale.x(fromH + onsetH),
        isMoment,
        beginsBefore: fromH < scale.fromH,
        goesOn: toH > scale.toH,
        hasEffect: factor.effect !== undefined,
        label,
        labelX: place.x,
        anchor: place.anchor,
        top: barsTop + row * BAR_ROW,
      };
    });

  return {
    marks,
    bars,
    changes: changesH.filter(isShown).map(scale.x),
    height: Math.max(SHORTEST_LANE, barsTop + barRows.length * BAR_ROW + PAD / 2),
  };
}

function endOf(factor: Factor, hours: (iso: string) => number): number {
  if (factor.to !== undefined) return hours(factor.to);
  return isEventMoment(factor) ? hours(factor.from) : Number.POSITIVE_INFINITY;
}

/** Begins at `start`, or ends at `end` where the right side has no room for it. */
function labelPlace(start: number, end: number, text: string, right: number) {
  const width = text.length * LETTER;
  if (start + width <= right) return { x: start, anchor: "start" as const, from: start, to: start + width };
  const at = Math.max(Math.min(end, right), Math.min(width, right));
  return { x: at, anchor: "end" as const, from: at - width, to: at };
}

/** The first row that is free from `x` on; a new one if there may be another; else null. */
function freeRow(rows: readonly number[], x: number, most: number): number | null {
  const free = rows.findIndex((taken) => taken <= x);
  if (free >= 0) return free;
  return rows.length < most ? rows.length : null;
}
