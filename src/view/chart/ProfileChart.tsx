import type { ReactNode } from "react";
import { numberPrint } from "../../core/units/index.ts";
import { LevelMark } from "./LevelMark.tsx";
import "./profileChart.css";
import type { ProfileScene } from "./profileScene.ts";
import { windowEdges } from "./windowEdges.ts";

/** How a curve is drawn: by its place among the options (dash first, hue second), or as the doses given. */
export type CurveStyle = "given" | "option-1" | "option-2" | "option-3" | "option-4";

export function optionStyle(index: number): CurveStyle {
  return `option-${(index % 4) + 1}` as CurveStyle;
}

interface ProfileChartProps {
  readonly scene: ProfileScene;
  readonly styleOf: (curveId: string) => CurveStyle;
  /** Curve to stand out: drawn heavier. */
  readonly chosen?: string | null;
  /** A level pointed at: what was predicted there is drawn beside it. */
  readonly litLevel?: string | null;
  readonly mode: "screen" | "print";
  /** Words for assistive technology: what the picture says. */
  readonly title: string;
  /** Written at the left above the axis, for example "mg per L". */
  readonly unitLabel?: string;
  readonly nowLabels?: { readonly before: string; readonly after: string };
  readonly dayLabels?: readonly { readonly x: number; readonly text: string }[];
  /** A readout drawn over the curves. */
  readonly children?: ReactNode;
}

/** Paints a profile scene: window, day lines, now line, curves named at their ends, levels with their bars. */
export function ProfileChart(props: ProfileChartProps) {
  const { scene, mode } = props;
  const { plot } = scene;
  const hatch = `profile-hatch-${mode}`;
  return (
    <svg
      className={`profile-chart profile-chart-${mode}`}
      viewBox={`0 0 ${scene.width} ${scene.height}`}
      width={scene.width}
      height={scene.height}
      role="img"
      aria-label={props.title}
    >
      <defs>
        <pattern id={hatch} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <line className="profile-hatch" x1="0" x2="0" y1="0" y2="7" />
        </pattern>
      </defs>
      {mode === "screen" && scene.nowX !== null && (
        <rect className="profile-past" x={plot.left} y={0} width={scene.nowX - plot.left} height={scene.height} />
      )}
      {scene.window && <WindowChannel scene={scene} hatch={mode === "print" ? `url(#${hatch})` : undefined} />}
      {scene.midnights.map((midnight) => (
        <line
          key={midnight.hours}
          className="profile-day"
          x1={midnight.x}
          x2={midnight.x}
          y1={mode === "print" ? plot.bottom : 0}
          y2={mode === "print" ? plot.bottom + 6 : scene.height}
        />
      ))}
      <Axes scene={scene} unitLabel={props.unitLabel} />
      {props.dayLabels?.map((label) => (
        <text key={label.x} className="profile-tick" x={label.x + 4} y={plot.bottom + 18}>
          {label.text}
        </text>
      ))}
      {scene.nowX !== null && <NowLine scene={scene} x={scene.nowX} labels={props.nowLabels} />}
      {scene.bands.map((band) => (
        <BandPaths key={band.id} band={band} style={props.styleOf(band.id)} />
      ))}
      {scene.curves.map((curve) => (
        <path
          key={curve.id}
          className={
            curve.isThin
              ? `profile-curve profile-thin profile-thin-${props.styleOf(curve.of)}`
              : `profile-curve profile-${props.styleOf(curve.of)}${curve.of === props.chosen ? " profile-chosen" : ""}`
          }
          d={curve.path}
        />
      ))}
      {scene.curves.map(
        (curve) =>
          curve.name !== "" && (
            <text
              key={curve.id}
              className={`profile-name profile-${props.styleOf(curve.of)}`}
              x={curve.endX + 8}
              y={curve.labelY + 5}
            >
              {curve.name}
            </text>
          ),
      )}
      {scene.levels.map((level) => (
        <LevelMark key={level.id} level={level} right={plot.right} isLit={level.id === props.litLevel} />
      ))}
      {props.children}
    </svg>
  );
}

/** 50 % inside 90 %, or only the 90 % edges. */
function BandPaths({ band, style }: { band: ProfileScene["bands"][number]; style: CurveStyle }) {
  return (
    <g className={`profile-band profile-band-${style}`} data-band={band.id}>
      {band.isFilled && <path className="profile-band-wide" d={band.wide} />}
      {band.isFilled && <path className="profile-band-narrow" d={band.narrow} />}
      <path
        className={band.isFilled ? "profile-band-edge" : "profile-band-edge profile-band-edge-alone"}
        d={band.edges}
      />
    </g>
  );
}

function WindowChannel({ scene, hatch }: { scene: ProfileScene; hatch: string | undefined }) {
  const { plot, window } = scene;
  if (!window) return null;
  const numbers = windowEdges(window);
  return (
    <g>
      <rect
        className="profile-window"
        x={plot.left}
        y={window.top}
        width={plot.right - plot.left}
        height={Math.max(0, window.bottom - window.top)}
        {...(hatch ? { fill: hatch, style: { fill: hatch } } : {})}
      />
      {[window.top, window.bottom].map((y, index) => (
        <g key={index}>
          <line className="profile-edge" x1={plot.left} x2={plot.right} y1={y} y2={y} />
          <text className="profile-edge-value" x={plot.right + 34} y={(numbers[index] ?? y) + 5}>
            {numberPrint(index === 0 ? window.high : window.low, { significant: 3 })}
          </text>
        </g>
      ))}
    </g>
  );
}

function Axes({ scene, unitLabel }: { scene: ProfileScene; unitLabel: string | undefined }) {
  const { plot } = scene;
  return (
    <g aria-hidden="true">
      <line className="profile-axis" x1={plot.left} x2={plot.right} y1={plot.bottom} y2={plot.bottom} />
      {scene.concentration.ticks.map((tick) => (
        <text key={tick.value} className="profile-tick profile-tick-y" x={plot.left - 10} y={tick.y + 5}>
          {numberPrint(tick.value, { significant: 3 })}
        </text>
      ))}
      {unitLabel && (
        <text className="profile-tick profile-unit" x={0} y={12}>
          {unitLabel}
        </text>
      )}
      {scene.hourTicks.map((tick) => (
        <g key={tick.hours}>
          <line className="profile-axis" x1={tick.x} x2={tick.x} y1={plot.bottom} y2={plot.bottom + 5} />
          <text className="profile-tick profile-tick-x" x={tick.x} y={plot.bottom + 18}>
            {tick.label}
          </text>
        </g>
      ))}
    </g>
  );
}

function NowLine({
  scene,
  x,
  labels,
}: {
  scene: ProfileScene;
  x: number;
  labels: { before: string; after: string } | undefined;
}) {
  return (
    <g>
      <line className="profile-now" x1={x} x2={x} y1={labels ? 2 : 0} y2={labels ? scene.plot.bottom : scene.height} />
      {labels && (
        <>
          <text className="profile-tick profile-now-before" x={x - 7} y={12}>
            {labels.before}
          </text>
          <text className="profile-tick" x={x + 7} y={12}>
            {labels.after}
          </text>
        </>
      )}
    </g>
  );
}
