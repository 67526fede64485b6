import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { ErrorBoundary } from "../../src/app/ErrorBoundary.tsx";
import { caseParse } from "../../src/core/case/index.ts";
import { startOpen, startWorkbench } from "../shell/store/workbenchSupport.ts";

function Broken(): never {
  throw new TypeError("a screen broke");
}

let files: { name: string; text: Promise<string> }[];
beforeEach(() => {
  files = [];
  vi.spyOn(console, "error").mockImplementation(() => {}); // React reports what the boundary catches
  URL.createObjectURL = vi.fn((blob: Blob) => {
    files.push({ name: "", text: blob.text() });
    return "blob:x";
  });
  URL.revokeObjectURL = vi.fn();
  vi.spyOn(HTMLAnchorElement.prototype, "click").mockImplementation(function (this: HTMLAnchorElement) {
    files.at(-1)!.name = this.download;
  });
});
afterEach(() => vi.restoreAllMocks());

test("a screen that works is left alone", async () => {
  const { workbench } = await startWorkbench();
  render(<ErrorBoundary workbench={workbench}>bench</ErrorBoundary>);
  expect(screen.getByText("bench")).toBeInTheDocument();
});

test("after a screen broke the open case can still be exported, and what is unsaved is said", async () => {
  const { workbench, state, repository, open } = await startOpen();
  repository.refusal = { ok: false, reason: "quota", detail: "" };
  state().edit("caseRename", { label: "changed" });
  await state().settle();
  render(
    <ErrorBoundary workbench={workbench}>
      <Broken />
    </ErrorBoundary>,
  );
  expect(screen.getByText(/not stored yet/)).toBeInTheDocument();
  expect(screen.getByText(/a screen broke/)).toBeInTheDocument();
  await userEvent.click(screen.getByRole("button", { name: "Export the open case" }));
  expect(files).toHaveLength(1);
  expect(files[0]!.name).toMatch(/\.ebbline\.json$/);
  expect(caseParse(await files[0]!.text)).toEqual({ ok: true, value: open().value });
});

test("with the case on disk it says so; with none open it offers nothing to export", async () => {
  const { workbench } = await startOpen();
  const { unmount } = render(
    <ErrorBoundary workbench={workbench}>
      <Broken />
    </ErrorBoundary>,
  );
  expect(screen.getByText(/stored on this device as you last saw it/)).toBeInTheDocument();
  unmount();
  render(
    <ErrorBoundary workbench={null}>
      <Broken />
    </ErrorBoundary>,
  );
  expect(screen.getByText(/No case was open/)).toBeInTheDocument();
  expect(screen.queryByRole("button", { name: "Export the open case" })).toBeNull();
});
