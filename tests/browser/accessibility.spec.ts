import AxeBuilder from "@axe-core/playwright";
import type { Page } from "@playwright/test";
import { openDemo } from "./support/caseSteps.ts";
import { expect, test } from "./support/test.ts";

/** WCAG 2.2 level A and AA, as far as a program can tell. */
const TAGS = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"];

/** In the dark nothing but colours changes: there only their contrast is looked at again. */
async function expectAccessible(page: Page, name: string, colorScheme: "light" | "dark"): Promise<void> {
  const axe = new AxeBuilder({ page });
  const { violations } = await (colorScheme === "light"
    ? axe.withTags(TAGS)
    : axe.withRules(["color-contrast"])
  ).analyze();
  const told = violations.map((each) => `${each.id}: ${each.nodes.map((node) => node.target.join(" ")).join(" | ")}`);
  expect(told, `axe on ${name}, ${colorScheme}`).toEqual([]);
}

for (const colorScheme of ["light", "dark"] as const) {
  test(`no axe violation on any screen or panel, ${colorScheme}`, async ({ page }) => {
    test.setTimeout(180_000);
    await page.emulateMedia({ colorScheme });
    await page.goto("/");
    await expect(page.getByRole("heading", { name: "Cases" })).toBeVisible();
    await expectAccessible(page, "empty cases", colorScheme);
    await page.getByRole("button", { name: "Medicines" }).click();
    await expectAccessible(page, "medicines", colorScheme);
    await page.getByRole("button", { name: "Settings" }).click();
    await expectAccessible(page, "settings", colorScheme);

    await openDemo(page, "Harbour ward 3, bed 12");
    await expectAccessible(page, "bench", colorScheme);
    const panels = [
      ["patient", page.getByRole("banner").getByRole("button", { name: /^weight/ })],
      ["medicine", page.getByRole("banner").getByRole("button", { name: /^medicine/ })],
      ["window", page.getByRole("button", { name: /^target window/ })],
      ["case", page.getByRole("button", { name: /^case/ })],
      ["events", page.getByRole("button", { name: "Add an event" })],
      ["levels", page.getByRole("button", { name: "Levels", exact: true })],
      ["doses given", page.getByRole("button", { name: "Given", exact: true })],
      ["option", page.getByRole("button", { name: "Option A, chosen: open" })],
      ["working", page.locator("[data-reading=peak] .readings-cell").first()],
    ] as const;
    for (const [name, opener] of panels) {
      await opener.click();
      await expect(page.getByRole("dialog")).toBeVisible();
      await expectAccessible(page, name, colorScheme);
      await page.keyboard.press("Escape");
      await expect(page.getByRole("dialog")).toHaveCount(0);
    }
    await page.getByRole("region", { name: "Given" }).getByRole("slider", { name: "Dose 2" }).click();
    await expectAccessible(page, "a dose's buttons", colorScheme);
    await page.getByRole("button", { name: "Print summary" }).click();
    await expect(page.getByText("Oral regimen summary").first()).toBeVisible();
    await expectAccessible(page, "summary", colorScheme);
    await page.goto("/");
    await expect(page.getByRole("button", { name: /Open .*Harbour ward 3/ }).first()).toBeVisible();
    await expectAccessible(page, "cases with one stored", colorScheme);
  });
}

test("tablet and narrow screens: the right column moves below and nothing is cut off", async ({ page }) => {
  await openDemo(page, "Harbour ward 3, bed 12");
  for (const width of [1440, 1024, 820, 390]) {
    await page.setViewportSize({ width, height: 900 });
    await page.waitForFunction(() => document.documentElement.scrollWidth <= window.innerWidth + 1);
    await expect(page.locator("[data-reading=peak]")).toBeVisible();
    await expect(page.getByRole("slider", { name: "Time on the profile" })).toBeVisible();
  }
});
