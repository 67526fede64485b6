import { expectFit, FIT_TIMEOUT, openDemo, reading } from "./support/caseSteps.ts";
import { acrossColumns, flat } from "./support/printedText.ts";
import { printPage } from "./support/printPage.ts";
import { expect, test } from "./support/test.ts";

test("saturable elimination: no half-life is shown, and an option above Vmax is said to have no steady state", async ({
  page,
}, info) => {
  await openDemo(page, "Quay ward 1, bed 7");
  await expectFit(page);
  await expect(page.locator("[data-reading=halfLife]")).toHaveCount(0);
  await expect(page.locator("[data-concern='never-steady-chance:C']")).toContainText("never to reach a steady state");
  await expect(page.locator("[data-reading=peak] td").nth(2)).toHaveText(/^not given\s*typical none$/);
  await page.getByRole("button", { name: "Print summary" }).click();
  const text = flat((await printPage(page, info.outputPath("summary.pdf"))).texts.join(" "));
  expect(text).toContain("saturable elimination (Michaelis–Menten)");
  expect(text).toContain("Phenytoin 100 mg extended-release capsule (sodium salt)");
  expect(text).toContain("3 capsules by mouth every day at 21:00");
  expect(text).toContain("Together 326 mg of active phenytoin per day");
  // A concern names its source, whose title has the word; nothing else on the sheet may.
  const title = "Therapeutic drug information (ranges, half-life, sampling, time to steady state)";
  expect(text).toContain(title);
  expect(text.replaceAll(title, "")).not.toMatch(/half-life/i);
});

test("changing kidney function: events on the clock, the final state named, micrograms on screen and paper", async ({
  page,
}, info) => {
  await openDemo(page, "Mill ward 4, bed 3");
  await expectFit(page);
  await expect(page.locator("[data-concern=kinetics-change]")).toContainText("final state");
  await expect(page.getByRole("region", { name: "Events" })).toContainText("verapamil");
  await expect(page.getByRole("banner")).toContainText("0.5 to 0.8 microgram/L");
  await page.getByRole("button", { name: "Print summary" }).click();
  const text = flat((await printPage(page, info.outputPath("summary.pdf"))).texts.join(" "));
  expect(text).toContain("Digoxin 125 microgram tablet");
  expect(text).toContain("half a tablet by mouth every day at 20:00");
  expect(text).toMatch(acrossColumns("Never earlier than 6 hours after a dose: distribution is not over."));
  expect(text).toContain("Window 0.5 to 0.8 microgram per L: chance,");
  expect(text).toMatch(/Lowest [\d.]+ microgram per L \(90 %: [\d.]+ to [\d.]+\)/);
  expect(text).not.toContain("0.0625 mg");
});

test("an event entered on the bench changes the curve at once, is one step, and undo takes it back", async ({
  page,
}) => {
  await openDemo(page, "Harbour ward 3, bed 12");
  const path = page.locator("path.profile-option-1");
  const before = await path.getAttribute("d");
  await page.getByRole("button", { name: "Add an event" }).click();
  const panel = page.getByRole("dialog", { name: "Events" });
  await panel.getByRole("combobox", { name: "What happened" }).selectOption({ index: 2 });
  await panel.getByRole("textbox", { name: "In words" }).fill("invented inhibitor");
  await panel.getByRole("textbox", { name: "From" }).fill("3 March 08:00");
  await panel.getByRole("textbox", { name: "Clearance, of usual" }).fill("60");
  await panel.getByRole("button", { name: /^Add/ }).click();
  await expect(path).not.toHaveAttribute("d", before!);
  await page.keyboard.press("Escape");
  await page.keyboard.press("Control+z");
  await expect(path).toHaveAttribute("d", before!);
});

test("where the dose is can be shown, and the two roads to the figures agree", async ({ page }, info) => {
  await openDemo(page, "Linden ward 2, bed 5");
  await expectFit(page);
  await page.getByRole("button", { name: "where the dose is" }).click();
  await expect(page.getByText(/Together they are F × dose/)).toBeVisible();
  await expect(reading(page, "peak")).toBeVisible();
  await page.getByRole("button", { name: "Print summary" }).click();
  // The cross-check follows the fit of a settled edit.
  const agreed = "cross-check: profile and exposure worked out again by plain numerical integration, and agree";
  await expect(page.getByText(agreed)).toBeVisible({ timeout: FIT_TIMEOUT });
  const text = flat((await printPage(page, info.outputPath("summary.pdf"))).texts.join(" "));
  // The second column of the sheet stands between the two lines of the sentence.
  expect(text).toMatch(
    /cross-check: profile and exposure worked out again by plain numerical .*integration, and agree/,
  );
  expect(text).not.toMatch(/NOT agree|cross-check by numerical integration not made/);
  await page.getByRole("button", { name: "Back to the bench" }).click();
  await expect(reading(page, "peak")).toBeVisible();
  await expect(page.locator("[data-concern=roads-differ]")).toHaveCount(0);
});
