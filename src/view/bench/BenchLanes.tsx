import { useMemo } from "react";
import { type Analysis, type DoseMark, laneDoses } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { benchWords, laneLineWords } from "../../core/messages/index.ts";
import type { DoseLine } from "../../core/regimen/index.ts";
import { optionStyle } from "../chart/ProfileChart.tsx";
import type { OpenPanel } from "./BenchPanel.tsx";
import type { ClockRow } from "./clockRow.ts";
import { DoseLane } from "./DoseLane.tsx";
import { EventsLane } from "./EventsLane.tsx";
import { LaneLines, OptionHead } from "./OptionHead.tsx";

interface BenchLanesProps {
  readonly value: Case;
  readonly analysis: Analysis;
  readonly row: ClockRow;
  readonly isReadOnly: boolean;
  readonly onPanel: (panel: OpenPanel) => void;
  /** The option pointed at, or none. */
  readonly onLit: (option: string | null) => void;
}

/** The lanes under the profile: the doses given, those of every option, the events. */
export function BenchLanes({ value, analysis, row, isReadOnly, onPanel, onLit }: BenchLanesProps) {
  const marks = useMemo(() => {
    const { originMs } = analysis.clock;
    const clock = {
      originMs,
      nowMs: originMs + analysis.clock.nowH * 3_600_000,
      untilMs: originMs + analysis.clock.toH * 3_600_000,
    };
    const given = laneDoses(value, value.given, "given", clock).marks;
    const options = value.options.map((option) => laneDoses(value, option.lines, "option", clock).marks);
    const largest = Math.max(0, ...[given, ...options].flat().map((mark: DoseMark) => mark.amount.value));
    return { given, options, largest };
  }, [value, analysis]);
  const lineTexts = (lines: readonly DoseLine[]) =>
    lines.map((line) => ({ id: line.id, text: laneLineWords(line, value.timeZone) }));
  const shared = { ...row, value, originMs: analysis.clock.originMs, largest: marks.largest, isReadOnly };
  const openGiven = () => onPanel({ kind: "doses" });
  const openGivenLine = (lineId: string) => onPanel({ kind: "doses", lineId });
  return (
    <>
      <DoseLane
        {...shared}
        lane="given"
        name={benchWords.given}
        lines={value.given}
        marks={marks.given}
        style="given"
        onOpenLine={openGivenLine}
        head={
          <>
            <button type="button" className="lane-line lane-title" onClick={openGiven}>
              {benchWords.given}
            </button>
            <LaneLines lines={lineTexts(value.given)} onOpenLine={openGivenLine} onAdd={openGiven} />
          </>
        }
      />
      {value.options.map((option, i) => {
        const openLine = (lineId: string) => onPanel({ kind: "option", option: option.id, lineId });
        return (
          <DoseLane
            {...shared}
            key={option.id}
            lane={option.id}
            name={`Option ${option.id}`}
            lines={option.lines}
            marks={marks.options[i] ?? []}
            style={optionStyle(i)}
            onLit={(isLit) => onLit(isLit ? option.id : null)}
            onOpenLine={openLine}
            head={
              <OptionHead
                option={option}
                index={i}
                lines={lineTexts(option.lines)}
                onOpenLine={openLine}
                onMenu={() => onPanel({ kind: "option", option: option.id })}
              />
            }
          />
        );
      })}
      <EventsLane
        {...row}
        value={value}
        analysis={analysis}
        onOpenEvent={(index) => onPanel({ kind: "events", ...(index === undefined ? {} : { index }) })}
        onOpenPatient={() => onPanel({ kind: "patient" })}
      />
    </>
  );
}
