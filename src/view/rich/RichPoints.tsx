import { type FormEvent, useState } from "react";
import { issueMessage, richWords } from "../../core/messages/index.ts";
import type { WagnerNelson } from "../../core/noncompartmental/index.ts";
import { type Issue, issue } from "../../core/result/index.ts";
import { numberPrint } from "../../core/units/index.ts";
import { Button } from "../ui/Button.tsx";
import { type DataColumn, DataTable } from "../ui/DataTable.tsx";
import { Notice } from "../ui/Notice.tsx";
import { TextField } from "../ui/TextField.tsx";
import type { richUnits } from "./richFigures.ts";
import type { RichOccasion, RichPoint } from "./richOccasions.ts";

interface RichPointsProps {
  readonly occasion: RichOccasion;
  /** Places of the points the shown figures have on their terminal line. */
  readonly used: readonly number[];
  readonly absorbed: WagnerNelson | null;
  readonly isOverruled: boolean;
  readonly show: ReturnType<typeof richUnits>;
  readonly clock: (hours: number) => string;
  /** Why these points make no terminal line; null when they do. */
  readonly faultOf: (indices: readonly number[]) => Issue | null;
  readonly onOverrule: (overrule: { readonly indices: readonly number[]; readonly reason: string } | null) => void;
}

type Row = RichPoint & { readonly index: number };

/** The levels used; which of them lie on the terminal line can be changed, with a reason. */
export function RichPoints(props: RichPointsProps) {
  const { occasion, used, absorbed, isOverruled, show, clock, faultOf, onOverrule } = props;
  const [draft, setDraft] = useState<readonly number[] | null>(null);
  const [reason, setReason] = useState("");
  const [isSent, setSent] = useState(false);
  const picked = draft ?? used;
  const isChanged = draft !== null && draft.join() !== used.join();
  const fault = isChanged && isSent ? faultOf(picked) : null;

  const start = (next: readonly number[] | null) => {
    setDraft(next);
    setSent(false);
  };
  const toggle = (index: number) =>
    start(picked.includes(index) ? picked.filter((each) => each !== index) : [...picked, index].sort((a, b) => a - b));
  const overrule = (next: Parameters<typeof onOverrule>[0]) => {
    onOverrule(next);
    start(null);
    setReason("");
  };
  const send = (event: FormEvent) => {
    event.preventDefault();
    setSent(true);
    if (reason.trim() && faultOf(picked) === null) overrule({ indices: picked, reason: reason.trim() });
  };

  const peak = occasion.points.reduce((best, { value }, i) => (value > occasion.points[best]!.value ? i : best), 0);
  const time = (row: Row) => `${numberPrint(row.time, { decimals: 2 })}\u00a0h`;
  const columns: DataColumn<Row>[] = [
    { id: "time", head: richWords.time, isRowHead: true, cell: time },
    {
      id: "drawn",
      head: richWords.drawn,
      cell: (row) => (
        <>
          {row.from === "nothing-before" ? null : clock(row.atH)}
          {row.from === "measured" ? null : <span className="rich-levels-from">{richWords.from[row.from]}</span>}
        </>
      ),
    },
    { id: "level", head: richWords.level, align: "end", cell: (row) => show.level(row.value) },
    ...(absorbed
      ? [
          {
            id: "absorbed",
            head: richWords.absorbed,
            align: "end" as const,
            cell: (row: Row) => `${numberPrint(absorbed.points[row.index]!.fraction * 100, { decimals: 0 })}\u00a0%`,
          },
        ]
      : []),
    {
      id: "line",
      head: richWords.onLine,
      align: "end",
      // Before the highest level, and at 0, a point can't be on the line.
      cell: (row) =>
        row.index < peak || row.value === 0 ? null : (
          <input
            type="checkbox"
            className="rich-levels-check"
            checked={picked.includes(row.index)}
            onChange={() => toggle(row.index)}
            aria-label={richWords.pick(time(row), show.level(row.value))}
          />
        ),
    },
  ];
  return (
    <>
      <DataTable
        caption={richWords.points}
        rows={occasion.points.map((point, index) => ({ ...point, index }))}
        rowKey={(row) => String(row.index)}
        columns={columns}
      />
      {isChanged && (
        <form className="rich-levels-form" onSubmit={send} noValidate>
          <p role="status">{richWords.changed}</p>
          <TextField
            label={richWords.reason}
            value={reason}
            onChange={setReason}
            maxLength={200}
            description={richWords.reasonHelp}
            fault={isSent && !reason.trim() ? issueMessage(issue("rich-reason-missing")) : undefined}
          />
          {fault && (
            <Notice gravity="stop" isAnnounced>
              <p>{issueMessage(fault)}</p>
            </Notice>
          )}
          <div className="rich-levels-buttons">
            <Button type="submit">{richWords.use}</Button>
            <Button kind="quiet" onPress={() => start(null)}>
              {richWords.back}
            </Button>
          </div>
        </form>
      )}
      {isOverruled && (
        <div className="rich-levels-buttons">
          <Button onPress={() => overrule(null)}>{richWords.automaticAgain}</Button>
        </div>
      )}
    </>
  );
}
