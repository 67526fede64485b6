import { type DraftGroup, type DraftPath, isDraftGroup } from "../../../core/medicine/index.ts";
import { medicinesWords, recordWords } from "../../../core/messages/index.ts";
import { ChoiceField } from "../../ui/ChoiceField.tsx";
import { figureName } from "../recordRows.ts";
import { DraftChoice } from "./DraftChoice.tsx";
import { DraftFigure, figureNew } from "./DraftFigure.tsx";
import { DraftList } from "./DraftList.tsx";
import { DraftText } from "./DraftText.tsx";
import { useDraft } from "./draftContext.ts";

const FORMS = ["tablet", "capsule", "liquid"] as const;
const RELEASES = ["immediate", "modified"] as const;
const DIVISIBLE = ["whole", "half", "unknown"] as const;
const INPUTS = ["first-order", "zero-order", "mixed"] as const;
const SLOW = ["rate", "duration"] as const;
const YES_NO = ["yes", "no"] as const;

type Form = (typeof FORMS)[number];
type Input = (typeof INPUTS)[number];

export function ProductFields({ path }: { readonly path: DraftPath }) {
  const { groupAt, change } = useDraft();
  const product = groupAt(path) ?? {};
  const input = inputOf(product);
  const form = FORMS.find((each) => each === product.form) ?? null;
  return (
    <div className="draft-product">
      <DraftText path={[...path, "name"]} label={recordWords.productName} description={recordWords.productNameHelp} />
      <div className="draft-triple">
        <ChoiceField
          label={recordWords.form}
          value={form}
          choices={FORMS.map((value) => ({ value, label: recordWords.forms[value] }))}
          onChoose={(next) => change(path, withForm(product, next))}
        />
        <DraftChoice
          path={[...path, "release"]}
          label={recordWords.releaseField}
          choices={RELEASES.map((value) => ({ value, label: medicinesWords.release[value] }))}
        />
        <DraftChoice
          path={[...path, "divisible"]}
          label={recordWords.divisible}
          choices={DIVISIBLE.map((value) => ({ value, label: medicinesWords.divisible[value] }))}
        />
        <ChoiceField
          label={recordWords.swallowWhole}
          value={product.swallowWhole === true ? "yes" : "no"}
          choices={YES_NO.map((value) => ({ value, label: recordWords[value] }))}
          onChoose={(value) => change([...path, "swallowWhole"], value === "yes")}
        />
        <DraftText path={[...path, "salt"]} label={recordWords.salt} description={recordWords.saltHelp} />
      </div>
      {form === "liquid" ? (
        <DraftFigure path={[...path, "concentration"]} label={figureName("concentration")} units={["mg/mL"]} />
      ) : (
        <DraftList
          path={[...path, "strengths"]}
          entry={recordWords.strength}
          entryNew={() => figureNew("mg")}
          hasOwnAway
        >
          {(at, index) => (
            <DraftFigure path={at} label={recordWords.partOf(recordWords.strength, index + 1)} units={["mg"]} isEntry />
          )}
        </DraftList>
      )}
      <ChoiceField
        label={recordWords.input}
        value={input}
        choices={INPUTS.map((value) => ({ value, label: recordWords.inputs[value] }))}
        onChoose={(next) => change(path, withInput(product, next))}
      />
      <InputFields path={path} product={product} input={input} />
      <DraftFigure path={[...path, "saltFactor"]} label={figureName("saltFactor")} units={["1"]} isOptional />
      <DraftFigure path={[...path, "lag"]} label={figureName("lag")} units={["h"]} />
      <DraftFigure path={[...path, "bioavailability"]} label={figureName("bioavailability")} units={["1"]} />
    </div>
  );
}

function InputFields({ path, product, input }: { path: DraftPath; product: DraftGroup; input: Input }) {
  const { change } = useDraft();
  const at = (name: string): DraftPath => [...path, "input", name];
  const rate = <DraftFigure path={[...path, "absorptionRate"]} label={figureName("absorptionRate")} units={["/h"]} />;
  if (input === "first-order") return rate;
  if (input === "zero-order") return <DraftFigure path={at("duration")} label={figureName("duration")} units={["h"]} />;
  const parts = isDraftGroup(product.input) ? product.input : {};
  const slow = "slowDuration" in parts ? "duration" : "rate";
  return (
    <>
      {rate}
      <DraftFigure path={at("fastFraction")} label={figureName("fastFraction")} units={["1"]} />
      <ChoiceField
        label={recordWords.slowBy}
        value={slow}
        choices={SLOW.map((value) => ({ value, label: recordWords.slowBys[value] }))}
        onChoose={(next) => {
          const { slowRate: _, slowDuration: __, ...others } = parts;
          const figure = next === "rate" ? { slowRate: figureNew("/h") } : { slowDuration: figureNew("h") };
          if (next !== slow) change([...path, "input"], { ...others, ...figure });
        }}
      />
      {slow === "rate" ? (
        <DraftFigure path={at("slowRate")} label={figureName("slowRate")} units={["/h"]} />
      ) : (
        <DraftFigure path={at("slowDuration")} label={figureName("slowDuration")} units={["h"]} />
      )}
      <DraftFigure path={at("slowLag")} label={figureName("slowLag")} units={["h"]} />
    </>
  );
}

function inputOf({ input }: DraftGroup): Input {
  return isDraftGroup(input) && (input.kind === "zero-order" || input.kind === "mixed") ? input.kind : "first-order";
}

/** A liquid has a concentration in place of strengths. */
function withForm(product: DraftGroup, form: Form): DraftGroup {
  const { concentration, ...others } = product;
  if (form === "liquid") return { ...others, form, strengths: [], concentration: concentration ?? figureNew("mg/mL") };
  return { ...others, form, strengths: product.form === "liquid" ? [figureNew("mg")] : (product.strengths ?? []) };
}

function withInput(product: DraftGroup, input: Input): DraftGroup {
  const { input: _, absorptionRate, ...others } = product;
  const rate = { absorptionRate: absorptionRate ?? figureNew("/h") };
  if (input === "first-order") return { ...others, ...rate };
  if (input === "zero-order") return { ...others, input: { kind: "zero-order", duration: figureNew("h") } };
  const parts = { fastFraction: figureNew("1"), slowRate: figureNew("/h"), slowLag: figureNew("h") };
  return { ...others, ...rate, input: { kind: "mixed", ...parts } };
}
