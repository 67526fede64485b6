import {
  DISPLAY_UNITS,
  type DraftGroup,
  type DraftNode,
  type DraftPath,
  draftTyped,
  isDraftGroup,
  TOXIC_AT,
  WINDOW_UNITS,
} from "../../../core/medicine/index.ts";
import { recordWords, windowQuantityWord } from "../../../core/messages/index.ts";
import { unitSpoken } from "../../../core/units/index.ts";
import { ChoiceField } from "../../ui/ChoiceField.tsx";
import { DraftChoice } from "./DraftChoice.tsx";
import { DraftFigure } from "./DraftFigure.tsx";
import { DraftList } from "./DraftList.tsx";
import { DraftProvenance } from "./DraftProvenance.tsx";
import { DraftSection } from "./DraftSection.tsx";
import { DraftText } from "./DraftText.tsx";
import { useDraft } from "./draftContext.ts";
import { entryId } from "./entryId.ts";

const ABOUT = ["lowest-and-highest", "trough", "peak", "average", "auc24"] as const;

export function WindowsSection() {
  const { nodeAt } = useDraft();
  return (
    <DraftSection id="windows" heading={recordWords.section.windows} roots={["windows", "toxicFrom", "toxicAt"]}>
      <DraftList
        path={["windows"]}
        entry={recordWords.window1}
        entryNew={(list) => windowNew(list, draftTyped(nodeAt(["displayUnit"])) || "mg/L")}
      >
        {(path) => <WindowFields path={path} />}
      </DraftList>
      <DraftFigure path={["toxicFrom"]} label={recordWords.toxicFrom} units={DISPLAY_UNITS} isOptional />
      <DraftChoice
        path={["toxicAt"]}
        label={recordWords.toxicAt}
        choices={TOXIC_AT.map((value) => ({ value, label: recordWords.toxicAts[value] }))}
        prompt={recordWords.toxicAts.any}
      />
    </DraftSection>
  );
}

function WindowFields({ path }: { readonly path: DraftPath }) {
  const { groupAt, change, faultAt } = useDraft();
  const window = groupAt(path) ?? {};
  const unit = unitOf(window);
  return (
    <div className="draft-figure">
      <DraftText path={[...path, "label"]} label={recordWords.label} />
      <div className="draft-pair">
        <DraftText path={[...path, "use"]} label={recordWords.use} />
        <DraftText path={[...path, "sampling"]} label={recordWords.samplingField} />
      </div>
      <div className="draft-quad">
        <DraftChoice
          path={[...path, "quantity"]}
          label={recordWords.quantity}
          choices={ABOUT.map((value) => ({ value, label: windowQuantityWord(value) }))}
        />
        <DraftText path={[...path, "low", "value"]} label={recordWords.low} />
        <DraftText path={[...path, "high", "value"]} label={recordWords.high} />
        <ChoiceField
          label={recordWords.unitField}
          value={WINDOW_UNITS.find((each) => each === unit) ?? null}
          choices={WINDOW_UNITS.map((value) => ({ value, label: unitSpoken(value, "screen") }))}
          onChoose={(next) => change(path, withUnit(window, next))}
          fault={faultAt([...path, "high", "unit"])}
        />
      </div>
      <DraftProvenance path={path} before={windowWas} />
      <DraftFigure path={[...path, "drawFrom"]} label={recordWords.drawFrom} units={["h"]} isOptional />
      <DraftFigure path={[...path, "drawTo"]} label={recordWords.drawTo} units={["h"]} isOptional />
    </div>
  );
}

function unitOf(window: DraftGroup): string {
  return isDraftGroup(window.high) ? draftTyped(window.high.unit) : "";
}

/** Both ends are in one unit. */
function withUnit(window: DraftGroup, unit: string): DraftGroup {
  const end = (node: DraftNode | undefined) => ({ value: isDraftGroup(node) ? (node.value ?? "") : "", unit });
  return { ...window, low: end(window.low), high: end(window.high) };
}

/** In the unit the medicine is read in. */
function windowNew(list: readonly DraftNode[], unit: string): DraftGroup {
  const end = { value: "", unit };
  return {
    id: entryId("window", list),
    label: "",
    use: "",
    sampling: "",
    quantity: "trough",
    low: end,
    high: end,
    source: "",
    basis: "",
  };
}

function windowWas(was: DraftGroup): string {
  const end = (node: DraftNode | undefined) => (isDraftGroup(node) ? draftTyped(node.value) : "");
  return `${end(was.low)} – ${end(was.high)} ${unitOf(was)}`;
}
