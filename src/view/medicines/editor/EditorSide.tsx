import { type ReactNode, useRef, useState } from "react";
import { type RecordProfile, recordProfile } from "../../../core/analysis/index.ts";
import {
  DISPLAY_UNITS,
  draftAt,
  draftTyped,
  isDraftGroup,
  type MedicineRecord,
  type RecordDraft,
  recordPreview,
} from "../../../core/medicine/index.ts";
import { issueMessage, recordWords } from "../../../core/messages/index.ts";
import { fail } from "../../../core/result/index.ts";
import { CourseFields } from "../trial/CourseFields.tsx";
import { type CourseDraft, courseDraftAtFirst, courseDraftRead } from "../trial/courseDraft.ts";
import { ReferenceFields } from "../trial/ReferenceFields.tsx";
import { type ReferenceDraft, referenceDraftRead } from "../trial/referenceDraft.ts";
import { TrialCurve } from "../trial/TrialCurve.tsx";
import { TrialReadings } from "../trial/TrialReadings.tsx";
import { type TrialUnit, trialUnit } from "../trial/trialUnit.ts";

export interface EditorSideProps {
  readonly draft: RecordDraft;
  readonly base: MedicineRecord;
  readonly reference: ReferenceDraft;
  readonly onReference: (draft: ReferenceDraft) => void;
  /** Under the curve: what stands in the way of saving. */
  readonly children: ReactNode;
}

interface Shown {
  readonly profile: RecordProfile;
  readonly unit: TrialUnit;
  readonly doseMg: number;
  readonly intervalH: number;
}

/** The typical curve and readings of the draft as it stands, for a patient, a dose and an interval of the editor's choice. */
export function EditorSide({ draft, base, reference, onReference, children }: EditorSideProps) {
  const patient = referenceDraftRead(reference);
  const products = productsOf(draft);
  const [chosen, setChosen] = useState<string | null>(null);
  const index = Math.max(
    0,
    products.findIndex(({ id }) => id === chosen),
  );
  const product = products[index];
  const [course, setCourse] = useState<CourseDraft>(() =>
    courseDraftAtFirst(base, base.products[0]?.id ?? "", patient),
  );
  const { doseMg, intervalH } = courseDraftRead(course);
  const preview = product ? recordPreview(draft, base, index) : fail<MedicineRecord>();
  const profile =
    preview.ok && product && doseMg !== null && intervalH !== null
      ? recordProfile(preview.value, patient, { product: product.id, doseMg, intervalH })
      : null;
  const made: Shown | null =
    profile?.ok && preview.ok && doseMg !== null && intervalH !== null
      ? {
          profile: profile.value,
          unit: trialUnit({ ...preview.value, displayUnit: displayUnitOf(draft, base) }),
          doseMg,
          intervalH,
        }
      : null;
  // What can't be worked out now leaves the last that could in sight, marked.
  const last = useRef<Shown | null>(null);
  if (made) last.current = made;
  const shown = made ?? last.current;
  const told = preview.ok ? (profile && !profile.ok ? profile.issues : []) : preview.issues;
  const name = draftTyped(draft.name) || base.name;
  return (
    <aside className="editor-side" aria-label={recordWords.typicalCurve}>
      <section>
        <h3>{recordWords.typicalCurve}</h3>
        <p className="trial-help">{recordWords.typicalNote}</p>
        {told.length > 0 ? (
          <div className="trial-none" role="status">
            <p>{shown ? recordWords.curveOld : recordWords.noCurve}</p>
            {[...new Set(told.map(issueMessage))].map((sentence) => (
              <p key={sentence}>{sentence}</p>
            ))}
          </div>
        ) : null}
        {shown ? (
          <div className={made ? undefined : "editor-side-old"}>
            <TrialCurve
              profiles={[{ id: "draft", name: "", profile: shown.profile }]}
              unit={shown.unit}
              title={recordWords.chartTitle(name, `${shown.doseMg} mg`, `${shown.intervalH} h`)}
            />
            <TrialReadings
              profiles={[{ id: "draft", name: recordWords.valueColumn, profile: shown.profile }]}
              unit={shown.unit}
            />
          </div>
        ) : null}
      </section>
      {children}
      <CourseFields
        draft={course}
        onChange={setCourse}
        products={[{ label: recordWords.product, products, chosen: product?.id ?? "", onChoose: setChosen }]}
      />
      <ReferenceFields draft={reference} onChange={onReference} />
    </aside>
  );
}

function productsOf(draft: RecordDraft): { readonly id: string; readonly name: string }[] {
  const list = Array.isArray(draft.products) ? draft.products : [];
  return list.map((_, index) => {
    const node = draftAt(draft, ["products", index]);
    const group = isDraftGroup(node) ? node : {};
    return {
      id: draftTyped(group.id),
      name: draftTyped(group.name) || recordWords.partOf(recordWords.product1, index + 1),
    };
  });
}

function displayUnitOf(draft: RecordDraft, base: MedicineRecord): MedicineRecord["displayUnit"] {
  return DISPLAY_UNITS.find((each) => each === draft.displayUnit) ?? base.displayUnit;
}
