import { readFileSync } from "node:fs";
import { join } from "node:path";
import type { Page } from "@playwright/test";
import { PROJECT } from "../../.ci/install.mjs";
import { expectSaved, openDemo } from "./support/caseSteps.ts";
import { expect, test } from "./support/test.ts";

const DEMO = "Harbour ward 3, bed 12";
const adjustment = readFileSync(join(PROJECT, "demo-data/adjustment.ebbline.json"), "utf8");

async function importFile(page: Page, name: string, text: string | Buffer): Promise<void> {
  const chooser = page.waitForEvent("filechooser");
  await page.getByRole("button", { name: "Import a case file" }).click();
  await (await chooser).setFiles({ name, mimeType: "application/json", buffer: Buffer.from(text) });
}

async function openImported(page: Page): Promise<void> {
  await page.getByRole("status").getByRole("button", { name: "Open", exact: true }).click();
}

test.describe("numbers and levels", () => {
  test("1,5 is refused and never read as 15; what was typed stays", async ({ page }) => {
    await openDemo(page, DEMO);
    await page.getByRole("button", { name: "Levels", exact: true }).click();
    const panel = page.getByRole("dialog");
    const field = panel.getByRole("textbox", { name: "Concentration" });
    const rows = await panel.getByRole("row").count();
    await field.fill("1,5");
    await panel.getByRole("textbox", { name: "Drawn at" }).fill("4 March 09:00");
    await panel.getByRole("button", { name: "Add a level" }).click();
    await expect(panel.getByText(/write 1\.5/i)).toBeVisible();
    await expect(field).toHaveValue("1,5");
    await expect(panel.getByRole("row")).toHaveCount(rows);
  });

  test("a level that is no concentration, or was drawn when none can have been, is refused with a sentence", async ({
    page,
  }) => {
    await openDemo(page, DEMO);
    await page.getByRole("button", { name: "Levels", exact: true }).click();
    const panel = page.getByRole("dialog");
    const concentration = panel.getByRole("textbox", { name: "Concentration" });
    const rows = await panel.getByRole("row").count();
    for (const [text, drawn, sentence] of [
      ["", "4 March 09:00", /Write a number\./],
      ["-3", "4 March 09:00", /-3 mg\/L can't be entered: write a value above 0/],
      ["0", "4 March 09:00", / 0 mg\/L can't be entered: write a value above 0/],
      ["6", "1 March 07:00", /07:00 lies before the first dose given/],
      ["6", "5 March 09:00", /lies after the now line/],
      ["6", "29 March 2026 01:30", /01:30 does not exist on Sunday 29 March 2026/],
      ["6", "4/3 09:00", /"4\/3" can be read as two different days/],
    ] as const) {
      await test.step(`"${text}" drawn ${drawn}`, async () => {
        await concentration.fill(text);
        await panel.getByRole("textbox", { name: "Drawn at" }).fill(drawn);
        await panel.getByRole("button", { name: "Add a level" }).click();
        await expect(panel.getByText(sentence).first()).toBeVisible();
        await expect(concentration).toHaveValue(text);
        await expect(panel.getByRole("row")).toHaveCount(rows);
      });
    }
  });

  test("a weight that looks like pounds is asked about, and the answer is recorded", async ({ page }) => {
    await openDemo(page, DEMO);
    await page
      .getByRole("banner")
      .getByRole("button", { name: /^weight/ })
      .click();
    const panel = page.getByRole("dialog");
    await panel.getByRole("textbox", { name: "Weight" }).fill("180");
    await panel.getByRole("textbox", { name: "Weight" }).press("Enter");
    await expect(panel.getByText(/pounds/i).first()).toBeVisible();
    await expect(panel.getByRole("rowheader", { name: "180 kg" })).toHaveCount(0);
    await panel.getByRole("button", { name: /180.*(lb|pounds)/i }).click();
    await expect(panel.getByRole("rowheader", { name: /180.lb|81\.6/ })).toBeVisible();
  });
});

test.describe("dose text", () => {
  test("each that can't be read is refused, stays as typed, and the answer says which part", async ({ page }) => {
    await openDemo(page, DEMO);
    await page.getByRole("button", { name: "Option A, chosen: open" }).click();
    const panel = page.getByRole("dialog");
    const rows = await panel.getByRole("row").count();
    const field = panel.getByRole("textbox", { name: "Type a dose" });
    for (const [text, sentence] of [
      ["300 mg evry 12 h from 08:00", /evry/],
      ["mg every 12 h from 08:00", /"mg" could not be read/],
      ["1,5 mg once at 20:00", /1\.5/],
      ["-300 mg once at 20:00", /negative|above 0|-300|greater/i],
      ["5 mL once at 20:00", /not measured in mL/],
      ["300 mg q12h", /q12h/],
      ["300 mg once at 25:00", /25:00/],
    ] as const) {
      await test.step(text, async () => {
        await field.fill(text);
        await field.press("Enter");
        await expect(panel.getByText(sentence).first()).toBeVisible();
        await expect(field).toHaveValue(text);
        await expect(panel.getByRole("row")).toHaveCount(rows);
        await field.fill("");
        await expect(panel.getByText(sentence)).toHaveCount(0);
      });
    }
  });

  test("a clock time that exists twice is asked about", async ({ page }) => {
    const value = JSON.parse(adjustment) as Record<string, unknown>;
    value.now = "2026-10-24T12:00:00+01:00";
    value.given = [];
    value.levels = [];
    value.options = [];
    await page.goto("/");
    await importFile(page, "autumn.ebbline.json", JSON.stringify(value));
    await openImported(page);
    await page.getByRole("button", { name: "Given", exact: true }).click();
    const panel = page.getByRole("dialog");
    const field = panel.getByRole("textbox", { name: "Type a dose" });
    await panel.getByRole("combobox", { name: "Product" }).selectOption({ index: 1 });
    await field.fill("300 mg once at 25 October 01:30");
    await field.press("Enter");
    await expect(panel.getByText(/twice/i).first()).toBeVisible();
  });
});

test.describe("files", () => {
  test("each that can't be taken is refused with a sentence, and nothing is stored", async ({ page }) => {
    await openDemo(page, DEMO);
    await expectSaved(page);
    await page.goto("/");
    const stored = page.getByRole("button", { name: /^Open / });
    await expect(stored.first()).toBeVisible();
    const count = await stored.count();
    for (const [what, text, sentence] of [
      ["corrupt", adjustment.replace('"label"', '"label'), /JSON|read|damaged|corrupt/i],
      ["truncated", adjustment.slice(0, 1500), /truncated|ends|cut|JSON|incomplete/i],
      [
        "of a newer version",
        adjustment.replace(/"version": \d+,/, '"version": 99,'),
        /newer version of Ebbline: its file version is 99/,
      ],
      ["something else", '{"hello":1}', /not .*(case|Ebbline)/i],
      ["with an unknown field", adjustment.replace('"label"', '"surprise": 1, "label"'), /surprise/],
      ["whose record lacks a source", adjustment.replace(/"source": "[^"]+",\s*/, ""), /source/i],
      ["too large", `${adjustment}${" ".repeat(6 * 1024 * 1024)}`, /too large|larger/i],
    ] as const) {
      await test.step(what, async () => {
        expect(text, "the file is spoilt").not.toBe(adjustment);
        await importFile(page, "bad.ebbline.json", text);
        await expect(page.getByText(sentence).first()).toBeVisible();
        // Without what was said before it, the next sentence is the next file's.
        await page.reload();
        await expect(stored).toHaveCount(count);
      });
    }
  });

  test("a good file is imported and gives the same case; exported, it is the same file again", async ({ page }) => {
    await page.goto("/");
    await importFile(page, "adjustment.ebbline.json", adjustment);
    await openImported(page);
    await expect(page.locator("[data-reading=peak]")).toBeVisible();
    await expectSaved(page);
    await page.goto("/");
    const download = page.waitForEvent("download");
    await page
      .getByRole("button", { name: /^Export .*Harbour ward 3/ })
      .first()
      .click();
    const file = await (await download).path();
    expect(readFileSync(file, "utf8")).toBe(adjustment);
  });
});
