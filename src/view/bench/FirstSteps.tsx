import type { Analysis } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { benchWords } from "../../core/messages/index.ts";
import { Button } from "../ui/Button.tsx";
import type { OpenPanel } from "./BenchPanel.tsx";
import "./FirstSteps.css";

interface FirstStepsProps {
  readonly value: Case;
  readonly analysis: Analysis | null;
  readonly onPanel: (panel: OpenPanel) => void;
  readonly onAddOption: () => void;
}

/** What is still to be entered before options can be compared, each a press away; gone when nothing is left. */
export function FirstSteps({ value, analysis, onPanel, onAddOption }: FirstStepsProps) {
  const words = benchWords.steps;
  const steps = [
    {
      isDone: analysis?.patient.weight !== null && value.patient.sex !== undefined && value.patient.age !== undefined,
      word: words.patient,
      go: () => onPanel({ kind: "patient" }),
    },
    { isDone: value.window !== undefined, word: words.window, go: () => onPanel({ kind: "window" }) },
    { isDone: value.given.length > 0, word: words.given, go: () => onPanel({ kind: "doses" }) },
    { isDone: value.levels.length > 0, word: words.levels, go: () => onPanel({ kind: "levels" }) },
    { isDone: value.options.some((option) => option.lines.length > 0), word: words.option, go: onAddOption },
  ];
  if (value.options.some((option) => option.lines.length > 0)) return null;
  return (
    <section className="first-steps" aria-labelledby="first-steps-head">
      <h2 className="first-steps-head" id="first-steps-head">
        {words.head}
      </h2>
      <ol>
        {steps.map((step) => (
          <li key={step.word}>
            <Button kind="quiet" onPress={step.go}>
              {step.word}
            </Button>
            {step.isDone ? <span className="first-steps-done"> {words.done}</span> : null}
          </li>
        ))}
      </ol>
    </section>
  );
}
