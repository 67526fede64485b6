import type { Settings } from "./workbenchState.ts";

export const SETTINGS_KEY = "settings";

/** What was stored; each field that can't be read is the default, and takes no other with it: a setting is a convenience, not a record. */
export function settingsRead(stored: unknown): Settings {
  const { pageSize, microgram, preparedBy } = (typeof stored === "object" && stored !== null ? stored : {}) as Partial<
    Record<keyof Settings, unknown>
  >;
  return {
    pageSize: pageSize === "Letter" ? "Letter" : "A4",
    microgram: microgram === "mcg" ? "mcg" : "microgram",
    preparedBy: typeof preparedBy === "string" ? preparedBy : "",
  };
}
