import { type FormEvent, useState } from "react";
import type { Case } from "../../core/case/index.ts";
import { doseLineSentence, doseWords, issueMessage } from "../../core/messages/index.ts";
import { type DoseLine, type DoseProduct, doseTextRead } from "../../core/regimen/index.ts";
import { issue } from "../../core/result/index.ts";
import { Button } from "../ui/Button.tsx";
import { FieldFrame } from "../ui/FieldFrame.tsx";
import { type FieldAsk, fieldQuestion } from "../ui/fieldQuestion.ts";
import { partId } from "../ui/partId.ts";
import { doseAsk } from "./doseAsk.ts";
import { doseProductsInFull } from "./doseProducts.ts";

export interface DoseTextFieldProps {
  readonly value: Case;
  readonly lane: string;
  readonly products: readonly DoseProduct[];
  readonly product: string | null;
  readonly text: string;
  readonly label: string;
  readonly sendWord: string;
  /** Said under a text that reads well: what Enter does. */
  readonly enterWord: string;
  /** The text as it stands without the user: its reading need not be said back. */
  readonly plainText?: string;
  readonly hasInitialFocus?: boolean;
  readonly onText: (text: string) => void;
  readonly onLines: (lines: readonly DoseLine[]) => void;
}

/** A regimen typed as it would be said. Its meaning is said back while it is typed; Enter takes it, or asks about an amount that can hardly be meant. */
export function DoseTextField(props: DoseTextFieldProps) {
  const { value, lane, products, product, text, label, sendWord, enterWord, plainText = "", onText, onLines } = props;
  const [isSent, setSent] = useState(false);
  const [asked, setAsked] = useState<{ readonly of: string; readonly ask: FieldAsk<readonly DoseLine[]> }>();
  const read =
    product === null
      ? ({ ok: false, issues: [issue("dose-product-missing")] } as const)
      : doseTextRead(text, {
          zone: value.timeZone,
          nowIso: value.now,
          lane: lane === "given" ? "given" : "option",
          products,
          defaultProduct: product,
          newId: partId,
        });
  const problem = read.ok ? undefined : read.issues[0];
  const isPlain = text.trim() === plainText;
  // Another product makes the same words another dose.
  const typed = `${product ?? ""} ${text}`;
  const send = (event: FormEvent) => {
    event.preventDefault();
    setSent(true);
    if (!read.ok) return;
    const ask = isPlain ? null : doseAsk(read.value, value, read.value);
    setSent(false);
    if (ask) setAsked({ of: typed, ask });
    else onLines(read.value);
  };
  const take = (lines: readonly DoseLine[]) => {
    setAsked(undefined);
    onLines(lines);
  };
  return (
    <form className="dose-text" onSubmit={send} noValidate>
      <FieldFrame
        label={label}
        description={doseWords.textHelp}
        fault={isSent && problem ? issueMessage(problem) : undefined}
        question={fieldQuestion(asked?.of === typed ? asked.ask : null, take)}
      >
        {(wiring) => (
          <div className="dose-text-line">
            <input
              {...wiring}
              className="field-control"
              type="text"
              autoComplete="off"
              spellCheck={false}
              // biome-ignore lint/a11y/noAutofocus: only in a panel that was opened to type here
              autoFocus={props.hasInitialFocus ?? false}
              value={text}
              onChange={(event) => {
                setSent(false);
                onText(event.currentTarget.value);
              }}
            />
            <Button kind="main" type="submit">
              {sendWord}
            </Button>
          </div>
        )}
      </FieldFrame>
      {isPlain || isSent ? null : (
        <div className="dose-text-reading">
          <p className="dose-text-reading-head">{read.ok ? doseWords.read : doseWords.notYet}</p>
          {read.ok ? (
            read.value.map((line, index) => (
              <p key={index}>
                {doseLineSentence(line, { zone: value.timeZone, products: doseProductsInFull(value.medicine) })}.
              </p>
            ))
          ) : (
            <p className="entry-panel-soft">{problem ? issueMessage(problem) : null}</p>
          )}
          {read.ok ? <p className="entry-panel-soft">{enterWord}</p> : null}
        </div>
      )}
    </form>
  );
}
