import { useMemo, useState } from "react";
import { richWords } from "../../core/messages/index.ts";
import type { AreaMethod } from "../../core/noncompartmental/index.ts";
import { unitSpoken } from "../../core/units/index.ts";
import { TerminalChart } from "../chart/TerminalChart.tsx";
import { terminalScene } from "../chart/terminalScene.ts";
import { DataTable } from "../ui/DataTable.tsx";
import { Notice } from "../ui/Notice.tsx";
import { RichPoints } from "./RichPoints.tsx";
import { type RichUnit, richFigures, richUnits } from "./richFigures.ts";
import { richMessage } from "./richMessage.ts";
import type { RichOccasion } from "./richOccasions.ts";
import { type RichReading, richFlags, richLineIndices, richLineIssues, richReading } from "./richReading.ts";

interface RichOccasionViewProps {
  readonly occasion: RichOccasion;
  readonly method: AreaMethod;
  readonly unit: RichUnit;
  /** From mg/L to the unit shown. */
  readonly factor: number;
  /** An hour of the case's clock in words. */
  readonly clock: (hours: number) => string;
}

/** Points of the terminal line the user took instead, and why. */
interface Overrule {
  readonly indices: readonly number[];
  readonly reason: string;
}

const SIZE = { width: 600, height: 300, margin: { top: 24, right: 8, bottom: 40, left: 48 } };

/** One dose's levels: the picture, what wants a look, the results and the points behind them. */
export function RichOccasionView({ occasion, method, unit, factor, clock }: RichOccasionViewProps) {
  const [overrule, setOverrule] = useState<Overrule | null>(null);
  const reading = useMemo(() => richReading(occasion, method, overrule?.indices), [occasion, method, overrule]);
  const { result } = reading;
  const line = result.ok ? result.value.terminal : null;
  const onLine = richLineIndices(reading);
  const scene = terminalScene({
    ...SIZE,
    factor,
    points: occasion.points.map(({ time, value }, i) => ({ time, value, isOnLine: onLine.includes(i) })),
    line,
    untilH: occasion.tau ?? 0,
  });
  const flags = richFlags(occasion, reading);
  const show = richUnits(unit, factor);
  return (
    <>
      <p>{occasion.tau === null ? richWords.oneDose : richWords.interval(show.hours(occasion.tau))}</p>
      <figure className="rich-levels-figure">
        <TerminalChart
          scene={scene}
          title={chartTitle(reading, occasion, show)}
          unitLabel={unitSpoken(unit, "screen")}
          hoursLabel={richWords.hours}
        />
        <figcaption className="rich-levels-soft">
          {line ? richWords.chartKey : richWords.chartNoLine}
          {scene.notDrawn > 0 && ` ${richWords.notDrawn(scene.notDrawn)}`}
        </figcaption>
      </figure>
      {!result.ok && (
        <Notice gravity="stop" title={richWords.refused} isAnnounced>
          {result.issues.map((each, i) => (
            <p key={i}>{richMessage(each, unit, factor)}</p>
          ))}
        </Notice>
      )}
      {flags.length > 0 && (
        <Notice gravity="check" title={richWords.flagged}>
          {flags.map((each) => (
            <p key={each.code}>{richMessage(each, unit, factor)}</p>
          ))}
        </Notice>
      )}
      {(line || overrule) && (
        <p className={overrule ? "rich-levels-overruled" : "rich-levels-soft"}>
          {overrule ? `${richWords.byHand(overrule.reason)} ${richWords.notKept}` : richWords.automatic}
        </p>
      )}
      {result.ok && (
        <>
          <DataTable
            caption={richWords.figures}
            rows={richFigures(reading, occasion.saturates, unit, factor)}
            rowKey={(row) => row.id}
            columns={[
              { id: "figure", head: richWords.figure, isRowHead: true, isHeadHidden: true, cell: (row) => row.name },
              { id: "value", head: richWords.value, isHeadHidden: true, align: "end", cell: (row) => row.value },
            ]}
          />
          {reading.absorbed && <p className="rich-levels-soft">{richWords.absorbedBy}</p>}
        </>
      )}
      <RichPoints
        occasion={occasion}
        used={onLine}
        absorbed={reading.absorbed}
        isOverruled={overrule !== null}
        show={show}
        clock={clock}
        faultOf={(indices) => richLineIssues(richReading(occasion, method, indices))[0] ?? null}
        onOverrule={setOverrule}
      />
    </>
  );
}

function chartTitle(
  { result }: RichReading,
  { points, saturates }: RichOccasion,
  show: ReturnType<typeof richUnits>,
): string {
  const found = result.ok ? result.value : null;
  if (!found?.terminal) return richWords.chartTitle(points.length, richWords.chartNoLine);
  const { indices, fromTime, toTime } = found.terminal;
  const line = [indices.length, show.hours(fromTime), show.hours(toTime)] as const;
  const words =
    found.halfLife === null || saturates
      ? richWords.chartLineAlone(...line)
      : richWords.chartLine(...line, show.hours(found.halfLife));
  return richWords.chartTitle(points.length, words);
}
