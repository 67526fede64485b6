import { spawnSync } from "node:child_process";
import { accessSync, constants, existsSync, readFileSync } from "node:fs";
import { delimiter, join } from "node:path";
import { fileURLToPath } from "node:url";

export const PROJECT = fileURLToPath(new URL("..", import.meta.url)).replace(/[\\/]$/, "");

/** A sentence for the person at the terminal; no stack. */
export class SetupFault extends Error {}

/** The packages named in `engines` of package.json run from this version on. */
const LOWEST_NODE = [20, 19];

export function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split(".").map(Number);
  const [lowMajor = 0, lowMinor = 0] = LOWEST_NODE;
  if (major > lowMajor || (major === lowMajor && minor >= lowMinor)) return;
  throw new SetupFault(
    `Ebbline needs Node ${LOWEST_NODE.join(".")} or newer; this is Node ${process.versions.node}. Install a newer one from https://nodejs.org and try again.`,
  );
}

/** Installs the npm packages unless exactly those of package-lock.json are there already. */
export function ensurePackages() {
  if (arePackagesCurrent()) return;
  console.error("Installing the npm packages named in package-lock.json ...");
  // Output to stderr: stdout belongs to what the command was asked for.
  const { status, error } = spawnSync("npm", ["ci", "--no-audit", "--no-fund"], {
    cwd: PROJECT,
    stdio: ["ignore", 2, 2],
    shell: process.platform === "win32",
  });
  if (error) throw new SetupFault(`npm could not be started (${error.message}). It comes with Node.`);
  if (status !== 0) throw new SetupFault("npm ci failed, see above. It needs the network once.");
}

/** Whether exactly the packages of package-lock.json are installed: compared entry by entry, as dates of files tell nothing after a clone. */
export function arePackagesCurrent(project = PROJECT) {
  const wanted = readPackages(join(project, "package-lock.json"));
  const installed = readPackages(join(project, "node_modules", ".package-lock.json"));
  if (!wanted) throw new SetupFault("package-lock.json is missing or not readable.");
  if (!installed) return false;
  for (const [path, entry] of Object.entries(wanted)) {
    if (path === "") continue;
    const found = installed[path];
    // An optional package is there or not by platform.
    if (!found && !entry.optional && !entry.devOptional) return false;
    if (found && found.version !== entry.version) return false;
    if (found && !existsSync(join(project, path))) return false;
  }
  return Object.keys(installed).every((path) => path in wanted);
}

/**
 * @param {string} file
 * @returns {Record<string, { version?: string, optional?: boolean, devOptional?: boolean }> | undefined}
 */
function readPackages(file) {
  try {
    return JSON.parse(readFileSync(file, "utf8")).packages;
  } catch {
    return undefined;
  }
}

const BROWSERS = ["chromium", "chromium-browser", "google-chrome", "google-chrome-stable"];
const PDF_TOOLS = ["pdftotext", "pdftoppm"];

/** What the browser tests need beside npm: a Chromium, and poppler's two tools to read a printed sheet. */
export function ensureBrowserTools() {
  let missing = missingSystemPackages();
  if (missing.length === 0) return;
  const isRoot = process.getuid?.() === 0;
  if (isRoot && findProgram(["apt-get"])) {
    console.error(`Installing ${missing.join(" and ")} with apt-get ...`);
    aptGet(["update"]);
    aptGet(["install", "-y", "--no-install-recommends", ...missing]);
    missing = missingSystemPackages();
    if (missing.length === 0) return;
  }
  throw new SetupFault(
    `The browser tests need ${missing.join(" and ")}. On Debian or Ubuntu: sudo apt-get install ${missing.join(" ")}. ` +
      `Elsewhere: Chromium or Google Chrome on the PATH under one of the names ${BROWSERS.join(", ")}, and poppler's ${PDF_TOOLS.join(" and ")}.`,
  );
}

function missingSystemPackages() {
  const missing = [];
  if (!findBrowser()) missing.push("chromium");
  if (PDF_TOOLS.some((tool) => !findProgram([tool]))) missing.push("poppler-utils");
  return missing;
}

/** @param {string[]} words */
function aptGet(words) {
  const env = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  const { status } = spawnSync("apt-get", ["-q", ...words], { stdio: ["ignore", 2, 2], env });
  if (status !== 0) throw new SetupFault(`apt-get ${words.join(" ")} failed, see above.`);
}

/** The first Chromium on the PATH, or undefined. */
export function findBrowser() {
  return findProgram(BROWSERS);
}

/**
 * The full name of the first of `names` found on the PATH, or undefined.
 * @param {readonly string[]} names
 */
export function findProgram(names) {
  const endings = process.platform === "win32" ? [".exe", ".cmd", ""] : [""];
  const folders = (process.env.PATH ?? "").split(delimiter).filter((folder) => folder !== "");
  for (const name of names) {
    for (const folder of folders) {
      for (const ending of endings) {
        const file = join(folder, name + ending);
        if (isExecutable(file)) return file;
      }
    }
  }
  return undefined;
}

/** @param {string} file */
function isExecutable(file) {
  try {
    accessSync(file, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/**
 * Runs a command of this folder: a SetupFault is told in one sentence, anything else is a defect and keeps its stack.
 * @param {() => Promise<void>} command
 */
export async function runCommand(command) {
  try {
    await command();
  } catch (fault) {
    if (!(fault instanceof SetupFault)) throw fault;
    console.error(fault.message);
    process.exitCode = 1;
  }
}
