import { useState } from "react";
import { doseWords, issueMessage } from "../../core/messages/index.ts";
import { clockTimeSchema, type DoseLine, type DoseRepeat } from "../../core/regimen/index.ts";
import { type Issue, issue } from "../../core/result/index.ts";
import { instantMs, wallClock } from "../../core/time/index.ts";
import type { FieldAsk } from "../ui/fieldQuestion.ts";
import { QuantityField } from "../ui/QuantityField.tsx";
import { RadioField } from "../ui/RadioField.tsx";
import { TextField } from "../ui/TextField.tsx";
import { repeatKind } from "./lineLook.ts";
import { WeekdayField } from "./WeekdayField.tsx";

export interface RepeatFieldsProps {
  readonly line: DoseLine;
  readonly zone: string;
  readonly faultOf: (line: DoseLine) => Issue | null;
  /** A question before the line counts; `taken` is what counts then. */
  readonly askOf: <T>(line: DoseLine, taken: T) => FieldAsk<T> | null;
  readonly onLine: (line: DoseLine) => void;
}

/** How often a line repeats and how far it reaches. */
export function RepeatFields({ line, zone, faultOf, askOf, onLine }: RepeatFieldsProps) {
  const [faults, setFaults] = useState<Readonly<Record<string, string>>>({});
  const { repeat } = line;
  /** Takes the change, or says beside the field why not. */
  const take = (field: string, next: DoseRepeat | undefined, own?: Issue) => {
    const { repeat: _, ...rest } = line;
    const changed: DoseLine = next ? { ...rest, repeat: next } : rest;
    const fault = own ?? faultOf(changed);
    setFaults(fault ? { [field]: issueMessage(fault) } : {});
    if (!fault) onLine(changed);
  };
  const startTime = wallClock(instantMs(line.start), zone).time;
  return (
    <div className="repeat-fields">
      <RadioField
        label={doseWords.repeat}
        value={repeatKind(line)}
        choices={[
          { value: "once", label: doseWords.once },
          { value: "every", label: doseWords.every },
          { value: "clock", label: doseWords.clock },
        ]}
        onChoose={(kind) => {
          if (kind === "once") take("kind", undefined);
          else if (kind === "every") take("kind", { every: { value: 12, unit: "h" } });
          else take("kind", { clock: [startTime] });
        }}
      />
      {faults.kind ? (
        <p className="field-frame-fault" role="status">
          {faults.kind}
        </p>
      ) : null}
      {repeat && "every" in repeat ? (
        <div className="line-form-row">
          <QuantityField
            label={doseWords.hours}
            value={repeat.every}
            units={["h"]}
            unit="h"
            look={(every) => {
              if (every.value <= 0)
                return { kind: "refused", issue: issue("line-interval", { found: every.value, unit: "h" }) };
              const next = { ...line, repeat: { ...repeat, every } };
              const fault = faultOf(next);
              if (fault) return { kind: "refused", issue: fault };
              const ask = askOf(next, every);
              return ask ? { kind: "asked", ask } : { kind: "fine" };
            }}
            onCommit={(every) => every && onLine({ ...line, repeat: { ...repeat, every } })}
          />
          <TextField
            key={`count ${repeat.count ?? ""}`}
            label={doseWords.count}
            value={repeat.count === undefined ? "" : String(repeat.count)}
            description={doseWords.endless}
            fault={faults.count}
            onCommit={(text) => {
              const { count: _, ...endless } = repeat;
              const count = wholeNumber(text);
              if (count === "empty") take("count", endless);
              else
                take("count", { ...endless, count: count ?? 1 }, count === null ? wholeNumberIssue(text) : undefined);
            }}
          />
        </div>
      ) : null}
      {repeat && "clock" in repeat ? (
        <WeekdayField
          value={repeat.weekdays}
          fault={faults.weekdays}
          onChange={(weekdays) => {
            const { weekdays: _, ...daily } = repeat;
            // Other days are other doses: a mark would come to stand at one it was not made for.
            const isMarked = (line.except ?? []).length > 0;
            take(
              "weekdays",
              weekdays ? { ...daily, weekdays } : daily,
              isMarked ? issue("dose-line-has-exceptions") : undefined,
            );
          }}
        />
      ) : null}
      {repeat && "clock" in repeat ? (
        <div className="line-form-row">
          <TextField
            label={doseWords.clockTimes}
            value={repeat.clock.join(", ")}
            description={doseWords.clockTimesHelp}
            fault={faults.clock}
            onCommit={(text) => {
              const clock = clockList(text);
              take(
                "clock",
                { ...repeat, clock: clock ?? repeat.clock },
                clock ? undefined : issue("dose-clock-list", { part: text.trim() }),
              );
            }}
          />
          <TextField
            key={`days ${repeat.days ?? ""}`}
            label={doseWords.days}
            value={repeat.days === undefined ? "" : String(repeat.days)}
            description={doseWords.endless}
            fault={faults.days}
            onCommit={(text) => {
              const { days: _, ...endless } = repeat;
              const days = wholeNumber(text);
              if (days === "empty") take("days", endless);
              else take("days", { ...endless, days: days ?? 1 }, days === null ? wholeNumberIssue(text) : undefined);
            }}
          />
        </div>
      ) : null}
    </div>
  );
}

/** Days and counts are small; five digits keep them far from what a file may hold. */
function wholeNumber(text: string): number | "empty" | null {
  const trimmed = text.trim();
  if (trimmed === "") return "empty";
  return /^[1-9]\d{0,3}$/.test(trimmed) ? Number(trimmed) : null;
}

const wholeNumberIssue = (text: string) => issue("dose-whole-number", { part: text.trim() });

/** "8:00, 22:00" or "08:00 and 22:00"; null when a part is no clock time, or stands twice. */
function clockList(text: string): string[] | null {
  const times = text
    .split(/\s*(?:,|;|\band\b|\s)\s*/)
    .filter((part) => part !== "")
    .map((part) => (/^\d:/.test(part) ? `0${part}` : part));
  const isGood = times.length > 0 && times.every((time) => clockTimeSchema.safeParse(time).success);
  return isGood && new Set(times).size === times.length ? times.sort() : null;
}
