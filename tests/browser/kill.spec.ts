import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { openDemo, openStored } from "./support/caseSteps.ts";
import { expect, test } from "./support/test.ts";

const LABEL = "Harbour ward 3, bed 12";
const KILLS = 20;
/** A kill later than this after "saved" is made all the same but does not count. */
const WITHIN_MS = 200;
const MOST_TRIES = 40;

test(`killed ${KILLS} times within 200 ms of the strip saying "saved": nothing acknowledged is lost`, {
  tag: "@alone",
}, async ({ openProfile }) => {
  test.setTimeout(300_000);
  const profile = mkdtempSync(join(tmpdir(), "ebbline-kill-"));
  try {
    let minutes = 0;
    const delays: number[] = [];
    for (let tried = 0; delays.filter((delay) => delay <= WITHIN_MS).length < KILLS; tried += 1) {
      expect(tried, "tries needed for enough quick kills").toBeLessThan(MOST_TRIES);
      const browser = await openProfile(profile);
      const { page } = browser;
      if (tried === 0) await openDemo(page, LABEL);
      else await openStored(page, LABEL);
      const dose = page.getByRole("region", { name: "Given" }).getByRole("slider", { name: "Dose 2" });
      // What the last life was told is saved, is there.
      await expect(dose).toHaveAttribute("aria-valuetext", new RegExp(`20:${String(minutes).padStart(2, "0")}`));
      await dose.focus();
      await page.evaluate(watchForSaved);
      await page.keyboard.press("Shift+ArrowRight");
      minutes += 1;
      const savedAt = await page.evaluate(() => (window as unknown as { savedAt: Promise<number> }).savedAt);
      delays.push(Date.now() - savedAt);
      await browser.kill();
    }
    console.log(`signal sent after "saved", ms: ${delays.join(" ")}`);
    const last = await openProfile(profile);
    await openStored(last.page, LABEL);
    await expect(
      last.page.getByRole("region", { name: "Given" }).getByRole("slider", { name: "Dose 2" }),
    ).toHaveAttribute("aria-valuetext", new RegExp(`20:${String(minutes).padStart(2, "0")}`));
    await last.close();
  } finally {
    rmSync(profile, { recursive: true, force: true });
  }
});

/** Runs in the page: notes the moment at which the strip says "saved" of a later revision than now. */
function watchForSaved(): void {
  const strip = document.querySelector("[data-saving]")!;
  const revision = strip.getAttribute("data-revision");
  (window as unknown as { savedAt: Promise<number> }).savedAt = new Promise((done) => {
    new MutationObserver(() => {
      if (strip.getAttribute("data-revision") === revision || strip.getAttribute("data-saving") !== "saved") return;
      done(Date.now());
    }).observe(strip, { attributes: true });
  });
}
