import type { KeyboardEvent } from "react";
import type { DoseMark } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { type Product, productOf } from "../../core/medicine/index.ts";
import { instantIso, instantText } from "../../core/time/index.ts";
import { quantityPrint } from "../../core/units/index.ts";
import type { ClockScale } from "../chart/clockScale.ts";
import type { CurveStyle } from "../chart/ProfileChart.tsx";
import { tokenNudge } from "./gestures/tokenSnap.ts";
import { useDoseDrag } from "./gestures/useDoseDrag.ts";
import type { LaneToken } from "./laneTokens.ts";
import { useTokenActions } from "./useTokenActions.ts";

interface DoseTokenProps {
  readonly token: LaneToken;
  readonly lane: string;
  readonly baseline: number;
  readonly scale: ClockScale;
  readonly originMs: number;
  readonly value: Case;
  readonly style: CurveStyle;
  readonly isSelected: boolean;
  readonly isReadOnly: boolean;
  readonly onSelect: () => void;
  readonly onOpenLine: () => void;
  /** While it is dragged: what changes, from what to what. */
  readonly onWords: (words: string | null) => void;
}

const HOUR_MS = 3_600_000;
const WIDTH = 15;
const HIT = 26;

const STATUS_WORDS: Readonly<Record<DoseMark["status"], string>> = {
  taken: "",
  missed: ", missed",
  late: ", late",
  moved: ", moved",
  "after-now": ", after the now line: not counted",
  "before-now": ", before the now line: not counted",
};

/** Release form by shape: a modified-release product is round-ended, an immediate-release tablet square-cornered, a liquid in between. */
function tokenCorner(product: Product): number {
  if (product.release === "modified") return WIDTH / 2.2;
  return product.form === "liquid" ? 4.5 : 2;
}

/** One dose: dragged along the clock, in an option also up and down; moved and changed with arrow keys, opened with Enter. */
export function DoseToken(props: DoseTokenProps) {
  const { token, lane, scale, originMs, value, baseline } = props;
  const { mark } = token;
  const actions = useTokenActions(value, lane, mark, originMs);
  const atMs = originMs + mark.atH * HOUR_MS;
  const { onSelect: onPress, onWords } = props;
  const startDrag = useDoseDrag({ value, lane, mark, scale, originMs, onPress, onWords });

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey) return;
    const done = () => {
      event.preventDefault();
      event.stopPropagation();
    };
    if (event.key === "ArrowLeft" || event.key === "ArrowRight") {
      done();
      if (!props.isReadOnly) actions.moveTo(tokenNudge(atMs, event.key === "ArrowLeft" ? -1 : 1, event.shiftKey));
    } else if (event.key === "ArrowUp" || event.key === "ArrowDown") {
      done();
      if (!props.isReadOnly) actions.step(event.key === "ArrowUp" ? 1 : -1);
    } else if (event.key === "Delete" || event.key === "Backspace") {
      done();
      if (!props.isReadOnly) actions.toggleMissed();
    } else if (event.key === "Enter") {
      done();
      props.onOpenLine();
    } else if (event.key === " ") {
      done();
      props.onSelect();
    }
  };

  const product = productOf(value.medicine, mark.product);
  const amount = quantityPrint(mark.amount, { style: "screen", microgram: "microgram" });
  const words = `${instantText(atMs, value.timeZone, "dayClock")}, ${amount}${STATUS_WORDS[mark.status]}`;
  const isHollow = mark.status === "missed" || mark.status === "after-now" || mark.status === "before-now";
  const foot = baseline - token.above;
  const y = foot - token.height;
  // Of a stack each token answers for its own part, the lowest for the label too.
  const hitTop = token.isTop ? Math.min(y, baseline - 40) : y;
  const hitFoot = token.above === 0 ? baseline + 22 : foot;
  return (
    <g
      className={`token token-${props.style}${lane === "given" ? "" : " token-scales"}${isHollow ? " token-hollow" : ""}${props.isSelected ? " token-selected" : ""}`}
      role="slider"
      tabIndex={0}
      aria-label={`Dose ${mark.index + 1}`}
      aria-valuenow={Math.round(mark.atH * 60) / 60}
      aria-valuemin={scale.fromH}
      aria-valuemax={scale.toH}
      aria-valuetext={words}
      aria-readonly={props.isReadOnly}
      data-at={instantIso(atMs, value.timeZone)}
      onKeyDown={onKeyDown}
      {...(props.isReadOnly ? { onClick: props.onSelect } : { onPointerDown: startDrag })}
    >
      <title>{`${words}, ${product.name}`}</title>
      <rect className="token-hit" x={token.x - HIT / 2} y={hitTop} width={HIT} height={hitFoot - hitTop} />
      <rect
        className="token-body"
        x={token.x - WIDTH / 2}
        y={y}
        width={WIDTH}
        height={token.height}
        rx={tokenCorner(product)}
      />
      {mark.status === "late" || mark.status === "moved" ? (
        <line
          className="token-scheduled"
          x1={scale.x(mark.scheduledH)}
          x2={token.x}
          y1={baseline + 4}
          y2={baseline + 4}
        />
      ) : null}
      <text className="token-label" x={token.x} y={baseline + 19}>
        {token.label}
      </text>
    </g>
  );
}
