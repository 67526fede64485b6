import { numberPrint } from "../../core/units/index.ts";
import type { LearntScene } from "./learntScene.ts";
import "./learntChart.css";

interface LearntChartProps {
  readonly scene: LearntScene;
  /** Words for assistive technology: what the picture says. */
  readonly title: string;
}

/** Paints what was known before as a dashed line, what is known now as an area with its 90 % interval under it. */
export function LearntChart({ scene, title }: LearntChartProps) {
  const { plot, interval } = scene;
  return (
    <svg className="learnt-chart" viewBox={`0 0 ${scene.width} ${scene.height}`} role="img" aria-label={title}>
      <g aria-hidden="true">
        <path className="learnt-posterior" d={scene.posterior} />
        <path className="learnt-posterior-line" d={scene.posteriorLine} />
        <path className="learnt-prior" d={scene.prior} />
        <line className="learnt-typical" x1={scene.typicalX} x2={scene.typicalX} y1={plot.top} y2={plot.bottom} />
        <line className="learnt-interval" x1={interval.x1} x2={interval.x2} y1={interval.y} y2={interval.y} />
        <circle className="learnt-median" cx={interval.median} cy={interval.y} r={4} />
        <line className="learnt-axis" x1={plot.left} x2={plot.right} y1={plot.bottom} y2={plot.bottom} />
        {scene.ticks.map((tick) => (
          <g key={tick.value}>
            <line className="learnt-axis" x1={tick.x} x2={tick.x} y1={plot.bottom} y2={plot.bottom + 4} />
            <text className="learnt-tick" x={tick.x} y={plot.bottom + 17}>
              {numberPrint(tick.value, { significant: 3 })}
            </text>
          </g>
        ))}
      </g>
    </svg>
  );
}
