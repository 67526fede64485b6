import { useMemo, useState } from "react";
import { richWords } from "../../core/messages/index.ts";
import type { AreaMethod } from "../../core/noncompartmental/index.ts";
import { instantText } from "../../core/time/index.ts";
import { quantityConvert, quantityPrint } from "../../core/units/index.ts";
import { ChoiceField } from "../ui/ChoiceField.tsx";
import { Notice } from "../ui/Notice.tsx";
import { RadioField } from "../ui/RadioField.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import "./RichLevelsPanel.css";
import { RichOccasionView } from "./RichOccasionView.tsx";
import type { RichUnit } from "./richFigures.ts";
import { richMessage } from "./richMessage.ts";
import { type RichOccasion, richOccasions } from "./richOccasions.ts";

const HOUR_MS = 3_600_000;

const METHODS = (["linear-up-log-down", "linear"] as const satisfies readonly AreaMethod[]).map((value) => ({
  value,
  ...richWords.methods[value],
}));

/** What the levels of the open case say without a model, where one dose has enough of them; otherwise what is missing. */
export function RichLevelsPanel({ unit }: { readonly unit: RichUnit }) {
  const open = useWorkbench((state) => state.open);
  const [method, setMethod] = useState<AreaMethod>("linear-up-log-down");
  const [chosenId, setChosenId] = useState<string | null>(null);
  const value = open?.value ?? null;
  const analysis = open?.analysis.result ?? null;
  const found = useMemo(() => value && analysis && richOccasions(value, analysis), [value, analysis]);
  if (!open) return null;
  if (!analysis || !found) return <p>{richWords.waiting}</p>;

  const { medicine, timeZone } = open.value;
  const factor = quantityConvert({ value: 1, unit: "mg/L" }, unit, medicine.molarMass.value);
  const clock = (hours: number) => instantText(analysis.clock.originMs + hours * HOUR_MS, timeZone, "dayClock");
  const occasion = found.occasions.find((each) => each.id === chosenId) ?? found.occasions[0];
  const label = ({ kind, doseAtH, doseMg, measured }: RichOccasion) => {
    const dose = quantityPrint({ value: doseMg, unit: "mg" }, { style: "screen" });
    const words = kind === "one-dose" ? richWords.occasionOneDose : richWords.occasionInterval;
    return words(dose, clock(doseAtH), measured);
  };
  return (
    <div className="rich-levels">
      <p className="rich-levels-soft">{richWords.about}</p>
      {open.analysis.revision !== open.revision && <p className="rich-levels-soft">{richWords.stale}</p>}
      {occasion ? (
        <>
          <div className="rich-levels-choices">
            <ChoiceField
              label={richWords.occasion}
              value={occasion.id}
              choices={found.occasions.map((each) => ({ value: each.id, label: label(each) }))}
              onChoose={setChosenId}
            />
            <RadioField
              label={richWords.method}
              value={method}
              choices={METHODS}
              onChoose={setMethod}
              arrangement="list"
            />
          </div>
          <RichOccasionView
            // Other levels are another question: a choice of points made for the old ones is not carried over.
            key={JSON.stringify([occasion.id, occasion.points])}
            occasion={occasion}
            method={method}
            unit={unit}
            factor={factor}
            clock={clock}
          />
        </>
      ) : (
        <Notice gravity="note" title={richWords.lacking}>
          {found.lacks.map((lack, i) => (
            <p key={i}>{richMessage(lack, unit, factor)}</p>
          ))}
          <p>{richWords.needs}</p>
        </Notice>
      )}
    </div>
  );
}
