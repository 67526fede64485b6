import { DISPLAY_UNITS } from "../../../core/medicine/index.ts";
import { recordWords } from "../../../core/messages/index.ts";
import { unitSpoken } from "../../../core/units/index.ts";
import { DraftChoice } from "./DraftChoice.tsx";
import { DraftFigure } from "./DraftFigure.tsx";
import { DraftSection } from "./DraftSection.tsx";
import { DraftText } from "./DraftText.tsx";

export function IdentitySection() {
  return (
    <DraftSection
      id="identity"
      heading={recordWords.section.identity}
      roots={["name", "matrix", "displayUnit", "molarMass"]}
      isOpen
    >
      <DraftText path={["name"]} label={recordWords.name} description={recordWords.nameHelp} maxLength={80} />
      <div className="draft-pair">
        <DraftText path={["matrix"]} label={recordWords.matrix} />
        <DraftChoice
          path={["displayUnit"]}
          label={recordWords.displayUnit}
          choices={DISPLAY_UNITS.map((value) => ({ value, label: unitSpoken(value, "screen") }))}
        />
      </div>
      <DraftFigure
        path={["molarMass"]}
        label={recordWords.molarMass}
        units={["g/mol"]}
        description={recordWords.molarMassHelp}
      />
    </DraftSection>
  );
}
