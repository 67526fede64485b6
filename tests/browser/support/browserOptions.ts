import type { LaunchOptions } from "@playwright/test";
import { findBrowser } from "../../../.ci/install.mjs";

const executablePath = findBrowser();
if (!executablePath) throw new Error("No Chromium on the PATH; npm test says what to install.");

export const LAUNCH_OPTIONS: LaunchOptions = {
  executablePath,
  args: [
    "--no-sandbox",
    "--disable-gpu",
    "--disable-quic",
    "--no-first-run",
    "--disable-background-networking",
    "--disable-component-update",
    "--disable-sync",
  ],
};

export const PAGE_OPTIONS = {
  locale: "en-GB",
  timezoneId: "Europe/London",
  viewport: { width: 1440, height: 900 },
} as const;
