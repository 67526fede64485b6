import { spawn } from "node:child_process";

/** The process group of the stage in progress: interrupted and overdue stages take their whole family with them. */
/** @type {import("node:child_process").ChildProcess | undefined} */
let current;

for (const signal of /** @type {const} */ (["SIGINT", "SIGTERM"])) {
  process.on(signal, () => {
    endFamily(current);
    process.exit(130);
  });
}

/**
 * Runs one command to its end; its output goes straight to the terminal.
 * @param {readonly string[]} words program and arguments
 * @param {{ cwd: string, env?: NodeJS.ProcessEnv, limitMinutes: number }} options
 * @returns {Promise<string | undefined>} what went wrong, or undefined
 */
export function runStage([program = "", ...words], { cwd, env = {}, limitMinutes }) {
  return new Promise((done) => {
    const child = spawn(program, words, {
      cwd,
      // CI: a missing snapshot fails instead of being written.
      env: { ...plainEnvironment(), CI: "1", ...env },
      stdio: ["ignore", "inherit", "inherit"],
      detached: process.platform !== "win32",
    });
    current = child;
    let overdue = false;
    // A test's own time limit cannot stop a busy loop; this can.
    const timer = setTimeout(() => {
      overdue = true;
      endFamily(child);
    }, limitMinutes * 60_000);
    const finish = (/** @type {string | undefined} */ fault) => {
      clearTimeout(timer);
      current = undefined;
      done(fault);
    };
    child.on("error", (fault) => finish(`could not be started: ${fault.message}`));
    child.on("exit", (code, signal) => {
      if (overdue) finish(`stopped after ${limitMinutes} minutes`);
      else if (signal) finish(`ended by ${signal}`);
      else finish(code === 0 ? undefined : `ended with exit code ${code}`);
    });
  });
}

/** @param {import("node:child_process").ChildProcess | undefined} child */
function endFamily(child) {
  if (child?.pid === undefined) return;
  try {
    if (process.platform === "win32") child.kill("SIGKILL");
    else process.kill(-child.pid, "SIGKILL");
  } catch {
    // Already gone.
  }
}

function plainEnvironment() {
  const { FORCE_COLOR: _, ...env } = process.env;
  return { ...env, NO_COLOR: "1" };
}
