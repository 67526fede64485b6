import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import { optionNextId } from "../../core/case/index.ts";
import { amountsWords, benchWords } from "../../core/messages/index.ts";
import { instantText } from "../../core/time/index.ts";
import { unitSpoken } from "../../core/units/index.ts";
import { Button } from "../ui/Button.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import { AmountsRow } from "./AmountsRow.tsx";
import { BenchColumn } from "./BenchColumn.tsx";
import { BenchPanel, type OpenPanel } from "./BenchPanel.tsx";
import "./BenchScreen.css";
import { useElementWidth } from "../ui/useElementWidth.ts";
import { BenchLanes } from "./BenchLanes.tsx";
import { BenchZoom } from "./BenchZoom.tsx";
import { type BenchSpan, spanStart, spanWithin } from "./benchSpan.ts";
import { CaseStrip } from "./CaseStrip.tsx";
import { ClockHead } from "./ClockHead.tsx";
import { clockRow } from "./clockRow.ts";
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
  const span = useMemo(() => {
    if (!analysis) return null;
    const { nowH, fromH, toH } = analysis.clock;
    return chosenSpan ? spanWithin({ fromH, toH }, chosenSpan) : spanStart({ fromH, toH }, nowH, width - RIGHT);
  }, [analysis, chosenSpan, width]);
  const row = useMemo(
    () => (analysis && span ? clockRow(analysis.clock, span, width, RIGHT) : null),
    [analysis, span, width],
  );
  const close = useCallback(() => setPanel(null), []);
  if (!open || !value) return null;
  const isReader = open.role === "reader";
  const units = shownUnits(value);
  const unit = isOtherUnit ? units.other : units.first;
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
            {row && analysis && <ClockHead {...row} clock={analysis.clock} zone={value.timeZone} />}
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
            <BenchZoom clock={analysis?.clock ?? null} span={span} onSpan={setChosenSpan} />
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
          {row && analysis && (
            <>
              {isWhereShown && <AmountsRow {...row} value={value} analysis={analysis} />}
              <BenchLanes
                value={value}
                analysis={analysis}
                row={row}
                isReadOnly={isReader}
                onPanel={setPanel}
                onLit={setLit}
              />
              <div className="bench-foot-side">
                <Button kind="quiet" onPress={addOption} isDisabled={isReader}>
                  {benchWords.addOption}
                </Button>
              </div>
              <div className="bench-foot">
                {row.nowX !== null && (
                  <button
                    type="button"
                    className="bench-now"
                    style={{ left: row.nowX }}
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
