import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { Page } from "@playwright/test";
import { expectSaved, openDemo, openStored } from "./support/caseSteps.ts";
import { expect, test } from "./support/test.ts";

const LABEL = "Harbour ward 3, bed 12";

const dose = (page: Page) => page.getByRole("region", { name: "Given" }).getByRole("slider", { name: "Dose 2" });

async function moveDose(page: Page): Promise<void> {
  await dose(page).focus();
  await page.keyboard.press("ArrowRight");
}

/** The folder in which Chromium keeps the IndexedDB of the one origin of this profile. */
function databaseFolder(profile: string): string {
  const root = join(profile, "Default", "IndexedDB");
  const [folder] = readdirSync(root).filter((name) => name.endsWith(".indexeddb.leveldb"));
  if (!folder) throw new Error(`no IndexedDB under ${root}: ${readdirSync(root).join(", ")}`);
  return join(root, folder);
}

/** Damages the database's file list, which Chromium answers by deleting the whole database. */
function damage(profile: string): void {
  const folder = databaseFolder(profile);
  for (const name of readdirSync(folder).filter((each) => each.startsWith("MANIFEST-"))) {
    const file = join(folder, name);
    writeFileSync(file, Buffer.alloc(readFileSync(file).length, 0x5a));
  }
}

test.describe("a database the browser threw away", () => {
  let profile: string;
  test.beforeEach(() => {
    profile = mkdtempSync(join(tmpdir(), "ebbline-storage-"));
  });
  test.afterEach(() => {
    rmSync(profile, { recursive: true, force: true });
  });

  test("is said to be lost, and its cases are put back from the second copy", async ({ openProfile }) => {
    const before = await openProfile(profile);
    await openDemo(before.page, LABEL);
    await moveDose(before.page);
    await expectSaved(before.page);
    await expect(dose(before.page)).toHaveAttribute("aria-valuetext", /20:15/);
    await before.close();
    damage(profile);

    const after = await openProfile(profile);
    await after.page.goto("/");
    await expect(after.page.getByText(/second copy, which “Go on” puts back/)).toBeVisible();
    await after.page.getByRole("button", { name: "Go on" }).click();
    await expect(after.page.getByText(/1 case put back/)).toBeVisible();
    await openStored(after.page, LABEL);
    await expect(dose(after.page)).toHaveAttribute("aria-valuetext", /20:15/);
    await moveDose(after.page);
    await expectSaved(after.page);
    await after.close();

    const last = await openProfile(profile);
    await openStored(last.page, LABEL);
    await expect(dose(last.page)).toHaveAttribute("aria-valuetext", /20:30/);
    await last.close();
  });

  test("together with its second copies is still no first run", async ({ openProfile }) => {
    const before = await openProfile(profile);
    await openDemo(before.page, LABEL);
    await before.page.evaluate(async () => {
      const root = await navigator.storage.getDirectory();
      await root.removeEntry("ebbline-copies", { recursive: true });
    });
    await before.close();
    damage(profile);
    for (const _ of [1, 2]) {
      const after = await openProfile(profile);
      await after.page.goto("/");
      await expect(after.page.getByRole("button", { name: "Go on" })).toBeVisible();
      await expect(after.page.getByRole("button", { name: `Open ${LABEL}` })).toHaveCount(0);
      await after.close();
    }
  });
});

test("a database of a newer version is read, not written", async ({ page }) => {
  await openDemo(page, LABEL);
  await page.evaluate(
    () =>
      new Promise<void>((resolve, reject) => {
        const request = indexedDB.open("ebbline");
        request.onerror = () => reject(request.error);
        request.onsuccess = () => {
          const database = request.result;
          const transaction = database.transaction("meta", "readwrite");
          const meta = transaction.objectStore("meta");
          const read = meta.get("database");
          read.onsuccess = () => meta.put({ ...read.result, schema: 2 });
          transaction.oncomplete = () => {
            database.close();
            resolve();
          };
        };
      }),
  );
  // The tab that holds the case notices at its next save and stops.
  await moveDose(page);
  await expect(page.locator("[data-saving]")).toHaveAttribute("data-saving", "failed");
  await expect(page.getByText(/newer version of Ebbline/).first()).toBeVisible();

  const other = await page.context().newPage();
  await other.goto("/");
  await expect(other.getByText("A newer Ebbline wrote these cases")).toBeVisible();
  await other
    .getByRole("table")
    .getByRole("button", { name: `Open ${LABEL}` })
    .click();
  await expect(other.locator("[data-saving]")).toHaveAttribute("data-saving", "read-only");
  await expect(dose(other)).toHaveAttribute("aria-valuetext", /20:00/);
});

test("with the disk full the work stays in memory, the case can be exported, and it is saved once there is room", async ({
  openProfile,
  program,
}) => {
  const { origin } = new URL(program.url);
  const profile = mkdtempSync(join(tmpdir(), "ebbline-storage-"));
  try {
    const before = await openProfile(profile);
    await openDemo(before.page, LABEL);
    await before.close();

    const { page, context, close } = await openProfile(profile);
    const session = await context.newCDPSession(page);
    // Before the first page: once a page has written, the browser lets it write on from an allowance.
    await session.send("Storage.overrideQuotaForOrigin", { origin, quotaSize: 1 });
    await openStored(page, LABEL);
    await moveDose(page);
    const strip = page.locator("[data-saving]");
    await expect(strip).toHaveAttribute("data-saving", "failed");
    await expect(page.getByText(/storage is full/).first()).toBeVisible();
    await expect(dose(page)).toHaveAttribute("aria-valuetext", /20:15/);

    await session.send("Storage.overrideQuotaForOrigin", { origin });
    await moveDose(page);
    await expectSaved(page);
    await page.reload();
    await expect(dose(page)).toHaveAttribute("aria-valuetext", /20:30/);
    await close();
  } finally {
    rmSync(profile, { recursive: true, force: true });
  }
});
