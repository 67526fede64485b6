import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import { type DoseMark, laneDoses } from "../../core/analysis/index.ts";
import { optionNextId } from "../../core/case/index.ts";
import { amountsWords, benchWords, laneLineWords } from "../../core/messages/index.ts";
import type { DoseLine } from "../../core/regimen/index.ts";
import { instantText } from "../../core/time/index.ts";
import { unitSpoken } from "../../core/units/index.ts";
import { clockScale } from "../chart/clockScale.ts";
import { optionStyle } from "../chart/ProfileChart.tsx";
import { Button } from "../ui/Button.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import { AmountsRow } from "./AmountsRow.tsx";
import { BenchColumn } from "./BenchColumn.tsx";
import { BenchPanel, type OpenPanel } from "./BenchPanel.tsx";
import "./BenchScreen.css";
import { useElementWidth } from "../ui/useElementWidth.ts";
import { type BenchSpan, spanMoved, spanStart, spanWithin, spanZoomed } from "./benchSpan.ts";
import { CaseStrip } from "./CaseStrip.tsx";
import { ClockHead } from "./ClockHead.tsx";
import { DoseLane } from "./DoseLane.tsx";
import { EventsLane } from "./EventsLane.tsx";
import { LaneLines, OptionHead } from "./OptionHead.tsx";
import { ProfileKey } from "./ProfileKey.tsx";
import { ProfileRow } from "./ProfileRow.tsx";
import { SavingBar } from "./SavingBar.tsx";
import { shownUnits } from "./shownUnit.ts";
import { useBenchKeys } from "./useBenchKeys.ts";

/** Room at the right of the clock for the curves' names and the window's edges, px. */
const RIGHT = 76;

/** Levels from which they can say something without a model. */
const RICH_FROM = 4;

interface BenchScreenProps {
  readonly onPrint: () => void;
}

/** The screen where a case is worked on: everything about it over one shared clock. */
export function BenchScreen({ onPrint }: BenchScreenProps) {
  const open = useWorkbench((state) => state.open);
  const edit = useWorkbench((state) => state.edit);
  const [panel, setPanel] = useState<OpenPanel | null>(null);
  const [scale, setScale] = useState<"linear" | "log">("linear");
  const [isOtherUnit, setOtherUnit] = useState(false);
  const [chosenSpan, setChosenSpan] = useState<BenchSpan | null>(null);
  const [lit, setLit] = useState<string | null>(null);
  const [isWhereShown, setWhereShown] = useState(false);
  const clockColumn = useRef<HTMLDivElement>(null);
  const width = useElementWidth(clockColumn, 900);
  useBenchKeys();

  const caseId = open?.value.id ?? null;
  useEffect(() => {
    // A different case starts with its own span.
    if (caseId !== null) setChosenSpan(null);
  }, [caseId]);

  const analysis = open?.analysis.result ?? null;
  const value = open ? (open.preview ?? open.value) : null;
  const whole = analysis ? { fromH: analysis.clock.fromH, toH: analysis.clock.toH } : null;
  const span = useMemo(() => {
    if (!analysis) return null;
    const { nowH, fromH, toH } = analysis.clock;
    return chosenSpan ? spanWithin({ fromH, toH }, chosenSpan) : spanStart({ fromH, toH }, nowH, width - RIGHT);
  }, [analysis, chosenSpan, width]);

  const lanes = useMemo(() => {
    if (!value || !analysis) return null;
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

  const close = useCallback(() => setPanel(null), []);
  if (!open || !value) return null;
  const isReader = open.role === "reader";
  const units = shownUnits(value);
  const unit = isOtherUnit ? units.other : units.first;
  const lineTexts = (lines: readonly DoseLine[]) =>
    lines.map((line) => ({ id: line.id, text: laneLineWords(line, value.timeZone) }));
  const clock = span ? clockScale(span.fromH, span.toH, 0, width - RIGHT) : null;
  const nowX =
    clock && analysis && span && analysis.clock.nowH >= span.fromH && analysis.clock.nowH <= span.toH
      ? clock.x(analysis.clock.nowH)
      : null;
  const midnightsX =
    clock && analysis && span
      ? analysis.clock.midnightsH.filter((hours) => hours > span.fromH && hours < span.toH).map(clock.x)
      : [];
  const zoom = (factor: number) => {
    if (whole && span && analysis) {
      const middle = nowX !== null ? analysis.clock.nowH : (span.fromH + span.toH) / 2;
      setChosenSpan(spanZoomed(whole, span, factor, middle));
    }
  };
  const addOption = () => {
    const id = optionNextId(value);
    edit("optionAdd", { id, label: "" });
    setPanel({ kind: "option", option: id });
  };

  return (
    <div className="bench">
      <CaseStrip open={open} analysis={analysis} onPanel={(kind) => setPanel({ kind })} onPrint={onPrint} />
      <SavingBar open={open} />
      <main className="bench-main">
        <div className="bench-clock">
          <div className="bench-corner">
            <h1 className="bench-corner-title">{benchWords.profile}</h1>
            <p className="bench-corner-text">
              {value.medicine.matrix}, {unitSpoken(unit, "screen")}
            </p>
          </div>
          <div className="bench-head" ref={clockColumn}>
            {clock && analysis && (
              <ClockHead
                scale={clock}
                width={width}
                midnightsH={analysis.clock.midnightsH}
                nowX={nowX}
                originMs={analysis.clock.originMs}
                zone={value.timeZone}
              />
            )}
          </div>
          <div className="bench-side">
            <div className="bench-switches">
              <Button kind="quiet" onPress={() => setOtherUnit(!isOtherUnit)}>
                {unitSpoken(isOtherUnit ? units.first : units.other, "screen")}
              </Button>
              <Button kind="quiet" onPress={() => setScale(scale === "linear" ? "log" : "linear")}>
                {scale === "linear" ? benchWords.log : benchWords.linear}
              </Button>
              <Button kind="quiet" onPress={() => setWhereShown(!isWhereShown)}>
                {isWhereShown ? amountsWords.hide : amountsWords.show}
              </Button>
              <Button kind="quiet" onPress={() => setPanel({ kind: "levels" })}>
                {benchWords.addLevel}
              </Button>
              {value.levels.length >= RICH_FROM && (
                <Button kind="quiet" onPress={() => setPanel({ kind: "rich" })}>
                  {benchWords.rich}
                </Button>
              )}
            </div>
            <div className="bench-zoom" role="group" aria-label="Part of the clock shown">
              <Button kind="quiet" onPress={() => zoom(0.6)}>
                {benchWords.closer}
              </Button>
              <Button kind="quiet" onPress={() => zoom(1 / 0.6)}>
                {benchWords.wider}
              </Button>
              <Button kind="quiet" onPress={() => whole && span && setChosenSpan(spanMoved(whole, span, -0.4))}>
                {benchWords.earlier}
              </Button>
              <Button kind="quiet" onPress={() => whole && span && setChosenSpan(spanMoved(whole, span, 0.4))}>
                {benchWords.later}
              </Button>
            </div>
          </div>
          <div className="bench-profile">
            {analysis && span ? (
              <ProfileRow
                value={value}
                analysis={analysis}
                span={span}
                width={width}
                right={RIGHT}
                scale={scale}
                unit={unit}
                lit={lit}
                isReadOnly={isReader}
                onOpenLevel={(id, form) => setPanel({ kind: "level", id, form })}
              />
            ) : (
              <p className="bench-waiting">{benchWords.analysisStates.running}</p>
            )}
            {analysis?.fit.kind === "fitted" && <ProfileKey />}
            {value.demo ? (
              <p className="bench-demo" aria-hidden="true">
                demo
              </p>
            ) : null}
            {analysis && analysis.typical === null && <p className="bench-no-prediction">{benchWords.noPrediction}</p>}
          </div>
          {clock && analysis && lanes && (
            <>
              {isWhereShown && (
                <AmountsRow
                  value={value}
                  analysis={analysis}
                  scale={clock}
                  width={width}
                  nowX={nowX}
                  midnightsX={midnightsX}
                />
              )}
              <DoseLane
                lane="given"
                name={benchWords.given}
                value={value}
                lines={value.given}
                marks={lanes.given}
                scale={clock}
                width={width}
                nowX={nowX}
                midnightsX={midnightsX}
                originMs={analysis.clock.originMs}
                largest={lanes.largest}
                style="given"
                isReadOnly={isReader}
                onOpenLine={(lineId) => setPanel({ kind: "doses", lineId })}
                head={
                  <>
                    <button type="button" className="lane-line lane-title" onClick={() => setPanel({ kind: "doses" })}>
                      {benchWords.given}
                    </button>
                    <LaneLines
                      lines={lineTexts(value.given)}
                      onOpenLine={(lineId) => setPanel({ kind: "doses", lineId })}
                      onAdd={() => setPanel({ kind: "doses" })}
                    />
                  </>
                }
              />
              {value.options.map((option, i) => (
                <DoseLane
                  key={option.id}
                  lane={option.id}
                  name={`Option ${option.id}`}
                  value={value}
                  lines={option.lines}
                  marks={lanes.options[i] ?? []}
                  scale={clock}
                  width={width}
                  nowX={nowX}
                  midnightsX={midnightsX}
                  originMs={analysis.clock.originMs}
                  largest={lanes.largest}
                  style={optionStyle(i)}
                  isReadOnly={isReader}
                  onLit={(isLit) => setLit(isLit ? option.id : null)}
                  onOpenLine={(lineId) => setPanel({ kind: "option", option: option.id, lineId })}
                  head={
                    <OptionHead
                      option={option}
                      index={i}
                      lines={lineTexts(option.lines)}
                      onOpenLine={(lineId) => setPanel({ kind: "option", option: option.id, lineId })}
                      onMenu={() => setPanel({ kind: "option", option: option.id })}
                    />
                  }
                />
              ))}
              <EventsLane
                value={value}
                analysis={analysis}
                scale={clock}
                width={width}
                nowX={nowX}
                midnightsX={midnightsX}
                onOpenEvent={(index) => setPanel({ kind: "events", ...(index === undefined ? {} : { index }) })}
                onOpenPatient={() => setPanel({ kind: "patient" })}
              />
              <div className="bench-foot-side">
                <Button kind="quiet" onPress={addOption} isDisabled={isReader}>
                  {benchWords.addOption}
                </Button>
              </div>
              <div className="bench-foot">
                {nowX !== null && (
                  <button
                    type="button"
                    className="bench-now"
                    style={{ left: nowX }}
                    onClick={() => setPanel({ kind: "case" })}
                  >
                    now,{" "}
                    {instantText(analysis.clock.originMs + analysis.clock.nowH * 3_600_000, value.timeZone, "dayClock")}
                  </button>
                )}
              </div>
            </>
          )}
        </div>
        <BenchColumn
          open={open}
          value={value}
          analysis={analysis}
          unit={unit}
          onPanel={setPanel}
          onAddOption={addOption}
          onLit={setLit}
        />
      </main>
      {panel && <BenchPanel panel={panel} unit={unit} onClose={close} />}
    </div>
  );
}
