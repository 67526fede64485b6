import { useState } from "react";
import { recordProfile } from "../../../core/analysis/index.ts";
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
import { trialUnit } from "../trial/trialUnit.ts";

export interface EditorSideProps {
  readonly draft: RecordDraft;
  readonly base: MedicineRecord;
  readonly reference: ReferenceDraft;
  readonly onReference: (draft: ReferenceDraft) => void;
}

/** The typical curve and readings of the draft as it stands, for a patient, a dose and an interval of the editor's choice. */
export function EditorSide({ draft, base, reference, onReference }: EditorSideProps) {
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
  const told = preview.ok ? (profile && !profile.ok ? profile.issues : []) : preview.issues;
  const name = draftTyped(draft.name) || base.name;
  return (
    <aside className="editor-side" aria-label={recordWords.typicalCurve}>
      <section>
        <h3>{recordWords.typicalCurve}</h3>
        <p className="trial-help">{recordWords.typicalNote}</p>
        {profile?.ok && preview.ok ? (
          <>
            <TrialCurve
              profiles={[{ id: "draft", name: "", profile: profile.value }]}
              unit={trialUnit({ ...preview.value, displayUnit: displayUnitOf(draft, base) })}
              title={recordWords.chartTitle(name, `${doseMg} mg`, `${intervalH} h`)}
            />
            <TrialReadings
              profiles={[{ id: "draft", name: recordWords.valueColumn, profile: profile.value }]}
              unit={trialUnit({ ...preview.value, displayUnit: displayUnitOf(draft, base) })}
            />
          </>
        ) : (
          <div className="trial-none" role="status">
            <p>{recordWords.noCurve}</p>
            {[...new Set(told.map(issueMessage))].map((sentence) => (
              <p key={sentence}>{sentence}</p>
            ))}
          </div>
        )}
      </section>
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
