import { COVARIATE_NAMES, draftTyped } from "../../../core/medicine/index.ts";
import { recordWords } from "../../../core/messages/index.ts";
import { unitSpoken } from "../../../core/units/index.ts";
import { ChoiceField } from "../../ui/ChoiceField.tsx";
import { covariateUnit } from "../recordRows.ts";
import { DraftFigure } from "./DraftFigure.tsx";
import { DraftList } from "./DraftList.tsx";
import { DraftProvenance } from "./DraftProvenance.tsx";
import { DraftSection } from "./DraftSection.tsx";
import { DraftStatement } from "./DraftStatement.tsx";
import { DraftText } from "./DraftText.tsx";
import { placeOf, useDraft } from "./draftContext.ts";

export function PopulationSection() {
  const { groupAt, change } = useDraft();
  return (
    <DraftSection id="population" heading={recordWords.section.population} roots={["population"]}>
      <DraftStatement path={["population"]} label={recordWords.populationText} />
      <DraftText path={["population", "setting"]} label={recordWords.setting} />
      <DraftFigure path={["population", "number"]} label={recordWords.patients} units={["1"]} isOptional />
      <DraftList
        path={["population", "ranges"]}
        entry={recordWords.range}
        entryNew={() => ({ covariate: "age", low: "", high: "", unit: "a", source: "", basis: "" })}
      >
        {(path) => {
          const node = groupAt(path) ?? {};
          const covariate = COVARIATE_NAMES.find((each) => each === node.covariate) ?? null;
          const unit = unitSpoken(covariateUnit(draftTyped(node.covariate)), "screen");
          const ending = unit === "" ? "" : `, ${unit}`;
          return (
            <div className="draft-figure" data-place={placeOf(path)}>
              <div className="draft-triple">
                <ChoiceField
                  label={recordWords.rangeOf}
                  value={covariate}
                  choices={COVARIATE_NAMES.map((value) => ({ value, label: recordWords.covariates[value] ?? value }))}
                  onChoose={(next) => change(path, { ...node, covariate: next, unit: covariateUnit(next) })}
                />
                <DraftText path={[...path, "low"]} label={`${recordWords.rangeLowField}${ending}`} />
                <DraftText path={[...path, "high"]} label={`${recordWords.rangeHighField}${ending}`} />
              </div>
              <DraftProvenance
                path={path}
                before={(was) => `${draftTyped(was.low)} – ${draftTyped(was.high)}${unit === "" ? "" : ` ${unit}`}`}
              />
            </div>
          );
        }}
      </DraftList>
    </DraftSection>
  );
}
