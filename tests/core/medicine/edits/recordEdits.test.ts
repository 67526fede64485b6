import { describe, expect, test } from "vitest";
import {
  BUILT_IN_RECORDS,
  historyChange,
  historyRedo,
  historyUndo,
  isDraftChanged,
  isRecordSame,
  type MedicineRecord,
  medicineParse,
  medicineRead,
  type RecordDraft,
  recordById,
  recordCopy,
  recordCopyName,
  recordDraft,
  recordDraftChange,
  recordDraftHistory,
  recordDraftRead,
  recordNextVersion,
  recordPreview,
} from "../../../../src/core/medicine/index.ts";

const record = recordById("theophylline")!;
const path = ["molarMass", "value"];
const figure = (draft: RecordDraft) => draft.molarMass as { source: string; basis: string; note?: string };
const codes = (read: ReturnType<typeof recordDraftRead>) => (read.ok ? [] : read.issues.map(({ code }) => code));

describe("a draft", () => {
  test.each(BUILT_IN_RECORDS.map((each) => [each.id, each] as const))(
    "of %s reads back as the record, to the bit",
    (_, each) => {
      expect(recordDraftRead(recordDraft(each))).toEqual({ ok: true, value: each });
    },
  );

  test("is plain data: stored and read again it is the same draft", () => {
    const draft = recordDraft(record);
    expect(JSON.parse(JSON.stringify(draft))).toEqual(draft);
  });

  test("whose figure was changed has lost its source, and cannot be read until it has one", () => {
    const draft = recordDraftChange(recordDraft(record), path, "181");
    expect(figure(draft)).toMatchObject({ value: "181", source: "", basis: "" });
    expect(codes(recordDraftRead(draft))).toEqual(["record-figure-without-source", "record-figure-without-source"]);
    const sourced = recordDraftChange(draft, ["molarMass", "source"], record.molarMass.source);
    const whole = recordDraftChange(sourced, ["molarMass", "basis"], "seen");
    const read = recordDraftRead(whole);
    if (!read.ok) throw new Error(JSON.stringify(read.issues));
    expect(read.value.molarMass).toEqual({ value: 181, unit: "g/mol", source: record.molarMass.source, basis: "seen" });
  });

  test("keeps a source chosen for the new figure while it is typed on, and gets the old one back with the old figure", () => {
    let draft = recordDraftChange(recordDraft(record), path, "18");
    draft = recordDraftChange(draft, ["molarMass", "source"], "mine");
    draft = recordDraftChange(draft, path, "181");
    expect(figure(draft).source).toBe("mine");
    draft = recordDraftChange(draft, path, String(record.molarMass.value));
    expect(recordDraftRead(draft)).toEqual({ ok: true, value: record });
  });

  test("a formula, a window and a statement ask for their source too; a label does not", () => {
    const start = recordDraft(record);
    const window = recordDraftChange(start, ["windows", 0, "low", "value"], "9.5");
    expect((window.windows as readonly RecordDraft[])[0]).toMatchObject({ source: "", basis: "" });
    const formula = recordDraftChange(start, ["kinetics", "clearance", "formula"], "4 L/h");
    expect((formula.kinetics as RecordDraft).clearance).toMatchObject({ source: "", basis: "" });
    const caution = recordDraftChange(start, ["cautions", 0, "text"], "Another.");
    expect((caution.cautions as readonly RecordDraft[])[0]).toMatchObject({ source: "", basis: "" });
    const label = recordDraftChange(start, ["windows", 0, "label"], "Another label");
    expect(recordDraftRead(label).ok).toBe(true);
    expect(isDraftChanged((label.windows as readonly RecordDraft[])[0]!)).toBe(false);
  });

  test("a number that can't be read is named at its field, once, as it was typed", () => {
    const read = recordDraftRead(recordDraftChange(recordDraft(record), path, "180,17"));
    if (read.ok) throw new Error("180,17 was read");
    expect(read.issues.filter((each) => each.path.at(-1) === "value")).toMatchObject([{ code: "number-comma", path }]);
  });

  test("a source still to be named hides no other fault", () => {
    const draft = recordDraftChange(recordDraft(record), ["kinetics", "clearance", "formula"], "0.05 L/h * weight");
    expect(codes(recordDraftRead(draft)).sort()).toEqual([
      "formula-dimension",
      "record-figure-without-source",
      "record-figure-without-source",
    ]);
  });

  test("both ends of a window put in another unit at once ask for their source", () => {
    const [window] = recordDraft(record).windows as readonly RecordDraft[];
    const end = { value: "1", unit: "umol/L" };
    const draft = recordDraftChange(recordDraft(record), ["windows", 0], { ...window, low: end, high: end });
    expect((draft.windows as readonly RecordDraft[])[0]).toMatchObject({ source: "", basis: "" });
  });

  test("an entry taken away leaves the marks of its neighbours with them", () => {
    const draft = recordDraftChange(recordDraft(record), ["products", 0, "strengths", 0], undefined);
    const [product] = draft.products as readonly RecordDraft[];
    for (const each of product!.strengths as readonly RecordDraft[]) expect(isDraftChanged(each)).toBe(false);
  });
});

describe("steps", () => {
  test("typing on in one field is one step; undo and redo go back and forth to the same drafts", () => {
    const start = recordDraftHistory(recordDraft(record));
    const typed = historyChange(historyChange(start, path, "1"), path, "18");
    expect(typed.undo).toHaveLength(1);
    const more = historyChange(typed, ["molarMass", "basis"], "memory");
    expect(more.undo).toHaveLength(2);
    const back = historyUndo(historyUndo(more));
    expect(back.draft).toBe(start.draft);
    expect(historyUndo(back)).toBe(back);
    expect(historyRedo(historyRedo(back)).draft).toBe(more.draft);
    expect(historyChange(historyUndo(more), path, "19").redo).toEqual([]);
  });
});

describe("a copy", () => {
  test("names what it was made from, counts from 1 and is reviewed by nobody", () => {
    const reviewed: MedicineRecord = { ...record, review: { status: "reviewed", by: "K. Example" }, recordVersion: 7 };
    const copy = recordCopy(reviewed, { id: "mine", name: recordCopyName(reviewed, []) });
    expect(copy).toEqual({
      ...reviewed,
      id: "mine",
      name: `${record.name}, copy`,
      recordVersion: 1,
      review: { status: "not-reviewed" },
      copyOf: { id: record.id, recordVersion: 7 },
    });
    expect(medicineParse(copy).ok).toBe(true);
  });

  test("finds a name no record has, within the length of a name", () => {
    expect(recordCopyName(record, [`${record.name}, copy`])).toBe(`${record.name}, copy 2`);
    expect(recordCopyName({ ...record, name: "x".repeat(80) }, [])).toHaveLength(80);
  });

  test("saved is one version further, and a review of what it was is gone", () => {
    const before: MedicineRecord = { ...record, review: { status: "reviewed", by: "K. Example" }, recordVersion: 4 };
    expect(recordNextVersion({ ...before, matrix: "serum" }, before)).toMatchObject({
      recordVersion: 5,
      review: { status: "not-reviewed" },
    });
    const anew = { ...before, review: { status: "reviewed", by: "L. Example" } } as const;
    expect(recordNextVersion(anew, before).review).toEqual(anew.review);
  });
});

describe("a preview", () => {
  test("is made of what the curve needs, whatever else is unfinished", () => {
    let draft = recordDraftChange(recordDraft(record), ["kinetics", "clearance", "formula"], "4 L/h");
    draft = recordDraftChange(draft, ["windows", 0, "low", "value"], "abc");
    draft = recordDraftChange(draft, ["name"], "");
    const preview = recordPreview(draft, record, 0);
    if (!preview.ok) throw new Error(JSON.stringify(preview.issues));
    expect(preview.value.kinetics).toMatchObject({ clearance: { formula: "4 L/h" } });
    expect(preview.value.products).toHaveLength(1);
  });

  test("says what is in the way at the field where it stands in the draft", () => {
    const draft = recordDraftChange(recordDraft(record), ["products", 1, "bioavailability", "value"], "-1");
    const preview = recordPreview(draft, record, 1);
    expect(preview).toMatchObject({ ok: false, issues: [{ path: ["products", 1, "bioavailability", "value"] }] });
    expect(recordPreview(draft, record, 0).ok).toBe(true);
  });
});

test("two records are the same whatever the order of their fields, and not when a figure differs", () => {
  const turned = Object.fromEntries(Object.entries(record).reverse());
  expect(isRecordSame(record, { ...turned, copyOf: undefined })).toBe(true);
  expect(isRecordSame(record, { ...record, molarMass: { ...record.molarMass, value: 1 } })).toBe(false);
  expect(isRecordSame([1, 2], [2, 1])).toBe(false);
});

describe("the file of a record", () => {
  test("a field given twice is refused, and a damaged file with its place", () => {
    const twice = JSON.stringify(record).replace('"matrix":', '"name":"other","matrix":');
    expect(medicineRead(twice)).toMatchObject({
      ok: false,
      issues: [{ code: "file-field-twice", data: { key: "name" } }],
    });
    expect(medicineRead("{")).toMatchObject({ ok: false, issues: [{ code: "file-truncated" }] });
    expect(medicineRead(JSON.stringify(record))).toEqual({ ok: true, value: record });
  });
});
