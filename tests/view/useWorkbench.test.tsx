import { act, render, screen } from "@testing-library/react";
import { expect, test, vi } from "vitest";
import { useWorkbench, WorkbenchProvider } from "../../src/view/useWorkbench.ts";
import { startOpen, turns } from "../shell/store/workbenchSupport.ts";

let drawn = 0;
function Label() {
  drawn += 1;
  return <p>{useWorkbench(({ open }) => open?.value.label)}</p>;
}

test("shows the part it selects, and draws again only when that part changes", async () => {
  const { workbench, state } = await startOpen("one");
  drawn = 0;
  render(
    <WorkbenchProvider store={workbench}>
      <Label />
    </WorkbenchProvider>,
  );
  expect(screen.getByText("one")).toBeInTheDocument();
  await act(async () => {
    state().edit("notesSet", { notes: "n" });
    await turns();
  });
  expect(drawn).toBe(1);
  await act(async () => {
    state().edit("caseRename", { label: "two" });
    await turns();
  });
  expect(screen.getByText("two")).toBeInTheDocument();
});

test("without a store above it is a programmer's mistake", () => {
  vi.spyOn(console, "error").mockImplementation(() => {});
  expect(() => render(<Label />)).toThrow(RangeError);
  vi.restoreAllMocks();
});
