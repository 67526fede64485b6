import { existsSync, mkdtempSync, readdirSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { countPlaywright, countVitest, crashed } from "./countTests.mjs";
import { checkNode, ensureBrowserTools, ensurePackages, PROJECT, SetupFault } from "./install.mjs";
import { runStage } from "./runStage.mjs";

/** `npm test`: installs what is missing, runs every check, ends with one line `N passed, N failed`. */

/** Daylight saving on other dates, and one offset of half an hour. */
const OTHER_ZONES = ["America/St_Johns", "Europe/London"];
/** As in the configuration of the browser tests: one after the other. */
const BROWSER_PROJECTS = ["together", "alone"];
const ZONED_TESTS = ["tests/core/time", "tests/core/regimen"];

const total = { passed: 0, failed: 0, skipped: 0 };
/** @type {string[]} */
const remarks = [];
const reports = mkdtempSync(join(tmpdir(), "ebbline-test-"));

try {
  if (await setUp("packages", ensurePackages)) {
    await check(
      "types",
      tsconfigs().map((file) => ["tsc", "-p", file]),
    );
    await check("lint", [["biome", "check", "--config-path=.ci/biome.json", "."]]);
    await runVitest("unit, outside and component tests", ["unit", "outside", "component"], [], {});
    for (const zone of OTHER_ZONES)
      await runVitest(`time and regimen tests under TZ=${zone}`, ["unit"], ZONED_TESTS, { TZ: zone });
    if (await setUp("browser tools", ensureBrowserTools)) await runBrowserTests();
  }
} finally {
  rmSync(reports, { recursive: true, force: true });
}
for (const remark of remarks) console.log(remark);
if (total.skipped > 0) console.log(`${total.skipped} skipped: neither passed nor failed`);
if (total.failed > 0 || total.passed === 0) process.exitCode = 1;
console.log(`${total.passed} passed, ${total.failed} failed`);

/**
 * @param {string} name
 * @param {() => void} step
 */
async function setUp(name, step) {
  try {
    checkNode();
    step();
    return true;
  } catch (fault) {
    if (!(fault instanceof SetupFault)) throw fault;
    note(name, crashed(), fault.message);
    return false;
  }
}

/**
 * One check: passed if every one of its commands ends well.
 * @param {string} name
 * @param {string[][]} commands
 */
async function check(name, commands) {
  title(name);
  const faults = [];
  for (const words of commands) {
    const fault = await run(words, 5);
    if (fault) faults.push(`${words.join(" ")}: ${fault}`);
  }
  note(name, faults.length === 0 ? { passed: 1, failed: 0, skipped: 0 } : crashed(), faults.join("; "));
}

/**
 * @param {string} name
 * @param {string[]} projects
 * @param {string[]} folders
 * @param {NodeJS.ProcessEnv} env
 */
async function runVitest(name, projects, folders, env) {
  title(name);
  const file = join(reports, `${name}.json`.replaceAll("/", "-"));
  const words = ["vitest", "run", ...projects.flatMap((project) => ["--project", project]), ...folders];
  const fault = await run([...words, "--reporter=default", "--reporter=json", `--outputFile.json=${file}`], 10, env);
  note(name, countVitest(file, fault), fault);
}

async function runBrowserTests() {
  title("build");
  const broken = await run(["vite", "build", "--logLevel", "warn"], 5);
  if (broken) return note("build", crashed(), broken);
  for (const project of BROWSER_PROJECTS) {
    const name = `browser tests, ${project}`;
    title(name);
    const file = join(reports, `browser-${project}.json`);
    const words = ["playwright", "test", "-c", "tests/browser/playwright.config.ts", `--project=${project}`];
    const fault = await run([...words, "--reporter=list,json"], 12, { PLAYWRIGHT_JSON_OUTPUT_NAME: file });
    note(name, countPlaywright(file, fault), fault);
  }
}

/** @param {string} name */
function title(name) {
  console.log(`\n== ${name}`);
}

/**
 * @param {string} name
 * @param {import("./countTests.mjs").Tally} tally
 * @param {string | undefined} fault
 */
function note(name, tally, fault) {
  for (const kind of /** @type {const} */ (["passed", "failed", "skipped"])) total[kind] += tally[kind];
  if (tally.failed > 0) remarks.push(`FAILED ${name}${fault ? `: ${fault}` : ""}`);
}

/**
 * @param {string[]} words a program of node_modules and its arguments
 * @param {number} limitMinutes
 * @param {NodeJS.ProcessEnv} [env]
 */
function run([name = "", ...words], limitMinutes, env = {}) {
  return runStage([process.execPath, programFile(name), ...words], { cwd: PROJECT, env, limitMinutes });
}

/** @param {string} name */
function programFile(name) {
  /** @type {Record<string, string>} */
  const files = {
    biome: "@biomejs/biome/bin/biome",
    playwright: "@playwright/test/cli.js",
    tsc: "typescript/bin/tsc",
    vite: "vite/bin/vite.js",
    vitest: "vitest/vitest.mjs",
  };
  return join(PROJECT, "node_modules", files[name] ?? name);
}

/** Every tsconfig.json of the project: a new one is checked without being named here. */
function tsconfigs() {
  return [
    "tsconfig.json",
    ...readdirSync(join(PROJECT, "src"), { recursive: true, encoding: "utf8" })
      .filter((file) => /(^|[\\/])tsconfig\.json$/.test(file))
      .map((file) => join("src", file)),
  ].filter((file) => existsSync(join(PROJECT, file)));
}
