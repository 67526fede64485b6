import type { Analysis, LevelResult } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { instantText } from "../../core/time/index.ts";
import type { CurveStyle } from "../chart/ProfileChart.tsx";
import type { ProfileScene } from "../chart/profileScene.ts";
import { levelLines, type Readout, readoutLines } from "./readoutLines.ts";
import type { ShownUnit } from "./shownUnit.ts";

interface ProfileReadoutProps {
  readonly value: Case;
  readonly analysis: Analysis;
  readonly scene: ProfileScene;
  readonly hours: number;
  readonly readouts: readonly Readout[];
  /** The level pointed at. */
  readonly level: LevelResult | null;
  readonly unit: ShownUnit;
  readonly styleOf: (id: string) => CurveStyle;
}

const LINE = 18;
const CHAR = 6.4;
const GAP = 14;

/** Dotted line, a dot on each curve and a box with what they say. */
export function ProfileReadout({ value, analysis, scene, hours, readouts, level, unit, styleOf }: ProfileReadoutProps) {
  const x = scene.clock.x(hours);
  const title = instantText(analysis.clock.originMs + hours * 3_600_000, value.timeZone, "dayClock");
  const all = [...readoutLines(value, readouts, unit), ...(level ? levelLines(value, level, unit) : [])];
  const most = Math.floor((scene.plot.right - scene.plot.left - 24) / CHAR);
  const lines = all.flatMap((line) => wrapped(line, most));
  const width = Math.max(title.length * (CHAR + 0.6), ...lines.map((line) => line.length * CHAR)) + 22;
  const height = 14 + LINE * (lines.length + 1);
  const isLeft = x + GAP + width > scene.plot.right;
  const boxX = isLeft ? Math.max(scene.plot.left, x - GAP - width) : x + GAP;
  return (
    <g className="readout" aria-hidden="true" pointerEvents="none">
      <line className="readout-line" x1={x} x2={x} y1={scene.plot.top} y2={scene.plot.bottom} />
      {readouts.map(({ option, typical, individual }) =>
        // A level's own mark is not to be hidden.
        level && option === null ? null : (
          <circle
            key={option ?? "given"}
            className={`readout-dot readout-${styleOf(option ?? "given")}`}
            cx={x}
            cy={scene.concentration.y((individual?.q50 ?? typical) * scene.factor)}
            r={5}
          />
        ),
      )}
      <rect className="readout-box" x={boxX} y={scene.plot.top + 6} width={width} height={height} rx={2} />
      <text className="readout-title" x={boxX + 11} y={scene.plot.top + 6 + LINE + 2}>
        {title}
      </text>
      {lines.map((line, i) => (
        <text key={`${i} ${line}`} className="readout-text" x={boxX + 11} y={scene.plot.top + 6 + LINE * (i + 2) + 2}>
          {line}
        </text>
      ))}
    </g>
  );
}

/** Broken at spaces into lines of at most so many characters; what follows the first is indented. */
function wrapped(text: string, most: number): string[] {
  const lines: string[] = [];
  let current = "";
  for (const word of text.split(" ")) {
    if (current !== "" && current.length + 1 + word.length > Math.max(most, 24)) {
      lines.push(current);
      current = `\u2003${word}`;
    } else current = current === "" ? word : `${current} ${word}`;
  }
  return [...lines, current];
}
