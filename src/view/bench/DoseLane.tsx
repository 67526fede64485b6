import { type ReactNode, useMemo, useState } from "react";
import type { DoseMark } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import type { DoseLine } from "../../core/regimen/index.ts";
import type { CurveStyle } from "../chart/ProfileChart.tsx";
import type { ClockRow } from "./clockRow.ts";
import { DoseToken } from "./DoseToken.tsx";
import "./DoseLane.css";
import { DragReadout } from "./DragReadout.tsx";
import { lineReach } from "./gestures/lineReach.ts";
import { LineEnd } from "./LineEnd.tsx";
import { laneTokens } from "./laneTokens.ts";
import { RowGround } from "./RowGround.tsx";
import { TokenBar } from "./TokenBar.tsx";

interface DoseLaneProps extends ClockRow {
  readonly lane: string;
  readonly name: string;
  readonly value: Case;
  readonly lines: readonly DoseLine[];
  readonly marks: readonly DoseMark[];
  readonly originMs: number;
  readonly largest: number;
  readonly style: CurveStyle;
  readonly isReadOnly: boolean;
  readonly onOpenLine: (lineId: string) => void;
  readonly head: ReactNode;
  /** Pointed at, or holding the focus. */
  readonly onLit?: (isLit: boolean) => void;
}

const BASELINE = 52;

/** A row of doses on the shared clock: tokens whose height is the dose, missed ones hollow. */
export function DoseLane(props: DoseLaneProps) {
  const { marks, scale, width } = props;
  const [selected, setSelected] = useState<string | null>(null);
  const [dragged, setDragged] = useState<{ readonly key: string; readonly words: string } | null>(null);
  const tokens = useMemo(() => laneTokens(marks, scale, props.largest), [marks, scale, props.largest]);
  const ends = props.lines.flatMap((line) => {
    const reach = lineReach(line);
    const last = marks.filter((mark) => mark.lineId === line.id).at(-1);
    return reach && last && last.atH >= scale.fromH && last.atH <= scale.toH ? [{ line, reach, lastH: last.atH }] : [];
  });
  const held = tokens.find((token) => token.key === dragged?.key);
  const chosen = tokens.find((token) => token.key === selected) ?? null;
  return (
    <section
      className="lane"
      aria-label={props.name}
      onPointerEnter={() => props.onLit?.(true)}
      onPointerLeave={() => props.onLit?.(false)}
      onFocus={() => props.onLit?.(true)}
      onBlur={() => props.onLit?.(false)}
    >
      <div className="lane-head">{props.head}</div>
      <div className="lane-body">
        <svg className="lane-row" width={width} role="group" aria-label={`${props.name}: doses`}>
          <RowGround row={props} />
          {tokens.map((token) => (
            <DoseToken
              key={token.key}
              token={token}
              lane={props.lane}
              baseline={BASELINE}
              scale={scale}
              originMs={props.originMs}
              value={props.value}
              style={props.style}
              isSelected={token.key === selected}
              isReadOnly={props.isReadOnly}
              onSelect={() => setSelected(token.key === selected ? null : token.key)}
              onOpenLine={() => props.onOpenLine(token.mark.lineId)}
              onWords={(words) => setDragged(words === null ? null : { key: token.key, words })}
            />
          ))}
          {!props.isReadOnly &&
            ends.map((end) => (
              <LineEnd
                key={end.line.id}
                lane={props.lane}
                line={end.line}
                reach={end.reach}
                lastH={end.lastH}
                scale={scale}
                baseline={BASELINE}
                style={props.style}
                onPress={() => props.onOpenLine(end.line.id)}
              />
            ))}
        </svg>
        {dragged && held && <DragReadout words={dragged.words} x={held.x} y={BASELINE - 8} width={width} />}
        {chosen && (
          <TokenBar
            mark={chosen.mark}
            lane={props.lane}
            value={props.value}
            originMs={props.originMs}
            x={Math.min(Math.max(chosen.x, 8), width - 8)}
            isReadOnly={props.isReadOnly}
            onClose={() => setSelected(null)}
            onOpenLine={() => props.onOpenLine(chosen.mark.lineId)}
          />
        )}
      </div>
    </section>
  );
}
