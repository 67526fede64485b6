import { readFileSync } from "node:fs";
import { resolve } from "node:path";
import { checkNode, ensurePackages, PROJECT, runCommand } from "./install.mjs";

/** `npm run -s recompute -- FILE`: every figure of a saved case as JSON on stdout, without a browser. Exit 2: the file's fault. */

const FILE_FAULT = 2;

await runCommand(async () => {
  const [file, ...rest] = process.argv.slice(2);
  if (file === undefined || rest.length > 0) return refuse(["usage: npm run -s recompute -- FILE.ebbline.json"]);
  const text = readText(file);
  if (text === undefined) return;
  checkNode();
  ensurePackages();
  const recompute = await loadRecompute();
  const outcome = recompute(text);
  if (!outcome.ok) return refuse(outcome.lines);
  process.stdout.write(`${JSON.stringify(outcome.output, null, 2)}\n`);
});

/** @param {string} file */
function readText(file) {
  // npm runs this in the project's folder; a relative name is meant from where the user stands.
  const here = process.env.npm_lifecycle_event === "recompute" ? process.env.INIT_CWD : undefined;
  const place = resolve(here ?? process.cwd(), file);
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(readFileSync(place));
  } catch (fault) {
    const why = fault instanceof TypeError ? "is not UTF-8 text" : `cannot be read (${errorCode(fault)})`;
    refuse([`${file}: ${why}`]);
    return undefined;
  }
}

/** @param {unknown} fault */
function errorCode(fault) {
  return fault instanceof Error && "code" in fault ? String(fault.code) : String(fault);
}

/** The same source the page is built from, through Vite, because Node 20 reads no TypeScript. */
async function loadRecompute() {
  const { runnerImport } = await import("vite");
  const { module } = await runnerImport(/** @type {string} */ (resolve(PROJECT, "src/app/recompute.ts")), {
    root: PROJECT,
    configFile: false,
    logLevel: "silent",
  });
  const { recompute } =
    /** @type {{ recompute: (text: string) => { ok: true, output: unknown } | { ok: false, lines: readonly string[] } }} */ (
      module
    );
  return recompute;
}

/** @param {readonly string[]} lines */
function refuse(lines) {
  for (const line of lines) console.error(line);
  process.exitCode = FILE_FAULT;
}
