import { screen, within } from "@testing-library/react";
import { describe, expect, test, vi } from "vitest";
import type { Factor } from "../../../src/core/case/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";
import { eventWords, issueMessage, medicinesWords } from "../../../src/core/messages/index.ts";
import { issue } from "../../../src/core/result/index.ts";
import { EventEntry } from "../../../src/view/entry/EventEntry.tsx";
import { caseFixture } from "../../core/analysis/caseFixture.ts";
import { axeFaults } from "../ui/axeFaults.ts";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";

const base = caseFixture();
const clarithromycin: Factor = {
  kind: "interacting-medicine",
  from: "2026-03-03T08:00:00+00:00",
  detail: "clarithromycin",
  effect: { clearance: 0.55, onset: { value: 2, unit: "d" } },
};
const show = (factors: Factor[] = [], change: Parameters<typeof caseFixture>[0] = {}, index?: number) =>
  renderWorkbench(<EventEntry onDone={vi.fn()} {...(index === undefined ? {} : { index })} />, {
    open: caseFixture({ patient: { ...base.patient, factors }, ...change }),
  });
type Shown = Awaited<ReturnType<typeof show>>;
const field = (name: string) => screen.getByRole<HTMLInputElement>("textbox", { name });
const fill = async (
  { user }: Shown,
  typed: Partial<Record<"name" | "from" | "to" | "clearance" | "volume" | "onset", string>>,
) => {
  await user.selectOptions(screen.getByRole("combobox", { name: eventWords.kind }), "interacting-medicine");
  for (const [key, text] of Object.entries(typed)) {
    await user.type(field(eventWords[key as "name"]), text);
  }
  await user.click(screen.getByRole("button", { name: eventWords.add }));
};
const factorsOf = (shown: Shown) => shown.value().patient.factors;
const expectRefused = (shown: Shown, name: string, sentence: string) => {
  expect(field(name)).toHaveAccessibleDescription(expect.stringContaining(sentence));
  expect(factorsOf(shown)).toEqual([]);
};

describe("EventEntry", () => {
  test("has no accessibility fault axe can see, with and without events", async () => {
    const empty = await show();
    expect(await axeFaults(empty.container)).toEqual([]);
    empty.unmount();
    const { container } = await show([clarithromycin], {}, 0);
    expect(await axeFaults(container)).toEqual([]);
  });

  test("an event is added with per cent of usual clearance and an onset; one undo step", async () => {
    const shown = await show();
    await fill(shown, { name: "clarithromycin", from: "3 March 08:00", clearance: "55", onset: "2" });
    expect(factorsOf(shown)).toEqual([clarithromycin]);
    expect(field(eventWords.name)).toHaveValue("");
    shown.state().undo();
    expect(factorsOf(shown)).toEqual([]);
  });

  test("without a figure it is an event that changes nothing", async () => {
    const shown = await show();
    await fill(shown, { name: "cold", from: "3 March 08:00", to: "4 March 08:00" });
    expect(factorsOf(shown)).toEqual([
      {
        kind: "interacting-medicine",
        from: "2026-03-03T08:00:00+00:00",
        to: "2026-03-04T08:00:00+00:00",
        detail: "cold",
      },
    ]);
  });

  test("a volume alone leaves clearance as usual, and reads back so", async () => {
    const shown = await show();
    await fill(shown, { name: "oedema", from: "3 March 08:00", volume: "120 %" });
    expect(factorsOf(shown)[0]!.effect).toEqual({ clearance: 1, volume: 1.2 });
    await shown.user.click(screen.getByRole("button", { name: `${eventWords.change} oedema` }));
    expect(field(eventWords.clearance)).toHaveValue("");
    await shown.user.click(screen.getByRole("button", { name: eventWords.save }));
    expect(factorsOf(shown)[0]!.effect).toEqual({ clearance: 1, volume: 1.2 });
  });

  test("says that the figure is the user's own", async () => {
    await show();
    expect(screen.getByText(eventWords.effectHelp)).toBeVisible();
  });

  test("an effect that starts before the first dose given is refused with the two times", async () => {
    const shown = await show();
    await fill(shown, { name: "rifampicin", from: "28 February 08:00", clearance: "150" });
    const data = { at: "Sat 28 February, 08:00", first: "Sun 1 March, 08:00" };
    expectRefused(shown, eventWords.from, issueMessage(issue("event-before-dose", data)));
    expect(field(eventWords.name)).toHaveValue("rifampicin");
  });

  test("without an effect it may have begun before the first dose", async () => {
    const shown = await show();
    await fill(shown, { name: "rifampicin", from: "28 February 08:00" });
    expect(factorsOf(shown)).toHaveLength(1);
  });

  test("with no dose given the first dose of the options counts", async () => {
    const shown = await show([], { given: [] });
    await fill(shown, { name: "rifampicin", from: "3 March 08:00", clearance: "150" });
    const data = { at: "Tue 3 March, 08:00", first: "Wed 4 March, 20:00" };
    expectRefused(shown, eventWords.from, issueMessage(issue("event-before-option", data)));
  });

  test("an end that is not after the beginning is refused", async () => {
    const shown = await show();
    await fill(shown, { name: "x", from: "3 March 08:00", to: "3 March 08:00" });
    const data = { from: "Tue 3 March, 08:00", to: "Tue 3 March, 08:00" };
    expectRefused(shown, eventWords.to, issueMessage(issue("event-ends-first", data)));
  });

  test.each([
    ["0.6", issue("event-clearance", { found: 0.6, low: 5, high: 2000 })],
    ["0", issue("event-clearance", { found: 0, low: 5, high: 2000 })],
    ["2001", issue("event-clearance", { found: 2001, low: 5, high: 2000 })],
    ["1,5", issue("number-comma", { text: "1,5", suggestion: "1.5" })],
    ["100", issue("event-no-change")],
  ])("a clearance of %s per cent is refused", async (text, fault) => {
    const shown = await show();
    await fill(shown, { name: "x", from: "3 March 08:00", clearance: text });
    expectRefused(shown, eventWords.clearance, issueMessage(fault));
  });

  test("5 and 2000 per cent are taken", async () => {
    const shown = await show();
    await fill(shown, { name: "x", from: "3 March 08:00", clearance: "5" });
    await fill(shown, { name: "y", from: "3 March 08:00", clearance: "2000" });
    expect(factorsOf(shown).map((one) => one.effect?.clearance)).toEqual([0.05, 20]);
  });

  test("a part-day onset and an onset without an effect are refused", async () => {
    const shown = await show();
    await fill(shown, { name: "x", from: "3 March 08:00", clearance: "60", onset: "1.5" });
    expectRefused(shown, eventWords.onset, issueMessage(issue("event-onset", { found: 1.5, most: 365 })));
    await shown.user.clear(field(eventWords.clearance));
    await shown.user.clear(field(eventWords.onset));
    await fill(shown, { onset: "2" });
    expectRefused(shown, eventWords.onset, issueMessage(issue("event-onset-alone")));
  });

  test("an interacting medicine needs a name, and a kind must be chosen", async () => {
    const shown = await show();
    await shown.user.click(screen.getByRole("button", { name: eventWords.add }));
    expect(screen.getByRole("combobox", { name: eventWords.kind })).toHaveAccessibleDescription(
      expect.stringContaining(issueMessage(issue("event-kind-missing"))),
    );
    await fill(shown, { from: "3 March 08:00" });
    expectRefused(shown, eventWords.name, issueMessage(issue("event-name-missing")));
  });

  test("the one pressed on the lane is changed at once, and removed with one undo step", async () => {
    const shown = await show([clarithromycin], {}, 0);
    expect(field(eventWords.clearance)).toHaveValue("55");
    await shown.user.clear(field(eventWords.clearance));
    await shown.user.type(field(eventWords.clearance), "50");
    await shown.user.click(screen.getByRole("button", { name: eventWords.save }));
    expect(factorsOf(shown)).toEqual([{ ...clarithromycin, effect: { ...clarithromycin.effect, clearance: 0.5 } }]);
    const table = screen.getByRole("table", { name: eventWords.list });
    expect(within(table).getByText("clearance 50 % of usual over 2 days")).toBeVisible();
    await shown.user.click(screen.getByRole("button", { name: `${eventWords.remove} clarithromycin` }));
    expect(factorsOf(shown)).toEqual([]);
    shown.state().undo();
    expect(factorsOf(shown)).toHaveLength(1);
  });

  test("every factor the form takes reads back to the same text and event", async () => {
    const shown = await show([clarithromycin], {}, 0);
    await shown.user.click(screen.getByRole("button", { name: eventWords.save }));
    expect(factorsOf(shown)).toEqual([clarithromycin]);
  });

  describe("an interaction of the record", () => {
    const medicine = recordById("lamotrigine")!;
    const [valproate] = medicine.interactions;
    const product = medicine.products[0]!.id;
    const lamotrigine = () =>
      show([], { medicine, given: base.given.map((line) => ({ ...line, product })), options: [] });
    const choose = async ({ user }: Shown) => {
      await user.selectOptions(screen.getByRole("combobox", { name: eventWords.kind }), "interacting-medicine");
      await user.selectOptions(screen.getByRole("combobox", { name: eventWords.interaction }), valproate!.id);
      await user.type(field(eventWords.from), "3 March 08:00");
    };
    const source = () => {
      const { title, authors, year } = medicine.sources[valproate!.factor.source]!;
      const named = [authors, title, year].filter((part) => part !== undefined).join(", ");
      return eventWords.sourceRecord("valproate", named, medicinesWords.bases[valproate!.factor.basis]).slice(0, 300);
    };

    test("fills in its factor and says where it comes from; it is kept with the event", async () => {
      const shown = await lamotrigine();
      await choose(shown);
      expect(field(eventWords.clearance)).toHaveValue("49");
      expect(screen.getByText(eventWords.sourceIs(source()))).toBeVisible();
      expect(await axeFaults(shown.container)).toEqual([]);
      await shown.user.click(screen.getByRole("button", { name: eventWords.add }));
      expect(factorsOf(shown)).toEqual([
        {
          kind: "interacting-medicine",
          from: "2026-03-03T08:00:00+00:00",
          detail: "valproate",
          effect: { clearance: 0.49, source: source() },
        },
      ]);
    });

    test("changed by hand it is the user's own figure again", async () => {
      const shown = await lamotrigine();
      await choose(shown);
      await shown.user.clear(field(eventWords.clearance));
      await shown.user.type(field(eventWords.clearance), "60");
      expect(screen.queryByText(eventWords.sourceIs(source()))).toBeNull();
      await shown.user.click(screen.getByRole("button", { name: eventWords.add }));
      expect(factorsOf(shown)[0]!.effect).toEqual({ clearance: 0.6 });
    });

    test("its source stays when only the time is changed", async () => {
      const shown = await lamotrigine();
      await choose(shown);
      await shown.user.click(screen.getByRole("button", { name: eventWords.add }));
      await shown.user.click(screen.getByRole("button", { name: `${eventWords.change} valproate` }));
      const form = within(screen.getByRole("form", { name: eventWords.save }));
      const from = form.getByRole("textbox", { name: eventWords.from });
      await shown.user.clear(from);
      await shown.user.type(from, "2 March 08:00");
      await shown.user.click(form.getByRole("button", { name: eventWords.save }));
      expect(factorsOf(shown)[0]).toMatchObject({
        from: "2026-03-02T08:00:00+00:00",
        effect: { clearance: 0.49, source: source() },
      });
    });

    test("is not offered for a meal, nor where the record has none", async () => {
      const shown = await lamotrigine();
      await shown.user.selectOptions(screen.getByRole("combobox", { name: eventWords.kind }), "meal");
      expect(screen.queryByRole("combobox", { name: eventWords.interaction })).toBeNull();
      shown.unmount();
      const { user } = await show();
      await user.selectOptions(screen.getByRole("combobox", { name: eventWords.kind }), "interacting-medicine");
      expect(screen.queryByRole("combobox", { name: eventWords.interaction })).toBeNull();
    });
  });
});
