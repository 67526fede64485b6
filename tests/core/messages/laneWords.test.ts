import { describe, expect, it } from "vitest";
import { laneLineWords } from "../../../src/core/messages/index.ts";
import { type DoseLine, doseTextRead } from "../../../src/core/regimen/index.ts";
import { doseTextContext } from "../regimen/doseTextContext.ts";

const base: DoseLine = {
  id: "a",
  product: "mr",
  amount: { value: 300, unit: "mg" },
  start: "2026-03-06T20:00:00+00:00",
};
const words = (line: DoseLine) => laneLineWords(line, "Europe/London").replaceAll("\u00a0", " ");

describe("the words beside a lane", () => {
  it.each<[string, DoseLine]>([
    ["300 mg once at Fri 6 March 20:00", base],
    ["62.5 microgram once at Fri 6 March 20:00", { ...base, amount: { value: 62.5, unit: "ug" } }],
    [
      "300 mg every 12 h from Fri 6 March 20:00, 10 doses",
      { ...base, repeat: { every: { value: 12, unit: "h" }, count: 10 } },
    ],
    ["300 mg every 24 h from Fri 6 March 20:00", { ...base, repeat: { every: { value: 24, unit: "h" } } }],
    ["300 mg daily at 20:00 from Fri 6 March 20:00", { ...base, repeat: { clock: ["20:00"] } }],
    [
      "300 mg daily at 08:00, 14:00 and 20:00 from Fri 6 March 20:00 for 7 days",
      { ...base, repeat: { clock: ["20:00", "08:00", "14:00"], days: 7 } },
    ],
    [
      "300 mg at 08:00 and 20:00 on Mon, Wed and Fri from Fri 6 March 20:00 for 28 days",
      { ...base, repeat: { clock: ["08:00", "20:00"], days: 28, weekdays: [1, 3, 5] } },
    ],
    ["300 mg at 20:00 every Fri from Fri 6 March 20:00", { ...base, repeat: { clock: ["20:00"], weekdays: [5] } }],
  ])("%s, and typed again it is the same line", (wanted, line) => {
    expect(words(line)).toBe(wanted);
    const read = doseTextRead(words(line), doseTextContext());
    if (!read.ok) throw new Error(JSON.stringify(read.issues));
    expect(read.value.map((one) => laneLineWords(one, "Europe/London"))).toEqual([
      laneLineWords(line, "Europe/London"),
    ]);
    expect(read.value).toHaveLength(1);
    expect(read.value[0]).toMatchObject({ start: line.start });
  });

  it("say how many doses were not as planned", () => {
    const line: DoseLine = {
      ...base,
      repeat: { every: { value: 12, unit: "h" }, count: 10 },
      except: [{ index: 1, status: "missed" }],
    };
    expect(words(line)).toBe("300 mg every 12 h from Fri 6 March 20:00, 10 doses, 1 not as planned");
  });
});
