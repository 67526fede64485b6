import { useEffect, useLayoutEffect, useMemo, useState } from "react";
import { flushSync } from "react-dom";
import { version } from "../../../package.json";
import { issueMessage, SUMMARY_BUTTONS as words } from "../../core/messages/index.ts";
import { ProfileChart } from "../chart/ProfileChart.tsx";
import { Button } from "../ui/Button.tsx";
import { Notice } from "../ui/Notice.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import { buildSummary } from "./buildSummary.ts";
import { printRefusal } from "./printRefusal.ts";
import { SummarySheet } from "./SummarySheet.tsx";
import { type SummaryInput, summaryInput } from "./summaryInput.ts";
import { summaryDays, summaryNowLabels, summaryScene } from "./summaryScene.ts";
import "./SummaryScreen.css";

/** The summary on the desk: what will be printed, with the way to print it and back. */
export function SummaryScreen() {
  const open = useWorkbench((state) => state.open);
  const settings = useWorkbench((state) => state.settings);
  const show = useWorkbench((state) => state.show);
  const printedAtMs = usePrintInstant();
  const input = open && summaryInput(open, settings, printedAtMs, version);
  const refusal = input && printRefusal(input);
  return (
    <div className="summary-desk">
      <header className="summary-bar">
        <Button onPress={() => show("bench")}>{words.back}</Button>
        <p>{words.screen}</p>
        <Button kind="main" isDisabled={!input || refusal !== null} onPress={() => window.print()}>
          {words.print}
        </Button>
      </header>
      <main>
        {refusal && (
          <div className="summary-refusal">
            <Notice gravity="stop" title={words.refused} isAnnounced>
              <p>{issueMessage(refusal)}</p>
            </Notice>
          </div>
        )}
        {input ? <Preview input={input} /> : <p className="summary-empty">{open ? words.working : words.noCase}</p>}
      </main>
    </div>
  );
}

function Preview({ input }: { readonly input: SummaryInput }) {
  const model = useMemo(() => buildSummary(input), [input]);
  const scene = useMemo(() => summaryScene(input, model.chart), [input, model]);
  useRunningWords(model.running);
  return (
    <SummarySheet
      model={model}
      chart={
        <ProfileChart
          scene={scene}
          styleOf={() => "given"}
          mode="print"
          title={model.chart.title}
          unitLabel={model.chart.unit}
          nowLabels={summaryNowLabels(scene, model.chart)}
          dayLabels={summaryDays(scene, model.chart)}
        />
      }
    />
  );
}

/** The instant the sheet is printed at: that of opening the preview, and of every printing, the browser's own included. */
function usePrintInstant(): number {
  const [printedAtMs, setPrintedAtMs] = useState(() => Date.now());
  useEffect(() => {
    // The page is drawn for print as soon as the listeners return, so the time must be on it by then.
    const stamp = () => flushSync(() => setPrintedAtMs(Date.now()));
    window.addEventListener("beforeprint", stamp);
    return () => window.removeEventListener("beforeprint", stamp);
  }, []);
  return printedAtMs;
}

/** Hands the words for the margin of every sheet to print.css. */
function useRunningWords(running: string): void {
  useLayoutEffect(() => {
    const { style } = document.documentElement;
    style.setProperty("--summary-running", `"${running.replace(/["\\]/g, "\\$&").replace(/\s+/g, " ")}"`);
    return () => {
      style.removeProperty("--summary-running");
    };
  }, [running]);
}
