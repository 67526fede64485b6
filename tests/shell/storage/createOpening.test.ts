import { IDBFactory } from "fake-indexeddb";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import type { StorageChange } from "../../../src/shell/storage/changeChannel.ts";
import type { CaseRow } from "../../../src/shell/storage/storageSchema.ts";
import { caseOf, createFakeBrowser, rawPut, rawRead, requestDone } from "./fakeBrowser.ts";

let browser: ReturnType<typeof createFakeBrowser>;
beforeEach(() => {
  browser = createFakeBrowser();
});
afterEach(() => browser.kill());

/** The browser throws its IndexedDB away and keeps the rest, as Chromium does with a damaged one. */
const wipe = (): void => {
  browser.indexedDB = new IDBFactory();
};
const noFiles = { openPrivateFiles: null };

async function withWork(...ids: string[]): Promise<void> {
  const tab = await browser.ready();
  for (const id of ids) await tab.save(caseOf(id));
  browser.kill();
}

describe("a first run and an ordinary one", () => {
  test("a first run is ready", async () => {
    expect(await browser.tab().open()).toEqual({ kind: "ready" });
  });

  test("so is the next, with and without work, after removals, and twice over", async () => {
    for (let run = 0; run < 3; run++) {
      const tab = await browser.ready();
      await tab.save(caseOf(`case-${run}`));
      if (run > 0) await tab.remove(`case-${run - 1}`);
      browser.kill();
    }
    expect(await browser.tab().open()).toEqual({ kind: "ready" });
  });

  test("opening twice is one opening", async () => {
    const tab = browser.tab();
    expect(await Promise.all([tab.open(), tab.open()])).toEqual([{ kind: "ready" }, { kind: "ready" }]);
    expect(await tab.open()).toEqual({ kind: "ready" });
  });

  test("a marker that went missing is written anew", async () => {
    await withWork("a");
    browser.localStorage.clear();
    await browser.ready();
    browser.kill();
    wipe();
    expect(await browser.tab().open()).toMatchObject({ kind: "lost", cases: 1 });
  });

  test("a browser without localStorage works, and relies on what the browser itself reports", async () => {
    const tab = await browser.ready({ localStorage: null });
    expect(await tab.save(caseOf("a"))).toMatchObject({ ok: true });
  });

  test("a browser without IndexedDB is said to have no storage", async () => {
    expect(await browser.tab({ indexedDB: null }).open()).toMatchObject({ kind: "unavailable" });
  });

  test("an IndexedDB that refuses is said to, with its reason", async () => {
    const open = () => {
      throw new DOMException("denied", "SecurityError");
    };
    const tab = browser.tab({ indexedDB: { open } as unknown as IDBFactory });
    expect(await tab.open()).toEqual({ kind: "unavailable", detail: "SecurityError: denied" });
    expect(await tab.save(caseOf("a"))).toMatchObject({ ok: false, reason: "closed" });
  });
});

describe("a lost database", () => {
  test("gone, although there was work: lost, again and again until accepted", async () => {
    await withWork("a", "b");
    wipe();
    const expected = { kind: "lost", extent: "all", cases: 2, lastSavedAt: expect.any(Number), recoverable: 0 };
    for (let run = 0; run < 2; run++) {
      expect(await browser.tab(noFiles).open()).toMatchObject(expected);
      browser.kill();
    }
    const tab = browser.tab(noFiles);
    await tab.open();
    expect(await tab.save(caseOf("c"))).toMatchObject({ ok: false, reason: "closed" });
    await tab.acceptLoss();
    expect(await tab.open()).toEqual({ kind: "ready" });
    expect(await tab.save(caseOf("c"))).toMatchObject({ ok: true });
    browser.kill();
    expect(await browser.tab(noFiles).open()).toEqual({ kind: "ready" });
  });

  test("emptied and made anew by another program or an older version: lost, with nothing written", async () => {
    await withWork("a");
    wipe();
    const other = browser.tab({ localStorage: null, openPrivateFiles: null });
    await other.open();
    browser.kill();
    expect(await browser.tab(noFiles).open()).toMatchObject({ kind: "lost", extent: "all", cases: 1 });
  });

  test("the browser reports a loss: lost even with no marker, and still after the tab was closed on it", async () => {
    const reporting = (): IDBFactory => {
      const factory = new IDBFactory();
      const open = factory.open.bind(factory);
      factory.open = (name: string, version?: number) => {
        const request = open(name, version);
        request.addEventListener("upgradeneeded", (event) =>
          Object.assign(event, { dataLoss: "total", dataLossMessage: "partial record" }),
        );
        return request;
      };
      return factory;
    };
    expect(await browser.tab({ indexedDB: reporting() }).open()).toMatchObject({
      kind: "lost",
      cases: null,
      detail: "partial record",
    });
    browser.kill();
    const tab = browser.tab();
    expect(await tab.open()).toMatchObject({ kind: "lost", detail: "partial record" });
    await tab.acceptLoss();
    expect(await tab.open()).toEqual({ kind: "ready" });
  });

  test("the event of an ordinary creation carries no loss", async () => {
    const factory = new IDBFactory();
    const open = factory.open.bind(factory);
    factory.open = (name: string, version?: number) => {
      const request = open(name, version);
      request.addEventListener("upgradeneeded", (event) =>
        Object.assign(event, { dataLoss: "none", dataLossMessage: "" }),
      );
      return request;
    };
    expect(await browser.tab({ indexedDB: factory }).open()).toEqual({ kind: "ready" });
  });

  test("some cases missing from the right database", async () => {
    await withWork("a", "b", "c");
    await rawDelete("cases", "b");
    const tab = browser.tab(noFiles);
    expect(await tab.open()).toMatchObject({ kind: "lost", extent: "some", cases: 1 });
    await tab.acceptLoss();
    expect((await tab.list()).map(({ id }) => id).sort()).toEqual(["a", "c"]);
    expect(await tab.save(caseOf("d"))).toMatchObject({ ok: true });
  });

  test("a case that fell back to an earlier save", async () => {
    const tab = await browser.ready();
    await tab.save(caseOf("a", "old"));
    const [old] = await rawRead(browser.indexedDB, "cases");
    await tab.save(caseOf("a", "new"));
    browser.kill();
    await rawPut(browser.indexedDB, "cases", old);
    expect(await browser.tab(noFiles).open()).toMatchObject({ kind: "lost", extent: "some", cases: 1 });
  });

  test("rows in a database that lost its identity", async () => {
    await withWork("a");
    await rawDelete("meta", "database");
    browser.localStorage.clear();
    const tab = browser.tab(noFiles);
    expect(await tab.open()).toMatchObject({ kind: "lost", extent: "all" });
    await tab.acceptLoss();
    expect(await tab.load("a")).toMatchObject({ ok: true });
  });

  async function rawDelete(store: string, key: string): Promise<void> {
    const database = await requestDone(browser.indexedDB.open("ebbline"));
    await requestDone(database.transaction(store, "readwrite").objectStore(store).delete(key));
    database.close();
  }
});

describe("second copies", () => {
  test("say how much can be put back, and are put back when the loss is accepted", async () => {
    await withWork("a", "b");
    wipe();
    const tab = browser.tab();
    const heard: StorageChange[] = [];
    tab.subscribe((change) => heard.push(change));
    expect(await tab.open()).toMatchObject({ kind: "lost", cases: 2, recoverable: 2 });
    await tab.acceptLoss();
    expect(await tab.open()).toEqual({ kind: "ready" });
    expect(await tab.load("a")).toEqual({ ok: true, value: caseOf("a") });
    expect(await tab.load("b")).toEqual({ ok: true, value: caseOf("b") });
    expect(heard).toEqual([
      { kind: "fault", issues: [expect.objectContaining({ code: "storage-restored", data: { cases: 2 } })] },
    ]);
    expect(await tab.save(caseOf("a", "goes on"))).toMatchObject({ ok: true });
    browser.kill();
    expect(await browser.tab().open()).toEqual({ kind: "ready" });
  });

  test("are a witness by themselves when the marker went too", async () => {
    await withWork("a");
    wipe();
    browser.localStorage.clear();
    expect(await browser.tab().open()).toMatchObject({ kind: "lost", cases: 1, recoverable: 1 });
  });

  test.each([
    ["are forbidden", () => Promise.reject(new DOMException("private window", "SecurityError"))],
    ["hang", () => new Promise<FileSystemDirectoryHandle>(() => {})],
  ])("that %s keep neither a first run nor a save from working", async (_, openPrivateFiles) => {
    vi.useFakeTimers({ toFake: ["setTimeout", "clearTimeout"], shouldAdvanceTime: true, advanceTimeDelta: 500 });
    try {
      const tab = browser.tab({ openPrivateFiles });
      expect(await tab.open()).toEqual({ kind: "ready" });
      expect(await tab.save(caseOf("a"))).toMatchObject({ ok: true });
    } finally {
      vi.useRealTimers();
    }
  });

  test("that can't be read after a loss are said, and the loss can still be accepted", async () => {
    await withWork("a");
    wipe();
    const tab = browser.tab({ openPrivateFiles: () => Promise.reject(new Error("locked")) });
    const heard: StorageChange[] = [];
    tab.subscribe((change) => heard.push(change));
    expect(await tab.open()).toMatchObject({ kind: "lost", cases: 1, recoverable: 0 });
    expect(heard).toEqual([{ kind: "fault", issues: [expect.objectContaining({ code: "storage-copies-unread" })] }]);
    await tab.acceptLoss();
    expect(await tab.open()).toEqual({ kind: "ready" });
  });

  test("a damaged copy is not put back, and stays", async () => {
    await withWork("a", "b");
    wipe();
    const files = browser.files.files();
    files.set("a.json", files.get("a.json")!.replace("Lisbon", "Lisbom"));
    files.set("b.json", files.get("b.json")!.slice(0, 50));
    files.set("c.json", "null");
    const tab = browser.tab();
    expect(await tab.open()).toMatchObject({ kind: "lost", cases: 2, recoverable: 0 });
    await tab.acceptLoss();
    expect(await tab.list()).toEqual([]);
    expect([...files.keys()]).toEqual(["a.json", "b.json", "c.json"]);
  });

  test("an older copy never takes the place of a newer row", async () => {
    await withWork("a", "b");
    const rows = (await rawRead(browser.indexedDB, "cases")) as CaseRow[];
    const stale = browser.files.files().get("a.json")!;
    const tab = await browser.ready();
    await tab.load("a");
    await tab.save(caseOf("a", "newest"));
    browser.kill();
    browser.files.files().set("a.json", stale);
    await rawPut(browser.indexedDB, "cases", { ...rows[1]!, revision: 0 });
    const next = browser.tab();
    expect(await next.open()).toMatchObject({ kind: "lost", extent: "some", cases: 1, recoverable: 1 });
    await next.acceptLoss();
    expect(await next.load("a")).toMatchObject({ value: { label: "newest" } });
  });
});

describe("a newer database", () => {
  const newer = (minReader: number) => ({ key: "database", id: "n", schema: 2, minReader, createdAt: 0 });

  test("is readable, never written", async () => {
    await withWork("a");
    await rawPut(browser.indexedDB, "meta", newer(1));
    const tab = browser.tab();
    expect(await tab.open()).toEqual({ kind: "newer", found: 2, known: 1, readable: true });
    expect((await tab.list()).map(({ id }) => id)).toEqual(["a"]);
    expect(await tab.load("a")).toMatchObject({ ok: true });
    for (const outcome of [await tab.save(caseOf("a")), await tab.remove("a"), await tab.writeSetting("k", 1)])
      expect(outcome).toMatchObject({ ok: false, reason: "newer" });
    await tab.acceptLoss();
    expect(await tab.save(caseOf("a"))).toMatchObject({ ok: false, reason: "newer" });
    expect(await rawRead(browser.indexedDB, "meta")).toEqual([newer(1)]);
  });

  test("of which we can't read a row is not read", async () => {
    await withWork("a");
    await rawPut(browser.indexedDB, "meta", newer(2));
    const tab = browser.tab();
    expect(await tab.open()).toEqual({ kind: "newer", found: 2, known: 1, readable: false });
    await expect(tab.list()).rejects.toThrow();
    expect(await tab.load("a")).toMatchObject({ ok: false, issues: [{ code: "storage-read-failed" }] });
  });

  test("that dropped a store of ours is not given it back", async () => {
    const database = await requestDone(
      Object.assign(browser.indexedDB.open("ebbline", 70), {
        onupgradeneeded(this: IDBOpenDBRequest) {
          this.result.createObjectStore("meta", { keyPath: "key" });
          this.result.createObjectStore("cases", { keyPath: "id" });
        },
      }),
    );
    database.close();
    await rawPut(browser.indexedDB, "meta", newer(1));
    expect(await browser.tab().open()).toMatchObject({ kind: "newer" });
    const after = await requestDone(browser.indexedDB.open("ebbline"));
    expect([after.version, [...after.objectStoreNames]]).toEqual([70, ["cases", "meta"]]);
    after.close();
  });
});

describe("blocked", () => {
  test("an older tab that does not let go is said, and the opening goes on when it does", async () => {
    const old = await requestDone(browser.indexedDB.open("ebbline", 5));
    const tab = browser.tab();
    const heard: StorageChange[] = [];
    tab.subscribe((change) => heard.push(change));
    expect(await tab.open()).toEqual({ kind: "blocked" });
    old.close();
    await vi.waitFor(() => expect(heard).toEqual([{ kind: "unblocked" }]));
    expect(await tab.open()).toEqual({ kind: "ready" });
  });

  test("an opening queued behind another tab's, which gets no event, is said after a while", async () => {
    vi.useFakeTimers();
    try {
      const tab = browser.tab({ indexedDB: { open: () => ({}) } as unknown as IDBFactory });
      const opening = tab.open();
      await vi.advanceTimersByTimeAsync(4_999);
      let found: unknown = null;
      void opening.then((state) => {
        found = state;
      });
      await vi.advanceTimersByTimeAsync(0);
      expect(found).toBeNull();
      await vi.advanceTimersByTimeAsync(1);
      expect(found).toEqual({ kind: "blocked" });
    } finally {
      vi.useRealTimers();
    }
  });
});
