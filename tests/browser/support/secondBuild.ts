import { execFileSync } from "node:child_process";
import { existsSync } from "node:fs";
import { join } from "node:path";
import { PROJECT } from "../../../.ci/install.mjs";

/** Marks the page of the second build. */
export const SECOND_BUILD_MARK = 'meta[name="second-build"]';

/** Builds a later version of the program into `folder`. */
export function buildSecond(folder: string): string {
  const vite = join(PROJECT, "node_modules", "vite", "bin", "vite.js");
  const config = join(PROJECT, "tests", "browser", "support", "secondBuild.config.ts");
  const { NODE_ENV: _, ...env } = process.env;
  execFileSync(process.execPath, [vite, "build", "--config", config, "--outDir", folder, "--logLevel", "warn"], {
    cwd: PROJECT,
    env,
    stdio: "pipe",
  });
  if (!existsSync(join(folder, "serviceWorker.js"))) throw new Error(`no program in ${folder}`);
  return folder;
}
