import { vi } from "vitest";

/** Lists of zones are cut short: jsdom and axe take a minute over the four hundred a browser knows. */
export function fewTimeZones(): void {
  vi.spyOn(Intl, "supportedValuesOf").mockReturnValue(["Europe/Berlin", "Europe/Lisbon", "Europe/London"]);
}
