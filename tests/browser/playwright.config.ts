import { existsSync } from "node:fs";
import { join } from "node:path";
import { defineConfig } from "@playwright/test";
import { PROJECT } from "../../.ci/install.mjs";
import { LAUNCH_OPTIONS, PAGE_OPTIONS } from "./support/browserOptions.ts";

/** Real Chromium against the real built program, served by the server that `npm start` uses. */

if (!existsSync(join(PROJECT, "dist", "headers.json"))) {
  throw new Error('There is no built program in dist. Run "npm run browser", which builds it first, or "npm test".');
}

const ALONE = /@alone/;

export default defineConfig({
  testDir: ".",
  testMatch: "*.spec.ts",
  outputDir: join(PROJECT, "test-results"),
  // The least of this and the project's own counts.
  workers: 2,
  projects: [
    { name: "together", grepInvert: ALONE, workers: 2 },
    // What measures times, or kills the browser again and again, has the two cores to itself: the projects are run one after the other.
    { name: "alone", grep: ALONE, workers: 1 },
  ],
  fullyParallel: false,
  retries: 0,
  forbidOnly: true,
  timeout: 90_000,
  expect: { timeout: 15_000 },
  reporter: "list",
  use: {
    ...PAGE_OPTIONS,
    launchOptions: LAUNCH_OPTIONS,
    actionTimeout: 15_000,
    navigationTimeout: 30_000,
    screenshot: "only-on-failure",
  },
});
