import { useRef, useState } from "react";
import type { RecordProfile } from "../../../core/analysis/index.ts";
import { recordWords } from "../../../core/messages/index.ts";
import { unitSpoken } from "../../../core/units/index.ts";
import { elapsedTicks } from "../../chart/elapsedTicks.ts";
import { optionStyle, ProfileChart } from "../../chart/ProfileChart.tsx";
import { profileScene } from "../../chart/profileScene.ts";
import { RadioField } from "../../ui/RadioField.tsx";
import { useElementWidth } from "../../ui/useElementWidth.ts";
import type { TrialUnit } from "./trialUnit.ts";
import "./trial.css";

export interface TrialCurveProps {
  readonly profiles: readonly { readonly id: string; readonly name: string; readonly profile: RecordProfile }[];
  readonly unit: TrialUnit;
  /** Words for assistive technology. */
  readonly title: string;
  readonly height?: number;
}

const VIEWS = ["course", "steady"] as const;
type View = (typeof VIEWS)[number];

/** Room for a curve's name at its end, px a letter; names longer than this are cut by the caller. */
const NAME_ROOM = 8.2;

/** Typical curves from the first dose, or over one interval at steady state: told apart by dash and by the name at their end. */
export function TrialCurve({ profiles, unit, title, height = 260 }: TrialCurveProps) {
  const column = useRef<HTMLDivElement>(null);
  const width = useElementWidth(column, 640);
  const [view, setView] = useState<View>("course");
  const curves = profiles.flatMap(({ id, name, profile }) => {
    const curve = view === "steady" ? profile.steady : profile.course;
    return curve ? [{ id, name, timesH: curve.timesH, values: curve.values }] : [];
  });
  const longest = Math.max(0, ...curves.map(({ name }) => name.length));
  const scene = profileScene({
    width,
    height,
    margin: { top: 22, right: Math.min(width / 3, 14 + longest * NAME_ROOM), bottom: 26, left: 54 },
    fromH: 0,
    toH: Math.max(1, ...curves.map(({ timesH }) => timesH.at(-1) ?? 0)),
    nowH: -1,
    midnightsH: [],
    scale: "linear",
    factor: unit.factor,
    window: null,
    curves,
    levels: [],
  });
  return (
    <div className="trial-curve">
      <RadioField
        label={recordWords.curveView}
        value={view}
        choices={VIEWS.map((value) => ({ value, label: recordWords.curveViews[value] }))}
        onChoose={setView}
      />
      <div ref={column}>
        {curves.length > 0 ? (
          <ProfileChart
            scene={{ ...scene, hourTicks: elapsedTicks(scene.clock) }}
            styleOf={(id) => optionStyle(profiles.findIndex((each) => each.id === id))}
            mode="screen"
            title={title}
            unitLabel={unitSpoken(unit.unit, "screen")}
          />
        ) : (
          <p>{recordWords.noSteady}</p>
        )}
      </div>
      <p className="trial-axis">{view === "steady" ? recordWords.hoursAxisSteady : recordWords.hoursAxis}</p>
    </div>
  );
}
