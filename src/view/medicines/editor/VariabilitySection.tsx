import { draftTyped, isDraftList, VARIED } from "../../../core/medicine/index.ts";
import { recordWords } from "../../../core/messages/index.ts";
import { figureName } from "../recordRows.ts";
import { DraftChoice } from "./DraftChoice.tsx";
import { DraftFigure, figureNew } from "./DraftFigure.tsx";
import { DraftList } from "./DraftList.tsx";
import { DraftSection } from "./DraftSection.tsx";
import { useDraft } from "./draftContext.ts";

export function VariabilitySection() {
  const { nodeAt, groupAt } = useDraft();
  const kinetics = groupAt(["kinetics"]) ?? {};
  // What the kind of kinetics does not have can't vary; what is there all the same stays in sight to be taken away.
  const names = VARIED.filter(
    (name) =>
      name in kinetics || name === "absorptionRate" || name === "bioavailability" || nodeAt(["variability", name]),
  );
  const choices = VARIED.map((value) => ({ value, label: figureName(value) }));
  const correlations = nodeAt(["variability", "correlations"]);
  return (
    <DraftSection id="variability" heading={recordWords.section.variability} roots={["variability"]}>
      {names.map((name) => (
        <DraftFigure
          key={name}
          path={["variability", name]}
          label={recordWords.variability(figureName(name))}
          units={["%"]}
          isOptional
        />
      ))}
      <DraftFigure
        path={["variability", "residualProportional"]}
        label={figureName("residualProportional")}
        units={["%"]}
        isOptional
      />
      <DraftFigure
        path={["variability", "residualAdditive"]}
        label={figureName("residualAdditive")}
        units={["mg/L"]}
        isOptional
      />
      <DraftList
        path={["variability", "correlations"]}
        entry={recordWords.correlationName}
        entryNew={() => ({ between: ["", ""], ...figureNew("1") })}
      >
        {(path, index) => (
          <>
            <div className="draft-pair">
              <DraftChoice path={[...path, "between", 0]} label={recordWords.between} choices={choices} />
              <DraftChoice path={[...path, "between", 1]} label={recordWords.and} choices={choices} />
            </div>
            <DraftFigure
              path={path}
              label={correlationLabel(isDraftList(correlations) ? correlations[index] : undefined)}
              units={["1"]}
            />
          </>
        )}
      </DraftList>
    </DraftSection>
  );
}

function correlationLabel(node: unknown): string {
  const between = typeof node === "object" && node !== null && "between" in node ? node.between : [];
  const [a, b] = Array.isArray(between) ? between.map((each) => figureName(draftTyped(each))) : [];
  return a && b ? recordWords.correlation(a, b) : recordWords.correlationName;
}
