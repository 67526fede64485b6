import { expectSaved, openDemo, reading } from "./support/caseSteps.ts";
import { expect, test } from "./support/test.ts";

const DEMO = "Harbour ward 3, bed 12";

test("a dose dragged along the clock moves the curve, is one step, and undo puts everything back", async ({ page }) => {
  await openDemo(page, DEMO);
  const token = page.getByRole("region", { name: "Option A" }).getByRole("slider", { name: "Dose 1" });
  const path = page.locator("path.profile-option-1");
  const before = { at: await token.getAttribute("data-at"), path: await path.getAttribute("d") };
  const box = (await token.locator(".token-body").boundingBox())!;
  const x = box.x + box.width / 2;
  const y = box.y + box.height / 2;
  await page.mouse.move(x, y);
  await page.mouse.down();
  await page.mouse.move(x + 12, y, { steps: 4 });
  await page.mouse.move(x + 30, y, { steps: 6 });
  // While it is dragged the curve follows, and nothing has been changed yet.
  await expect(path).not.toHaveAttribute("d", before.path!);
  await expect(page.getByRole("button", { name: "Undo", exact: true })).toBeDisabled();
  await page.mouse.up();
  await expect(page.getByRole("button", { name: "Undo: move a dose" })).toBeEnabled();
  const moved = await token.getAttribute("data-at");
  expect(moved).not.toBe(before.at);
  // Quarter hours.
  expect(new Date(moved!).getUTCMinutes() % 15).toBe(0);
  await expectSaved(page);

  await page.keyboard.press("Control+z");
  await expect(token).toHaveAttribute("data-at", before.at!);
  await expect(path).toHaveAttribute("d", before.path!);
  await expect(page.getByRole("button", { name: "Undo", exact: true })).toBeDisabled();
  await page.keyboard.press("Control+Shift+z");
  await expect(token).toHaveAttribute("data-at", moved!);
});

test("Escape in the middle of a drag leaves nothing behind", async ({ page }) => {
  await openDemo(page, DEMO);
  const token = page.getByRole("region", { name: "Given" }).getByRole("slider", { name: "Dose 3" });
  const before = await token.getAttribute("data-at");
  const box = (await token.locator(".token-body").boundingBox())!;
  await page.mouse.move(box.x + 4, box.y + 4);
  await page.mouse.down();
  await page.mouse.move(box.x + 44, box.y + 4, { steps: 5 });
  await expect(token).not.toHaveAttribute("data-at", before!);
  await page.keyboard.press("Escape");
  await page.mouse.up();
  await expect(token).toHaveAttribute("data-at", before!);
  await expect(page.getByRole("button", { name: "Undo", exact: true })).toBeDisabled();
});

test("arrow keys do what a drag does; Delete misses a dose; up and down change it; all of it undoes", async ({
  page,
}) => {
  await openDemo(page, DEMO);
  const token = page.getByRole("region", { name: "Given" }).getByRole("slider", { name: "Dose 2" });
  await token.focus();
  await page.keyboard.press("ArrowRight");
  await page.keyboard.press("ArrowRight");
  await page.keyboard.press("Shift+ArrowLeft");
  await expect(token).toHaveAttribute("aria-valuetext", /20:29, 200.mg, late/);
  await page.keyboard.press("ArrowUp");
  await expect(token).toHaveAttribute("aria-valuetext", /300.mg/);
  await page.keyboard.press("Delete");
  await expect(token).toHaveAttribute("aria-valuetext", /missed/);
  // Presses within a second of each other are one step: three here, or up to five on a slow machine.
  for (let step = 0; step < 5; step += 1) await page.keyboard.press("Control+z");
  await expect(token).toHaveAttribute("aria-valuetext", /20:00, 200.mg$/);
  await expect(page.getByRole("button", { name: "Undo", exact: true })).toBeDisabled();
});

test("everything a drag does can be done by single presses, and the end of a repeat stretches", async ({ page }) => {
  await openDemo(page, DEMO);
  const given = page.getByRole("region", { name: "Given" });
  await given.getByRole("slider", { name: "Dose 5" }).click();
  const bar = page.getByRole("group", { name: /^Dose of/ });
  await bar.getByRole("button", { name: "15 min later" }).click();
  await expect(given.getByRole("slider", { name: "Dose 5" })).toHaveAttribute("aria-valuetext", /08:15/);
  const end = given.getByRole("slider", { name: "End of the repeat" });
  await end.focus();
  await page.keyboard.press("ArrowLeft");
  await expect(given.getByRole("slider", { name: /^Dose/ })).toHaveCount(6);
  await page.keyboard.press("Control+z");
  await expect(given.getByRole("slider", { name: /^Dose/ })).toHaveCount(7);
});

test("options: add, duplicate, rename, choose, remove, each undone with one key", async ({ page }) => {
  await openDemo(page, DEMO);
  await page.getByRole("button", { name: "Option B: open" }).click();
  let panel = page.getByRole("dialog", { name: "Option B" });
  await panel.getByRole("button", { name: "Duplicate" }).click();
  await panel.getByRole("textbox", { name: "Name (optional)" }).fill("evening heavy");
  await panel.getByRole("textbox", { name: "Name (optional)" }).press("Enter");
  await panel.getByRole("button", { name: "Choose", exact: true }).click();
  await page.keyboard.press("Escape");
  await expect(page.getByRole("button", { name: "Option B, chosen: open" })).toContainText("evening heavy");
  await expect(page.getByRole("region", { name: "Option C" })).toBeVisible();
  await expect(reading(page, "peak", 2)).toHaveText((await reading(page, "peak", 1).innerText()).trim());
  await page.getByRole("button", { name: "Option C: open" }).click();
  panel = page.getByRole("dialog", { name: "Option C" });
  await panel.getByRole("button", { name: "Remove", exact: true }).click();
  await expect(page.getByRole("region", { name: "Option C" })).toHaveCount(0);
  for (let step = 0; step < 4; step += 1) await page.keyboard.press("Control+z");
  await expect(page.getByRole("button", { name: "Option A, chosen: open" })).toBeVisible();
  await expect(page.getByRole("button", { name: "Undo", exact: true })).toBeDisabled();
});

test("the profile reads out exactly what was asked, follows the arrow keys, and the unit and scale switch", async ({
  page,
}) => {
  await openDemo(page, DEMO);
  const profile = page.getByRole("slider", { name: "Time on the profile" });
  await profile.focus();
  await page.keyboard.press("Home");
  await expect(profile).toHaveAttribute("aria-valuetext", /Sun 1 March, 00:00; 0 mg\/L, no dose before/);
  for (let hour = 0; hour < 12; hour += 1) await page.keyboard.press("ArrowRight");
  await expect(profile).toHaveAttribute("aria-valuetext", /Sun 1 March, 12:00; .* mg\/L, 4 h after the dose/);
  const mass = (await reading(page, "peak").innerText()).trim();
  await page.getByRole("button", { name: "micromol/L" }).click();
  await expect(page.getByText(/Readings at steady state.*micromol\/L/)).toBeVisible();
  expect(Number.parseFloat(await reading(page, "peak").innerText()) / Number.parseFloat(mass)).toBeCloseTo(
    1000 / 180.17,
    1,
  );
  const linear = await page.locator("path.profile-option-1").getAttribute("d");
  await page.getByRole("button", { name: "log scale" }).click();
  await expect(page.locator("path.profile-option-1")).not.toHaveAttribute("d", linear!);
});
