import { execFileSync } from "node:child_process";
import { PROJECT } from "../../.ci/install.mjs";
import { expectFit, openDemo, reading } from "./support/caseSteps.ts";
import { flat } from "./support/printedText.ts";
import { printPage } from "./support/printPage.ts";
import { expect, test } from "./support/test.ts";

const DEMOS = [
  { label: "Harbour ward 3, bed 12", file: "demo-data/adjustment.ebbline.json" },
  { label: "Harbour ward 1, bed 4", file: "demo-data/start.ebbline.json" },
] as const;

interface Interval {
  median: number;
  interval90: [number, number];
}
type Individual = Record<string, Interval> & { steadyState: Record<string, Interval> };

interface Recomputed {
  fingerprint: string;
  thisPatient: { parameters?: Record<string, Interval> };
  options: Record<
    string,
    {
      chosen: boolean;
      typical: Record<string, { value: number }> & { steadyState: Record<string, { value: number }> };
      individual: Individual | null;
    }
  >;
  levels: {
    measured: { value: number };
    individual: { predicted: Interval; forecast: Interval & { held: boolean } };
  }[];
}

/** Three significant digits, as shown. */
const shown = (value: number) => String(Number(value.toPrecision(3)));
const spread = ({ median, interval90 }: Interval, unit: string) =>
  `${shown(median)} ${unit} (90 %: ${interval90.map(shown).join(" to ")})`;

for (const demo of DEMOS) {
  test(`screen, sheet and recompute say the same of ${demo.label}`, async ({ page }, info) => {
    const recomputed = JSON.parse(
      execFileSync("npm", ["run", "-s", "recompute", "--", demo.file], { cwd: PROJECT, encoding: "utf8" }),
    ) as Recomputed;
    await openDemo(page, demo.label);
    const ids = Object.keys(recomputed.options);
    const isFitted = recomputed.thisPatient.parameters !== undefined;
    await expectFit(page, isFitted ? "fitted" : "none");
    for (const [i, id] of ids.entries()) {
      const { steadyState, ...span } = recomputed.options[id]!.typical;
      const pairs: [string, number | undefined][] = [
        ["peak", steadyState.peak?.value],
        ["lowest", steadyState.trough?.value],
        ["average", steadyState.average?.value],
        ["auc24", steadyState.auc24?.value],
        ["spanPeak", span.peak?.value],
        ["spanLowest", span.trough?.value],
      ];
      for (const [row, value] of pairs) {
        expect(value, `${row} of ${id}`).toBeDefined();
        await expect(reading(page, row, i)).toContainText(shown(value!));
      }
      const { individual } = recomputed.options[id]!;
      expect(individual !== null).toBe(isFitted);
      if (!individual) continue;
      const own: [string, Interval][] = [
        ["peak", individual.steadyState.peak!],
        ["lowest", individual.steadyState.trough!],
        ["average", individual.steadyState.average!],
        ["spanPeak", individual.peak!],
      ];
      for (const [row, { median, interval90 }] of own) {
        const cell = page.locator(`[data-reading=${row}] .readings-own`).nth(i);
        await expect(cell).toContainText(shown(median));
        await expect(cell).toContainText(interval90.map(shown).join(" to "));
      }
    }

    await page.getByRole("button", { name: "Print summary" }).click();
    await expect(page.getByText("Oral regimen summary").first()).toBeVisible();
    const sheets = await printPage(page, info.outputPath("summary.pdf"));
    const text = flat(sheets.texts.join(" "));
    const chosen = ids.find((id) => recomputed.options[id]!.chosen)!;
    const { typical, individual } = recomputed.options[chosen]!;
    for (const name of ["peak", "trough", "average"]) {
      expect(text).toContain(
        individual
          ? spread(individual.steadyState[name]!, "mg per L")
          : `${shown(typical.steadyState[name]!.value)} mg per L`,
      );
    }
    expect(text).toContain(`Expected at steady state, ${individual ? "this" : "typical"} patient`);
    if (isFitted) expect(text).toContain(spread(recomputed.thisPatient.parameters!.CL!, "L per h"));
    for (const { measured, individual: level } of recomputed.levels) {
      const { predicted, forecast } = level;
      expect(text).toContain(`${shown(measured.value)} mg per L`);
      expect(text).toContain(`${shown(predicted.median)} mg per L (${predicted.interval90.map(shown).join(" to ")})`);
      expect(text).toContain(
        `${forecast.interval90.map(shown).join(" to ")} mg per L: ${forecast.held ? "held" : "did NOT hold"}`,
      );
    }
    const { fingerprint } = recomputed;
    expect(text).toContain([0, 4, 8].map((at) => fingerprint.slice(at, at + 4)).join(" "));
    expect(text.replaceAll(" ", "")).toContain(fingerprint);
    expect(text).toContain(demo.label);
    expect(text).toMatch(/demo/i);
    expect(text).toMatch(/independently checked by/i);
    expect(text).toMatch(/licensed professional.s judgement and local policy/i);
    for (const [i, sheet] of sheets.texts.entries()) {
      expect(flat(sheet)).toContain(`page ${i + 1} of ${sheets.texts.length}`);
      expect(flat(sheet)).toContain(demo.label);
    }
    await info.attach("first sheet", { path: sheets.pictures[0]! });
  });
}

test("printing is refused while the case is not saved, with the reason", async ({ page }) => {
  await openDemo(page, "Harbour ward 3, bed 12");
  // From here on nothing can be written.
  await page.evaluate(() => {
    IDBObjectStore.prototype.put = () => {
      throw new DOMException("no room", "QuotaExceededError");
    };
  });
  await page.getByRole("region", { name: "Given" }).getByRole("slider", { name: "Dose 2" }).focus();
  await page.keyboard.press("ArrowRight");
  await expect(page.locator("[data-saving]")).toHaveAttribute("data-saving", "failed");
  await page.getByRole("button", { name: "Print summary" }).click();
  await expect(page.getByRole("button", { name: "Print", exact: true })).toBeDisabled();
  await expect(page.getByText(/not.*(saved|on disk)/i).first()).toBeVisible();
});

test("the order, its times and its strengths stand on the first sheet in plain words", async ({ page }, info) => {
  await openDemo(page, "Harbour ward 3, bed 12");
  await page.getByRole("button", { name: "Print summary" }).click();
  await expect(page.getByText("Oral regimen summary").first()).toBeVisible();
  const first = flat((await printPage(page, info.outputPath("summary.pdf"))).texts[0]!);
  expect(first).toContain("Theophylline 300 mg 12-hour modified-release tablet");
  expect(first).toContain("1 tablet by mouth every 12 hours, at 08:00 and 20:00");
  expect(first).toContain("First dose Wednesday 4 March 2026 at 20:00");
});
