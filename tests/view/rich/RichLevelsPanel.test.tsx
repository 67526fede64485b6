import { screen, within } from "@testing-library/react";
import { describe, expect, test } from "vitest";
import type { Case } from "../../../src/core/case/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";
import { issueMessage, richWords } from "../../../src/core/messages/index.ts";
import { noncompartmental } from "../../../src/core/noncompartmental/index.ts";
import { issue } from "../../../src/core/result/index.ts";
import { numberPrint } from "../../../src/core/units/index.ts";
import { RichLevelsPanel } from "../../../src/view/rich/RichLevelsPanel.tsx";
import { asText } from "../ui/asText.ts";
import { axeFaults } from "../ui/axeFaults.ts";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";
import { levelsOf, ORAL_LEVELS, richCase } from "./richCase.ts";

const show = async (value: Case, unit: "mg/L" | "umol/L" = "mg/L") => {
  const shown = await renderWorkbench(<RichLevelsPanel unit={unit} />, { open: value });
  await screen.findByText(richWords.about);
  return shown;
};
const three = (value: number) => numberPrint(value, { significant: 3 });
const cell = (name: string) =>
  within(screen.getByRole("row", { name: new RegExp(`^${escaped(name)} \\d`) })).getAllByRole("cell")[0]!;
const escaped = (text: string) => text.replace(/[.*+?^${}()|[\]\\]/g, "\\$&");
const check = (hours: string) =>
  screen.getByRole<HTMLInputElement>("checkbox", { name: new RegExp(` at ${escaped(hours.replace(" ", "\u00a0"))}$`) });
const ticked = () => screen.getAllByRole<HTMLInputElement>("checkbox").filter((box) => box.checked).length;

const points = [
  { time: 0, value: 0 },
  ...ORAL_LEVELS.map((level, i) => ({
    time: [0.25, 0.5, 1, 2, 3.5, 5, 7, 9, 12, 24][i]!,
    value: level.quantity.value,
  })),
];
const expected = (change: Partial<Parameters<typeof noncompartmental>[1]> = {}) => {
  const found = noncompartmental(points, { dose: 200, method: "linear-up-log-down", ...change });
  if (!found.ok || found.value.kind !== "one-dose") throw new Error("no reading");
  return found.value;
};

describe("RichLevelsPanel after one dose", () => {
  test("has no accessibility fault axe can see, also while points are being changed", async () => {
    const { container, user } = await show(richCase(1, ORAL_LEVELS));
    expect(await axeFaults(container)).toEqual([]);
    await user.click(check("9 h"));
    expect(await axeFaults(container)).toEqual([]);
  });

  test("shows the figures of the core, with their units", async () => {
    await show(richCase(1, ORAL_LEVELS));
    const found = expected();
    expect(cell(richWords.names.cmax)).toHaveTextContent("9.75 mg/L");
    expect(cell(richWords.names.tmax)).toHaveTextContent("3.5 h");
    expect(cell(richWords.names.halfLife)).toHaveTextContent(`${three(found.halfLife)} h`);
    expect(cell(richWords.names.aucLinear)).toHaveTextContent(`${three(found.auc.linear)} mg·h/L up to 24 h`);
    expect(cell(richWords.names.aucInfinity)).toHaveTextContent(`${three(found.observed.auc)} mg·h/L`);
    expect(cell(richWords.names.carriedOn)).toHaveTextContent(`${three(found.observed.extrapolatedShare * 100)} %`);
    expect(cell(richWords.names.mrt)).toHaveTextContent(`${three(found.observed.mrt)} h`);
    expect(cell(richWords.names.clearance)).toHaveTextContent(`${three(found.observed.clearance)} L/h`);
    expect(cell(richWords.names.volume)).toHaveTextContent(`${three(found.observed.volume)} L`);
    expect(screen.getByText(richWords.from["nothing-before"])).toBeVisible();
    expect(ticked()).toBe(found.terminal.indices.length);
  });

  test("the picture says what it shows", async () => {
    await show(richCase(1, ORAL_LEVELS));
    const { terminal, halfLife } = expected();
    const words = richWords.chartLine(
      terminal.indices.length,
      `${three(terminal.fromTime)}\u00a0h`,
      `${three(terminal.toTime)}\u00a0h`,
      `${three(halfLife)}\u00a0h`,
    );
    const picture = screen.getByRole("img", { name: richWords.chartTitle(11, words) });
    expect(picture.querySelectorAll(".terminal-point-on")).toHaveLength(terminal.indices.length);
    expect(picture.querySelectorAll(".terminal-point")).toHaveLength(10);
    expect(screen.getByText(new RegExp(escaped(richWords.notDrawn(1))))).toBeVisible();
  });

  test("the other method gives other areas", async () => {
    const { user } = await show(richCase(1, ORAL_LEVELS));
    await user.click(screen.getByRole("radio", { name: /^linear\s?straight everywhere/ }));
    const linear = expected({ method: "linear" });
    expect(three(linear.observed.clearance)).not.toBe(three(expected().observed.clearance));
    expect(cell(richWords.names.clearance)).toHaveTextContent(`${three(linear.observed.clearance)} L/h`);
  });

  test("in the molar unit concentrations change, clearance does not", async () => {
    const value = richCase(1, ORAL_LEVELS);
    await show(value, "umol/L");
    expect(cell(richWords.names.cmax)).toHaveTextContent(`${three(9750 / value.medicine.molarMass.value)} micromol/L`);
    expect(cell(richWords.names.clearance)).toHaveTextContent(`${three(expected().observed.clearance)} L/h`);
  });

  test("shows no half-life of a medicine whose elimination saturates, and says why", async () => {
    const medicine = recordById("phenytoin")!;
    const line = { ...richCase(1, []).given[0]!, product: medicine.products[0]!.id };
    await show(richCase(1, ORAL_LEVELS, { medicine, given: [line] }));
    expect(screen.queryByText(richWords.names.halfLife)).toBeNull();
    expect(screen.getByRole("img", { name: /^Log plot/ })).not.toHaveAccessibleName(/halves/);
    expect(screen.getByText(issueMessage(issue("rich-saturates")))).toBeVisible();
    expect(screen.queryByText(richWords.names.ka)).toBeNull();
    expect(screen.queryByText(richWords.absorbed)).toBeNull();
    expect(cell(richWords.names.cmax)).toHaveTextContent("9.75 mg/L");
  });

  test("a large part carried on is pointed out", async () => {
    await show(richCase(1, ORAL_LEVELS.slice(0, 9)));
    expect(screen.getByText(/of the area was not measured but carried on, more than 20 %/)).toBeVisible();
  });

  test("a level that changes changes the figures", async () => {
    const { workbench } = await show(richCase(1, ORAL_LEVELS));
    const last = workbench.getState().open!.value.levels.at(-1)!;
    workbench.getState().edit("levelChange", { level: { ...last, quantity: { value: 2.5, unit: "mg/L" } } });
    const changed = points.map((point) => (point.time === 24 ? { ...point, value: 2.5 } : point));
    const found = noncompartmental(changed, { dose: 200, method: "linear-up-log-down" });
    expect(await screen.findByText(`${three(found.ok ? found.value.halfLife! : 0)} h`)).toBeVisible();
  });
});

describe("the user's overrule", () => {
  test("wants a reason, then the figures follow it and the reason stands beside them", async () => {
    const { user } = await show(richCase(1, ORAL_LEVELS));
    const before = cell(richWords.names.halfLife).textContent!;
    const automatic = expected().terminal.indices;
    await user.click(check("5 h"));
    expect(screen.getByText(richWords.changed)).toBeVisible();
    expect(cell(richWords.names.halfLife)).toHaveTextContent(asText(before));

    await user.click(screen.getByRole("button", { name: richWords.use }));
    const reason = screen.getByRole("textbox", { name: richWords.reason });
    expect(reason).toHaveAccessibleDescription(expect.stringContaining(issueMessage(issue("rich-reason-missing"))));
    expect(cell(richWords.names.halfLife)).toHaveTextContent(asText(before));

    await user.type(reason, "distribution still going on{Enter}");
    const indices = automatic.includes(6) ? automatic.filter((each) => each !== 6) : [6, ...automatic];
    const found = expected({ terminal: indices });
    expect(cell(richWords.names.halfLife)).toHaveTextContent(`${three(found.halfLife)} h`);
    expect(cell(richWords.names.halfLife).textContent).not.toBe(before);
    expect(screen.getByText(new RegExp(escaped(richWords.byHand("distribution still going on"))))).toBeVisible();
    expect(screen.queryByText(richWords.automatic)).toBeNull();
    expect(screen.queryByText(richWords.changed)).toBeNull();

    await user.click(screen.getByRole("button", { name: richWords.automaticAgain }));
    expect(cell(richWords.names.halfLife)).toHaveTextContent(asText(before));
    expect(screen.getByText(richWords.automatic)).toBeVisible();
  });

  test("works by keyboard", async () => {
    const { user } = await show(richCase(1, ORAL_LEVELS));
    const count = ticked();
    check("5 h").focus();
    await user.keyboard(" ");
    expect(ticked()).not.toBe(count);
  });

  test("points that make no line are refused with the reason, and the figures stay", async () => {
    const { user } = await show(richCase(1, ORAL_LEVELS));
    const before = cell(richWords.names.halfLife).textContent!;
    for (const box of screen.getAllByRole<HTMLInputElement>("checkbox")) if (box.checked) await user.click(box);
    await user.click(check("24 h"));
    await user.type(screen.getByRole("textbox", { name: richWords.reason }), "to see{Enter}");
    expect(
      screen.getByText(issueMessage(issue("nca-terminal-few", { found: 1, needed: 3, picked: true }))),
    ).toBeVisible();
    expect(cell(richWords.names.halfLife)).toHaveTextContent(asText(before));
    await user.click(screen.getByRole("button", { name: richWords.back }));
    expect(ticked()).toBe(expected().terminal.indices.length);
  });

  test("a rise at the end is refused until other points are picked with a reason", async () => {
    const levels = levelsOf([
      [1, 9],
      [3, 8],
      [6, 6],
      [9, 4],
      [12, 2],
      [14, 4],
      [16, 8],
    ]);
    const { user } = await show(richCase(1, levels));
    expect(screen.getByText(/do not fall: there is no half-life in them/)).toBeVisible();
    expect(screen.queryByRole("table", { name: richWords.figures })).toBeNull();
    expect(screen.getByRole("img", { name: new RegExp(escaped(richWords.chartNoLine)) })).toBeVisible();
    for (const hours of ["3 h", "6 h", "9 h", "12 h"]) await user.click(check(hours));
    await user.type(screen.getByRole("textbox", { name: richWords.reason }), "late samples taken after a meal{Enter}");
    expect(cell(richWords.names.halfLife)).toHaveTextContent(/ h$/);
  });
});

describe("RichLevelsPanel within an interval, and without enough", () => {
  const interval = levelsOf([
    [84, 6],
    [85, 8],
    [87, 11],
    [90, 9],
    [93, 7.5],
    [96, 6.2],
  ]);

  test("at steady state: average and clearance over the interval, nothing to infinity", async () => {
    await show(richCase(9, interval));
    const found = noncompartmental(
      [0, 1, 3, 6, 9, 12].map((time, i) => ({ time, value: interval[i]!.quantity.value })),
      { dose: 200, method: "linear-up-log-down", tau: 12 },
    );
    if (!found.ok || found.value.kind !== "interval") throw new Error("no reading");
    expect(screen.getByText(richWords.interval("12 h"))).toBeVisible();
    expect(cell(richWords.names.aucInterval)).toHaveTextContent(`${three(found.value.interval.auc)} mg·h/L in 12 h`);
    expect(cell(richWords.names.average)).toHaveTextContent(`${three(found.value.interval.average)} mg/L`);
    expect(cell(richWords.names.clearance)).toHaveTextContent(`${three(found.value.interval.clearance)} L/h`);
    expect(screen.queryByText(richWords.names.aucInfinity)).toBeNull();
    expect(screen.queryByText(richWords.absorbed)).toBeNull();
  });

  test("of two doses with enough levels one is chosen", async () => {
    const { user } = await show(
      richCase(9, [
        ...levelsOf([
          [1, 5],
          [3, 4],
          [6, 3],
          [9, 2],
        ]),
        ...interval.map((each) => ({ ...each, id: `i${each.id}` })),
      ]),
    );
    expect(screen.getByText(richWords.interval("12 h"))).toBeVisible();
    await user.selectOptions(
      screen.getByRole("combobox", { name: richWords.occasion }),
      screen.getByRole("option", { name: /the first dose: 4 levels/ }),
    );
    expect(screen.getByText(richWords.oneDose)).toBeVisible();
    expect(cell(richWords.names.cmax)).toHaveTextContent("5 mg/L");
  });

  test.each<[string, Case, string]>([
    ["no dose", richCase(1, [], { given: [] }), issueMessage(issue("rich-no-dose"))],
    [
      "three levels",
      richCase(1, ORAL_LEVELS.slice(0, 3)),
      issueMessage(issue("rich-levels-few", { found: 3, needed: 4 })),
    ],
    [
      "too early for steady state",
      richCase(
        3,
        levelsOf([
          [25, 6],
          [27, 9],
          [30, 8],
          [36, 6],
        ]),
      ),
      "regular doses had run for only 24 h before it",
    ],
  ])("says what is missing: %s", async (_, value, sentence) => {
    const { container } = await show(value);
    expect(screen.getByText(new RegExp(escaped(sentence)))).toBeVisible();
    expect(screen.getByText(richWords.needs)).toBeVisible();
    expect(screen.queryByRole("img", { name: /^Log plot/ })).toBeNull();
    expect(await axeFaults(container)).toEqual([]);
  });
});
