import { Button } from "./Button.tsx";
import type { FieldQuestion } from "./fieldQuestion.ts";
import { GravityMark } from "./GravityMark.tsx";
import "./FieldFrame.css";

export interface FieldSaidProps {
  readonly id: string;
  /** The sentence that says what can't be read; nothing is asked before that is put right. */
  readonly fault?: string | undefined;
  readonly question?: FieldQuestion | undefined;
}

/** What is said about what was typed, in a polite live region, and the answers to what is asked. */
export function FieldSaid({ id, fault, question }: FieldSaidProps) {
  const asked = fault ? undefined : question;
  return (
    <>
      <div role="status" className="field-frame-said" id={id}>
        {fault ? (
          <p className="field-frame-fault">
            <GravityMark gravity="stop" /> {fault}
          </p>
        ) : null}
        {asked ? (
          <p className="field-frame-asked">
            <GravityMark gravity="check" /> {asked.text}
          </p>
        ) : null}
      </div>
      {asked ? (
        // biome-ignore lint/a11y/useSemanticElements: a fieldset would need its own visible legend; the question is the legend
        <div className="field-frame-answers" role="group" aria-labelledby={id}>
          {asked.answers.map((answer) => (
            <Button key={answer.label} onPress={answer.onAnswer}>
              {answer.label}
            </Button>
          ))}
        </div>
      ) : null}
    </>
  );
}
