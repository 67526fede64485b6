import { useEffect, useRef, useState } from "react";
import type { Case } from "../../core/case/index.ts";
import { productDoseUnits, productOf } from "../../core/medicine/index.ts";
import { doseWords, issueMessage } from "../../core/messages/index.ts";
import { DOSE_UNITS, type DoseLine, type DoseProduct, doseLineText } from "../../core/regimen/index.ts";
import { ChoiceField } from "../ui/ChoiceField.tsx";
import { InstantField } from "../ui/InstantField.tsx";
import { QuantityField } from "../ui/QuantityField.tsx";
import { DoseTable } from "./DoseTable.tsx";
import { DoseTextField } from "./DoseTextField.tsx";
import { doseAsk } from "./doseAsk.ts";
import { lineFault } from "./lineLook.ts";
import { RepeatFields } from "./RepeatFields.tsx";

export interface LineFormProps {
  readonly value: Case;
  readonly lane: string;
  readonly line: DoseLine;
  readonly products: readonly DoseProduct[];
  readonly onLine: (line: DoseLine) => void;
  readonly onReplace: (lines: readonly DoseLine[]) => void;
}

/** One dose line as a form: every field counts on its own, a change that can't be is refused beside its field. */
export function LineForm({ value, lane, line, products, onLine, onReplace }: LineFormProps) {
  const [text, setText] = useState(() => textOf(line, value, products));
  const [seen, setSeen] = useState(line);
  const [productFault, setProductFault] = useState<string>();
  if (seen !== line) {
    setSeen(line);
    setText(textOf(line, value, products));
    setProductFault(undefined);
  }
  const head = useRef<HTMLHeadingElement>(null);
  // It opens below the list: whoever opened it, by key or by a token on the lane, is taken there.
  useEffect(() => head.current?.focus(), []);
  const units = DOSE_UNITS.filter((unit) => productDoseUnits(productOf(value.medicine, line.product)).includes(unit));
  const faultOf = (next: DoseLine) => lineFault(next, line, value);
  return (
    <section className="line-form entry-panel-inset" aria-labelledby="line-form-head">
      <h3 id="line-form-head" ref={head} tabIndex={-1}>
        {doseWords.editing}
      </h3>
      <DoseTextField
        value={value}
        lane={lane}
        products={products}
        product={line.product}
        text={text}
        label={doseWords.retype}
        sendWord={doseWords.replace}
        enterWord={doseWords.enterReplaces}
        plainText={textOf(line, value, products)}
        onText={setText}
        // The first keeps the line's id, so that it stays the one being edited.
        onLines={(lines) => onReplace(lines.map((one, index) => (index === 0 ? { ...one, id: line.id } : one)))}
      />
      {products.length > 1 ? (
        <ChoiceField
          label={doseWords.product}
          value={line.product}
          choices={products.map((one) => ({ value: one.id, label: one.name }))}
          fault={productFault}
          onChoose={(product) => {
            const next = { ...line, product };
            const fault = faultOf(next);
            setProductFault(fault ? issueMessage(fault) : undefined);
            if (!fault) onLine(next);
          }}
        />
      ) : null}
      <div className="line-form-row">
        <QuantityField
          label={doseWords.amount}
          value={line.amount}
          units={units}
          unit={line.amount.unit}
          look={(amount) => {
            const fault = faultOf({ ...line, amount });
            if (fault) return { kind: "refused", issue: fault };
            const ask = doseAsk([{ ...line, amount }], value, amount);
            return ask ? { kind: "asked", ask } : { kind: "fine" };
          }}
          onCommit={(amount) => amount && onLine({ ...line, amount })}
        />
        <InstantField
          label={doseWords.start}
          value={line.start}
          zone={value.timeZone}
          now={value.now}
          refuse={(start) => faultOf({ ...line, start })}
          onCommit={(start) => onLine({ ...line, start })}
        />
      </div>
      <RepeatFields
        line={line}
        zone={value.timeZone}
        faultOf={faultOf}
        askOf={(next, taken) => doseAsk([next], value, taken)}
        onLine={onLine}
      />
      {lane === "given" ? <DoseTable value={value} lane={lane} line={line} units={units} onLine={onLine} /> : null}
    </section>
  );
}

function textOf(line: DoseLine, value: Case, products: readonly DoseProduct[]): string {
  return doseLineText(line, { zone: value.timeZone, products, defaultProduct: line.product });
}
