import { afterEach, beforeEach, expect, test } from "vitest";
import { BUILT_IN_RECORDS } from "../../../src/core/medicine/index.ts";
import type { StorageChange } from "../../../src/shell/storage/changeChannel.ts";
import { createFakeBrowser, type Repository, rawPut, rawRead } from "./fakeBrowser.ts";

let browser: ReturnType<typeof createFakeBrowser>;
let tab: Repository;
beforeEach(async () => {
  browser = createFakeBrowser();
  tab = await browser.ready();
});
afterEach(() => browser.kill());

const record = BUILT_IN_RECORDS[0]!;
const window = {
  quantity: "trough",
  low: { value: 5, unit: "mg/L" },
  high: { value: 10, unit: "mg/L" },
  basis: "ward policy",
} as const;

async function next(): Promise<Repository> {
  browser.kill();
  return browser.ready();
}

test("settings, records and windows outlive the tab, and go when removed", async () => {
  await tab.writeSetting("settings", { pageSize: "Letter" });
  await tab.saveMedicine(record);
  await tab.saveWindow("m", "w", window);
  await tab.saveWindow("m", "v", window);
  let later = await next();
  expect(await later.readSetting("settings")).toEqual({ pageSize: "Letter" });
  expect(await later.readSetting("nothing")).toBeUndefined();
  expect(await later.listMedicines()).toEqual([record]);
  expect(await later.listWindows()).toEqual([
    { medicine: "m", id: "v", window },
    { medicine: "m", id: "w", window },
  ]);
  await later.removeMedicine(record.id);
  await later.removeWindow("m", "w");
  later = await next();
  expect(await later.listMedicines()).toEqual([]);
  expect(await later.listWindows()).toEqual([{ medicine: "m", id: "v", window }]);
});

test("an entry that can't be read is said, left where it is, and takes no other with it", async () => {
  await tab.saveMedicine(record);
  await tab.saveWindow("m", "good", window);
  await rawPut(browser.indexedDB, "medicines", {
    id: "bad",
    savedAt: 1,
    record: { ...record, molarMass: { value: 1, unit: "g/mol" } },
  });
  await rawPut(browser.indexedDB, "windows", {
    medicine: "m",
    id: "bad",
    window: { ...window, low: { value: "5", unit: "mg/L" } },
  });
  const heard: StorageChange[] = [];
  tab.subscribe((change) => heard.push(change));
  expect(await tab.listMedicines()).toEqual([record]);
  expect(await tab.listWindows()).toEqual([{ medicine: "m", id: "good", window }]);
  expect(heard.map((change) => change.kind === "fault" && change.issues[0])).toMatchObject([
    { code: "storage-entry-unreadable", data: { table: "medicines", name: "bad" } },
    { code: "storage-entry-unreadable", data: { table: "windows", name: "m: bad" } },
  ]);
  expect(await rawRead(browser.indexedDB, "medicines")).toHaveLength(2);
});
