import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { expect, test } from "./support/test.ts";

const KILLS = 20;
/** A kill later than this after "saved" is made all the same but does not count. */
const WITHIN_MS = 200;
const MOST_TRIES = 40;

test(`killed ${KILLS} times within 200 ms of the strip saying "saved": nothing acknowledged is lost`, async ({
  openProfile,
}) => {
  test.setTimeout(300_000);
  const profile = mkdtempSync(join(tmpdir(), "ebbline-kill-"));
  try {
    let minutes = 0;
    const delays: number[] = [];
    for (let tried = 0; delays.filter((delay) => delay <= WITHIN_MS).length < KILLS; tried += 1) {
      expect(tried, "tries needed for enough quick kills").toBeLessThan(MOST_TRIES);
      const browser = await openProfile(profile);
      const { page } = browser;
      await page.goto("/");
      if (tried === 0) await page.getByRole("button", { name: "Open Harbour ward 3, bed 12" }).click();
      else
        await page
          .getByRole("button", { name: /Open .*Harbour ward 3/ })
          .first()
          .click();
      const dose = page.getByRole("region", { name: "Given" }).getByRole("slider", { name: "Dose 2" });
      // What the last life was told is saved, is there.
      await expect(dose).toHaveAttribute("aria-valuetext", new RegExp(`20:${String(minutes).padStart(2, "0")}`));
      await dose.focus();
      await page.keyboard.press("Shift+ArrowRight");
      minutes += 1;
      await expect(dose).toHaveAttribute("aria-valuetext", new RegExp(`20:${String(minutes).padStart(2, "0")}`));
      // Seen in the page itself, at the moment it says so.
      const savedAt = await page.evaluate(
        () =>
          new Promise<number>((done) => {
            const look = () => {
              const strip = document.querySelector("[data-saving]");
              if (strip?.getAttribute("data-saving") === "saved") done(Date.now());
              else requestAnimationFrame(look);
            };
            look();
          }),
      );
      delays.push(Date.now() - savedAt);
      await browser.kill();
    }
    console.log(`signal sent after "saved", ms: ${delays.join(" ")}`);
    const last = await openProfile(profile);
    await last.page.goto("/");
    await last.page
      .getByRole("button", { name: /Open .*Harbour ward 3/ })
      .first()
      .click();
    await expect(
      last.page.getByRole("region", { name: "Given" }).getByRole("slider", { name: "Dose 2" }),
    ).toHaveAttribute("aria-valuetext", new RegExp(`20:${String(minutes).padStart(2, "0")}`));
    await last.close();
  } finally {
    rmSync(profile, { recursive: true, force: true });
  }
});
