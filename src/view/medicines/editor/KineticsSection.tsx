import {
  COVARIATE_NAMES,
  type Covariates,
  type DraftGroup,
  draftTyped,
  isDraftGroup,
  type Kinetics,
  kineticsFormulas,
} from "../../../core/medicine/index.ts";
import { recordWords } from "../../../core/messages/index.ts";
import { ChoiceField } from "../../ui/ChoiceField.tsx";
import { DraftChoice } from "./DraftChoice.tsx";
import { DraftSection } from "./DraftSection.tsx";
import { DraftStatement } from "./DraftStatement.tsx";
import { useDraft } from "./draftContext.ts";
import { FormulaField } from "./FormulaField.tsx";

type Kind = Kinetics["kind"];
const KINDS = Object.keys(recordWords.kinds) as Kind[];
const ESTIMATES = ["one-model", "pieced-together"] as const;
const APPARENT = ["yes", "no"] as const;

/** Which formulas a kind has; the kind alone is looked at. */
function formulasOf(kind: Kind) {
  return kineticsFormulas({ kinetics: { kind } as Kinetics });
}

export function KineticsSection({ covariates }: { readonly covariates: Covariates }) {
  const { groupAt, change } = useDraft();
  const kinetics = groupAt(["kinetics"]) ?? {};
  const kind = KINDS.find((each) => each === kinetics.kind) ?? null;
  return (
    <DraftSection id="kinetics" heading={recordWords.section.kinetics} roots={["kinetics", "estimates"]} isOpen>
      <div className="draft-pair">
        <ChoiceField
          label={recordWords.kind}
          value={kind}
          choices={KINDS.map((value) => ({ value, label: recordWords.kinds[value] }))}
          onChoose={(next) => change(["kinetics"], kineticsAs(kinetics, next))}
        />
        <ChoiceField
          label={recordWords.apparent}
          value={kinetics.apparent === true ? "yes" : "no"}
          choices={APPARENT.map((value) => ({ value, label: recordWords.apparents[value] }))}
          onChoose={(value) => change(["kinetics", "apparent"], value === "yes")}
        />
      </div>
      <p className="draft-help">{recordWords.formulaHelp(COVARIATE_NAMES.join(", "))}</p>
      {kind
        ? formulasOf(kind).map((spec) => (
            <FormulaField key={spec.name} path={["kinetics", spec.name]} spec={spec} covariates={covariates} />
          ))
        : null}
      <DraftChoice
        path={["estimates", "from"]}
        label={recordWords.estimates}
        choices={ESTIMATES.map((value) => ({ value, label: recordWords.estimatesFrom[value] }))}
      />
      <DraftStatement path={["estimates"]} label={recordWords.text} />
    </DraftSection>
  );
}

/** Another kind keeps the formulas it shares with the one before; the others begin empty. */
function kineticsAs(kinetics: DraftGroup, kind: Kind): DraftGroup {
  const formulas = formulasOf(kind).map(({ name, unit }) => {
    const before = kinetics[name];
    const keeps = isDraftGroup(before) && draftTyped(before.unit) === unit;
    return [name, keeps ? before : { formula: "", unit, source: "", basis: "" }];
  });
  return { kind, ...Object.fromEntries(formulas), apparent: kinetics.apparent ?? false };
}
