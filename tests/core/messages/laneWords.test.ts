import { expect, it } from "vitest";
import { laneLineWords } from "../../../src/core/messages/index.ts";

it("a line on weekdays names them in short", () => {
  const words = laneLineWords(
    {
      id: "a",
      product: "tablet",
      amount: { value: 300, unit: "mg" },
      start: "2026-03-06T08:00:00+00:00",
      repeat: { clock: ["08:00", "20:00"], days: 28, weekdays: [1, 3, 5] },
    },
    "Europe/Lisbon",
  );
  expect(words.replaceAll("\u00a0", " ")).toBe(
    "300 mg at 08:00 and 20:00 on Mon, Wed and Fri from Fri 6 March, 08:00, 28 days",
  );
});
