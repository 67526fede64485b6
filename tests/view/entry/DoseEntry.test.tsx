import { screen, within } from "@testing-library/react";
import { describe, expect, test, vi } from "vitest";
import { doseLineSentence, doseWords, issueMessage } from "../../../src/core/messages/index.ts";
import { type DoseLine, doseLineExpand } from "../../../src/core/regimen/index.ts";
import { issue } from "../../../src/core/result/index.ts";
import { DoseEntry } from "../../../src/view/entry/DoseEntry.tsx";
import { doseProductsInFull } from "../../../src/view/entry/doseProducts.ts";
import { caseFixture } from "../../core/analysis/caseFixture.ts";
import { asText } from "../ui/asText.ts";
import { axeFaults } from "../ui/axeFaults.ts";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";

const show = (change: Parameters<typeof caseFixture>[0] = {}, lane = "given") =>
  renderWorkbench(<DoseEntry lane={lane} onDone={vi.fn()} />, { open: caseFixture(change) });
const text = () => screen.getByRole<HTMLInputElement>("textbox", { name: doseWords.text });
const product = () => screen.getByRole<HTMLSelectElement>("combobox", { name: doseWords.product });

describe("typing a dose", () => {
  test("has no accessibility fault axe can see", async () => {
    const { container } = await show();
    expect(await axeFaults(container)).toEqual([]);
  });

  test("is said back in full words before it counts, and Enter adds it", async () => {
    const { user, value } = await show({ options: [{ id: "A", label: "", chosen: false, lines: [] }] }, "A");
    expect(text()).toHaveFocus();
    await user.keyboard("200 mg at 08:00 and 300 mg at 22:00 for 7 days");
    expect(
      screen.getByText(
        "300 mg of theophylline 12-hour modified-release tablet each day at 22:00, first dose Wednesday 4 March 2026 at 22:00, last Tuesday 10 March at 22:00: 7 doses.",
      ),
    ).toBeVisible();
    expect(value().options[0]?.lines).toEqual([]);
    await user.keyboard("{Enter}");
    expect(value().options[0]?.lines.map((line) => line.amount.value)).toEqual([200, 300]);
    expect(text()).toHaveValue("");
  });

  test("what can't be read is refused with the part named, and stays", async () => {
    const { user, value } = await show();
    await user.type(text(), "300 mg evry 12 h from 08:00, 10 doses{Enter}");
    expect(text()).toBeInvalid();
    expect(text()).toHaveAccessibleDescription(expect.stringContaining('"evry"'));
    expect(text()).toHaveValue("300 mg evry 12 h from 08:00, 10 doses");
    expect(value().given).toHaveLength(1);
  });

  test.each([
    "1,5 mg once at 08:00",
    "0 mg once at 08:00",
    "-5 mg once at 08:00",
    "5 mL once at 08:00",
    "once at 08:00",
  ])("%s is refused with a sentence and stays", async (typed) => {
    const { user, value } = await show();
    await user.type(text(), `${typed}{Enter}`);
    expect(text()).toBeInvalid();
    expect(text().getAttribute("aria-describedby")).not.toBeNull();
    expect(
      screen
        .getAllByRole("status")
        .map((one) => one.textContent)
        .join("").length,
    ).toBeGreaterThan(10);
    expect(text()).toHaveValue(typed);
    expect(value().given).toHaveLength(1);
  });

  test("a dose far above the record's maximum is asked about before it counts, and taken with one press", async () => {
    const { user, value } = await show({ options: [{ id: "A", label: "", chosen: false, lines: [] }] }, "A");
    await user.type(text(), "2000 mg every 12 h from 20:00{Enter}");
    const asked = () => screen.queryByText(/is far above the 600.mg that the record states as the maximum daily dose/);
    expect(asked()).toBeVisible();
    expect(text()).toHaveAccessibleDescription(expect.stringContaining("2,000\u00a0mg in one dose"));
    expect(value().options[0]?.lines).toEqual([]);
    // Typed on: the question is about what stood there.
    await user.type(text(), ", 4 doses");
    expect(asked()).toBeNull();
    await user.keyboard("{Enter}");
    await user.click(screen.getByRole("button", { name: "Yes, 2,000\u00a0mg is meant" }));
    expect(value().options[0]?.lines).toMatchObject([{ amount: { value: 2000 }, repeat: { count: 4 } }]);
    expect(asked()).toBeNull();
    expect(text()).toHaveValue("");
  });

  test("a clock time that does not exist that day is said when it is typed", async () => {
    const { user, value } = await show({
      timeZone: "Europe/London",
      now: "2026-03-30T12:00:00+01:00",
      given: [],
    });
    await user.selectOptions(product(), "tablet-12h");
    await user.type(text(), "200 mg daily at 01:30 from 28 March, 3 doses{Enter}");
    const typed: DoseLine = {
      id: "t",
      product: "tablet-12h",
      amount: { value: 200, unit: "mg" },
      start: "2026-03-28T01:30:00+00:00",
      repeat: { clock: ["01:30"], days: 3 },
    };
    const laidOut = doseLineExpand(typed, { zone: "Europe/London", untilMs: Number.POSITIVE_INFINITY });
    const [fault] = laidOut.ok ? [] : laidOut.issues;
    expect(fault?.code).toBe("dose-clock-skipped");
    const sentence = issueMessage(fault!);
    expect(text()).toHaveAccessibleDescription(expect.stringContaining(sentence));
    expect(text()).toHaveValue("200 mg daily at 01:30 from 28 March, 3 doses");
    expect(value().given).toEqual([]);
  });

  test("with several products and none used yet, one has to be chosen", async () => {
    const { user, value } = await show({ given: [], options: [] });
    expect(product()).toHaveValue("");
    await user.type(text(), "200 mg once at 08:00{Enter}");
    expect(text()).toHaveAccessibleDescription(expect.stringContaining(issueMessage(issue("dose-product-missing"))));
    await user.selectOptions(product(), "tablet");
    await user.type(text(), "{Enter}");
    expect(value().given[0]).toMatchObject({ product: "tablet", amount: { value: 200, unit: "mg" } });
  });
});

describe("editing a line", () => {
  const edit = async (change: Parameters<typeof caseFixture>[0] = {}) => {
    const shown = await show(change);
    await shown.user.click(screen.getByRole("button", { name: new RegExp(`^${doseWords.edit}:`) }));
    const form = screen.getByRole("region", { name: doseWords.editing });
    return { ...shown, form, line: () => shown.value().given[0]! };
  };

  test("opens with the focus on it and without a fault axe can see", async () => {
    const { container } = await edit();
    expect(screen.getByRole("heading", { name: doseWords.editing })).toHaveFocus();
    expect(await axeFaults(container)).toEqual([]);
  });

  test("amount, interval and number of doses each count on Enter", async () => {
    const { user, form, line, value } = await edit();
    const amount = within(form).getByRole("textbox", { name: doseWords.amount });
    await user.clear(amount);
    await user.type(amount, "300{Enter}");
    expect(line().amount).toEqual({ value: 300, unit: "mg" });
    const hours = within(form).getByRole("textbox", { name: doseWords.hours });
    await user.clear(hours);
    await user.type(hours, "8{Enter}");
    const count = within(form).getByRole("textbox", { name: doseWords.count });
    await user.clear(count);
    await user.type(count, "6{Enter}");
    expect(line().repeat).toEqual({ every: { value: 8, unit: "h" }, count: 6 });
    const sentence = doseLineSentence(line(), {
      zone: value().timeZone,
      products: doseProductsInFull(value().medicine),
    });
    expect(screen.getByText(asText(`${sentence}.`))).toBeVisible();
  });

  test("an amount far above the record's maximum counts only when it is said to be meant", async () => {
    const { user, form, line } = await edit();
    const amount = within(form).getByRole("textbox", { name: doseWords.amount });
    const before = line().amount;
    await user.clear(amount);
    await user.type(amount, "99999{Enter}");
    expect(line().amount).toEqual(before);
    await user.click(within(form).getByRole("button", { name: "Yes, 99,999\u00a0mg is meant" }));
    expect(line().amount).toEqual({ value: 99_999, unit: "mg" });
  });

  test("so does an interval that makes a day of it far above", async () => {
    const [given] = caseFixture().given;
    const endless = { ...given!, repeat: { every: { value: 12, unit: "h" as const } } };
    const { user, form, line } = await edit({ given: [endless] });
    const hours = within(form).getByRole("textbox", { name: doseWords.hours });
    await user.clear(hours);
    await user.type(hours, "2{Enter}");
    expect(line().repeat).toEqual(endless.repeat);
    // 12 doses of 200 mg.
    await user.click(within(form).getByRole("button", { name: "Yes, 2,400\u00a0mg is meant" }));
    expect(line().repeat).toEqual({ every: { value: 2, unit: "h" } });
  });

  test("an amount of 0, an interval of 0 and half a dose are refused beside their fields", async () => {
    const { user, form, line } = await edit();
    const before = line();
    for (const [name, typed] of [
      [doseWords.amount, "0"],
      [doseWords.hours, "0"],
      [doseWords.count, "2.5"],
    ] as const) {
      const field = within(form).getByRole("textbox", { name });
      await user.clear(field);
      await user.type(field, `${typed}{Enter}`);
      expect(field).toBeInvalid();
      expect(field).toHaveValue(typed);
    }
    expect(line()).toEqual(before);
  });

  test("repeats at clock times instead, and once", async () => {
    const { user, form, line } = await edit();
    await user.click(within(form).getByRole("radio", { name: doseWords.clock }));
    expect(line().repeat).toEqual({ clock: ["08:00"] });
    const clock = within(form).getByRole("textbox", { name: doseWords.clockTimes });
    await user.clear(clock);
    await user.type(clock, "8:00, 22:00{Enter}");
    expect(line().repeat).toEqual({ clock: ["08:00", "22:00"] });
    await user.clear(clock);
    await user.type(clock, "08:00, 25:00{Enter}");
    expect(clock).toHaveAccessibleDescription(
      expect.stringContaining(issueMessage(issue("dose-clock-list", { part: "08:00, 25:00" }))),
    );
    expect(line().repeat).toEqual({ clock: ["08:00", "22:00"] });
    await user.click(within(form).getByRole("radio", { name: doseWords.once }));
    expect(line()).not.toHaveProperty("repeat");
  });

  test("on weekdays alone, marked one by one; none marked is every day", async () => {
    const { user, form, line } = await edit();
    await user.click(within(form).getByRole("radio", { name: doseWords.clock }));
    const days = within(form).getByRole("group", { name: doseWords.weekdays });
    expect(within(days).getAllByRole("checkbox")).toHaveLength(7);
    expect(days).toHaveAccessibleDescription(doseWords.weekdaysHelp);
    await user.click(within(days).getByRole("checkbox", { name: "Friday" }));
    await user.click(within(days).getByRole("checkbox", { name: "Monday" }));
    expect(line().repeat).toEqual({ clock: ["08:00"], weekdays: [1, 5] });
    expect(within(days).getByRole("checkbox", { name: "Monday" })).toBeChecked();
    expect(within(days).getByRole("checkbox", { name: "Tuesday" })).not.toBeChecked();
    expect(screen.getByText(/at 08:00 on Monday and Friday, first dose/)).toBeVisible();
    expect(await axeFaults(form)).toEqual([]);
    await user.click(within(days).getByRole("checkbox", { name: "Monday" }));
    await user.click(within(days).getByRole("checkbox", { name: "Friday" }));
    expect(line().repeat).toEqual({ clock: ["08:00"] });
  });

  test("weekdays of a line with marked doses are refused: the marks would come to stand at other doses", async () => {
    const repeat = { clock: ["08:00"], days: 3 };
    const given = [{ ...caseFixture().given[0]!, repeat, except: [{ index: 1, status: "missed" as const }] }];
    const { user, form, line } = await edit({ given });
    await user.click(within(form).getByRole("checkbox", { name: "Monday" }));
    expect(within(form).getByText(issueMessage(issue("dose-line-has-exceptions")))).toBeVisible();
    expect(line().repeat).toEqual(repeat);
    expect(within(form).getByRole("checkbox", { name: "Monday" })).not.toBeChecked();
  });

  test("typed anew, it takes the place of the old line and keeps its id", async () => {
    const { user, form, line } = await edit();
    const retype = within(form).getByRole("textbox", { name: doseWords.retype });
    await user.clear(retype);
    await user.type(retype, "250 mg every 8 h from 1 March 08:00, 9 doses{Enter}");
    expect(line()).toMatchObject({ id: "g", amount: { value: 250 }, repeat: { every: { value: 8 }, count: 9 } });
  });

  test("a product that can't give the amount's unit is refused", async () => {
    const given = [{ ...caseFixture().given[0]!, product: "solution", amount: { value: 15, unit: "mL" as const } }];
    const { user, form, line } = await edit({ given });
    await user.selectOptions(within(form).getByRole("combobox", { name: doseWords.product }), "tablet-12h");
    expect(within(form).getByRole("combobox", { name: doseWords.product })).toBeInvalid();
    expect(line().product).toBe("solution");
  });

  test("a dose is marked missed, taken at another time and with another amount, each one undo step", async () => {
    const { user, line, state, value } = await edit();
    const change = (nth: number) =>
      screen.getByRole("button", { name: new RegExp(`^${doseWords.change} dose ${nth},`) });
    await user.click(change(4));
    await user.click(screen.getByRole("radio", { name: doseWords.missed }));
    await user.click(screen.getByRole("button", { name: doseWords.save }));
    expect(line().except).toEqual([{ index: 3, status: "missed" }]);

    await user.click(change(2));
    await user.click(screen.getByRole("radio", { name: doseWords.otherTime }));
    const when = screen.getByRole("textbox", { name: doseWords.takenWhen });
    await user.clear(when);
    await user.type(when, "1 March 23:15");
    const amount = screen.getByRole("textbox", { name: doseWords.takenAmount });
    await user.clear(amount);
    await user.type(amount, "100");
    const steps = state().open!.undo.length;
    await user.click(screen.getByRole("button", { name: doseWords.save }));
    expect(line().except?.[0]).toEqual({
      index: 1,
      status: "late",
      at: "2026-03-01T23:15:00+00:00",
      amount: { value: 100, unit: "mg" },
    });
    expect(state().open!.undo.length).toBe(steps + 1);
    const doses = doseLineExpand(line(), { zone: value().timeZone, untilMs: Number.POSITIVE_INFINITY });
    expect(doses.ok && doses.value.map((dose) => dose.status)).toEqual([
      "taken",
      "late",
      "taken",
      "missed",
      "taken",
      "taken",
      "taken",
    ]);
  });

  test("a dose vomited or half taken is entered as the share that counts, where it was taken", async () => {
    const { user, line, state } = await edit();
    const change = (nth: number) =>
      screen.getByRole("button", { name: new RegExp(`^${doseWords.change} dose ${nth},`) });
    await user.click(change(3));
    await user.click(screen.getByRole("radio", { name: doseWords.part }));
    const share = screen.getByRole("textbox", { name: doseWords.share });
    for (const [text, fault] of [
      ["0", issue("dose-share", { found: 0 })],
      ["100", issue("dose-share", { found: 100 })],
      ["1,5", issue("number-comma", { text: "1,5", suggestion: "1.5" })],
    ] as const) {
      await user.clear(share);
      await user.type(share, `${text}{Enter}`);
      expect(share).toHaveAccessibleDescription(expect.stringContaining(issueMessage(fault)));
      expect(line()).not.toHaveProperty("except");
    }
    await user.clear(share);
    const steps = state().open!.undo.length;
    await user.type(share, "50{Enter}");
    expect(line().except).toEqual([
      { index: 2, status: "moved", at: "2026-03-02T08:00:00+00:00", amount: { value: 100, unit: "mg" } },
    ]);
    expect(state().open!.undo.length).toBe(steps + 1);
  });

  test("fewer doses than a mark needs is refused, and so is another kind of repeat; no mark is dropped", async () => {
    const given = [{ ...caseFixture().given[0]!, except: [{ index: 5, status: "missed" as const }] }];
    const { user, form, line } = await edit({ given });
    const count = within(form).getByRole("textbox", { name: doseWords.count });
    await user.clear(count);
    await user.type(count, "4{Enter}");
    expect(count).toHaveAccessibleDescription(
      expect.stringContaining(issueMessage(issue("dose-exception-beyond", { dose: 6, doses: 4 }))),
    );
    await user.click(within(form).getByRole("radio", { name: doseWords.clock }));
    expect(within(form).getByText(issueMessage(issue("dose-line-has-exceptions")))).toBeVisible();
    expect(line()).toEqual(given[0]);
  });

  test("a dose can't have been taken after the now line", async () => {
    const { user, line } = await edit();
    await user.click(screen.getByRole("button", { name: new RegExp(`^${doseWords.change} dose 7,`) }));
    await user.click(screen.getByRole("radio", { name: doseWords.otherTime }));
    const when = screen.getByRole("textbox", { name: doseWords.takenWhen });
    await user.clear(when);
    await user.type(when, "4 March 13:00{Enter}");
    expect(when).toBeInvalid();
    expect(line()).not.toHaveProperty("except");
  });

  test("removing takes the whole line, and undo brings it back", async () => {
    const { user, value, state } = await edit();
    await user.click(screen.getByRole("button", { name: new RegExp(`^${doseWords.remove}:`) }));
    expect(value().given).toEqual([]);
    expect(screen.getByText(doseWords.none)).toBeVisible();
    const { act } = await import("@testing-library/react");
    act(() => state().undo());
    expect(value().given).toHaveLength(1);
  });
});
