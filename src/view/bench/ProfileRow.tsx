import { type KeyboardEvent, type PointerEvent, useMemo, useState } from "react";
import type { Analysis } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { instantText } from "../../core/time/index.ts";
import { numberPrint, unitSpoken } from "../../core/units/index.ts";
import { optionStyle, ProfileChart } from "../chart/ProfileChart.tsx";
import { profileScene } from "../chart/profileScene.ts";
import type { BenchSpan } from "./benchSpan.ts";
import { ProfileReadout } from "./ProfileReadout.tsx";
import { readoutLines } from "./readoutLines.ts";
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
}

export const PROFILE_HEIGHT = 430;
const MARGIN = { top: 14, bottom: 28, left: 0 };

/** The concentration-time curve on the shared clock, with a readout that follows the pointer or the arrow keys. */
export function ProfileRow({ value, analysis, span, width, right, scale, unit }: ProfileRowProps) {
  const [readoutH, setReadoutH] = useState<number | null>(null);
  const factor = unitFactor(value, unit);
  const scene = useMemo(() => {
    const { window } = value;
    const isConcentration = window?.low.unit === "mg/L";
    return profileScene({
      width,
      height: PROFILE_HEIGHT,
      margin: { ...MARGIN, right },
      fromH: span.fromH,
      toH: span.toH,
      nowH: analysis.clock.nowH,
      midnightsH: analysis.clock.midnightsH,
      scale,
      factor,
      window: window && isConcentration ? { low: window.low.value, high: window.high.value } : null,
      curves: [
        ...(analysis.givenCurve ? [{ id: "given", name: "", ...analysis.givenCurve }] : []),
        ...analysis.options.flatMap((option) =>
          option.curve ? [{ id: option.id, name: option.id, ...option.curve }] : [],
        ),
      ],
      levels: analysis.levels.map((level) => ({
        id: level.id,
        atH: level.atH,
        value: level.measured,
        sd: level.assaySd,
        excluded: level.excluded !== null,
        belowLimit: level.belowLimit,
        label: `${level.belowLimit ? "below " : ""}${numberPrint(level.measured * factor, { significant: 3 })}`,
      })),
    });
  }, [value, analysis, span, width, right, scale, factor]);

  const clamp = (hours: number) => Math.min(Math.max(hours, span.fromH), span.toH);
  const onPointerMove = (event: PointerEvent<HTMLDivElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    setReadoutH(clamp(scene.clock.hours(event.clientX - box.left)));
  };
  const onKeyDown = (event: KeyboardEvent) => {
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
  const chosen = value.options.find((option) => option.chosen)?.id ?? null;
  const style = (id: string) =>
    id === "given" ? ("given" as const) : optionStyle(value.options.findIndex((option) => option.id === id));
  const shownH = readoutH ?? clamp(analysis.clock.nowH);
  return (
    <div
      className="profile-row"
      role="slider"
      tabIndex={0}
      aria-label="Time on the profile"
      aria-valuemin={span.fromH}
      aria-valuemax={span.toH}
      aria-valuenow={shownH}
      aria-valuetext={readoutWords(value, analysis, shownH, unit)}
      onPointerMove={onPointerMove}
      onPointerDown={onPointerMove}
      onPointerLeave={() => setReadoutH(null)}
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
        mode="screen"
        title={profileTitle(value, analysis, unit)}
      >
        {readoutH !== null && (
          <ProfileReadout
            value={value}
            analysis={analysis}
            scene={scene}
            hours={readoutH}
            unit={unit}
            styleOf={style}
          />
        )}
      </ProfileChart>
    </div>
  );
}

function profileTitle(value: Case, analysis: Analysis, unit: ShownUnit): string {
  const factor = unitFactor(value, unit);
  const three = (mgPerL: number) => numberPrint(mgPerL * factor, { significant: 3 });
  const shown = unitSpoken(unit, "screen");
  const window =
    value.window?.low.unit === "mg/L"
      ? `target window ${three(value.window.low.value)} to ${three(value.window.high.value)} ${shown}, `
      : "";
  const options = analysis.options
    .flatMap((option) => {
      const settled = option.typical?.steadyState;
      return settled
        ? [`option ${option.id} settles between ${three(settled.lowest)} and ${three(settled.peak)} ${shown}`]
        : [];
    })
    .join(", ");
  return `Predicted ${value.medicine.name} concentration in ${shown} over time: ${window}${options || "no option with a steady state"}`;
}

function readoutWords(value: Case, analysis: Analysis, hours: number, unit: ShownUnit): string {
  const lines = readoutLines(value, analysis, hours, unit);
  return [instantText(analysis.clock.originMs + hours * 3_600_000, value.timeZone, "dayClock"), ...lines].join("; ");
}
