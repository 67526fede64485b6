import type { Observation } from "../../core/case/index.ts";
import { patientWords } from "../../core/messages/index.ts";
import { quantityConvert } from "../../core/units/index.ts";
import { partId } from "../ui/partId.ts";
import { QuantityField } from "../ui/QuantityField.tsx";
import { RadioField } from "../ui/RadioField.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import { ObservationEntry } from "./ObservationEntry.tsx";
import { PanelDone } from "./PanelDone.tsx";
import { PatientFigures } from "./PatientFigures.tsx";
import { ageLook, albuminLook, creatinineLook, heightLook, type KnownTraits, weightLook } from "./quantityLooks.ts";
import "./entryPanel.css";

export interface PatientPanelProps {
  readonly onDone: () => void;
}

export function PatientPanel({ onDone }: PatientPanelProps) {
  const open = useWorkbench((state) => state.open);
  const edit = useWorkbench((state) => state.edit);
  if (!open) return null;
  const { value } = open;
  const { sex, age, height, observations } = value.patient;
  const isReadOnly = open.role === "reader";
  const known: KnownTraits = {
    ...(age ? { ageYears: age.value } : {}),
    ...(height ? { heightCm: quantityConvert(height, "cm") } : {}),
    ...(sex ? { sex } : {}),
  };
  const weights = observations.filter((one) => one.kind === "weight");
  const creatinines = observations.filter((one) => one.kind === "serumCreatinine");
  const albumins = observations.filter((one) => one.kind === "albumin");
  const add = (observation: Observation, isConfirmed: boolean) =>
    edit("observationAdd", { observation: isConfirmed ? { ...observation, confirmed: true } : observation });
  const shared = { value, isReadOnly, onRemove: (id: string) => edit("observationRemove", { id }) };
  return (
    <div className="entry-panel">
      <div className="entry-panel-row">
        <QuantityField
          label={patientWords.age}
          value={age ?? null}
          units={["a"]}
          unit="a"
          look={ageLook}
          isReadOnly={isReadOnly}
          onCommit={(next) => edit("ageSet", { age: next })}
        />
        <QuantityField
          label={patientWords.height}
          value={height ?? null}
          units={["cm", "[in_i]", "m"]}
          unit="cm"
          look={(typed) => heightLook(typed, known)}
          isReadOnly={isReadOnly}
          onCommit={(next) => edit("heightSet", { height: next })}
        />
        <RadioField
          label={patientWords.sex}
          value={sex ?? null}
          choices={[
            { value: "female", label: patientWords.female },
            { value: "male", label: patientWords.male },
          ]}
          isReadOnly={isReadOnly}
          onChoose={(next) => edit("sexSet", { sex: next })}
        />
      </div>
      <ObservationEntry
        {...shared}
        words={{
          label: patientWords.weight,
          list: patientWords.weights,
          none: patientWords.noWeight,
          at: patientWords.measuredAt,
        }}
        observations={weights}
        units={["kg", "[lb_av]"]}
        unit={weights.at(-1)?.quantity.unit ?? "kg"}
        look={(typed) => weightLook(typed, known)}
        onAdd={(at, quantity, isConfirmed) => add({ id: partId(), at, kind: "weight", quantity }, isConfirmed)}
      />
      <ObservationEntry
        {...shared}
        words={{
          label: patientWords.creatinine,
          list: patientWords.creatinines,
          none: patientWords.noCreatinine,
          at: patientWords.drawnAt,
        }}
        observations={creatinines}
        units={["mg/dL", "umol/L"]}
        unit={creatinines.at(-1)?.quantity.unit ?? "mg/dL"}
        look={creatinineLook}
        onAdd={(at, quantity, isConfirmed) => add({ id: partId(), at, kind: "serumCreatinine", quantity }, isConfirmed)}
      />
      <ObservationEntry
        {...shared}
        words={{
          label: patientWords.albumin,
          list: patientWords.albumins,
          none: patientWords.noAlbumin,
          at: patientWords.drawnAt,
        }}
        observations={albumins}
        units={["g/L", "g/dL"]}
        unit={albumins.at(-1)?.quantity.unit ?? "g/L"}
        look={albuminLook}
        onAdd={(at, quantity, isConfirmed) => add({ id: partId(), at, kind: "albumin", quantity }, isConfirmed)}
      />
      <p className="entry-panel-soft">{patientWords.latest}</p>
      <PatientFigures value={value} figures={open.analysis.result?.patient ?? null} />
      <PanelDone onDone={onDone} />
    </div>
  );
}
