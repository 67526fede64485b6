import { IDBFactory } from "fake-indexeddb";
import { afterEach, describe, expect, test, vi } from "vitest";
import { casePrint } from "../../../src/core/case/index.ts";
import { textChecksum } from "../../../src/shell/storage/caseRow.ts";
import type { CaseRow } from "../../../src/shell/storage/storageSchema.ts";
import { failOperation } from "./failingDatabase.ts";
import { caseOf, createFakeBrowser, rawRead } from "./fakeBrowser.ts";
import { createFakeStorage } from "./fakeStorage.ts";

afterEach(() => {
  vi.restoreAllMocks();
});

/** What is done to a storage that holds case "a" as "stored": its steps say whether they were acknowledged. */
const FLOWS = {
  save: async (tab: Tab) => {
    await tab.load("a");
    return (await tab.save(caseOf("a", "changed"))).ok ? { a: "changed" } : {};
  },
  "save two": async (tab: Tab) => {
    await tab.load("a");
    const first = await tab.save(caseOf("a", "changed"));
    const second = await tab.save(caseOf("b", "new"));
    return { ...(first.ok && { a: "changed" }), ...(second.ok && { b: "new" }) };
  },
  remove: async (tab: Tab) => ((await tab.remove("a")).ok ? { a: null } : {}),
  "save after save": async (tab: Tab) => {
    await tab.load("a");
    await tab.save(caseOf("a", "changed"));
    return (await tab.save(caseOf("a", "again"))).ok ? { a: "again" } : {};
  },
} as const;
type Tab = Awaited<ReturnType<ReturnType<typeof createFakeBrowser>["ready"]>>;

const MODES = [
  ["the request fails", "UnknownError", false],
  ["the disk is full at the request", "QuotaExceededError", false],
  ["the disk is full at the commit", "QuotaExceededError", true],
  ["the transaction is aborted", "AbortError", true],
] as const;

describe.each(Object.keys(FLOWS) as (keyof typeof FLOWS)[])("the nth operation fails during: %s", (flow) => {
  test.each(MODES)(
    "%s",
    async (_, error, atCommit) => {
      for (const isForEver of [false, true]) {
        let nth = 0;
        let counted = 0;
        do {
          nth += 1;
          const browser = createFakeBrowser();
          const before = await browser.ready();
          await before.save(caseOf("a", "stored"));
          browser.kill();
          const tab = await browser.ready();
          const failing = failOperation(nth, isForEver, error, atCommit);
          const acknowledged: Record<string, string | null> = await FLOWS[flow](tab);
          counted = failing.counted();
          vi.restoreAllMocks();
          browser.kill();

          // What was acknowledged is there, whole; what was not is as before or as wanted, never in between.
          const next = browser.tab({ openPrivateFiles: null });
          expect(await next.open(), `operation ${nth}`).toEqual({ kind: "ready" });
          for (const [id, label] of Object.entries(acknowledged)) {
            const loaded = await next.load(id);
            if (label === null) expect(loaded).toMatchObject({ ok: false, issues: [{ code: "storage-case-gone" }] });
            else expect(loaded).toMatchObject({ ok: true, value: { label } });
          }
          for (const row of (await rawRead(browser.indexedDB, "cases")) as CaseRow[]) {
            expect(row.checksum).toBe(textChecksum(row.text));
            expect(row.text).toBe(casePrint(caseOf(row.id, row.label)));
          }
          browser.kill();
        } while (counted >= nth); // until a run in which nothing failed
        expect(nth).toBeGreaterThan(2);
      }
    },
    60_000,
  );
});

test.each(MODES)(
  "the nth operation fails while opening: never taken for a loss or a first run (%s)",
  async (_, error, atCommit) => {
    let nth = 0;
    let counted = 0;
    do {
      nth += 1;
      const browser = createFakeBrowser();
      await (await browser.ready()).save(caseOf("a", "stored"));
      browser.kill();
      const tab = browser.tab();
      const failing = failOperation(nth, false, error, atCommit);
      expect(["ready", "unavailable"]).toContain((await tab.open()).kind);
      counted = failing.counted();
      vi.restoreAllMocks();
      // The same tab gets there when it is asked again.
      expect(await tab.open()).toEqual({ kind: "ready" });
      expect(await tab.load("a")).toMatchObject({ value: { label: "stored" } });
      browser.kill();
    } while (counted >= nth);
    expect(nth).toBeGreaterThan(2);
  },
  60_000,
);

test.each([
  ["at the request", false],
  ["at the commit", true],
])("a full disk is named as such %s, and the next save works once there is room", async (_, atCommit) => {
  const browser = createFakeBrowser();
  const tab = await browser.ready();
  // The first operation of a save reads the identity, the second the row, the third writes.
  failOperation(3, true, "QuotaExceededError", atCommit);
  expect(await tab.save(caseOf("a"))).toMatchObject({ ok: false, reason: "quota" });
  vi.restoreAllMocks();
  expect(await tab.save(caseOf("a"))).toMatchObject({ ok: true });
  browser.kill();
});

test("a full localStorage stops no save and raises no false alarm", async () => {
  const browser = createFakeBrowser();
  const full = {
    ...createFakeStorage(),
    setItem: () => {
      throw new DOMException("full", "QuotaExceededError");
    },
  };
  const tab = await browser.ready({ localStorage: full });
  expect(await tab.save(caseOf("a"))).toMatchObject({ ok: true });
  browser.kill();
  expect(await browser.tab({ localStorage: full }).open()).toEqual({ kind: "ready" });
});

test("a removal that failed is noted as not done: the case is still missed if it is lost later", async () => {
  const browser = createFakeBrowser();
  const tab = await browser.ready({ openPrivateFiles: null });
  await tab.save(caseOf("a"));
  failOperation(1, true, "UnknownError", false);
  expect(await tab.remove("a")).toMatchObject({ ok: false, reason: "failed" });
  vi.restoreAllMocks();
  browser.kill();
  browser.indexedDB = new IDBFactory();
  expect(await browser.tab({ openPrivateFiles: null }).open()).toMatchObject({ kind: "lost", cases: 1 });
  browser.kill();
});
