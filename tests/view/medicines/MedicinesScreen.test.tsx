import { fireEvent, screen, waitFor, within } from "@testing-library/react";
import { describe, expect, test } from "vitest";
import { BUILT_IN_RECORDS, medicineRead, recordById, recordFigures } from "../../../src/core/medicine/index.ts";
import {
  issueMessage,
  medicinesWords,
  recordWords,
  windowQuantityWord,
  windowWords,
} from "../../../src/core/messages/index.ts";
import { MedicinesScreen } from "../../../src/view/medicines/MedicinesScreen.tsx";
import { NoticeStack } from "../../../src/view/NoticeStack.tsx";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";

// Pages and tables are large for a simulated browser: found by text; axe looks at them in the real one.

const own = { ...recordById("demoxiline")!, id: "own-demoxiline", name: "own demoxiline (invented)" };
const FILE = "own.ebbline-medicine.json";
const file = (text: string) => new File([text], FILE, { type: "application/json" });
const picker = () => document.querySelector<HTMLInputElement>('input[type="file"]')!;
const choices = () => [...document.querySelectorAll<HTMLButtonElement>(".record-list-choice")];
const choose = (name: string) =>
  fireEvent.click(choices().find((each) => each.querySelector("strong")?.textContent === name)!);
const button = (name: string) => screen.getByText(name, { selector: "button, button *" }).closest("button")!;
const page = () => document.querySelector<HTMLElement>(".record-page")!;
const heading = (name: string) => screen.findByText(name, { selector: "h2" });

describe("the list", () => {
  test("says of each record how far it can be trusted, and finds by name, product or interacting medicine", async () => {
    await renderWorkbench(<MedicinesScreen />);
    expect(choices()).toHaveLength(BUILT_IN_RECORDS.length);
    const saying = (words: string) => choices().filter((each) => each.textContent?.includes(words)).length;
    expect(saying(recordWords.notReviewed)).toBe(BUILT_IN_RECORDS.length);
    const pieced = BUILT_IN_RECORDS.filter(({ estimates }) => estimates.from === "pieced-together").length;
    expect(saying(recordWords.piecedTogether)).toBe(pieced);
    const search = screen.getByLabelText(recordWords.search);
    fireEvent.change(search, { target: { value: "Phenytoin" } });
    const found = BUILT_IN_RECORDS.filter(
      ({ name, interactions, products }) =>
        name.includes("phenytoin") ||
        products.some((each) => each.name.includes("phenytoin")) ||
        interactions.some(({ medicine }) => medicine.includes("phenytoin")),
    ).length;
    expect(choices()).toHaveLength(found);
    expect(screen.getByText(recordWords.found(found, BUILT_IN_RECORDS.length))).toBeVisible();
    fireEvent.change(search, { target: { value: "zzz" } });
    expect(screen.getByText(recordWords.foundNone)).toBeVisible();
  });

  test("keeps the user's own apart", async () => {
    const { user } = await renderWorkbench(<MedicinesScreen />);
    expect(screen.getByText(recordWords.listOwnNone)).toBeVisible();
    await user.upload(picker(), file(JSON.stringify(own)));
    await heading(own.name);
    const group = screen.getByText(recordWords.listOwn, { selector: "h2" }).parentElement!;
    expect([...group.querySelectorAll(".record-list-choice strong")].map((each) => each.textContent)).toEqual([
      own.name,
    ]);
  });
});

describe("a record's page", () => {
  test("of every record: each figure and statement stands with its source and basis", async () => {
    await renderWorkbench(<MedicinesScreen />);
    for (const record of BUILT_IN_RECORDS) {
      choose(record.name);
      const provenance = [...page().querySelectorAll(".record-page-provenance")].map((one) => one.textContent ?? "");
      for (const line of provenance) {
        expect(line).toMatch(/\[[1-9]\d*\]/);
        expect(Object.values(recordWords.bases).some((basis) => line.includes(basis))).toBe(true);
      }
      const { cautions, doseLimits, sampling, autoinduction, interactions, windows } = record;
      // Population and estimates are statements of every record.
      const statements = cautions.length + doseLimits.length + sampling.length + (autoinduction ? 1 : 0) + 2;
      // An onset stands on the line of its factor, the hours of drawing on that of their window.
      const joined = [
        ...interactions.map(({ onset }) => onset),
        ...windows.flatMap((each) => [each.drawFrom, each.drawTo]),
      ];
      const lines = recordFigures(record).length + statements - joined.filter((each) => each !== undefined).length;
      // Strengths known in different ways take a line each, so there can be more lines, never fewer.
      expect(provenance.length, record.id).toBeGreaterThanOrEqual(lines);
    }
  });

  test("says first what is invented, not reviewed, pieced together and from memory; and windows by mass and by amount", async () => {
    await renderWorkbench(<MedicinesScreen />);
    choose("theophylline");
    expect(page()).toHaveTextContent(recordWords.beforeReview);
    expect(page()).toHaveTextContent(/figures are from memory and unverified/);
    expect(page()).toHaveTextContent(/Pieced together from more than one study/);
    // 10 and 20 mg/L ÷ 180.17 g/mol: 55.5 and 111 micromol/L.
    expect(page()).toHaveTextContent(/10 to 20.mg\/L \(55\.5 to 111.micromol\/L\)/);
    expect(page()).toHaveTextContent(recordWords.builtInFixed);
    for (const name of [recordWords.remove, recordWords.edit]) {
      expect(screen.queryByText(name, { selector: "button, button *" })).toBeNull();
    }
    choose("demoxiline (invented)");
    expect(page()).toHaveTextContent(medicinesWords.inventedTitle);
  });
});

describe("a record's file", () => {
  test("is imported, shown, removed, and brought back by the notice on another screen", async () => {
    const { user, repository, state } = await renderWorkbench(
      <>
        <MedicinesScreen />
        <NoticeStack />
      </>,
    );
    await user.upload(picker(), file(JSON.stringify(own)));
    await screen.findByText(medicinesWords.imported(own.name, own.recordVersion));
    expect([...repository.medicines.keys()]).toEqual([own.id]);
    fireEvent.click(button(recordWords.remove));
    await screen.findByText(recordWords.undo);
    expect(state().ownMedicines).toEqual([]);
    state().show("settings");
    fireEvent.click(button(recordWords.undo));
    await waitFor(() => expect(repository.medicines.get(own.id)).toEqual(own));
    expect(state().ownMedicines).toEqual([own.id]);
  });

  test.each([
    ["with a figure without a source", JSON.stringify({ ...own, molarMass: { ...own.molarMass, source: undefined } })],
    ["with a field given twice", JSON.stringify(own).replace('"matrix":', '"name":"x","matrix":')],
    ["cut off", JSON.stringify(own).slice(0, 200)],
    ["with a formula of the wrong dimension", JSON.stringify(own).replaceAll("L/h", "L")],
  ])("%s is refused with the sentence of its fault, and nothing is stored", async (_, text) => {
    const read = medicineRead(text);
    if (read.ok) throw new Error("it was taken");
    const { user, repository } = await renderWorkbench(<MedicinesScreen />);
    await user.upload(picker(), file(text));
    const notice = (await screen.findByText(medicinesWords.refusedTitle(FILE))).closest(".notice")!;
    expect(notice).toHaveTextContent(issueMessage(read.issues[0]!));
    expect(repository.medicines.size).toBe(0);
  });
});

test("two records stand side by side: curves, readings, and only the figures that differ", async () => {
  const { user } = await renderWorkbench(<MedicinesScreen />);
  const original = recordById("theophylline")!;
  const other = {
    ...original,
    id: "other",
    name: "theophylline, other",
    copyOf: { id: original.id, recordVersion: original.recordVersion },
    steadyStateAfter: { ...original.steadyStateAfter!, value: 5 },
  };
  await user.upload(picker(), file(JSON.stringify(other)));
  await heading(other.name);
  fireEvent.click(button(recordWords.compare));
  const [readings, differences] = [...document.querySelectorAll<HTMLTableElement>("table")];
  expect([...differences!.querySelectorAll("tbody tr")].map((row) => row.textContent)).toEqual([
    expect.stringMatching(/steady state after.*3.days.*5.days/),
  ]);
  expect(document.querySelectorAll("svg path.profile-curve")).toHaveLength(2);
  expect([...readings!.querySelectorAll("thead th")].map((each) => each.textContent)).toEqual([
    recordWords.readings,
    original.name,
    other.name,
  ]);
  fireEvent.change(screen.getByLabelText(recordWords.compareFirst), { target: { value: other.id } });
  expect(screen.getByText(recordWords.compareSame)).toBeVisible();
});

test("a window of the ward's own is stored and removed", async () => {
  const { state } = await renderWorkbench(<MedicinesScreen />);
  choose("theophylline");
  fireEvent.click(button(medicinesWords.wardWindowAdd));
  const form = document.querySelector<HTMLElement>(".ward-windows-form")!;
  const fill = (name: string, value: string) =>
    fireEvent.change(within(form).getByLabelText(name), { target: { value } });
  const about = within(form).getByLabelText<HTMLSelectElement>(windowWords.about);
  const trough = [...about.options].find((each) => each.text === windowQuantityWord("trough"))!;
  fireEvent.change(about, { target: { value: trough.value } });
  fill(windowWords.low, "8");
  fill(windowWords.high, "15");
  fill(windowWords.basis, "ward policy (invented)");
  fireEvent.submit(form);
  await waitFor(() => expect(state().wardWindows).toHaveLength(1));
  expect(state().wardWindows[0]).toMatchObject({
    medicine: "theophylline",
    window: { low: { value: 8, unit: "mg/L" } },
  });
  fireEvent.click(button(medicinesWords.removeWindow));
  await waitFor(() => expect(state().wardWindows).toEqual([]));
});

test("a window of the ward's own begun again says nothing of the entry given up", async () => {
  await renderWorkbench(<MedicinesScreen />);
  choose("theophylline");
  fireEvent.click(button(medicinesWords.wardWindowAdd));
  const form = () => document.querySelector<HTMLElement>(".ward-windows-form")!;
  const told = () => form().querySelectorAll("[aria-invalid=true]").length;
  expect(told()).toBe(0);
  fireEvent.submit(form());
  expect(told()).toBeGreaterThan(0);
  fireEvent.click(button(medicinesWords.cancel));
  fireEvent.click(button(medicinesWords.wardWindowAdd));
  expect(told()).toBe(0);
});

test("a ward's window is typed in the medicine's unit, asked about in another, and may be hours after the dose", async () => {
  const { state } = await renderWorkbench(<MedicinesScreen />);
  choose("lithium");
  fireEvent.click(button(medicinesWords.wardWindowAdd));
  const form = document.querySelector<HTMLElement>(".ward-windows-form")!;
  const fill = (name: string, value: string) =>
    fireEvent.change(within(form).getByLabelText(name), { target: { value } });
  expect(within(form).getByLabelText(windowWords.unit)).toHaveValue("mmol/L");
  fill(windowWords.about, "trough");
  fill(windowWords.unit, "mg/L");
  fill(windowWords.low, "0.6");
  fill(windowWords.high, "0.9");
  fill(windowWords.drawFrom, "11");
  fill(windowWords.drawTo, "13");
  fill(windowWords.basis, "ward policy (invented)");
  fireEvent.submit(form);
  await waitFor(() => expect(form.querySelector(".field-frame-answers")).not.toBeNull());
  expect(state().wardWindows).toEqual([]);
  fireEvent.click(within(form).getAllByRole("button", { name: /mmol\/L/ })[0]!);
  await waitFor(() => expect(state().wardWindows).toHaveLength(1));
  expect(state().wardWindows[0]!.window).toEqual({
    quantity: "trough",
    low: { value: 0.6, unit: "mmol/L" },
    high: { value: 0.9, unit: "mmol/L" },
    drawFrom: { value: 11, unit: "h" },
    drawTo: { value: 13, unit: "h" },
    basis: "ward policy (invented)",
  });
  expect(screen.getByRole("rowheader", { name: /12 hours after the dose/ })).toBeVisible();
});
