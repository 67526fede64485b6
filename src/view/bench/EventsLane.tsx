import { type KeyboardEvent, useMemo } from "react";
import type { Analysis } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { eventEffectWords, eventWords } from "../../core/messages/index.ts";
import type { ClockRow } from "./clockRow.ts";
import "./DoseLane.css";
import "./EventsLane.css";
import { BAR_ROW, type EventBar, type EventMark, eventsScene, MARK_ROW } from "./eventsScene.ts";
import { RowGround } from "./RowGround.tsx";

interface EventsLaneProps extends ClockRow {
  readonly value: Case;
  readonly analysis: Analysis;
  /** Without an index: the list, to add to. */
  readonly onOpenEvent: (index?: number) => void;
  readonly onOpenPatient: () => void;
}

/** What happened to the patient, on the shared clock: events as bars, measured values as marks, a thin line wherever the kinetics change. */
export function EventsLane(props: EventsLaneProps) {
  const { value, analysis, scale, width } = props;
  const { factors, observations } = value.patient;
  const dispositions = analysis.typical?.dispositions;
  const scene = useMemo(
    () =>
      eventsScene({
        factors,
        observations,
        changesH: (dispositions ?? []).map((span) => span.from).filter(Number.isFinite),
        scale,
        originMs: analysis.clock.originMs,
        zone: value.timeZone,
      }),
    [factors, observations, dispositions, scale, analysis.clock.originMs, value.timeZone],
  );
  return (
    <section className="lane" aria-label={eventWords.lane}>
      <div className="lane-head">
        <button type="button" className="lane-line lane-title" onClick={() => props.onOpenEvent()}>
          {eventWords.lane}
        </button>
        <ul className="lane-lines">
          {factors.length === 0 ? (
            <li>
              <button type="button" className="lane-line lane-add" onClick={() => props.onOpenEvent()}>
                {eventWords.add}
              </button>
            </li>
          ) : null}
          {scene.changes.length > 0 ? <li>{eventWords.changesAt}</li> : null}
        </ul>
      </div>
      <div className="lane-body events-lane-body" style={{ minHeight: scene.height }}>
        <svg className="lane-row" width={width} role="group" aria-label={eventWords.lane}>
          <RowGround row={props}>
            {scene.changes.map((x) => (
              <line key={x} className="event-change" x1={x} x2={x} y1={0} y2="100%" />
            ))}
          </RowGround>
          {scene.marks.map((mark) => (
            <MarkShape key={mark.id} mark={mark} onPress={props.onOpenPatient} />
          ))}
          {scene.bars.map((bar) => {
            const factor = factors[bar.index];
            const effect = factor ? eventEffectWords(factor) : null;
            return (
              <BarShape
                key={bar.index}
                bar={bar}
                words={effect ? `${bar.label}; ${effect}` : bar.label}
                onPress={() => props.onOpenEvent(bar.index)}
              />
            );
          })}
        </svg>
      </div>
    </section>
  );
}

const pressKey = (onPress: () => void) => (event: KeyboardEvent) => {
  if (event.key !== "Enter" && event.key !== " ") return;
  event.preventDefault();
  event.stopPropagation();
  onPress();
};

function MarkShape({ mark, onPress }: { readonly mark: EventMark; readonly onPress: () => void }) {
  const y = mark.top + MARK_ROW / 2;
  return (
    <g
      className="event"
      role="button"
      tabIndex={0}
      aria-label={mark.words}
      onClick={onPress}
      onKeyDown={pressKey(onPress)}
    >
      <title>{mark.words}</title>
      <rect className="event-hit" x={mark.x - 12} y={mark.top} width={24} height={MARK_ROW} />
      <path className="event-mark" d={`M${mark.x} ${y - 5}l5 5l-5 5l-5 -5z`} />
      {mark.label ? (
        <text className="event-label" x={mark.labelX} y={y + 4.5} textAnchor={mark.anchor}>
          {mark.label}
        </text>
      ) : null}
    </g>
  );
}

function BarShape({
  bar,
  words,
  onPress,
}: {
  readonly bar: EventBar;
  readonly words: string;
  readonly onPress: () => void;
}) {
  const top = bar.top + 6;
  const hitFrom = Math.min(bar.from, bar.to - 24);
  return (
    <g className="event" role="button" tabIndex={0} aria-label={words} onClick={onPress} onKeyDown={pressKey(onPress)}>
      <title>{words}</title>
      <rect className="event-hit" x={hitFrom} y={bar.top} width={bar.to - hitFrom} height={BAR_ROW - 4} />
      <path className={bar.hasEffect ? "event-bar event-bar-effect" : "event-bar"} d={barPath(bar, top)} />
      <text className="event-label" x={bar.labelX} y={bar.top + 28} textAnchor={bar.anchor}>
        {bar.label}
      </text>
    </g>
  );
}

const BAR = 7;

/** The bar, its onset rising as a ramp; a moment is a small upright. */
function barPath({ from, to, full, isMoment }: EventBar, top: number): string {
  const foot = top + BAR;
  if (isMoment) return `M${from} ${top - 3}h3v${BAR + 4}h-3z`;
  if (full <= from) return `M${from} ${foot}V${top}H${to}V${foot}z`;
  if (full <= to) return `M${from} ${foot}V${foot - 1}L${full} ${top}H${to}V${foot}z`;
  const reached = top + (BAR - 1) * (1 - (to - from) / (full - from));
  return `M${from} ${foot}V${foot - 1}L${to} ${reached}V${foot}z`;
}
