import { useMemo } from "react";
import { type Analysis, amountsOverTime } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { amountsWords } from "../../core/messages/index.ts";
import { instantText, MS_PER_HOUR } from "../../core/time/index.ts";
import { numberPrint } from "../../core/units/index.ts";
import "./AmountsRow.css";
import { amountsScene, amountsTimes } from "../chart/amountsScene.ts";
import type { ClockRow } from "./clockRow.ts";
import { RowGround } from "./RowGround.tsx";

interface AmountsRowProps extends ClockRow {
  readonly value: Case;
  readonly analysis: Analysis;
}

const HEIGHT = 190;
/** Leaves the sentence above the drawing its own strip. */
const TOP = 34;
const BOTTOM = HEIGHT - 12;

/** Where the dose is under the chosen option: gut, body, eliminated, stacked up to all that was taken. */
export function AmountsRow(props: AmountsRowProps) {
  const { value, analysis, scale, width } = props;
  const option = (value.options.find((one) => one.chosen) ?? value.options.find((one) => one.lines.length > 0))?.id;
  const shown = option ?? null;
  const drawn = useMemo(() => {
    const own = analysis.options.find((one) => one.id === shown)?.doses ?? [];
    const counted = [...analysis.given, ...own].filter((mark) => mark.countedMg > 0).map((mark) => mark.atH);
    const times = amountsTimes(scale.fromH, scale.toH, counted);
    const amounts = amountsOverTime(analysis, shown, times);
    return amounts && { scene: amountsScene(times, amounts, scale, TOP, BOTTOM), amounts };
  }, [analysis, shown, scale]);
  const ofWhat = shown === null ? amountsWords.given : amountsWords.option(shown);
  if (!drawn) return null;
  const { scene, amounts } = drawn;
  const hasTissues = scene.bands.some((band) => band.part === "peripheral");
  const names = {
    ...amountsWords,
    body: hasTissues ? amountsWords.central : amountsWords.body,
  };
  const end = instantText(analysis.clock.originMs + scale.toH * MS_PER_HOUR, value.timeZone, "dayClock");
  const mg = (amount: number) => numberPrint(amount, { significant: 3 });
  const sum = amountsWords.sum(mg(amounts.taken.at(-1) ?? 0), end);
  const parts = scene.bands.map(({ part }) => `${names[part]} ${mg(amounts[part].at(-1) ?? 0)} mg`).join(", ");
  return (
    <section className="amounts" aria-label={amountsWords.title}>
      <div className="amounts-head">
        <h2 className="amounts-title">{amountsWords.title}</h2>
        <p>
          {ofWhat}, {amountsWords.unit}
        </p>
      </div>
      <div className="amounts-plot">
        <svg
          className="amounts-chart"
          width={width}
          height={HEIGHT}
          viewBox={`0 0 ${width} ${HEIGHT}`}
          role="img"
          aria-label={`${amountsWords.title}, ${ofWhat}. ${sum} ${parts}.`}
        >
          <RowGround row={props} height={HEIGHT}>
            {scene.bands.map(({ part, path }) => (
              <path key={part} className={`amounts-band amounts-${part}`} d={path} />
            ))}
            <path className="amounts-edge" d={scene.edge} />
            <line className="profile-axis" x1={scale.left} x2={scale.right} y1={scene.bottom} y2={scene.bottom} />
            {scene.ticks.map((tick) => (
              <text key={tick.value} className="profile-tick profile-tick-y" x={scale.left - 10} y={tick.y + 5}>
                {numberPrint(tick.value, { significant: 3 })}
              </text>
            ))}
          </RowGround>
          <text className="amounts-sum" x={scale.left + 8} y={22}>
            {sum}
          </text>
          {scene.bands.map(({ part, labelY }) => (
            <text key={part} className="amounts-name" x={scale.right + 8} y={labelY + 4.5}>
              {names[part]}
            </text>
          ))}
        </svg>
      </div>
    </section>
  );
}
