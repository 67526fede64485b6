import { numberPrint } from "../../core/units/index.ts";
import "./terminalChart.css";
import type { TerminalScene } from "./terminalScene.ts";

interface TerminalChartProps {
  readonly scene: TerminalScene;
  /** Words for assistive technology: what the picture says. */
  readonly title: string;
  /** Written above the axis, for example "mg/L". */
  readonly unitLabel: string;
  readonly hoursLabel: string;
}

/** Half the width of a mark, px. */
const ARM = 5;

/** Paints a terminal scene: levels on the line as full squares, others hollow; the line full where fitted, dashed where carried on. */
export function TerminalChart({ scene, title, unitLabel, hoursLabel }: TerminalChartProps) {
  const { plot } = scene;
  return (
    <svg className="terminal-chart" viewBox={`0 0 ${scene.width} ${scene.height}`} role="img" aria-label={title}>
      <g aria-hidden="true">
        <line className="terminal-axis" x1={plot.left} x2={plot.right} y1={plot.bottom} y2={plot.bottom} />
        {scene.levelTicks.map((tick) => (
          <g key={tick.value}>
            <line className="terminal-grid" x1={plot.left} x2={plot.right} y1={tick.y} y2={tick.y} />
            <text className="terminal-tick terminal-tick-y" x={plot.left - 8} y={tick.y + 5}>
              {numberPrint(tick.value, { significant: 3 })}
            </text>
          </g>
        ))}
        <text className="terminal-tick" x={0} y={12}>
          {unitLabel}
        </text>
        {scene.hourTicks.map((tick) => (
          <g key={tick.value}>
            <line className="terminal-axis" x1={tick.x} x2={tick.x} y1={plot.bottom} y2={plot.bottom + 5} />
            <text className="terminal-tick terminal-tick-x" x={tick.x} y={plot.bottom + 18}>
              {numberPrint(tick.value, { significant: 3 })}
            </text>
          </g>
        ))}
        <text className="terminal-tick terminal-hours" x={plot.right} y={scene.height - 2}>
          {hoursLabel}
        </text>
        <path className="terminal-course" d={scene.course} />
        {scene.fitted && <line className="terminal-fitted" {...scene.fitted} />}
        {scene.carriedOn && <line className="terminal-fitted terminal-carried-on" {...scene.carriedOn} />}
        {scene.points.map((point) => (
          <rect
            key={point.time}
            className={point.isOnLine ? "terminal-point terminal-point-on" : "terminal-point"}
            x={point.x - ARM}
            y={point.y - ARM}
            width={2 * ARM}
            height={2 * ARM}
          />
        ))}
      </g>
    </svg>
  );
}
