import { readFile } from "node:fs/promises";
import AxeBuilder from "@axe-core/playwright";
import type { Page } from "@playwright/test";
import { expect, test } from "./support/test.ts";

const TAGS = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"];

/** `part`: only what a selector names, where the rest was looked at before. */
async function expectAccessible(page: Page, name: string, part = "main"): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).include(part).withTags(TAGS).analyze();
  const told = violations.map((each) => `${each.id}: ${each.nodes.map((node) => node.target.join(" ")).join(" | ")}`);
  expect(told, `axe on ${name}`).toEqual([]);
}

async function openMedicines(page: Page): Promise<void> {
  await page.goto("/");
  await page.getByRole("button", { name: "Medicines" }).click();
}

const list = (page: Page) => page.getByRole("navigation", { name: "Records" });
/** A figure beside the typical curve. */
const trial = (page: Page, name: RegExp) =>
  page.getByRole("complementary", { name: "Typical curve" }).getByRole("row", { name });

async function copyToEdit(page: Page, name: string): Promise<void> {
  await list(page)
    .getByRole("button", { name: new RegExp(`^${name}`) })
    .click();
  await page.getByRole("button", { name: "Make a copy to edit" }).click();
  await expect(page.getByRole("heading", { name: `Editing ${name}, copy` })).toBeVisible();
}

test("a copy is edited wrongly and rightly, survives a reload, is saved, compared, exported, removed and brought back", async ({
  page,
}, info) => {
  await openMedicines(page);
  await copyToEdit(page, "theophylline");
  const clearance = page.getByRole("textbox", { name: "Clearance (CL)" });
  const group = page.getByRole("group", { name: "Clearance (CL)" });
  const average = trial(page, /^average/);
  const before = (await average.textContent())!;

  await clearance.fill("0.05 L/h * weight");
  await expect(group.getByText(/units of the formula do not fit/)).toBeVisible();
  await expect(page.getByRole("button", { name: "Save as version 2" })).toBeDisabled();
  await expect(page.getByText("those before the last change")).toBeVisible();
  await expect(average).toHaveText(before);

  // Wrong as it is, it is there again after a reload.
  await page.reload();
  await page.getByRole("button", { name: "Medicines" }).click();
  await list(page)
    .getByRole("button", { name: /^theophylline, copy unsaved changes/ })
    .click();
  await page.getByRole("button", { name: "Go on editing" }).click();
  await expect(clearance).toHaveValue("0.05 L/h * weight");

  await clearance.fill("0.05 L/h/kg * weight");
  await expect(group.getByText(/3\.5.L\/h for the reference patient; dimension L\/h/)).toBeVisible();
  await expect(trial(page, /^Clearance/)).toContainText(/3\.5.L\/h/);
  await expect(average).not.toHaveText(before);
  await page.getByRole("button", { name: "Go there: The clearance" }).first().click();
  await expect(group.getByRole("combobox", { name: "Source" })).toBeFocused();
  await page.getByRole("combobox", { name: "Source" }).and(page.locator(":focus")).selectOption({ index: 2 });
  await group.getByRole("combobox", { name: "How it is known" }).selectOption("common practice");
  await page.getByRole("button", { name: "Undo a step" }).click();
  await expect(page.getByRole("button", { name: "Save as version 2" })).toBeDisabled();
  await page.getByRole("button", { name: "Redo a step" }).click();
  await page.getByRole("button", { name: "Save as version 2" }).click();
  await expect(page.getByText("“theophylline, copy” is saved as record version 2.")).toBeVisible();

  await page.getByRole("button", { name: "Compare" }).click();
  await expect(page.locator("path.profile-curve")).toHaveCount(2);
  const differences = page.getByRole("table", { name: "What differs" });
  await expect(differences.getByRole("row")).toHaveCount(2);
  await expect(differences).toContainText("0.05 L/h/kg * weight");
  await page.getByRole("button", { name: "Back to the record" }).click();

  const [download] = await Promise.all([
    page.waitForEvent("download"),
    page.getByRole("button", { name: "Export as a file" }).click(),
  ]);
  expect(download.suggestedFilename()).toMatch(/\.ebbline-medicine\.json$/);
  const path = info.outputPath("record.ebbline-medicine.json");
  await download.saveAs(path);
  expect(JSON.parse(await readFile(path, "utf8"))).toMatchObject({
    recordVersion: 2,
    copyOf: { id: "theophylline" },
    review: { status: "not-reviewed" },
  });

  await page.getByRole("button", { name: "Remove", exact: true }).click();
  await expect(list(page).getByRole("button", { name: /^theophylline, copy/ })).toHaveCount(0);
  // The way back waits on another screen too.
  await page.getByRole("button", { name: "Settings" }).click();
  await page.getByRole("region", { name: "Notices" }).getByRole("button", { name: "Undo" }).click();
  await page.getByRole("button", { name: "Medicines" }).click();
  await list(page)
    .getByRole("button", { name: /^theophylline, copy/ })
    .click();
  await expect(page.getByRole("article")).toContainText("record version 2");

  // And the file goes in again on an empty shelf.
  await page.getByRole("button", { name: "Remove", exact: true }).click();
  await page.locator('input[type="file"]').setInputFiles(path);
  await expect(page.getByText("“theophylline, copy”, record version 2, is stored on this device")).toBeVisible();
});

test("a screen pressed while the store is still opening stays", async ({ page }) => {
  // Pressed in the same turn in which it appears: before any answer of the store.
  await page.addInitScript(() => {
    const seen = new MutationObserver(() => {
      const press = [...document.querySelectorAll("button")].find((each) => each.textContent === "Medicines");
      if (!press) return;
      seen.disconnect();
      press.click();
    });
    seen.observe(document, { childList: true, subtree: true });
  });
  await page.goto("/");
  await expect(page).toHaveURL(/#medicines$/);
  await expect(page.getByRole("heading", { name: "Medicine records", level: 1 })).toBeVisible();
});

test("a bad file is answered with where, what was found and what is allowed", async ({ page }) => {
  await openMedicines(page);
  const put = (text: string) =>
    page
      .locator('input[type="file"]')
      .setInputFiles({ name: "bad.json", mimeType: "application/json", buffer: Buffer.from(text) });
  await put('{"format": "ebbline-medicine", "format": "x"}');
  await expect(page.getByText(/“bad.json” was not imported/)).toBeVisible();
  await expect(page.getByText(/"format".*twice|twice.*"format"/)).toBeVisible();
  await put('{"format": "ebbline-case", "version": 2}');
  await expect(page.locator(".medicines-screen-faults")).toContainText("ebbline-case");
  await expect(list(page).getByText("None yet.")).toBeVisible();
});

test("folds open by keyboard, typing keeps up with every fold open, and axe finds nothing", async ({ page }) => {
  test.setTimeout(180_000);
  await openMedicines(page);
  await page.getByRole("button", { name: "Compare" }).click();
  await expectAccessible(page, "comparison");
  await page.getByRole("button", { name: "Back to the record" }).click();
  await copyToEdit(page, "ethosuximide");
  await page.locator("#draft-products > summary").focus();
  await page.keyboard.press("Enter");
  await expect(page.getByRole("button", { name: "Add product" })).toBeVisible();
  await expectAccessible(page, "editor");
  await page.emulateMedia({ colorScheme: "dark" });
  await expectAccessible(page, "editor, dark", "#draft-kinetics");

  const folded = page.locator(".draft-section:not([open]) > summary");
  for (let left = await folded.count(); left > 0; left -= 1) await folded.first().press("Enter");
  await expect(folded).toHaveCount(0);
  const name = page.locator("#draft-identity input").first();
  await name.focus();
  const began = Date.now();
  await page.keyboard.type(" of mine");
  await expect(name).toHaveValue(/ of mine$/);
  // Eight letters; a person takes two seconds. Loose, for a busy machine.
  expect(Date.now() - began).toBeLessThan(8_000);
});

test("narrow: nothing of list, page, editor or comparison is cut off", async ({ page }) => {
  await page.setViewportSize({ width: 390, height: 844 });
  const fits = () => page.waitForFunction(() => document.documentElement.scrollWidth <= window.innerWidth + 1);
  await openMedicines(page);
  await fits();
  await copyToEdit(page, "phenytoin");
  await fits();
  await page.getByRole("button", { name: "Back to the records" }).click();
  await page.getByRole("button", { name: "Compare" }).click();
  await fits();
});
