import { type FormEvent, useState } from "react";
import { casesWords } from "../../core/messages/index.ts";
import { instantRead } from "../../core/time/index.ts";
import type { WorkbenchState } from "../../shell/store/workbenchState.ts";
import { Button } from "../ui/Button.tsx";
import { ChoiceField } from "../ui/ChoiceField.tsx";
import { InstantInput, instantTyped } from "../ui/InstantInput.tsx";
import { presentMinute } from "../ui/presentMinute.ts";
import { TextField } from "../ui/TextField.tsx";
import { timeZoneHere, timeZoneNames } from "../ui/timeZones.ts";

export interface NewCaseFormProps {
  readonly medicines: WorkbenchState["medicines"];
  readonly onCreate: WorkbenchState["newCase"];
}

/** The first step. The medicine is never preselected; zone and now line start as the machine has them. */
export function NewCaseForm({ medicines, onCreate }: NewCaseFormProps) {
  const [label, setLabel] = useState("");
  const [medicine, setMedicine] = useState<string | null>(null);
  const [zone, setZone] = useState(timeZoneHere);
  const [present] = useState(() => presentMinute(zone));
  const [nowText, setNowText] = useState(() => instantTyped(present, zone));
  const [isSent, setSent] = useState(false);

  // An untouched now line stays the present minute; a typed clock time is meant in whatever zone is chosen.
  const chooseZone = (next: string) => {
    if (nowText === instantTyped(present, zone)) setNowText(instantTyped(present, next));
    setZone(next);
  };
  const now = instantRead(nowText, zone, present);
  const send = (event: FormEvent) => {
    event.preventDefault();
    setSent(true);
    const trimmed = label.trim();
    if (trimmed && medicine && now.ok) void onCreate({ label: trimmed, medicine, timeZone: zone, now: now.value });
  };
  return (
    <form className="new-case-form" onSubmit={send} noValidate>
      <TextField
        label={casesWords.label}
        value={label}
        onChange={setLabel}
        maxLength={120}
        description={casesWords.labelHelp}
        fault={isSent && !label.trim() ? casesWords.labelMissing : undefined}
      />
      <ChoiceField
        label={casesWords.medicineLabel}
        value={medicine}
        prompt={casesWords.medicinePrompt}
        onChoose={setMedicine}
        choices={medicines.map((record) => ({
          value: record.id,
          label: record.invented ? `${record.name} (${casesWords.invented})` : record.name,
        }))}
        fault={isSent && !medicine ? casesWords.medicineMissing : undefined}
      />
      <ChoiceField
        label={casesWords.timeZone}
        value={zone}
        onChoose={chooseZone}
        choices={timeZoneNames(zone).map((name) => ({ value: name, label: name }))}
      />
      <InstantInput
        label={casesWords.now}
        text={nowText}
        onChange={setNowText}
        zone={zone}
        now={present}
        isTold={isSent}
        description={casesWords.nowHelp}
      />
      <div>
        <Button kind="main" type="submit">
          {casesWords.create}
        </Button>
      </div>
    </form>
  );
}
