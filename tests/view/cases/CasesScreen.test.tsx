import { fireEvent, screen, waitFor, within } from "@testing-library/react";
import { beforeEach, describe, expect, test } from "vitest";
import demo from "../../../demo-data/adjustment.ebbline.json";
import { casePrint } from "../../../src/core/case/index.ts";
import { bootWords, casesWords, INTENDED_USE, issueMessage } from "../../../src/core/messages/index.ts";
import { CasesScreen } from "../../../src/view/cases/CasesScreen.tsx";
import { caseFixture } from "../../core/analysis/caseFixture.ts";
import { MemoryRepository } from "../../shell/store/memoryRepository.ts";
import { axeFaults } from "../ui/axeFaults.ts";
import { fewTimeZones } from "../ui/fewTimeZones.ts";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";

const stored = () => {
  const repository = new MemoryRepository();
  repository.store(caseFixture({ id: "a", label: "Harbour ward 1" }));
  repository.store(caseFixture({ id: "b", label: "Harbour ward 2", demo: true }));
  return repository;
};
const file = (name: string, text: string) => new File([text], name, { type: "application/json" });
const picker = () => document.querySelector<HTMLInputElement>('input[type="file"]')!;

beforeEach(fewTimeZones);

describe("the empty screen", () => {
  test("offers the first step and the demo cases, and says what it is for", async () => {
    const { container } = await renderWorkbench(<CasesScreen />, { demos: { adjustment: demo } });
    expect(screen.getByRole("heading", { name: casesWords.newCaseFirst })).toBeVisible();
    expect(screen.getByRole("button", { name: `${casesWords.openDemo} ${demo.label}` })).toBeVisible();
    expect(screen.getByText(INTENDED_USE)).toBeVisible();
    expect(await axeFaults(container)).toEqual([]);
  });

  test("a demo opens with one click, as a marked copy", async () => {
    const { user, state } = await renderWorkbench(<CasesScreen />, { demos: { adjustment: demo } });
    await user.click(screen.getByRole("button", { name: `${casesWords.openDemo} ${demo.label}` }));
    await waitFor(() => expect(state().screen).toBe("bench"));
    expect(state().open?.value.demo).toBe(true);
    expect(state().open?.value.id).not.toBe(demo.id);
  });

  test("a case is started by keyboard alone", async () => {
    const { user, state } = await renderWorkbench(<CasesScreen />);
    screen.getByRole("textbox", { name: casesWords.label }).focus();
    await user.keyboard("Harbour ward 3, bed 12");
    await user.tab();
    expect(screen.getByRole("combobox", { name: casesWords.medicineLabel })).toHaveFocus();
    // jsdom does not open a native list by key; its choice is set as the browser would.
    await user.selectOptions(screen.getByRole("combobox", { name: casesWords.medicineLabel }), "theophylline");
    await user.selectOptions(screen.getByRole("combobox", { name: casesWords.timeZone }), "Europe/London");
    const now = screen.getByRole("textbox", { name: casesWords.now });
    await user.clear(now);
    await user.type(now, "2026-03-04 12:00{Enter}");
    await waitFor(() => expect(state().screen).toBe("bench"));
    expect(state().open?.value).toMatchObject({
      label: "Harbour ward 3, bed 12",
      timeZone: "Europe/London",
      now: "2026-03-04T12:00:00+00:00",
      medicine: { id: "theophylline" },
    });
  });

  test("no medicine is preselected, and what is missing is said without losing the rest", async () => {
    const { user, state } = await renderWorkbench(<CasesScreen />);
    const now = screen.getByRole("textbox", { name: casesWords.now });
    await user.clear(now);
    await user.type(now, "4/3/2026");
    await user.click(screen.getByRole("button", { name: casesWords.create }));
    expect(screen.getByRole("combobox", { name: casesWords.medicineLabel })).toHaveAccessibleDescription(
      casesWords.medicineMissing,
    );
    expect(screen.getByRole("textbox", { name: casesWords.label })).toBeInvalid();
    expect(now).toBeInvalid();
    expect(now).toHaveValue("4/3/2026");
    expect(state().open).toBeNull();
  });
});

describe("stored cases", () => {
  test("are listed, the last saved first, demos marked", async () => {
    const { container } = await renderWorkbench(<CasesScreen />, { repository: stored() });
    const heads = screen.getAllByRole("rowheader").map((cell) => cell.textContent);
    expect(heads).toEqual([`Harbour ward 2 ${casesWords.demoMark}`, "Harbour ward 1"]);
    expect(await axeFaults(container)).toEqual([]);
  });

  test("one is removed only after the question is answered", async () => {
    const { user, repository } = await renderWorkbench(<CasesScreen />, { repository: stored() });
    await user.click(screen.getByRole("button", { name: `${casesWords.remove} Harbour ward 1` }));
    const dialog = screen.getByRole("alertdialog");
    expect(within(dialog).getByRole("button", { name: casesWords.keep })).toHaveFocus();
    await user.keyboard("{Enter}");
    expect(repository.cases.has("a")).toBe(true);
    await user.click(screen.getByRole("button", { name: `${casesWords.remove} Harbour ward 1` }));
    await user.click(screen.getByRole("button", { name: casesWords.removeNow }));
    await waitFor(() => expect(repository.cases.has("a")).toBe(false));
    expect(screen.queryByText("Harbour ward 1")).toBeNull();
  });

  test("a good file is imported and can be opened", async () => {
    const { user, state, repository } = await renderWorkbench(<CasesScreen />, { repository: stored() });
    const text = casePrint(caseFixture({ id: "c", label: "Harbour ward 3" }));
    await user.upload(picker(), file("ward3.ebbline.json", text));
    await screen.findByText(casesWords.imported("Harbour ward 3"));
    expect(repository.cases.get("c")?.label).toBe("Harbour ward 3");
    await user.click(
      within(screen.getByText(casesWords.imported("Harbour ward 3")).parentElement!).getByRole("button"),
    );
    await waitFor(() => expect(state().open?.value.id).toBe("c"));
  });

  test("a truncated file is refused with a sentence, dropped on the page or picked, and nothing is stored", async () => {
    const { container, state, repository } = await renderWorkbench(<CasesScreen />, { repository: stored() });
    const text = casePrint(caseFixture({ id: "c" })).slice(0, 200);
    const bad = await state().importFile("cut.ebbline.json", text);
    if (bad.ok) throw new Error("a truncated file was imported");
    fireEvent.drop(container.querySelector(".file-drop-area")!, {
      dataTransfer: { types: ["Files"], files: [file("cut.ebbline.json", text)] },
    });
    await screen.findByText(casesWords.refusedTitle("cut.ebbline.json"));
    expect(screen.getByText(issueMessage(bad.issues[0]!))).toBeVisible();
    expect([...repository.cases.keys()]).toEqual(["a", "b"]);
  });
});

describe("what is said of the store", () => {
  test("lost: what was lost and what to do; accepted, the screen goes on", async () => {
    const repository = new MemoryRepository();
    repository.state = { kind: "lost", extent: "all", cases: 3, lastSavedAt: null, recoverable: 0, detail: "" };
    const { user, container } = await renderWorkbench(<CasesScreen />, { repository });
    expect(screen.getByText(bootWords.lostTitle.all)).toBeVisible();
    expect(screen.getByText(bootWords.lostWhatToDo)).toBeVisible();
    expect(screen.queryByRole("heading", { name: casesWords.newCaseFirst })).toBeNull();
    expect(await axeFaults(container)).toEqual([]);
    await user.click(screen.getByRole("button", { name: bootWords.lostAccept }));
    await screen.findByRole("heading", { name: casesWords.newCaseFirst });
    expect(repository.lossAccepted).toBe(1);
  });

  test("lost: a backup can be imported straight away", async () => {
    const repository = new MemoryRepository();
    repository.state = { kind: "lost", extent: "all", cases: 1, lastSavedAt: null, recoverable: 0, detail: "" };
    const { user } = await renderWorkbench(<CasesScreen />, { repository });
    await user.upload(picker(), file("a.ebbline.json", casePrint(caseFixture({ id: "a", label: "Harbour ward 1" }))));
    await screen.findByText(casesWords.imported("Harbour ward 1"));
    expect(repository.lossAccepted).toBe(1);
  });

  test("newer: read and export only, with the reason", async () => {
    const repository = stored();
    repository.state = { kind: "newer", found: 4, known: 1, readable: true };
    await renderWorkbench(<CasesScreen />, { repository });
    expect(screen.getByText(bootWords.newer(4, 1, true))).toBeVisible();
    expect(screen.queryByRole("heading", { name: casesWords.newCase })).toBeNull();
    for (const button of screen.queryAllByRole("button", { name: /^Remove/ })) expect(button).toBeDisabled();
  });

  test("unavailable: said, and work goes on in memory", async () => {
    const repository = new MemoryRepository();
    repository.state = { kind: "unavailable", detail: "private window" };
    await renderWorkbench(<CasesScreen />, { repository });
    expect(screen.getByText(bootWords.unavailable("private window"))).toBeVisible();
    expect(screen.getByRole("heading", { name: casesWords.newCaseFirst })).toBeVisible();
  });
});
