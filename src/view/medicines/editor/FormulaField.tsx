import type { Covariates, DraftPath, Formula, KineticsFormula } from "../../../core/medicine/index.ts";
import { draftTyped, formulaTrace } from "../../../core/medicine/index.ts";
import { issueMessage, recordWords } from "../../../core/messages/index.ts";
import type { Issue } from "../../../core/result/index.ts";
import { quantityPrint } from "../../../core/units/index.ts";
import { TextField } from "../../ui/TextField.tsx";
import { DraftProvenance } from "./DraftProvenance.tsx";
import { placeOf, useDraft } from "./draftContext.ts";

export interface FormulaFieldProps {
  readonly path: DraftPath;
  readonly spec: Pick<KineticsFormula, "words" | "symbol" | "unit">;
  readonly covariates: Covariates;
}

/** What the patient lacks is no fault of the formula. */
const OF_PATIENT = new Set(["formula-needs", "formula-covariate"]);

/** A formula as it is typed: its dimension, its value for the reference patient, or what is wrong and where. */
export function FormulaField({ path, spec, covariates }: FormulaFieldProps) {
  const { nodeAt, change } = useDraft();
  const formula = draftTyped(nodeAt([...path, "formula"]));
  const unit = spec.unit as Formula["unit"];
  const trace = formulaTrace({ formula, unit }, covariates);
  const wrong = trace.issues.filter(({ code }) => !OF_PATIENT.has(code));
  const lacking = trace.issues.filter(({ code }) => OF_PATIENT.has(code));
  const label = recordWords.formula(spec.words, spec.symbol);
  const reading = [
    ...(trace.value === null
      ? lacking.map(issueMessage)
      : [recordWords.formulaValue(quantityPrint({ value: trace.value, unit }, { style: "screen", significant: 4 }))]),
    ...(trace.dimension === null ? [] : [recordWords.formulaDimension(trace.dimension)]),
  ].join("; ");
  return (
    <fieldset className="draft-figure draft-formula" data-place={placeOf(path)}>
      <legend className="visually-hidden">{label}</legend>
      <div data-place={placeOf([...path, "formula"])}>
        <TextField
          label={label}
          value={formula}
          onChange={(text) => change([...path, "formula"], text)}
          reading={reading}
          fault={wrong.length > 0 ? [...new Set(wrong.map(issueMessage))].join(" ") : undefined}
        />
        {wrong.slice(0, 1).map((each, index) => (
          <FaultPlace key={index} formula={formula} issue={each} />
        ))}
      </div>
      <DraftProvenance path={path} before={(was) => draftTyped(was.formula)} />
    </fieldset>
  );
}

/** The formula with the part at fault underlined. */
function FaultPlace({ formula, issue }: { readonly formula: string; readonly issue: Issue }) {
  const { start, end } = issue.data;
  if (typeof start !== "number" || typeof end !== "number" || formula === "") return null;
  return (
    <p className="draft-place">
      {recordWords.formulaPlace} <code>{formula.slice(0, start)}</code>
      <mark>{formula.slice(start, end) || "␣"}</mark>
      <code>{formula.slice(end)}</code>
    </p>
  );
}
