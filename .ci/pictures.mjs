// Takes the pictures that the docs show, from the built program with the demo cases. Run after "npm run build".
import { execFileSync } from "node:child_process";
import { mkdirSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { chromium } from "@playwright/test";
import { findBrowser, PROJECT } from "./install.mjs";
import { startServer } from "./serve.mjs";

const folder = join(PROJECT, "docs", "pictures");
const DEMO = "Open Harbour ward 3, bed 12";

const executablePath = findBrowser();
if (!executablePath) throw new Error("No Chromium on the PATH; npm test says what to install.");
const server = await startServer({ folder: join(PROJECT, "dist"), port: 0 });
const browser = await chromium.launch({ executablePath, args: ["--no-sandbox", "--disable-gpu"] });
mkdirSync(folder, { recursive: true });

/** @param {string} name @param {import("@playwright/test").BrowserContextOptions} options @param {(page: import("@playwright/test").Page) => Promise<unknown>} act */
async function picture(name, options, act) {
  const context = await browser.newContext({ locale: "en-GB", timezoneId: "Europe/Lisbon", ...options });
  const page = await context.newPage();
  await page.goto(server.url);
  await act(page);
  await page.screenshot({ path: join(folder, `${name}.png`), fullPage: options.viewport?.width !== 1440 });
  await context.close();
}

/** @param {import("@playwright/test").Page} page */
async function openDemo(page) {
  await page.getByRole("button", { name: DEMO }).click();
  await page.locator("[data-saving=saved]").waitFor();
  await page.locator("[data-reading=peak]").waitFor();
  await page.locator("[data-fit=fitted]").waitFor();
}

/** @param {import("@playwright/test").Page} page */
async function readOut(page) {
  await openDemo(page);
  const box = await page.locator(".profile-row").boundingBox();
  if (box) await page.mouse.move(box.x + box.width * 0.62, box.y + box.height / 2);
  await page.locator(".readout").waitFor();
}

await picture("cases-empty", { viewport: { width: 1440, height: 900 } }, (page) =>
  page.getByRole("button", { name: DEMO }).waitFor(),
);
await picture("bench-wide", { viewport: { width: 1440, height: 900 } }, readOut);
await picture("bench-dark", { viewport: { width: 1440, height: 900 }, colorScheme: "dark" }, readOut);
await picture("bench-tablet", { viewport: { width: 820, height: 1180 } }, openDemo);

// The sheet as it comes out of the printer.
const context = await browser.newContext({ locale: "en-GB", timezoneId: "Europe/Lisbon" });
const page = await context.newPage();
await page.goto(server.url);
await openDemo(page);
// The cross-check follows a settled edit; its outcome belongs on the sheet.
await page.waitForTimeout(2500);
await page.getByRole("button", { name: "Print summary" }).click();
await page.getByText("Oral regimen summary").first().waitFor();
const temporary = mkdtempSync(join(tmpdir(), "ebbline-pictures-"));
const pdf = join(temporary, "summary.pdf");
await page.pdf({ path: pdf, preferCSSPageSize: true, tagged: true, printBackground: true });
execFileSync("pdftoppm", ["-png", "-r", "110", "-f", "1", "-l", "2", pdf, join(temporary, "summary")]);
for (const sheet of [1, 2]) {
  execFileSync("cp", [join(temporary, `summary-${sheet}.png`), join(folder, `summary-${sheet}.png`)]);
}
rmSync(temporary, { recursive: true, force: true });

await browser.close();
await server.close();
console.log(`pictures in ${folder}`);
