import { readFileSync } from "node:fs";
import { printPage } from "./support/printPage.ts";
import { expect, test } from "./support/test.ts";

/** The harness itself: what other tests lean on does what it says. */

test("a killed browser starts again on its profile with what was stored", async ({ openProfile }, testInfo) => {
  const profile = testInfo.outputPath("profile");
  const first = await openProfile(profile);
  await first.page.goto("./");
  await first.page.evaluate(() => caches.open("planted").then((cache) => cache.put("/planted", new Response("kept"))));
  await first.kill();
  await expect(first.page.evaluate(() => 1)).rejects.toThrow();

  const second = await openProfile(profile);
  await second.page.goto("./");
  expect(await second.page.evaluate(() => caches.match("/planted").then((found) => found?.text()))).toBe("kept");
});

test("a stopped server answers nobody until it is started again", async ({ program }) => {
  await program.stop();
  await expect(fetch(program.url)).rejects.toThrow();
  await program.start();
  expect((await fetch(program.url)).status).toBe(200);
});

test("a printed page is read back sheet by sheet", async ({ page }, testInfo) => {
  await page.goto("./");
  await page.evaluate(() => {
    document.body.innerHTML = "<p>first sheet</p><p>second sheet</p>";
    const second = document.body.lastElementChild as HTMLElement;
    second.style.breakBefore = "page";
  });
  const printed = await printPage(page, testInfo.outputPath("planted.pdf"));
  expect(printed.texts).toHaveLength(2);
  expect(printed.texts[0]).toContain("first sheet");
  expect(printed.texts[0]).not.toContain("second sheet");
  expect(printed.texts[1]).toContain("second sheet");
  for (const picture of printed.pictures) expect(readFileSync(picture).subarray(1, 4).toString()).toBe("PNG");
});
