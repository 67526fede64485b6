import type { Traced } from "../../core/analysis/index.ts";
import { twoCompartmentConstants } from "../../core/kinetics/index.ts";
import { productOf } from "../../core/medicine/index.ts";
import { tracedWords } from "../../core/messages/index.ts";
import { numberPrint } from "../../core/units/index.ts";
import { ChoiceField } from "../ui/ChoiceField.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import "./OptionPanel.css";

/** The case's medicine: its kinetics with this patient's numbers put in, both readings of each product, and a change of medicine. */
export function MedicinePanel() {
  const open = useWorkbench((state) => state.open);
  const medicines = useWorkbench((state) => state.medicines);
  const edit = useWorkbench((state) => state.edit);
  if (!open) return null;
  const { value } = open;
  const model = open.analysis.result?.typical ?? null;
  const final = model?.dispositions.at(-1)?.disposition;
  const hasLines = value.given.length > 0 || value.options.some((option) => option.lines.length > 0);
  const figures: { readonly name: string; readonly figure: Traced }[] = model
    ? [
        ...model.parameters.map(({ symbol, words, figure }) => ({ name: `${words} (${symbol})`, figure })),
        ...(model.eliminationRate && model.kind === "one-compartment"
          ? [{ name: "Elimination rate (ke)", figure: model.eliminationRate }]
          : []),
        ...(model.halfLife ? [{ name: "Half-life", figure: model.halfLife }] : []),
        ...model.products.flatMap((product) => {
          const name = productOf(value.medicine, product.product).name;
          return [
            ...(product.absorptionRate
              ? [{ name: `Absorption rate (ka), ${name}`, figure: product.absorptionRate }]
              : []),
            ...product.inputFigures.map(({ words, figure }) => ({ name: `${words}, ${name}`, figure })),
            { name: `Lag, ${name}`, figure: product.lag },
            { name: `Bioavailability (F), ${name}`, figure: product.bioavailability },
          ];
        }),
      ]
    : [];
  return (
    <div className="medicine-panel">
      <p>
        {value.medicine.name}, record version {value.medicine.recordVersion},{" "}
        {value.medicine.review.status === "reviewed"
          ? `reviewed by ${value.medicine.review.by}`
          : "not independently reviewed"}
      </p>
      {hasLines || open.role === "reader" ? (
        <p>The medicine can be changed only while the case has no dose lines.</p>
      ) : (
        <ChoiceField
          label="Medicine"
          value={value.medicine.id}
          choices={medicines.map((record) => ({ value: record.id, label: record.name }))}
          onChoose={(id) => {
            const record = medicines.find((candidate) => candidate.id === id);
            if (record && record.id !== value.medicine.id) edit("medicineSet", { record });
          }}
        />
      )}
      {final?.kind === "two-compartment" && <Constants disposition={final} />}
      <dl>
        {figures.map(({ name, figure }) => (
          <div key={name}>
            <dt>{name}</dt>
            <dd className="medicine-panel-figure">{tracedWords(figure)}</dd>
            <dd>
              {figure.source} ({figure.basis})
            </dd>
          </div>
        ))}
      </dl>
      {model?.products.map((product) => {
        if (product.readings === null) return null;
        const { assumed, alternative } = product.readings;
        const h = (hours: number) => `${numberPrint(hours, { significant: 3 })} h`;
        return (
          <section key={product.product}>
            <h3>Both readings of the curve: {productOf(value.medicine, product.product).name}</h3>
            <p>
              Assumed: elimination {h(assumed.eliminationHalfLife)}, absorption {h(assumed.absorptionHalfLife)}, volume{" "}
              {numberPrint(assumed.volume, { significant: 3 })} L. The other way round: elimination{" "}
              {h(alternative.eliminationHalfLife)}, absorption {h(alternative.absorptionHalfLife)}, volume{" "}
              {numberPrint(alternative.volume, { significant: 3 })} L. Clearance{" "}
              {numberPrint(assumed.clearance, { significant: 3 })} L/h in both.
            </p>
          </section>
        );
      })}
    </div>
  );
}

/** Micro and macro constants of two compartments, in the final state. */
function Constants({ disposition }: { readonly disposition: Parameters<typeof twoCompartmentConstants>[0] }) {
  const found = twoCompartmentConstants(disposition);
  const perH = (rate: number) => `${numberPrint(rate, { significant: 4 })} per h`;
  return (
    <p>
      Rates: k10 {perH(found.k10)}, k12 {perH(found.k12)}, k21 {perH(found.k21)}; exponential rates: fast{" "}
      {perH(found.alpha)}, terminal {perH(found.beta)}; volume at steady state{" "}
      {numberPrint(found.volumeSteady, { significant: 4 })} L.
    </p>
  );
}
