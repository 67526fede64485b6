import { spawnSync } from "node:child_process";
import { readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, it } from "vitest";
import { PROJECT } from "../../.ci/install.mjs";
import { modelProfile, modelScaled } from "../../src/core/kinetics/index.ts";
import { chiSquareQuantile } from "../../src/core/numerics/index.ts";
import { calibrationModels } from "../calibration/calibrationModels.ts";
import { calibrationInto } from "../calibration/calibrationPage.ts";
import { calibrationPicture, coverageLine } from "../calibration/calibrationPicture.ts";
import type { CalibrationResults } from "../calibration/calibrationResults.ts";
import { chiSquareTail, rankBins, rankUniformity } from "../calibration/rankUniformity.ts";
import { simulatedPatient } from "../calibration/simulatedPatient.ts";

const text = (file: string) => readFileSync(join(PROJECT, file), "utf8");
const RESULTS = "tests/calibration/results.json";
const results = JSON.parse(text(RESULTS)) as CalibrationResults;
const sum = (values: readonly number[]) => values.reduce((total, each) => total + each, 0);

describe("the committed calibration", () => {
  // After a change of how it is told: npm run calibrate -- --docs
  it("is what the page and the picture show", () => {
    const page = text("docs/verification.md");
    expect(calibrationInto(page, results)).toBe(page);
    expect(calibrationPicture(results)).toBe(text("docs/pictures/calibration.svg"));
  });

  it("is of today's models, 500 patients or more each", () => {
    const posed = calibrationModels().map(({ id, draws }) => ({ id, draws }));
    expect(results.models.map(({ id, draws }) => ({ id, draws }))).toEqual(posed);
    for (const { patients } of results.models) expect(patients).toBeGreaterThanOrEqual(500);
  });

  it.each(results.models)(
    "$id: ranks, coverage and counts of fits hang together",
    ({ ranks, coverage, fits, patients }) => {
      for (const { counts, chiSquare, p } of ranks) {
        expect(counts).toHaveLength(results.rankDraws + 1);
        expect(sum(counts)).toBe(coverage.patients);
        const again = rankUniformity(counts);
        // Written with four places.
        expect(Math.abs(again.chiSquare / chiSquare - 1)).toBeLessThanOrEqual(5e-4);
        expect(Math.abs(again.p / p - 1)).toBeLessThanOrEqual(5e-4);
      }
      expect(patients - coverage.patients).toBeLessThanOrEqual(fits.notConverged + fits.withheld);
    },
  );

  it("shows the fault that was put in on purpose", () => {
    expect(results.planted.p).toBeLessThan(1e-6);
  });
});

describe("whether ranks are even", () => {
  it("the tail is the other side of the quantile, relative 1e-12", () => {
    for (const p of [0.5, 0.1, 0.01, 1e-4]) {
      expect(Math.abs(chiSquareTail(chiSquareQuantile(1 - p, 20), 20) / p - 1)).toBeLessThanOrEqual(1e-12);
    }
  });

  it("even ranks have p 1 and every interval its nominal size; heaped ones neither", () => {
    const even = Array.from({ length: 105 }, () => 4);
    expect(rankBins(even)).toEqual(Array.from({ length: 21 }, () => 20));
    // Rounding of the sum of ten terms.
    expect(Math.abs(rankUniformity(even).p - 1)).toBeLessThanOrEqual(1e-12);
    for (const { nominal, found } of coverageLine(even)) expect(Math.abs(found - nominal)).toBeLessThanOrEqual(1e-12);
    const heaped = even.map((count, rank) => (rank < 5 || rank >= 100 ? 4 * count : count));
    // 540 in all: two bins of 80 and nineteen of 20 where 540/21 are expected.
    const byHand = (2 * (80 - 540 / 21) ** 2 + 19 * (20 - 540 / 21) ** 2) / (540 / 21);
    expect(Math.abs(rankUniformity(heaped).chiSquare / byHand - 1)).toBeLessThanOrEqual(1e-12);
    expect(rankUniformity(heaped).p).toBeLessThan(1e-30);
    // Of the 105 ranks the middle 95, all 4: 380 of 540.
    const within = coverageLine(heaped).find(({ nominal }) => nominal === 95 / 105)!.found;
    expect(Math.abs(within - 380 / 540)).toBeLessThanOrEqual(1e-12);
  });
});

describe.each(calibrationModels())("simulated patients, $id", (model) => {
  const patients = Array.from({ length: 400 }, (_, nth) => simulatedPatient(model, nth, nth));

  it("are the same for the same seed", () => {
    expect(simulatedPatient(model, 7, 7)).toEqual(patients[7]);
    expect(simulatedPatient(model, 7, 8).truth).not.toEqual(patients[7]!.truth);
  });

  it("take doses in order, some missed; levels are drawn after the first dose and before the dose of now", () => {
    for (const { given, next, levels } of patients) {
      const times = given.inputs[0]!.doses.map(({ time }) => time);
      const now = next.inputs[0]!.doses.at(-1)!.time;
      expect(times).toEqual([...times].sort((a, b) => a - b));
      expect(times.at(-1)!).toBeLessThan(now);
      for (const { time, value, kind } of levels) {
        expect(time).toBeGreaterThan(0);
        expect(time).toBeLessThanOrEqual(now);
        expect(kind === "measured" ? value >= model.limit : value === model.limit).toBe(true);
      }
    }
  });

  // 400 patients: four standard errors of a standard deviation are 14 %, of a correlation 0.2.
  it("are spread as the record says, and their levels about the true ones", () => {
    const size = (values: readonly number[]) => Math.sqrt(sum(values.map((each) => each * each)) / values.length);
    const scaled = model.random.map(({ omega }, i) => patients.map(({ truth }) => truth[i]! / omega));
    for (const column of scaled) expect(Math.abs(size(column) - 1)).toBeLessThanOrEqual(0.14);
    for (const [i, row] of model.correlation.entries()) {
      for (const [j, expected] of row.entries()) {
        if (i === j) continue;
        const found = sum(scaled[i]!.map((each, n) => each * scaled[j]![n]!)) / patients.length;
        expect(Math.abs(found - expected)).toBeLessThanOrEqual(0.2);
      }
    }
    const names = model.random.map(({ name }) => name);
    const { additive, proportional } = model.residual;
    const residuals = patients.flatMap(({ given, truth, levels: [first] }) => {
      const level = modelProfile(modelScaled(given, names, truth), [first!.time])[0]!;
      // Far above the limit nothing is cut off.
      if (level < 4 * model.limit) return [];
      return [(first!.value - level) / Math.hypot(additive, proportional * level)];
    });
    expect(residuals.length).toBeGreaterThan(200);
    expect(Math.abs(size(residuals) - 1)).toBeLessThanOrEqual(0.2);
  });
});

describe("npm run calibrate", () => {
  const run = (words: readonly string[]) =>
    spawnSync(process.execPath, [join(PROJECT, ".ci", "calibrate.mjs"), ...words], { cwd: PROJECT, encoding: "utf8" });

  it("a few patients: the tables are printed, nothing is written", () => {
    const before = [RESULTS, "docs/verification.md", "docs/pictures/calibration.svg"].map(text);
    const { status, stdout } = run(["--patients", "1"]);
    expect(status).toBe(0);
    for (const { id, symbols } of calibrationModels()) {
      expect(stdout).toContain(`| ${id} | ${symbols[0]} | `);
      expect(stdout).toMatch(new RegExp(`\\| ${id} \\| none: typical patient \\| 1 \\|`));
    }
    expect([RESULTS, "docs/verification.md", "docs/pictures/calibration.svg"].map(text)).toEqual(before);
    // Two seconds of work; others may be at work beside it.
  }, 120_000);

  it.each([[["--patients", "2.5"]], [["--quick", "--docs"]], [["--full"]]])(
    "%j: says how it is used, exit 2",
    (words) => {
      const { status, stderr } = run(words);
      expect({ status, stderr: stderr.trim() }).toEqual({
        status: 2,
        stderr: "usage: npm run calibrate [-- --quick | --patients N | --docs]",
      });
    },
    60_000,
  );
});
