import { expect, test, vi } from "vitest";
import { keepWork } from "../../src/app/keepWork.ts";
import { startOpen, turns } from "../shell/store/workbenchSupport.ts";

const leaving = (): boolean => {
  const event = new Event("beforeunload", { cancelable: true });
  window.dispatchEvent(event);
  return event.defaultPrevented;
};

test("closing the page asks while something is not on disk, and only then", async () => {
  const { workbench, state, repository } = await startOpen();
  keepWork(workbench);
  expect(leaving()).toBe(false);
  repository.hold = true;
  state().edit("caseRename", { label: "x" });
  expect(leaving()).toBe(true);
  repository.settleSave({ ok: false, reason: "quota", detail: "" });
  await turns();
  expect(leaving()).toBe(true);
  state().edit("caseRename", { label: "y" });
  repository.settleSave();
  await turns();
  expect(leaving()).toBe(false);
});

test("a page put away writes what a failure left unwritten", async () => {
  const { workbench, state, repository } = await startOpen();
  keepWork(workbench);
  repository.refusal = { ok: false, reason: "quota", detail: "" };
  state().edit("caseRename", { label: "x" });
  await turns();
  repository.refusal = null;
  window.dispatchEvent(new Event("pagehide"));
  await turns();
  expect(repository.cases.get("a")?.label).toBe("x");
});

test("the browser is asked to keep the storage once a case is saved, and not again", async () => {
  const persist = vi.fn(async () => true);
  vi.stubGlobal("navigator", Object.assign(Object.create(navigator), { storage: { persist } }));
  const { workbench, state } = await startOpen();
  keepWork(workbench);
  expect(persist).not.toHaveBeenCalled();
  for (const label of ["x", "y"]) {
    state().edit("caseRename", { label });
    await turns();
  }
  expect(persist).toHaveBeenCalledOnce();
  vi.unstubAllGlobals();
});
