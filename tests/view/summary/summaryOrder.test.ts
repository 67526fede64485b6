// @vitest-environment node
import { describe, expect, it } from "vitest";
import type { Case } from "../../../src/core/case/index.ts";
import type { DoseLine } from "../../../src/core/regimen/index.ts";
import { buildSummary } from "../../../src/view/summary/buildSummary.ts";
import type { SummaryOrder } from "../../../src/view/summary/summaryModel.ts";
import { orderedLine } from "../../core/case/orderedLine.ts";
import { caseOrdering, summaryCase, summaryInputOf } from "./summaryFixture.ts";

/** The order as it is read: products, instruction and sentences of each line, then the sentences of the whole. NBSP read as space. */
function orderText(value: Case): readonly string[] {
  const { order } = buildSummary(summaryInputOf(value));
  return order ? words(order) : [];
}

function words(order: SummaryOrder): readonly string[] {
  return [
    ...order.lines.flatMap(({ products, instruction, sentences }) => [...products, instruction, ...sentences]),
    ...order.sentences,
  ].map((text) => text.replaceAll("\u00a0", " "));
}

const solution = (amount: DoseLine["amount"]): DoseLine => orderedLine({ product: "solution", amount });

const CASES: readonly (readonly [name: string, value: Case, expected: readonly string[]])[] = [
  [
    "every 12 hours",
    summaryCase(),
    [
      "Theophylline 300 mg 12-hour modified-release tablet",
      "1 tablet by mouth every 12 hours, at 08:00 and 20:00",
      "First dose Wednesday 4 March 2026 at 20:00.",
      "No end date: until reviewed.",
      "Swallow whole.",
      "Replaces 200 mg every 12 hours.",
      "300 mg per dose, 600 mg per day, 10.3 mg per kg per day.",
    ],
  ],
  [
    "a counted course, two tablets",
    caseOrdering([
      orderedLine({ amount: { value: 400, unit: "mg" }, repeat: { every: { value: 24, unit: "h" }, count: 10 } }),
    ]),
    [
      "Theophylline 200 mg 12-hour modified-release tablet",
      "2 tablets by mouth every 24 hours, at 20:00",
      "First dose Wednesday 4 March 2026 at 20:00.",
      "10 doses, the last Friday 13 March 2026 at 20:00.",
      "Swallow whole.",
      "Replaces 200 mg every 12 hours.",
      "400 mg per dose, 400 mg per day, 6.9 mg per kg per day.",
    ],
  ],
  [
    "an interval that does not divide the day",
    caseOrdering([orderedLine({ repeat: { every: { value: 36, unit: "h" } } })]),
    [
      "Theophylline 300 mg 12-hour modified-release tablet",
      "1 tablet by mouth every 36 hours",
      "First dose Wednesday 4 March 2026 at 20:00.",
      "No end date: until reviewed.",
      "Swallow whole.",
      "Replaces 200 mg every 12 hours.",
      "300 mg per dose, on average 200 mg per day, 3.45 mg per kg per day.",
    ],
  ],
  [
    "unequal clock doses, one line each",
    caseOrdering([
      orderedLine({ id: "a", amount: { value: 200, unit: "mg" }, repeat: { clock: ["08:00"] } }),
      orderedLine({ id: "b", repeat: { clock: ["22:00"] } }),
    ]),
    [
      "Theophylline 200 mg 12-hour modified-release tablet",
      "1 tablet by mouth every day at 08:00",
      "200 mg per dose.",
      "First dose Thursday 5 March 2026 at 08:00.",
      "No end date: until reviewed.",
      "Swallow whole.",
      "Theophylline 300 mg 12-hour modified-release tablet",
      "1 tablet by mouth every day at 22:00",
      "300 mg per dose.",
      "First dose Wednesday 4 March 2026 at 22:00.",
      "No end date: until reviewed.",
      "Swallow whole.",
      "Replaces 200 mg every 12 hours.",
      "Together 500 mg per day, 8.62 mg per kg per day.",
    ],
  ],
  [
    "one amount at several clock times",
    caseOrdering([orderedLine({ repeat: { clock: ["22:00", "06:00", "14:00"], days: 7 } })]),
    [
      "Theophylline 300 mg 12-hour modified-release tablet",
      "1 tablet by mouth at each of 06:00, 14:00 and 22:00, every day",
      "First dose Wednesday 4 March 2026 at 22:00.",
      "19 doses, the last Tuesday 10 March 2026 at 22:00.",
      "Swallow whole.",
      "Replaces 200 mg every 12 hours.",
      "300 mg per dose, 900 mg per day, 15.5 mg per kg per day.",
    ],
  ],
  [
    "once",
    caseOrdering(
      [{ id: "a", product: "tablet", amount: { value: 250, unit: "mg" }, start: "2026-03-04T20:00:00+00:00" }],
      {
        given: [],
      },
    ),
    [
      "Theophylline 250 mg immediate-release tablet",
      "1 tablet by mouth once",
      "One dose, Wednesday 4 March 2026 at 20:00.",
      "No dose is recorded as given before.",
      "250 mg per dose.",
    ],
  ],
  [
    "two strengths in one dose",
    caseOrdering([orderedLine({ amount: { value: 500, unit: "mg" } })]),
    [
      "Theophylline 300 mg 12-hour modified-release tablet",
      "Theophylline 200 mg 12-hour modified-release tablet",
      "1 tablet of 300 mg and 1 tablet of 200 mg, taken together, by mouth every 12 hours, at 08:00 and 20:00",
      "First dose Wednesday 4 March 2026 at 20:00.",
      "No end date: until reviewed.",
      "Swallow whole.",
      "Replaces 200 mg every 12 hours.",
      "500 mg per dose, 1,000 mg per day, 17.2 mg per kg per day.",
    ],
  ],
  [
    "a liquid ordered in mg",
    caseOrdering([solution({ value: 300, unit: "mg" })]),
    [
      "Theophylline oral solution 80 mg in 15 mL",
      "56.25 mL (300 mg) by mouth every 12 hours, at 08:00 and 20:00",
      "First dose Wednesday 4 March 2026 at 20:00.",
      "No end date: until reviewed.",
      "Measure with an oral syringe marked in mL only.",
      "Replaces 12-hour modified-release tablet, 200 mg every 12 hours.",
      "300 mg per dose, 600 mg per day, 10.3 mg per kg per day.",
    ],
  ],
  [
    "a liquid ordered in mL",
    caseOrdering([solution({ value: 30, unit: "mL" })]),
    [
      "Theophylline oral solution 80 mg in 15 mL",
      "30 mL (160 mg) by mouth every 12 hours, at 08:00 and 20:00",
      "First dose Wednesday 4 March 2026 at 20:00.",
      "No end date: until reviewed.",
      "Measure with an oral syringe marked in mL only.",
      "Replaces 12-hour modified-release tablet, 200 mg every 12 hours.",
      "160 mg per dose, 320 mg per day, 5.52 mg per kg per day.",
    ],
  ],
];

describe("the chosen option in plain sentences", () => {
  it.each(CASES)("%s", (_, value, expected) => {
    expect(orderText(value)).toEqual(expected);
  });

  it("names the weekdays, and calls the daily amount an average", () => {
    const on = (clock: string[], weekdays: number[]) =>
      orderText(caseOrdering([orderedLine({ repeat: { clock, weekdays } })]));
    const text = on(["08:00"], [1, 3, 5]);
    expect(text).toContain("1 tablet by mouth on Monday, Wednesday and Friday at 08:00");
    expect(text).toContain("First dose Friday 6 March 2026 at 08:00.");
    // 3 of 300 mg in seven days: 128.57 mg per day, for 58 kg 2.2167.
    expect(text.at(-1)).toBe("300 mg per dose, on average 128.6 mg per day, 2.22 mg per kg per day.");
    expect(on(["08:00", "20:00"], [2])).toContain("1 tablet by mouth on Tuesday, at each of 08:00 and 20:00");
  });

  it("a regimen on other weekdays is not the same, and runs on over the gap between two of them", () => {
    // Now is Wednesday 4 March 12:00; the last dose was on Monday.
    const given = [
      {
        ...orderedLine(),
        id: "g",
        start: "2026-02-23T08:00:00+00:00",
        repeat: { clock: ["08:00"], days: 8, weekdays: [1, 5] },
      },
    ];
    const to = (weekdays: number[]) =>
      orderText(caseOrdering([orderedLine({ repeat: { clock: ["08:00"], weekdays } })], { given }));
    expect(to([1, 5])).toContain("Continues 300 mg on Monday and Friday at 08:00, unchanged.");
    expect(to([1, 4])).toContain("Replaces 300 mg on Monday and Friday at 08:00.");
  });

  it("writes halves in words", () => {
    const instruction = (mg: number) =>
      orderText(
        caseOrdering(
          [orderedLine({ product: "tablet", amount: { value: mg, unit: "mg" } })],
          { given: [] },
          "demoxiline",
        ),
      ).find((text) => text.includes("by mouth"));
    expect(instruction(25)).toBe("half a tablet by mouth every 12 hours, at 08:00 and 20:00");
    expect(instruction(300)).toBe(
      "1 tablet of 200 mg and 1 tablet of 100 mg, taken together, by mouth every 12 hours, at 08:00 and 20:00",
    );
    expect(instruction(125)).toBe(
      "1 tablet of 100 mg and half a tablet of 50 mg, taken together, by mouth every 12 hours, at 08:00 and 20:00",
    );
  });

  it("says plainly what can't be made from the strengths, across the sheet, and prints no tablet count", () => {
    const value = caseOrdering([orderedLine({ amount: { value: 130, unit: "mg" } })]);
    expect(orderText(value).slice(0, 2)).toEqual([
      "Theophylline 12-hour modified-release tablet",
      "130 mg by mouth every 12 hours, at 08:00 and 20:00",
    ]);
    const { banners, concerns } = buildSummary(summaryInputOf(value));
    expect(banners[0]).toEqual({
      gravity: "stop",
      title: "Cannot be given as written",
      text: "From whole tablets of 100 mg, 200 mg, 300 mg or 450 mg, 130 mg cannot be made.".replace(
        /(\d) mg/g,
        "$1\u00a0mg",
      ),
    });
    expect(concerns.filter(({ title }) => title.includes("made from"))).toEqual([]);
  });

  it("names doses that do not go as the line says", () => {
    const line = orderedLine({
      except: [
        { index: 1, status: "missed" },
        { index: 2, status: "moved", at: "2026-03-05T22:00:00+00:00" },
        { index: 3, status: "moved", at: "2026-03-06T08:00:00+00:00", amount: { value: 200, unit: "mg" } },
      ],
    });
    const text = orderText(caseOrdering([line]));
    expect(text).toContain("The dose of Thu 5 March, 08:00 is left out.");
    expect(text).toContain("The dose of Thu 5 March, 20:00 is given on Thu 5 March, 22:00 instead.");
    expect(text).toContain("The dose of Fri 6 March, 08:00 is 1 tablet of 200 mg instead.");
    expect(text).toContain("Theophylline 200 mg 12-hour modified-release tablet");
  });

  it("leaves doses before the now line out of the order and says so", () => {
    const text = orderText(caseOrdering([orderedLine({ start: "2026-03-04T08:00:00+00:00" })]));
    expect(text).toContain("First dose Wednesday 4 March 2026 at 20:00.");
    expect(text).toContain("1 dose before the now line is not part of this order.");
  });

  it("says that a regimen goes on unchanged", () => {
    expect(orderText(caseOrdering([orderedLine({ amount: { value: 200, unit: "mg" } })]))).toContain(
      "Continues 200 mg every 12 hours, unchanged.",
    );
  });

  /** What the order says of the regimen before it, and the details beside it. */
  const replaced = (given: Case["given"], now = "2026-03-04T12:00:00+00:00", ordered = orderedLine()) => {
    const { order, details } = buildSummary(summaryInputOf(caseOrdering([ordered], { given, now, levels: [] })));
    const row = details.elements.find(({ label }) => label === "Regimen before");
    return [order?.sentences[0], row?.value].map((text) => text?.replaceAll("\u00a0", " "));
  };
  const ended = (count: number, change: Partial<DoseLine> = {}) =>
    orderedLine({
      id: "g",
      start: "2026-03-01T08:00:00+00:00",
      repeat: { every: { value: 12, unit: "h" }, count },
      ...change,
    });

  it("a dose held for the level: the regimen is still the one replaced, and its last dose is named", () => {
    // Six doses: the last on Tuesday at 20:00, the next would be due on Wednesday at 08:00.
    const held = "300 mg every 12 hours (last dose Tue 3 March, 20:00)";
    expect(replaced([ended(6)], "2026-03-04T09:00:00+00:00")).toEqual([`Continues ${held}, unchanged.`, held]);
    expect(replaced([ended(6, { amount: { value: 200, unit: "mg" } })], "2026-03-04T19:59:00+00:00")[0]).toBe(
      "Replaces 200 mg every 12 hours (last dose Tue 3 March, 20:00).",
    );
    // Due right now is not yet held.
    expect(replaced([ended(6)], "2026-03-04T08:00:00+00:00")[0]).toBe("Continues 300 mg every 12 hours, unchanged.");
    // A line without an end whose last dose is marked missed.
    const missed = orderedLine({
      id: "g",
      start: "2026-03-03T08:00:00+00:00",
      amount: { value: 200, unit: "mg" },
      except: [{ index: 2, status: "missed" }],
    });
    expect(replaced([missed])[0]).toBe("Replaces 200 mg every 12 hours (last dose Tue 3 March, 20:00).");
  });

  it("by the clock and on weekdays the longest gap counts twice", () => {
    const daily = (days: number) => ended(0, { repeat: { clock: ["08:00", "12:00"], days } });
    // The last dose on Monday at 12:00; the longest gap is 20 hours.
    const text = "300 mg at each of 08:00 and 12:00, every day (last dose Mon 2 March, 12:00)";
    expect(replaced([daily(2)], "2026-03-04T03:59:00+00:00")[1]).toBe(text);
    expect(replaced([daily(2)], "2026-03-04T04:00:00+00:00")[1]).toBe(
      "none running; last dose 300 mg, Mon 2 March, 12:00",
    );
    // Mondays only: two weeks less a minute after the last.
    const mondays = ended(0, { repeat: { clock: ["08:00"], weekdays: [1], days: 2 } });
    expect(replaced([mondays], "2026-03-16T07:59:00+00:00")[1]).toBe(
      "300 mg on Monday at 08:00 (last dose Mon 2 March, 08:00)",
    );
    expect(replaced([mondays], "2026-03-16T08:00:00+00:00")[1]).toMatch(/^none running/);
  });

  it("what another line followed is not replaced a second time; two lines in parallel both are", () => {
    const second = orderedLine({ id: "h", start: "2026-03-03T08:00:00+00:00" });
    expect(replaced([ended(4, { amount: { value: 200, unit: "mg" } }), second], "2026-03-03T09:00:00+00:00")[0]).toBe(
      "Continues 300 mg every 12 hours, unchanged.",
    );
    const each = { repeat: { every: { value: 24, unit: "h" as const }, count: 2 } };
    const evening = ended(0, { id: "h", start: "2026-03-01T20:00:00+00:00", ...each });
    expect(replaced([ended(0, each), evening], "2026-03-03T09:00:00+00:00")[0]).toBe(
      "Replaces 300 mg every 24 hours (last dose Mon 2 March, 08:00) and 300 mg every 24 hours.",
    );
  });

  it("says that nothing was running, and the last dose, when the given doses had ended or were single", () => {
    const none = "No regimen was running at the now line; last dose";
    expect(replaced([ended(2)])).toEqual([
      `${none} 300 mg, Sun 1 March, 20:00.`,
      "none running; last dose 300 mg, Sun 1 March, 20:00",
    ]);
    expect(replaced([ended(6)], "2026-03-04T20:00:00+00:00")[0]).toBe(`${none} 300 mg, Tue 3 March, 20:00.`);
    const { repeat: _, ...single } = ended(1, { product: "tablet", start: "2026-03-04T08:00:00+00:00" });
    expect(replaced([single])[0]).toBe(`${none} immediate-release tablet, 300 mg, Wed 4 March, 08:00.`);
    const later = { ...single, start: "2026-03-04T13:00:00+00:00" };
    expect(replaced([later])).toEqual(["No regimen was running at the now line.", "not recorded"]);
  });

  it("warns when the clocks change under an elapsed-hours interval", () => {
    const value = caseOrdering(
      [orderedLine({ start: "2026-03-27T20:00:00+00:00", repeat: { every: { value: 12, unit: "h" }, count: 8 } })],
      {
        now: "2026-03-27T12:00:00+00:00",
        given: [],
        levels: [],
      },
    );
    expect(orderText(value)).toContain(
      "The clocks change: the interval stays as written in elapsed hours, so from Sunday 29 March 2026, 09:00 the dose falls at 09:00 and 21:00.",
    );
  });

  it("settles: a first week that ends is not in the daily total", () => {
    const value = caseOrdering([
      orderedLine({
        id: "a",
        amount: { value: 200, unit: "mg" },
        repeat: { every: { value: 12, unit: "h" }, count: 6 },
      }),
      orderedLine({ id: "b", start: "2026-03-07T20:00:00+00:00" }),
    ]);
    expect(orderText(value).at(-1)).toBe("Settles at 600 mg per day, 10.3 mg per kg per day.");
  });

  it("prints no order without a chosen option, with two, or with an empty one", () => {
    const option = { id: "A", label: "", lines: [orderedLine()], chosen: true };
    const without = (options: Case["options"]) => buildSummary(summaryInputOf(summaryCase({ options })));
    for (const [options, title] of [
      [[], "No option is chosen, so there is no order to print. Choose one on the bench."],
      [[option, { ...option, id: "B" }], "More than one option is chosen (A, B). Choose one on the bench."],
      [[{ ...option, lines: [] }], "The chosen option A has no dose line. Add one on the bench."],
    ] as const) {
      const model = without(options as unknown as Case["options"]);
      expect(model.order).toBeNull();
      expect(model.banners[0]).toEqual({ gravity: "stop", title: "Not for use", text: title });
      expect(model.marks).toContain("Not for use");
    }
  });
});
