import { type KeyboardEvent, type PointerEvent, useId, useMemo, useState } from "react";
import { type Analysis, concentrationWindow, type LevelResult } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { benchWords, chanceWords, fitWords } from "../../core/messages/index.ts";
import { instantText } from "../../core/time/index.ts";
import { numberPrint, unitSpoken } from "../../core/units/index.ts";
import { valueAt } from "../chart/bandAt.ts";
import { optionStyle, ProfileChart } from "../chart/ProfileChart.tsx";
import { profileParts } from "../chart/profileParts.ts";
import { type ProfileScene, profileScene } from "../chart/profileScene.ts";
import type { OpenLevel } from "../entry/LevelTable.tsx";
import type { BenchSpan } from "./benchSpan.ts";
import { LevelHandles } from "./LevelHandles.tsx";
import { ProfileReadout } from "./ProfileReadout.tsx";
import { levelLines, levelNear, type Readout, readoutLines, readoutsAt } from "./readoutLines.ts";
import { type ShownUnit, unitFactor } from "./shownUnit.ts";
import "./ProfileRow.css";

interface ProfileRowProps {
  readonly value: Case;
  readonly analysis: Analysis;
  readonly span: BenchSpan;
  readonly width: number;
  readonly right: number;
  readonly scale: "linear" | "log";
  readonly unit: ShownUnit;
  /** The option pointed at elsewhere on the bench: its band is filled. */
  readonly lit: string | null;
  readonly isReadOnly: boolean;
  readonly onOpenLevel: (id: string, form: OpenLevel["form"]) => void;
}

export const PROFILE_HEIGHT = 430;
const MARGIN = { top: 14, bottom: 28, left: 0 };

/** The concentration-time curve on the shared clock, with a readout that follows the pointer or the arrow keys. */
export function ProfileRow(props: ProfileRowProps) {
  const { value, analysis, span, width, right, scale, unit, lit } = props;
  const [readoutH, setReadoutH] = useState<number | null>(null);
  const [nearest, setNearest] = useState<string | null>(null);
  const [isDragging, setDragging] = useState(false);
  const factor = unitFactor(value, unit);
  const chosen = value.options.find((option) => option.chosen)?.id ?? null;
  const litOption = lit ?? nearest ?? chosen ?? value.options[0]?.id ?? null;
  const scene = useMemo(
    () =>
      profileScene({
        width,
        height: PROFILE_HEIGHT,
        margin: { ...MARGIN, right },
        fromH: span.fromH,
        toH: span.toH,
        nowH: analysis.clock.nowH,
        midnightsH: analysis.clock.midnightsH,
        scale,
        factor,
        ...profileParts(value, analysis, factor, litOption),
      }),
    [value, analysis, span, width, right, scale, factor, litOption],
  );

  const pxPerHour = (scene.plot.right - scene.plot.left) / (span.toH - span.fromH);
  const hintId = useId();
  const clamp = (hours: number) => Math.min(Math.max(hours, span.fromH), span.toH);
  const onPointerMove = (event: PointerEvent<HTMLDivElement>) => {
    if (isDragging) return;
    const box = event.currentTarget.getBoundingClientRect();
    const hours = clamp(scene.clock.hours(event.clientX - box.left));
    const level = levelNear(analysis, hours, pxPerHour);
    setReadoutH(level ? level.atH : hours);
    setNearest(optionNear(analysis, hours, scene, event.clientY - box.top));
  };
  const goToLevel = (step: 1 | -1) => {
    const from = readoutH ?? clamp(analysis.clock.nowH);
    const shown = analysis.levels.map((level) => level.atH).filter((atH) => atH >= span.fromH && atH <= span.toH);
    const ahead = shown.filter((atH) => (step > 0 ? atH > from : atH < from));
    const next = step > 0 ? (ahead[0] ?? shown[0]) : (ahead.at(-1) ?? shown.at(-1));
    if (next !== undefined) setReadoutH(next);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key.toLowerCase() === "l" && !event.ctrlKey && !event.metaKey && !event.altKey) {
      goToLevel(event.shiftKey ? -1 : 1);
      return;
    }
    const current = readoutH ?? clamp(analysis.clock.nowH);
    const step = event.shiftKey ? 0.25 : 1;
    const next = {
      ArrowLeft: current - step,
      ArrowRight: current + step,
      Home: span.fromH,
      End: span.toH,
      PageDown: current - 24,
      PageUp: current + 24,
    }[event.key];
    if (next === undefined) {
      if (event.key === "Escape") setReadoutH(null);
      return;
    }
    event.preventDefault();
    setReadoutH(clamp(next));
  };
  const style = (id: string) =>
    id === "given" ? ("given" as const) : optionStyle(value.options.findIndex((option) => option.id === id));
  const shownH = readoutH ?? clamp(analysis.clock.nowH);
  const readouts = useMemo(() => readoutsAt(analysis, shownH), [analysis, shownH]);
  const level = readoutH === null ? null : levelNear(analysis, readoutH, pxPerHour);
  return (
    <div
      className="profile-place"
      role="group"
      aria-label={benchWords.profile}
      onPointerMove={onPointerMove}
      onPointerDown={onPointerMove}
      onPointerLeave={() => {
        setReadoutH(null);
        setNearest(null);
      }}
    >
      <div
        className="profile-row"
        role="slider"
        tabIndex={0}
        aria-label="Time on the profile"
        aria-valuemin={span.fromH}
        aria-valuemax={span.toH}
        aria-valuenow={shownH}
        aria-valuetext={readoutWords(value, analysis, shownH, readouts, unit, level)}
        aria-describedby={hintId}
        onFocus={(event) => {
          if (event.currentTarget.matches(":focus-visible"))
            setReadoutH((current) => current ?? clamp(analysis.clock.nowH));
        }}
        onBlur={() => setReadoutH(null)}
        onKeyDown={onKeyDown}
      >
        <ProfileChart
          scene={scene}
          styleOf={style}
          chosen={chosen}
          litLevel={level?.id ?? null}
          mode="screen"
          title={profileTitle(value, analysis, unit)}
        >
          {readoutH !== null && !isDragging && (
            <ProfileReadout
              value={value}
              analysis={analysis}
              scene={scene}
              hours={readoutH}
              readouts={readouts}
              level={level}
              unit={unit}
              styleOf={style}
            />
          )}
        </ProfileChart>
        <span id={hintId} className="visually-hidden">
          {fitWords.profileHint}
        </span>
      </div>
      <LevelHandles
        value={value}
        scene={scene}
        originMs={analysis.clock.originMs}
        isReadOnly={props.isReadOnly}
        onOpen={props.onOpenLevel}
        onDragging={setDragging}
      />
    </div>
  );
}

function profileTitle(value: Case, analysis: Analysis, unit: ShownUnit): string {
  const factor = unitFactor(value, unit);
  const three = (mgPerL: number) => numberPrint(mgPerL * factor, { significant: 3 });
  const shown = unitSpoken(unit, "screen");
  const limits = concentrationWindow(value);
  const window = limits ? `target window ${three(limits.low)} to ${three(limits.high)} ${shown}, ` : "";
  const options = analysis.options
    .flatMap((option) => {
      const settled = option.typical?.steadyState;
      const { individual } = option;
      const own = individual?.steadyState;
      if (own) {
        return [
          `option ${option.id} settles in this patient between ${three(own.lowest.q50)} (${three(own.lowest.q05)} to ${three(own.lowest.q95)}) and ${three(own.peak.q50)} (${three(own.peak.q05)} to ${three(own.peak.q95)}) ${shown}`,
        ];
      }
      // The typical patient's levels would be taken for this one's.
      if (individual) {
        return individual.shareNeverSteady > 0
          ? [
              `option ${option.id} never settles in this patient with a chance of ${chanceWords(individual.shareNeverSteady)}`,
            ]
          : [];
      }
      return settled
        ? [`option ${option.id} settles between ${three(settled.lowest)} and ${three(settled.peak)} ${shown}`]
        : [];
    })
    .join(", ");
  return `Predicted ${value.medicine.name} concentration in ${shown} over time: ${window}${options || "no option with a steady state"}`;
}

function readoutWords(
  value: Case,
  analysis: Analysis,
  hours: number,
  readouts: readonly Readout[],
  unit: ShownUnit,
  level: LevelResult | null,
): string {
  const lines = [...readoutLines(value, readouts, unit), ...(level ? levelLines(value, level, unit) : [])];
  return [instantText(analysis.clock.originMs + hours * 3_600_000, value.timeZone, "dayClock"), ...lines].join("; ");
}

/** How near the pointer counts as on a curve, px. */
const NEAR_CURVE = 28;

/** The option whose curve, as drawn, lies under the pointer. */
function optionNear(analysis: Analysis, hours: number, scene: ProfileScene, y: number): string | null {
  if (hours < analysis.clock.nowH) return null;
  const near = analysis.options.flatMap(({ id, curve, band }) => {
    const drawn = band ? { timesH: band.timesH, values: band.q50 } : curve;
    const at = drawn && valueAt(drawn.timesH, drawn.values, hours);
    if (at === null) return [];
    const distance = Math.abs(scene.concentration.y(at * scene.factor) - y);
    return distance <= NEAR_CURVE ? [{ id, distance }] : [];
  });
  return near.sort((a, b) => a.distance - b.distance)[0]?.id ?? null;
}
