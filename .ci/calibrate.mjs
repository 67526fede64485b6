import { spawnSync } from "node:child_process";
import { readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { checkNode, ensurePackages, PROJECT, runCommand } from "./install.mjs";

/**
 * `npm run calibrate`: simulated patients through the estimation, many thousand fits, about ten minutes. Writes
 * tests/calibration/results.json, and from it the table in docs/verification.md and docs/pictures/calibration.svg.
 * `-- --quick` (40 patients a model) and `-- --patients N` print the table and write nothing. `-- --docs` writes table and picture again
 * from the results there are.
 */

const RESULTS = join(PROJECT, "tests", "calibration", "results.json");
const PAGE = join(PROJECT, "docs", "verification.md");
const PICTURE = join(PROJECT, "docs", "pictures", "calibration.svg");
const QUICK_PATIENTS = 40;
const USAGE = "usage: npm run calibrate [-- --quick | --patients N | --docs]";

await runCommand(async () => {
  const wanted = wantedOf(process.argv.slice(2));
  if (wanted === null) {
    console.error(USAGE);
    process.exitCode = 2;
    return;
  }
  checkNode();
  ensurePackages();
  const { calibrationSection, calibrationInto } = await load("tests/calibration/calibrationPage.ts");
  if (wanted !== "docs") {
    const { calibrate, FULL_PLAN, quickPlan } = await load("tests/calibration/calibrate.ts");
    const before = process.cpuUsage();
    const found = calibrate(wanted === "full" ? FULL_PLAN : quickPlan(wanted), (/** @type {string} */ line) =>
      console.error(line),
    );
    const used = process.cpuUsage(before);
    const results = {
      date: new Date().toISOString().slice(0, 10),
      machine: `${process.platform} ${process.arch}, Node ${process.version}`,
      seconds: Math.round((used.user + used.system) / 1e6),
      ...found,
    };
    console.log(calibrationSection(results));
    if (wanted !== "full") return;
    writeFileSync(RESULTS, `${JSON.stringify(results, null, 2)}\n`);
    formatted(RESULTS);
  }
  const { calibrationPicture } = await load("tests/calibration/calibrationPicture.ts");
  const results = JSON.parse(readFileSync(RESULTS, "utf8"));
  writeFileSync(PAGE, calibrationInto(readFileSync(PAGE, "utf8"), results));
  writeFileSync(PICTURE, calibrationPicture(results));
  console.log(
    `wrote ${wanted === "docs" ? "" : "tests/calibration/results.json, "}docs/verification.md, docs/pictures/calibration.svg`,
  );
});

/**
 * @param {readonly string[]} words
 * @returns {"full" | "docs" | number | null} a number: so many patients a model, nothing written
 */
function wantedOf(words) {
  if (words.length === 0) return "full";
  if (words.length === 1 && words[0] === "--docs") return "docs";
  if (words.length === 1 && words[0] === "--quick") return QUICK_PATIENTS;
  const patients = Number(words[1]);
  return words.length === 2 && words[0] === "--patients" && Number.isInteger(patients) && patients > 0
    ? patients
    : null;
}

/**
 * The program's own source, through Vite, because Node 20 reads no TypeScript.
 * @param {string} file
 */
async function load(file) {
  const { runnerImport } = await import("vite");
  const { module } = await runnerImport(join(PROJECT, file), { root: PROJECT, configFile: false, logLevel: "silent" });
  return /** @type {Record<string, any>} */ (module);
}

/** @param {string} file */
function formatted(file) {
  const biome = join(PROJECT, "node_modules", "@biomejs", "biome", "bin", "biome");
  const words = [biome, "format", "--write", `--config-path=${join(PROJECT, ".ci", "biome.json")}`, file];
  const { status, stderr } = spawnSync(process.execPath, words, { cwd: PROJECT, encoding: "utf8" });
  if (status !== 0) throw new Error(`${file} could not be formatted: ${stderr}`);
}
