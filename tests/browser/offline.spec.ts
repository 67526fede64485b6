import { cpSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import type { BrowserContext, Page } from "@playwright/test";
import { buildSecond, SECOND_BUILD_MARK } from "./support/secondBuild.ts";
import { expect, test } from "./support/test.ts";

const UPDATE_BUTTON = /new version/i;

async function openAndStore(page: Page): Promise<void> {
  await page.goto("./");
  await expectProgram(page);
  await page.waitForFunction(() => navigator.serviceWorker.controller !== null);
}

async function expectProgram(page: Page): Promise<void> {
  await expect(page.getByRole("heading").first()).toBeVisible();
  await expect(page.locator("#root")).not.toBeEmpty();
}

async function goOffline(context: BrowserContext, stop: () => Promise<void>): Promise<void> {
  await stop();
  await context.setOffline(true);
}

/** A mark that a reload takes away. */
async function markPage(page: Page): Promise<void> {
  await page.evaluate(() => document.documentElement.setAttribute("data-not-reloaded", ""));
}

const isMarked = (page: Page) => page.evaluate(() => document.documentElement.hasAttribute("data-not-reloaded"));

async function checkForUpdate(page: Page): Promise<void> {
  await page.evaluate(() => window.dispatchEvent(new Event("focus")));
}

test("opens and works after the server and the network are gone", async ({ page, context, program }) => {
  await openAndStore(page);
  await goOffline(context, program.stop);
  for (const round of [1, 2]) {
    const response = await page.reload();
    expect(response?.fromServiceWorker(), `reload ${round}`).toBe(true);
    await expectProgram(page);
  }
  const other = await context.newPage();
  await other.goto("./");
  await expectProgram(other);
});

test("a case is opened, computed, changed and found again without server and network", async ({
  page,
  context,
  program,
}) => {
  await openAndStore(page);
  await goOffline(context, program.stop);
  await page.reload();
  await page.getByRole("button", { name: "Open Harbour ward 3, bed 12" }).click();
  const highest = page.getByRole("table", { name: /steady state/ }).getByRole("row", { name: /^Highest/ });
  await expect(highest).toHaveText(/\d mg\/L.*\d mg\/L/s);
  // One for the typical patient, one for what the levels make of this one.
  const worker = expect.stringMatching(/^\/assets\/analysis\.worker-/);
  await expect.poll(() => page.workers().map((each) => new URL(each.url()).pathname)).toEqual([worker, worker]);
  await page.getByRole("button", { name: "Add an option" }).click();
  await expect(page.getByRole("region", { name: "Option C" })).toBeVisible();
  await expect(page.getByRole("status").filter({ hasText: /^saved/ })).toBeVisible();
  const shown = await highest.textContent();

  await page.reload();
  await expect(page.getByRole("region", { name: "Option C" })).toBeVisible();
  await expect.poll(() => highest.textContent()).toBe(shown);
});

test("an address inside the program that is no file leads to the program, offline as well", async ({
  page,
  context,
  program,
}) => {
  await page.goto("./some/old/bookmark");
  await expect(page).toHaveURL(program.url);
  await openAndStore(page);
  await goOffline(context, program.stop);
  await page.goto("./some/old/bookmark");
  await expect(page).toHaveURL(program.url);
  await expectProgram(page);
});

test("a page reloaded past the cache is taken into the worker's care again", async ({ page, context, program }) => {
  await openAndStore(page);
  const session = await context.newCDPSession(page);
  const reloaded = page.waitForEvent("load");
  await session.send("Page.reload", { ignoreCache: true });
  await reloaded;
  await page.waitForFunction(() => navigator.serviceWorker.controller !== null);
  await goOffline(context, program.stop);
  const response = await page.evaluate(() => fetch("icon.svg").then(({ status }) => status));
  expect(response).toBe(200);
});

test("everything the build made is kept, so that nothing is missing offline", async ({ page, context, program }) => {
  await openAndStore(page);
  await goOffline(context, program.stop);
  await page.reload();
  const fonts = await page.evaluate(async () => {
    const faces = [...document.fonts];
    await Promise.all(faces.map((face) => face.load()));
    return faces.map((face) => face.status);
  });
  expect(fonts.length).toBeGreaterThan(0);
  expect(new Set(fonts)).toEqual(new Set(["loaded"]));
});

test.describe("a new version", () => {
  let folder = "";

  // biome-ignore lint/correctness/noEmptyPattern: Playwright reads the fixture's needs from this pattern
  test.beforeAll(({}, testInfo) => {
    test.setTimeout(180_000);
    folder = buildSecond(join(testInfo.project.outputDir, "second-build"));
  });
  test.afterAll(() => rmSync(folder, { recursive: true, force: true }));

  test("waits, asks, and comes only when agreed to", async ({ page, program }) => {
    await openAndStore(page);
    await program.start(folder);
    await markPage(page);
    await checkForUpdate(page);
    const take = page.getByRole("button", { name: UPDATE_BUTTON });
    await expect(take).toBeVisible();

    // Asking is all it does: the page stays, and even a reload by hand brings the old version.
    expect(await isMarked(page)).toBe(true);
    await page.reload();
    await expectProgram(page);
    await expect(page.locator(SECOND_BUILD_MARK)).toHaveCount(0);

    await take.click();
    await expect(page.locator(SECOND_BUILD_MARK)).toHaveCount(1);
    await expectProgram(page);
    await expect(take).toHaveCount(0);
  });

  test("does not reload another tab that has not agreed", async ({ page, context, program }) => {
    await openAndStore(page);
    const other = await context.newPage();
    await openAndStore(other);
    await markPage(other);
    await program.start(folder);
    await checkForUpdate(page);
    await page.getByRole("button", { name: UPDATE_BUTTON }).click();
    await expect(page.locator(SECOND_BUILD_MARK)).toHaveCount(1);

    await expect(other.getByRole("button", { name: UPDATE_BUTTON })).toBeVisible();
    expect(await isMarked(other)).toBe(true);
    // What the old tab has not loaded yet is still there, though the server no longer has it.
    await goOffline(context, program.stop);
    const oldScript = await other.locator('script[type="module"]').getAttribute("src");
    expect(await other.evaluate(async (path) => (await fetch(path ?? "")).ok, oldScript)).toBe(true);

    await other.getByRole("button", { name: UPDATE_BUTTON }).click();
    await expect(other.locator(SECOND_BUILD_MARK)).toHaveCount(1);
  });

  test("that arrived damaged is not taken, and the old one goes on", async ({ page, context, program }, testInfo) => {
    const damaged = testInfo.outputPath("damaged");
    cpSync(folder, damaged, { recursive: true });
    writeFileSync(join(damaged, "icon.svg"), "<svg/>");
    await openAndStore(page);
    await program.start(damaged);
    const outcome = await page.evaluate(async () => {
      const registration = await navigator.serviceWorker.ready;
      const found = new Promise<string>((done) => {
        registration.addEventListener("updatefound", () => {
          const worker = registration.installing;
          worker?.addEventListener("statechange", () => done(worker.state));
        });
      });
      await registration.update();
      return found;
    });
    expect(outcome).toBe("redundant");
    await expect(page.getByRole("button", { name: UPDATE_BUTTON })).toHaveCount(0);
    await goOffline(context, program.stop);
    await page.reload();
    await expectProgram(page);
    await expect(page.locator(SECOND_BUILD_MARK)).toHaveCount(0);
  });
});

test("the first visit is not reloaded by the worker's arrival", async ({ page }) => {
  await page.addInitScript(() => {
    const loads = Number(sessionStorage.getItem("loads") ?? "0") + 1;
    sessionStorage.setItem("loads", String(loads));
  });
  await openAndStore(page);
  await page.evaluate(() => navigator.serviceWorker.ready);
  await page.waitForTimeout(500);
  expect(await page.evaluate(() => sessionStorage.getItem("loads"))).toBe("1");
});
