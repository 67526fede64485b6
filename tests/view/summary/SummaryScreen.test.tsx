import { act, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { createStore } from "zustand/vanilla";
import type { Workbench } from "../../../src/shell/store/createWorkbench.ts";
import type { OpenCase, WorkbenchState } from "../../../src/shell/store/workbenchState.ts";
import { SummaryScreen } from "../../../src/view/summary/SummaryScreen.tsx";
import { WorkbenchProvider } from "../../../src/view/useWorkbench.ts";
import { summaryCase, typicalAnalysis } from "./summaryFixture.ts";

function openCase(change: Partial<OpenCase> = {}): OpenCase {
  const value = summaryCase({ demo: true });
  return {
    value,
    revision: 3,
    role: "writer",
    undo: [],
    redo: [],
    saving: { status: "saved", savedAt: Date.UTC(2026, 2, 4, 12, 3), reason: null, detail: "" },
    analysis: {
      result: typicalAnalysis(value),
      revision: 3,
      ofPreview: false,
      status: "fresh",
      failure: null,
      isFitStale: false,
      fitProgress: null,
    },
    preview: null,
    ...change,
  };
}

function show(open: OpenCase | null) {
  const go = vi.fn();
  const state = { open, settings: { pageSize: "A4", microgram: "microgram", preparedBy: "" }, show: go };
  const store = createStore<WorkbenchState>(() => state as unknown as WorkbenchState) as unknown as Workbench;
  render(
    <WorkbenchProvider store={store}>
      <SummaryScreen />
    </WorkbenchProvider>,
  );
  return { go, store };
}

const printButton = () => screen.getByRole("button", { name: "Print" });

describe("SummaryScreen", () => {
  const print = vi.fn();
  beforeEach(() => {
    window.print = print;
  });
  afterEach(() => {
    print.mockClear();
    vi.useRealTimers();
  });

  it("prints a saved and fresh case, and leads back to the bench", async () => {
    const { go } = show(openCase());
    await userEvent.click(printButton());
    expect(print).toHaveBeenCalledTimes(1);
    await userEvent.click(screen.getByRole("button", { name: "Back to the bench" }));
    expect(go).toHaveBeenCalledWith("bench");
  });

  it.each([
    [
      "unsaved",
      { saving: { status: "unsaved", savedAt: null, reason: null, detail: "" } },
      "The latest change is not on disk yet.",
    ],
    ["stale", { revision: 4 }, "The figures belong to an earlier state of the case."],
    [
      "read-only with changes",
      {
        saving: { status: "read-only", savedAt: null, reason: "other-tab", detail: "" },
        undo: [{ name: "case-label" }],
      },
      "This tab is read-only",
    ],
  ] as const)("refuses with the reason: %s", async (_, change, reason) => {
    show(openCase(change as unknown as Partial<OpenCase>));
    expect(printButton()).toBeDisabled();
    await userEvent.click(printButton());
    expect(print).not.toHaveBeenCalled();
    expect(screen.getByRole("status")).toHaveTextContent(reason);
    // The browser's own way of printing must not get round it: the sheet says so too.
    expect(document.querySelector(".summary-banner-stop")).toHaveTextContent("Not for use.");
  });

  it("takes the refusal away as soon as the case is saved", () => {
    const { store } = show(openCase({ saving: { status: "saving", savedAt: null, reason: null, detail: "" } }));
    expect(printButton()).toBeDisabled();
    act(() => store.setState({ open: openCase() }));
    expect(printButton()).toBeEnabled();
    expect(document.querySelector(".summary-banner-stop")).toBeNull();
  });

  it("stamps the sheet with the instant of printing, the browser's own printing included", () => {
    vi.useFakeTimers({ now: Date.UTC(2026, 2, 4, 12, 5), toFake: ["Date"] });
    show(openCase());
    expect(document.querySelector(".summary-when")).toHaveTextContent("Wednesday 4 March 2026, 12:05");
    vi.setSystemTime(Date.UTC(2026, 2, 4, 12, 31));
    window.dispatchEvent(new Event("beforeprint"));
    expect(document.querySelector(".summary-when")).toHaveTextContent("Wednesday 4 March 2026, 12:31");
  });

  it("hands the words of the margin to the page rules, with quotes escaped, and takes them back", () => {
    const open = openCase();
    const value = { ...open.value, label: 'Ward "3" \\ bed' };
    const { store } = show({ ...open, value });
    const margin = () => document.documentElement.style.getPropertyValue("--summary-running");
    expect(margin()).toMatch(
      /^"Ward \\"3\\" \\\\ bed · saved Wed 4 March 2026 12:03 · fingerprint [0-9a-f ]+ · demo — invented patient"$/,
    );
    act(() => store.setState({ open: null }));
    expect(margin()).toBe("");
  });

  it("says that figures are awaited while there are none", () => {
    const { analysis } = openCase();
    show(openCase({ analysis: { ...analysis, result: null, status: "running" } }));
    expect(screen.getByText("The figures are being worked out …")).toBeInTheDocument();
    expect(printButton()).toBeDisabled();
  });
});
