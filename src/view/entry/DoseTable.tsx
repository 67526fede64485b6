import { useState } from "react";
import type { Case } from "../../core/case/index.ts";
import { doseWords } from "../../core/messages/index.ts";
import { type DoseAmount, type DoseEvent, type DoseLine, doseLineExpand } from "../../core/regimen/index.ts";
import { instantMs, instantText } from "../../core/time/index.ts";
import { numberPrint, quantityPrint } from "../../core/units/index.ts";
import { Button } from "../ui/Button.tsx";
import { DataTable } from "../ui/DataTable.tsx";
import { DoseBecameForm } from "./DoseBecameForm.tsx";

/** Doses shown before the rest has to be asked for: about a week of a three-times-daily regimen. */
const SHOWN = 21;

export interface DoseTableProps {
  readonly value: Case;
  readonly lane: string;
  readonly line: DoseLine;
  readonly units: readonly DoseAmount["unit"][];
  readonly onLine: (line: DoseLine) => void;
}

/** Every dose of a given line up to the now line, and what became of it; the latest last. */
export function DoseTable({ value, lane, line, units, onLine }: DoseTableProps) {
  const [changing, setChanging] = useState<number | null>(null);
  const [isAll, setAll] = useState(false);
  const { timeZone: zone } = value;
  const laidOut = doseLineExpand(line, { zone, untilMs: instantMs(value.now) });
  if (!laidOut.ok) return null;
  const doses = laidOut.value;
  const shown = isAll ? doses : doses.slice(-SHOWN);
  const dose = doses.find((one) => one.index === changing);
  const dueWords = (one: DoseEvent) => instantText(one.scheduledMs, zone, "dayClock");
  return (
    <div className="dose-table">
      <DataTable
        caption={doseWords.doses}
        rows={shown}
        rowKey={(one) => String(one.index)}
        isRowFaint={(one) => one.status === "missed"}
        columns={[
          { id: "dose", head: doseWords.dose, align: "end", cell: (one) => numberPrint(one.index + 1) },
          { id: "due", head: doseWords.due, isRowHead: true, cell: dueWords },
          {
            id: "amount",
            head: doseWords.amount.toLowerCase(),
            align: "end",
            cell: (one) => quantityPrint(one.amount, { style: "screen" }),
          },
          { id: "became", head: doseWords.became, cell: (one) => becameWords(one, line, zone) },
          {
            id: "change",
            head: doseWords.actions,
            isHeadHidden: true,
            align: "end",
            cell: (one) => (
              <Button
                kind="quiet"
                onPress={() => setChanging(one.index)}
                name={`${doseWords.change} dose ${one.index + 1}, ${dueWords(one)}`}
              >
                {doseWords.change}
              </Button>
            ),
          },
        ]}
      />
      {shown.length < doses.length ? (
        <p className="entry-panel-soft">
          {doseWords.earlier(doses.length - shown.length)}{" "}
          <Button kind="quiet" onPress={() => setAll(true)}>
            {doseWords.showAll(doses.length)}
          </Button>
        </p>
      ) : null}
      {dose ? (
        <DoseBecameForm
          key={dose.index}
          value={value}
          lane={lane}
          line={line}
          dose={dose}
          units={units}
          onCancel={() => setChanging(null)}
          onLine={(changed) => {
            onLine(changed);
            setChanging(null);
          }}
        />
      ) : null}
    </div>
  );
}

function becameWords(dose: DoseEvent, line: DoseLine, zone: string): string {
  const words = doseWords.takenAs[dose.status];
  const isElsewhere = dose.status !== "missed" && dose.atMs !== dose.scheduledMs;
  if (isElsewhere) return doseWords.takenAt(instantText(dose.atMs, zone, "dayClock"), words);
  if (dose.status === "missed") return words;
  const isPart = dose.amount.unit === line.amount.unit && dose.amount.value < line.amount.value;
  return isPart ? doseWords.partOf(quantityPrint(line.amount, { style: "screen" })) : doseWords.taken;
}
