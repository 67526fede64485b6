import { expect, type Locator, type Page } from "@playwright/test";

/** Moves focus with Tab alone until it is on `target`; fails when the page has been gone through without meeting it. */
export async function tabTo(page: Page, target: Locator, direction: "Tab" | "Shift+Tab" = "Tab"): Promise<void> {
  for (let pressed = 0; pressed < 120; pressed += 1) {
    if (await target.evaluate((element) => element === document.activeElement)) return;
    await page.keyboard.press(direction);
  }
  throw new Error("Tab never reached the element");
}

/** Replaces what stands in a text field, from the keyboard. */
export async function typeInto(page: Page, target: Locator, text: string): Promise<void> {
  await tabTo(page, target);
  await page.keyboard.press("Control+A");
  await page.keyboard.type(text);
}

/** Presses a button or link from the keyboard. */
export async function pressOn(page: Page, target: Locator): Promise<void> {
  await tabTo(page, target);
  await page.keyboard.press("Enter");
}

export async function openDemo(page: Page, label: string): Promise<void> {
  await page.goto("/");
  await page.getByRole("button", { name: `Open ${label}` }).click();
  await expectSaved(page);
  await expect(page.locator("[data-reading=peak]")).toBeVisible();
}

/** A fit takes a second or two, ten times that on a busy machine; ms. */
export const FIT_TIMEOUT = 60_000;

/** Until what the levels make of this patient is there, or it is said that nothing can be: before it the sheet is not to be printed. */
export async function expectFit(page: Page, kind: "fitted" | "none" = "fitted"): Promise<void> {
  await expect(page.locator("[data-fit]")).toHaveAttribute("data-fit", kind, { timeout: FIT_TIMEOUT });
}

/** Waits until the strip says that everything is on disk. */
export async function expectSaved(page: Page): Promise<void> {
  await expect(page.locator("[data-saving]")).toHaveAttribute("data-saving", "saved");
}

/** Waits until the service worker has the page, so that it works without the server. */
export async function expectOfflineReady(page: Page): Promise<void> {
  await page.waitForFunction(() => navigator.serviceWorker.controller !== null);
}

/** The printed value of a reading of an option, by the row's id and the option's place. */
export function reading(page: Page, row: string, option = 0): Locator {
  return page.locator(`[data-reading=${row}] .readings-cell`).nth(option);
}

/** Opens a stored case from the list. */
export async function openStored(page: Page, label: string): Promise<void> {
  await page.goto("/");
  await page
    .getByRole("table")
    .getByRole("button", { name: `Open ${label}` })
    .first()
    .click();
  await expect(page.locator("[data-reading=peak]")).toBeVisible();
}
