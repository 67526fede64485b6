import { useState } from "react";
import { recordProfile } from "../../core/analysis/index.ts";
import type { MedicineRecord } from "../../core/medicine/index.ts";
import { issueMessage, recordWords } from "../../core/messages/index.ts";
import { Button } from "../ui/Button.tsx";
import { ChoiceField } from "../ui/ChoiceField.tsx";
import { DataTable } from "../ui/DataTable.tsx";
import { RecordProvenance } from "./RecordProvenance.tsx";
import type { RecordRow } from "./recordRows.ts";
import { recordDifferences } from "./recordSections.ts";
import { CourseFields } from "./trial/CourseFields.tsx";
import { type CourseDraft, courseDraftAtFirst, courseDraftRead } from "./trial/courseDraft.ts";
import { ReferenceFields } from "./trial/ReferenceFields.tsx";
import { type ReferenceDraft, referenceDraftRead } from "./trial/referenceDraft.ts";
import { TrialCurve } from "./trial/TrialCurve.tsx";
import { TrialReadings } from "./trial/TrialReadings.tsx";
import { trialUnit } from "./trial/trialUnit.ts";
import "./RecordCompare.css";

export interface RecordCompareProps {
  readonly records: readonly MedicineRecord[];
  readonly first: MedicineRecord;
  /** What to begin with beside it. */
  readonly second: MedicineRecord;
  /** Ids of records with unsaved edits. */
  readonly edited: readonly string[];
  readonly onLeave: () => void;
  readonly reference: ReferenceDraft;
  readonly onReference: (draft: ReferenceDraft) => void;
}

/** Two records under the same patient, dose and interval: curves, readings, and the figures in which they differ. */
export function RecordCompare(props: RecordCompareProps) {
  const { records, onLeave, reference, onReference } = props;
  const [ids, setIds] = useState<readonly [string, string]>([props.first.id, props.second.id]);
  const of = (id: string) => records.find((each) => each.id === id) ?? props.first;
  const pair = [of(ids[0]), of(ids[1])] as const;
  const [chosen, setChosen] = useState<Readonly<Record<string, string>>>({});
  const patient = referenceDraftRead(reference);
  const [course, setCourse] = useState<CourseDraft>(() =>
    courseDraftAtFirst(props.first, props.first.products[0]?.id ?? "", patient),
  );
  const { doseMg, intervalH } = courseDraftRead(course);
  const choices = records.map(({ id, name }) => ({ value: id, label: name }));
  const productOf = (record: MedicineRecord) =>
    record.products.find(({ id }) => id === chosen[record.id])?.id ?? record.products[0]?.id ?? "";
  const made = pair.map((record) => ({
    record,
    result:
      doseMg === null || intervalH === null
        ? null
        : recordProfile(record, patient, { product: productOf(record), doseMg, intervalH }),
  }));
  const profiles = made.flatMap(({ record, result }, index) =>
    result?.ok ? [{ id: `${index}`, name: record.name, profile: result.value }] : [],
  );
  const isSame = pair[0].id === pair[1].id;
  const differences = isSame ? [] : recordDifferences(pair[0], pair[1]);
  const unit = trialUnit(pair[0]);
  const cell = (record: MedicineRecord, row: RecordRow | null) =>
    row ? (
      <span className="compare-cell">
        {row.value}
        {row.note ? <span className="record-page-note">{row.note}</span> : null}
        <RecordProvenance record={record} source={row.source} basis={row.basis} />
      </span>
    ) : (
      recordWords.notThere
    );
  return (
    <div className="compare">
      <header>
        <h2>{recordWords.compareHeading}</h2>
        <p className="record-page-state">{recordWords.compareHelp}</p>
        <div className="record-page-actions">
          <Button onPress={onLeave}>{recordWords.back}</Button>
        </div>
      </header>
      <div className="compare-pair">
        <ChoiceField
          label={recordWords.compareFirst}
          value={pair[0].id}
          choices={choices}
          onChoose={(id) => setIds([id, ids[1]])}
        />
        <ChoiceField
          label={recordWords.compareSecond}
          value={pair[1].id}
          choices={choices}
          onChoose={(id) => setIds([ids[0], id])}
          fault={isSame ? recordWords.compareSame : undefined}
        />
      </div>
      {pair.map(({ id, name }) =>
        props.edited.includes(id) ? (
          <p key={id} className="record-page-note">
            {recordWords.compareUnsaved(name)}
          </p>
        ) : null,
      )}
      {isSame ? null : (
        <>
          <section>
            <h3>{recordWords.typicalCurve}</h3>
            <p className="record-page-note">{recordWords.typicalNote}</p>
            {profiles.length > 0 ? (
              <>
                <TrialCurve
                  profiles={profiles.map((each) => ({ ...each, name: shortName(each.name) }))}
                  unit={unit}
                  title={recordWords.chartTitle(
                    profiles.map(({ name }) => name).join(", "),
                    `${doseMg} mg`,
                    `${intervalH} h`,
                  )}
                  height={300}
                />
                <TrialReadings profiles={profiles} unit={unit} />
              </>
            ) : null}
            {made.map(({ record, result }) =>
              result === null || result.ok ? null : (
                <div key={record.id} className="trial-none" role="status">
                  <p>
                    {record.name}: {recordWords.noCurve}
                  </p>
                  {result.issues.map((issue, index) => (
                    <p key={index}>{issueMessage(issue)}</p>
                  ))}
                </div>
              ),
            )}
          </section>
          <div className="compare-fields">
            <CourseFields
              draft={course}
              onChange={setCourse}
              products={pair.map((record) => ({
                label: `${recordWords.product}: ${record.name}`,
                products: record.products,
                chosen: productOf(record),
                onChoose: (product) => setChosen({ ...chosen, [record.id]: product }),
              }))}
            />
            <ReferenceFields draft={reference} onChange={onReference} />
          </div>
          <section>
            <h3>{recordWords.differences}</h3>
            {differences.length > 0 ? (
              <p className="record-page-note">{recordWords.differencesAbout(differences.length)}</p>
            ) : null}
            <DataTable
              caption={recordWords.differences}
              isCaptionHidden
              rows={differences}
              rowKey={(row) => row.key}
              empty={recordWords.differencesNone}
              columns={[
                {
                  id: "figure",
                  head: recordWords.figureColumn,
                  isRowHead: true,
                  cell: (row) => (
                    <span className="compare-cell">
                      {row.name}
                      <span className="record-page-note">{row.section}</span>
                    </span>
                  ),
                },
                { id: "first", head: pair[0].name, cell: (row) => cell(pair[0], row.first) },
                { id: "second", head: pair[1].name, cell: (row) => cell(pair[1], row.second) },
              ]}
            />
          </section>
        </>
      )}
    </div>
  );
}

/** Longest name written at the end of a curve. */
const NAME_MOST = 18;

/** The end of a name tells a copy from its original, so a long one is cut in its middle. */
function shortName(name: string): string {
  if (name.length <= NAME_MOST) return name;
  return `${name.slice(0, 9).trimEnd()}…${name.slice(-8).trimStart()}`;
}
