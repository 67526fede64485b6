import { forceCloseDatabase, IDBFactory } from "fake-indexeddb";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import type { StorageChange } from "../../../src/shell/storage/changeChannel.ts";
import { caseOf, createFakeBrowser, type Repository, rawPut, rawRead, requestDone } from "./fakeBrowser.ts";

let browser: ReturnType<typeof createFakeBrowser>;
let tab: Repository;
let heard: StorageChange[];
/** Native connections opened, newest last. */
let connections: IDBDatabase[];

beforeEach(async () => {
  browser = createFakeBrowser();
  connections = [];
  const open = browser.indexedDB.open.bind(browser.indexedDB);
  browser.indexedDB.open = (name: string, version?: number) => {
    const request = open(name, version);
    request.addEventListener("success", () => connections.push(request.result));
    return request;
  };
  tab = await browser.ready();
  heard = [];
  tab.subscribe((change) => heard.push(change));
});
afterEach(() => browser.kill());

describe("a newer version in another tab", () => {
  const openNewer = () => requestDone(browser.indexedDB.open("ebbline", 20));

  test("takes over; this tab lets go, says so, and writes no more", async () => {
    await tab.save(caseOf("a"));
    const other = await openNewer();
    expect(heard).toEqual([{ kind: "superseded" }]);
    expect(await tab.save(caseOf("a", "late"))).toMatchObject({ ok: false, reason: "newer" });
    expect(await tab.load("a")).toMatchObject({ ok: false, issues: [{ code: "storage-read-failed" }] });
    other.close();
    expect(await rawRead(browser.indexedDB, "cases")).toMatchObject([{ id: "a", revision: 1 }]);
  });

  test("waits for the write under way and the one behind it", async () => {
    const saves: unknown[] = [];
    const first = tab.save(caseOf("a", "one")).then(async (outcome) => {
      saves.push(outcome);
      saves.push(await tab.save(caseOf("a", "two")));
    });
    const other = await openNewer();
    await first;
    expect(saves).toMatchObject([{ ok: true }, { ok: true }]);
    other.close();
    expect(await rawRead(browser.indexedDB, "cases")).toMatchObject([{ label: "two", revision: 2 }]);
  });

  test("is noticed by the schema alone, even if its event was missed", async () => {
    await tab.save(caseOf("a"));
    const [meta] = (await rawRead(browser.indexedDB, "meta")) as object[];
    await rawPut(browser.indexedDB, "meta", { ...meta, schema: 2 });
    expect(await tab.save(caseOf("a", "late"))).toMatchObject({ ok: false, reason: "newer" });
    expect(heard).toEqual([{ kind: "superseded" }]);
    expect(await rawRead(browser.indexedDB, "cases")).toMatchObject([{ revision: 1 }]);
  });
});

describe("a connection the browser drops", () => {
  const drop = () => forceCloseDatabase(connections.at(-1) as never);

  test("is said, and opened again by the next call", async () => {
    await tab.save(caseOf("a"));
    drop();
    await vi.waitFor(() => expect(heard).toEqual([{ kind: "gone" }]));
    expect(await tab.load("a")).toMatchObject({ ok: true });
    expect(await tab.save(caseOf("a", "after"))).toMatchObject({ ok: true });
    expect(await tab.load("a")).toMatchObject({ value: { label: "after" } });
  });

  test("with its database gone is not opened again: nothing is made anew behind the user's back", async () => {
    await tab.save(caseOf("a"));
    drop();
    const fresh = new IDBFactory();
    browser.indexedDB.open = fresh.open.bind(fresh);
    expect(await tab.save(caseOf("a", "after"))).toMatchObject({ ok: false, reason: "closed" });
    expect(await tab.save(caseOf("a", "after"))).toMatchObject({ ok: false, reason: "closed" });
    expect(await fresh.databases()).toEqual([]);
  });

  test("with another database in its place is not written to", async () => {
    await tab.save(caseOf("a"));
    drop();
    const other = createFakeBrowser();
    await other.ready({ newId: () => "other" });
    browser.indexedDB.open = other.indexedDB.open.bind(other.indexedDB);
    expect(await tab.save(caseOf("a", "after"))).toMatchObject({ ok: false, reason: "closed" });
    expect(await rawRead(other.indexedDB, "cases")).toEqual([]);
    other.kill();
  });
});

test("a database deleted under an open tab is said, and nothing is written any more", async () => {
  await tab.save(caseOf("a"));
  await requestDone(browser.indexedDB.deleteDatabase("ebbline"));
  expect(heard).toEqual([{ kind: "gone" }]);
  expect(await tab.save(caseOf("a"))).toMatchObject({ ok: false, reason: "closed" });
});

test("a database swapped while the connection lives is caught inside the write", async () => {
  const [meta] = (await rawRead(browser.indexedDB, "meta")) as object[];
  await rawPut(browser.indexedDB, "meta", { ...meta, id: "another" });
  expect(await tab.save(caseOf("a"))).toMatchObject({ ok: false, reason: "closed" });
  expect(await rawRead(browser.indexedDB, "cases")).toEqual([]);
});
