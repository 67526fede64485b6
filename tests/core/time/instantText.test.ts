import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { instantMs, instantRead, instantText } from "../../../src/core/time/index.ts";

describe("instantText", () => {
  const ms = instantMs("2026-03-04T07:30:00+00:00");
  it.each([
    ["clock", "07:30"],
    ["day", "Wed 4 March"],
    ["dayClock", "Wed 4 March, 07:30"],
    ["date", "Wednesday 4 March"],
    ["dateYear", "Wednesday 4 March 2026"],
    ["full", "Wednesday 4 March 2026, 07:30"],
    ["typed", "Wed 4 March 2026 07:30"],
    ["typedShort", "Wed 4 March 07:30"],
    ["isoLocal", "2026-03-04 07:30"],
  ] as const)("%s: %s", (form, text) => {
    expect(instantText(ms, "Europe/London", form)).toBe(text);
  });

  it("is on the 24-hour clock of the zone", () => {
    const evening = instantMs("2026-07-31T22:05:00+00:00");
    expect(instantText(evening, "Europe/London", "full")).toBe("Friday 31 July 2026, 23:05");
    expect(instantText(evening, "America/St_Johns", "full")).toBe("Friday 31 July 2026, 19:35");
  });

  it("adds the offset where the clock shows the time twice, and only there", () => {
    const clock = (iso: string, zone: string) => instantText(instantMs(iso), zone, "clock");
    expect(clock("2026-10-25T00:30:00+00:00", "Europe/London")).toBe("01:30 (UTC+01:00)");
    expect(clock("2026-10-25T01:30:00+00:00", "Europe/London")).toBe("01:30 (UTC+00:00)");
    expect(clock("2026-10-25T02:00:00+00:00", "Europe/London")).toBe("02:00");
    expect(clock("2026-11-01T01:30:00-03:30", "America/St_Johns")).toBe("01:30 (UTC-03:30)");
    expect(instantText(instantMs("2026-10-25T00:30:00+00:00"), "Europe/London", "day")).toBe("Sun 25 October");
  });

  it("is read back to the same minute, in forms that carry the year, whatever the zone and the season", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 60_000_000 }),
        fc.constantFrom("Europe/London", "America/St_Johns", "Australia/Lord_Howe"),
        fc.constantFrom("full", "typed", "isoLocal"),
        (minutes, zone, form) => {
          const at = Date.UTC(1990, 0, 1) + minutes * 60_000;
          const read = instantRead(instantText(at, zone, form), zone, "2026-03-04T09:00:00+00:00");
          expect(read.ok && instantMs(read.value)).toBe(at);
        },
      ),
      { seed: 20260304, numRuns: 200 },
    );
  });

  it("is read back in the hours that come twice", () => {
    for (let minute = 0; minute < 240; minute += 5) {
      const at = instantMs("2026-10-25T00:00:00+01:00") + minute * 60_000;
      const read = instantRead(instantText(at, "Europe/London", "typed"), "Europe/London", "2026-03-04T09:00:00+00:00");
      expect(read.ok && instantMs(read.value)).toBe(at);
    }
  });
});
