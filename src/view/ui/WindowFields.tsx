import { useId } from "react";
import { windowDrawnAt } from "../../core/analysis/index.ts";
import type { TargetWindow } from "../../core/case/index.ts";
import { issueMessage, windowAboutWords, windowQuantityWord, windowWords } from "../../core/messages/index.ts";
import { quantityConvert, quantityPrint, unitDimension, unitSpoken } from "../../core/units/index.ts";
import { ChoiceField } from "./ChoiceField.tsx";
import { FieldSaid } from "./FieldSaid.tsx";
import type { FieldQuestion } from "./fieldQuestion.ts";
import { TextField } from "./TextField.tsx";
import { type WindowDraft, type WindowUnit, windowDraftRead, windowUnits } from "./windowDraft.ts";
import "./WindowFields.css";

const ABOUT: readonly TargetWindow["quantity"][] = ["lowest-and-highest", "trough", "peak", "average", "auc24"];

export interface WindowFieldsProps {
  readonly draft: WindowDraft;
  readonly onChange: (draft: WindowDraft) => void;
  /** g/mol; for windows typed in a molar unit. */
  readonly molarMass: number;
  /** The form was sent: say what is missing. */
  readonly isTold: boolean;
  /** Offered; all of them where it is left out. */
  readonly units?: readonly WindowUnit[];
  /** An odd window, asked about under its ends and unit. */
  readonly question?: FieldQuestion | undefined;
}

export function WindowFields({
  draft,
  onChange,
  molarMass,
  isTold,
  units = windowUnits(draft.about),
  question,
}: WindowFieldsProps) {
  const askedId = useId();
  const read = windowDraftRead(draft);
  const faultOf = (path: string, text?: string) => {
    const found = read.ok ? undefined : read.issues.find((one) => one.path[0] === path);
    return found && (isTold || (text !== undefined && text.trim() !== "")) ? issueMessage(found) : undefined;
  };
  const shown = (end: TargetWindow["low"]) => quantityPrint(end, { style: "screen", significant: 4 });
  const isMolar = unitDimension(draft.unit) === "molar concentration";
  const inMass = (end: TargetWindow["low"]) => shown({ value: quantityConvert(end, "mg/L", molarMass), unit: "mg/L" });
  return (
    <div className="window-fields">
      <ChoiceField
        label={windowWords.about}
        value={draft.about}
        prompt={windowWords.aboutPrompt}
        choices={ABOUT.map((value) => ({ value, label: windowQuantityWord(value) }))}
        onChoose={(about) => {
          const allowed = windowUnits(about);
          const first = units.find((unit) => allowed.includes(unit)) ?? allowed[0] ?? "mg/L";
          onChange({ ...draft, about, unit: allowed.includes(draft.unit) ? draft.unit : first });
        }}
        fault={faultOf("about")}
      />
      <div className="window-fields-ends">
        <TextField
          label={windowWords.low}
          value={draft.low}
          onChange={(low) => onChange({ ...draft, low })}
          fault={faultOf("low", draft.low)}
        />
        <TextField
          label={windowWords.high}
          value={draft.high}
          onChange={(high) => onChange({ ...draft, high })}
          fault={faultOf("high", draft.high)}
          reading={read.ok && isMolar ? `= ${inMass(read.value.low)} to ${inMass(read.value.high)}` : undefined}
        />
        <ChoiceField
          label={windowWords.unit}
          value={draft.unit}
          choices={units.map((unit) => ({ value: unit, label: unitSpoken(unit, "screen") }))}
          onChoose={(unit) => onChange({ ...draft, unit })}
        />
      </div>
      <FieldSaid id={askedId} question={question} />
      {draft.about === "trough" ? (
        <div className="window-fields-drawn">
          <TextField
            label={windowWords.drawFrom}
            value={draft.drawFrom}
            onChange={(drawFrom) => onChange({ ...draft, drawFrom })}
            description={windowWords.drawHelp}
            fault={faultOf("drawFrom", draft.drawFrom + draft.drawTo)}
          />
          <TextField
            label={windowWords.drawTo}
            value={draft.drawTo}
            onChange={(drawTo) => onChange({ ...draft, drawTo })}
            fault={faultOf("drawTo", draft.drawTo)}
            reading={
              read.ok && windowDrawnAt(read.value) !== null
                ? windowWords.drawReading(windowAboutWords(read.value))
                : undefined
            }
          />
        </div>
      ) : null}
      <TextField
        label={windowWords.basis}
        value={draft.basis}
        onChange={(basis) => onChange({ ...draft, basis })}
        description={windowWords.basisHelp}
        maxLength={400}
        fault={faultOf("basis")}
      />
    </div>
  );
}
