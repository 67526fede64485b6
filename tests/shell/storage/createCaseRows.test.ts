import { IDBDatabase } from "fake-indexeddb";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { casePrint } from "../../../src/core/case/index.ts";
import { BUILT_IN_RECORDS } from "../../../src/core/medicine/index.ts";
import { textChecksum } from "../../../src/shell/storage/caseRow.ts";
import type { StorageChange } from "../../../src/shell/storage/changeChannel.ts";
import type { CaseRow } from "../../../src/shell/storage/storageSchema.ts";
import { caseOf, createFakeBrowser, rawPut, rawRead } from "./fakeBrowser.ts";

let browser: ReturnType<typeof createFakeBrowser>;
beforeEach(() => {
  browser = createFakeBrowser();
});
afterEach(() => {
  browser.kill();
  vi.restoreAllMocks();
});

const codes = (result: { ok: boolean; issues?: readonly { code: string }[] }) =>
  (result.issues ?? []).map(({ code }) => code);

describe("saving", () => {
  test("what is saved is loaded, in this tab and in the next", async () => {
    const value = caseOf("a");
    const tab = await browser.ready();
    const outcome = await tab.save(value);
    expect(outcome.ok).toBe(true);
    expect(await tab.load("a")).toEqual({ ok: true, value });
    browser.kill();
    const next = await browser.ready();
    expect(await next.load("a")).toEqual({ ok: true, value });
    expect(await next.list()).toEqual([
      {
        id: "a",
        label: value.label,
        medicine: value.medicine.name,
        demo: false,
        savedAt: outcome.ok && outcome.savedAt,
      },
    ]);
  });

  test("the list has the last saved first", async () => {
    const tab = await browser.ready();
    for (const id of ["a", "b", "c", "a"]) await tab.save(caseOf(id));
    expect((await tab.list()).map(({ id }) => id)).toEqual(["a", "c", "b"]);
  });

  test("every write asks for strict durability", async () => {
    const asked = vi.spyOn(IDBDatabase.prototype, "transaction");
    const tab = await browser.ready();
    await tab.save(caseOf("a"));
    await tab.remove("a");
    await tab.writeSetting("settings", { pageSize: "A4" });
    await tab.saveMedicine(BUILT_IN_RECORDS[0]!);
    await tab.removeMedicine(BUILT_IN_RECORDS[0]!.id);
    const window = {
      quantity: "trough",
      low: { value: 5, unit: "mg/L" },
      high: { value: 10, unit: "mg/L" },
      basis: "x",
    } as const;
    await tab.saveWindow("m", "w", window);
    await tab.removeWindow("m", "w");
    const writes = asked.mock.calls.filter(([, mode]) => mode === "readwrite");
    expect(writes).toHaveLength(7);
    expect(writes.map(([, , options]) => options?.durability)).toEqual(Array(7).fill("strict"));
  });

  test("a save that another tab overtook is refused and leaves the other's work", async () => {
    const one = await browser.ready({ locks: null, makeChannel: null });
    const two = await browser.ready({ locks: null, makeChannel: null });
    await one.save(caseOf("a", "first"));
    await two.load("a");
    await two.save(caseOf("a", "second"));
    expect(await one.save(caseOf("a", "late"))).toMatchObject({ ok: false, reason: "read-only", detail: "other-tab" });
    expect(await two.load("a")).toMatchObject({ value: { label: "second" } });
    await one.load("a");
    expect(await one.save(caseOf("a", "after reading"))).toMatchObject({ ok: true });
  });

  test("a new case never takes the place of a stored one", async () => {
    await (await browser.ready()).save(caseOf("a", "stored"));
    browser.kill();
    const tab = await browser.ready();
    expect(await tab.save(caseOf("a", "new"))).toMatchObject({ ok: false, reason: "read-only" });
  });

  test("the other tabs are told, this one is not", async () => {
    const one = await browser.ready();
    const two = await browser.ready();
    const heard: [string, StorageChange][] = [];
    one.subscribe((change) => heard.push(["one", change]));
    two.subscribe((change) => heard.push(["two", change]));
    await one.save(caseOf("a"));
    await one.remove("a");
    await vi.waitFor(() => expect(heard).toHaveLength(2));
    expect(heard).toEqual([
      ["two", { kind: "saved", id: "a" }],
      ["two", { kind: "removed", id: "a" }],
    ]);
  });

  test("nothing is saved before the storage is open", async () => {
    expect(await browser.tab().save(caseOf("a"))).toMatchObject({ ok: false, reason: "closed" });
  });
});

describe("damaged rows", () => {
  async function damage(change: (row: CaseRow) => CaseRow): Promise<CaseRow> {
    await (await browser.ready()).save(caseOf("a", "bed 12"));
    browser.kill();
    const [row] = (await rawRead(browser.indexedDB, "cases")) as CaseRow[];
    const damaged = change(row!);
    await rawPut(browser.indexedDB, "cases", damaged);
    return damaged;
  }

  test.each<[string, (row: CaseRow) => CaseRow, string]>([
    ["a text changed", (row) => ({ ...row, text: row.text.replace("Lisbon", "Lisbom") }), "storage-row-damaged"],
    ["a text cut short", (row) => ({ ...row, text: row.text.slice(0, 100) }), "storage-row-damaged"],
    ["another case's text", (row) => signed(row, casePrint(caseOf("b"))), "storage-row-damaged"],
    ["no text", (row) => ({ ...row, text: undefined as unknown as string }), "storage-row-damaged"],
    [
      "a text that is whole but no case",
      (row) => signed(row, row.text.replace('"levels"', '"level"')),
      "storage-row-unreadable",
    ],
  ])("%s: says which case, keeps the row, still lists it", async (_, change, code) => {
    const row = await damage(change);
    const tab = await browser.ready();
    const loaded = await tab.load("a");
    const [first, ...faults] = loaded.ok ? [] : loaded.issues;
    expect(first).toMatchObject({ code, data: { id: "a", label: "bed 12" } });
    expect(faults.map((each) => each.code)).toEqual(
      code === "storage-row-unreadable" ? ["field-missing", "field-unknown"] : [],
    );
    expect(await rawRead(browser.indexedDB, "cases")).toEqual([row]);
    expect((await tab.list()).map(({ id }) => id)).toEqual(["a"]);
    // And it can't be written over by accident.
    expect(await tab.save(caseOf("a", "other"))).toMatchObject({ ok: false });
  });

  const signed = (row: CaseRow, text: string): CaseRow => ({ ...row, text, checksum: textChecksum(text) });
});

test("a case that is not stored says so", async () => {
  const tab = await browser.ready();
  expect(codes(await tab.load("none"))).toEqual(["storage-case-gone"]);
});

describe("second copies", () => {
  const copies = (): string[] => [...browser.files.files().values()].map((text) => (JSON.parse(text) as CaseRow).text);

  test("each save is copied before it is acknowledged, each removal takes the copy along", async () => {
    const tab = await browser.ready();
    await tab.save(caseOf("a"));
    await tab.save(caseOf("b", "one"));
    await tab.save(caseOf("b", "two"));
    expect(copies()).toEqual([casePrint(caseOf("a")), casePrint(caseOf("b", "two"))]);
    await tab.remove("a");
    expect(copies()).toEqual([casePrint(caseOf("b", "two"))]);
  });

  test("a copy that fails does not undo the save, and is said once", async () => {
    const tab = await browser.ready();
    const heard: StorageChange[] = [];
    tab.subscribe((change) => heard.push(change));
    browser.files.fail(new Error("disk"));
    expect(await tab.save(caseOf("a"))).toMatchObject({ ok: true });
    expect(await tab.save(caseOf("a", "again"))).toMatchObject({ ok: true });
    expect(heard).toEqual([{ kind: "fault", issues: [expect.objectContaining({ code: "storage-copy-failed" })] }]);
  });

  test("a copy that can't be removed keeps its case: it would bring it back after a loss", async () => {
    const tab = await browser.ready();
    await tab.save(caseOf("a"));
    browser.files.fail(new Error("locked"));
    expect(await tab.remove("a")).toMatchObject({ ok: false, reason: "failed" });
    expect(await tab.load("a")).toMatchObject({ ok: true });
    browser.files.fail(null);
    expect(await tab.remove("a")).toMatchObject({ ok: true });
    expect(copies()).toEqual([]);
  });

  test("a case that may not be written keeps its copy", async () => {
    await (await browser.ready()).save(caseOf("a"));
    browser.kill();
    const [meta] = (await rawRead(browser.indexedDB, "meta")) as object[];
    await rawPut(browser.indexedDB, "meta", { ...meta, schema: 2 });
    const tab = browser.tab();
    await tab.open();
    expect(await tab.remove("a")).toMatchObject({ ok: false, reason: "newer" });
    expect(copies()).toHaveLength(1);
  });

  test("an id from a file can't lead out of the folder", async () => {
    const tab = await browser.ready();
    await tab.save(caseOf("../a/b"));
    expect([...browser.files.files().keys()]).toEqual(["%2E%2E%2Fa%2Fb.json"]);
  });
});
