import { type FormEvent, useEffect, useRef, useState } from "react";
import type { Case } from "../../core/case/index.ts";
import { doseWords, issueMessage } from "../../core/messages/index.ts";
import type { DoseAmount, DoseEvent, DoseLine } from "../../core/regimen/index.ts";
import { type Issue, issue } from "../../core/result/index.ts";
import { instantIso, instantMs, instantRead, instantText } from "../../core/time/index.ts";
import { quantityPrint } from "../../core/units/index.ts";
import { Button } from "../ui/Button.tsx";
import { InstantInput, instantTyped } from "../ui/InstantInput.tsx";
import { QuantityInput } from "../ui/QuantityInput.tsx";
import { quantityDraft, quantityDraftRead } from "../ui/quantityDraft.ts";
import { RadioField } from "../ui/RadioField.tsx";
import { lineFault, lineWithDose } from "./lineLook.ts";

export interface DoseBecameFormProps {
  readonly value: Case;
  readonly lane: string;
  readonly line: DoseLine;
  readonly dose: DoseEvent;
  readonly units: readonly DoseAmount["unit"][];
  readonly onLine: (line: DoseLine) => void;
  readonly onCancel: () => void;
}

type Became = "taken" | "missed" | "at" | "part";

const amountWords = (amount: DoseAmount) => quantityPrint(amount, { style: "screen", significant: 4 });

/** What became of one dose: taken when due, missed, taken at another time, or only in part; and how much of it. One edit. */
export function DoseBecameForm({ value, lane, line, dose, units, onLine, onCancel }: DoseBecameFormProps) {
  const { timeZone: zone, now } = value;
  const [became, setBecame] = useState<Became>(() => {
    if (dose.status === "missed") return "missed";
    return dose.atMs === dose.scheduledMs ? "taken" : "at";
  });
  const [atText, setAtText] = useState(() => instantTyped(instantIso(dose.atMs, zone), zone));
  const [amount, setAmount] = useState(() => quantityDraft<DoseAmount["unit"]>(dose.amount, dose.amount.unit));
  const [share, setShare] = useState(() => quantityDraft<"%">(null, "%"));
  const [isSent, setSent] = useState(false);
  const [fault, setFault] = useState<Issue | null>(null);

  const form = useRef<HTMLFormElement>(null);
  // It opens below the table: the one who asked for it is taken there.
  useEffect(() => form.current?.querySelector<HTMLInputElement>("input:checked")?.focus(), []);

  const at = instantRead(atText, zone, now);
  const isLate = at.ok && instantMs(at.value) > instantMs(now);
  const words = (iso: string) => instantText(instantMs(iso), zone, "dayClock");
  const atFault = at.ok && isLate ? issue("dose-taken-after-now", { at: words(at.value), now: words(now) }) : null;
  const part = quantityDraftRead(share, ["%"]);
  const isShare = part.ok && part.value.value > 0 && part.value.value < 100;
  const partAmount =
    part.ok && isShare ? { ...line.amount, value: (line.amount.value * part.value.value) / 100 } : null;
  const shareFault = part.ok && !isShare ? issue("dose-share", { found: part.value.value }) : fault;
  const send = (event: FormEvent) => {
    event.preventDefault();
    setSent(true);
    if (became === "part") {
      if (!partAmount) return;
      // It stays where it was taken: only a missed dose had no time of its own.
      const isMoved = dose.status !== "missed" && dose.atMs !== dose.scheduledMs;
      const how = isMoved ? ({ kind: "at", at: instantIso(dose.atMs, zone) } as const) : ({ kind: "taken" } as const);
      return keep(lineWithDose(value, lane, line, dose, how, partAmount));
    }
    const read = quantityDraftRead(amount, units);
    if (became === "missed") return onLine(lineWithDose(value, lane, line, dose, { kind: "missed" }, dose.amount));
    if (!read.ok || (became === "at" && (!at.ok || atFault))) return;
    if (read.value.value <= 0)
      return setFault(issue("dose-amount", { found: read.value.value, unit: read.value.unit }));
    const how = became === "at" && at.ok ? ({ kind: "at", at: at.value } as const) : ({ kind: "taken" } as const);
    keep(lineWithDose(value, lane, line, dose, how, read.value));
  };
  const keep = (changed: DoseLine) => {
    const found = lineFault(changed, line, value);
    setFault(found);
    if (!found) onLine(changed);
  };
  return (
    <form ref={form} className="entry-panel-form dose-became" onSubmit={send} noValidate>
      <RadioField
        label={`${doseWords.dose} ${dose.index + 1}, ${doseWords.due} ${instantText(dose.scheduledMs, zone, "dayClock")}`}
        value={became}
        choices={[
          { value: "taken", label: doseWords.taken },
          { value: "at", label: doseWords.otherTime },
          { value: "part", label: doseWords.part },
          { value: "missed", label: doseWords.missed },
        ]}
        onChoose={(next) => {
          setFault(null);
          setSent(false);
          setBecame(next);
        }}
      />
      {became === "part" ? (
        <QuantityInput
          label={doseWords.share}
          draft={share}
          units={["%"]}
          isTold={isSent}
          fault={isSent && shareFault ? issueMessage(shareFault) : undefined}
          description={doseWords.shareHelp}
          reading={partAmount ? doseWords.shareIs(amountWords(partAmount), amountWords(line.amount)) : undefined}
          onChange={(next) => {
            setFault(null);
            setSent(false);
            setShare(next);
          }}
        />
      ) : null}
      {became === "missed" || became === "part" ? null : (
        <div className="line-form-row">
          <QuantityInput
            label={doseWords.takenAmount}
            draft={amount}
            units={units}
            isTold={isSent}
            fault={fault ? issueMessage(fault) : undefined}
            onChange={(next) => {
              setFault(null);
              setAmount(next);
            }}
          />
          {became === "at" ? (
            <InstantInput
              label={doseWords.takenWhen}
              text={atText}
              zone={zone}
              now={now}
              isTold={isSent}
              fault={isSent && atFault ? issueMessage(atFault) : undefined}
              onChange={setAtText}
            />
          ) : null}
        </div>
      )}
      <div className="entry-panel-buttons">
        <Button type="submit">{doseWords.save}</Button>
        <Button kind="quiet" onPress={onCancel}>
          {doseWords.cancel}
        </Button>
      </div>
    </form>
  );
}
