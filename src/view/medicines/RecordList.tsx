import { type ReactNode, useState } from "react";
import { type MedicineRecord, unverifiedFigures } from "../../core/medicine/index.ts";
import { medicinesWords, recordWords } from "../../core/messages/index.ts";
import { unitSpoken } from "../../core/units/index.ts";
import { TextField } from "../ui/TextField.tsx";
import "./RecordList.css";

export interface RecordListProps {
  readonly records: readonly MedicineRecord[];
  readonly own: readonly string[];
  /** Ids of records with unsaved edits. */
  readonly edited: readonly string[];
  readonly chosen: string | undefined;
  readonly onChoose: (id: string) => void;
  /** Under the user's own records: how to get more. */
  readonly children: ReactNode;
}

/** All records, the user's own apart from those that come with the program; each says how far it can be trusted. */
export function RecordList({ records, own, edited, chosen, onChoose, children }: RecordListProps) {
  const [search, setSearch] = useState("");
  const found = records.filter((record) => isFound(record, search)).sort(byName);
  const groups = [
    {
      heading: recordWords.listOwn,
      records: found.filter(({ id }) => own.includes(id)),
      empty: recordWords.listOwnNone,
    },
    { heading: recordWords.listBuiltIn, records: found.filter(({ id }) => !own.includes(id)), empty: "" },
  ];
  const isSearched = search.trim() !== "";
  return (
    <nav className="record-list" aria-label={medicinesWords.list}>
      <TextField label={recordWords.search} value={search} onChange={setSearch} description={recordWords.searchHelp} />
      <p className="record-list-found" role="status">
        {isSearched
          ? found.length === 0
            ? recordWords.foundNone
            : recordWords.found(found.length, records.length)
          : ""}
      </p>
      {groups.map((group) =>
        group.records.length === 0 && isSearched ? null : (
          <section key={group.heading}>
            <h2>{group.heading}</h2>
            {group.records.length === 0 ? <p className="record-list-found">{group.empty}</p> : null}
            <ul>
              {group.records.map((record) => (
                <li key={record.id}>
                  <button
                    type="button"
                    className="record-list-choice"
                    aria-current={record.id === chosen ? "true" : undefined}
                    onClick={() => onChoose(record.id)}
                  >
                    <strong>{record.name}</strong>
                    <span>{remarks(record, edited.includes(record.id))}</span>
                  </button>
                </li>
              ))}
            </ul>
            {group.heading === recordWords.listOwn && !isSearched ? children : null}
          </section>
        ),
      )}
    </nav>
  );
}

/** By name; what is invented comes last. */
function byName(a: MedicineRecord, b: MedicineRecord): number {
  if (a.invented !== b.invented) return a.invented ? 1 : -1;
  return a.name < b.name ? -1 : 1;
}

function remarks(record: MedicineRecord, isEdited: boolean): string {
  const { unverified, total } = unverifiedFigures(record);
  return [
    ...(isEdited ? [recordWords.unsaved] : []),
    unverified > 0 ? recordWords.unverifiedOf(unverified, total) : recordWords.allSeen(total),
    record.review.status === "reviewed" ? recordWords.reviewed : recordWords.notReviewed,
    ...(record.estimates.from === "pieced-together" ? [recordWords.piecedTogether] : []),
    unitSpoken(record.displayUnit, "screen"),
  ].join(" · ");
}

function isFound(record: MedicineRecord, search: string): boolean {
  const wanted = search.trim().toLowerCase();
  const names = [
    record.name,
    ...record.products.map(({ name }) => name),
    ...record.interactions.map((each) => each.medicine),
  ];
  return names.some((name) => name.toLowerCase().includes(wanted));
}
