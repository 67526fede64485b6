import { BUILT_IN_RECORDS } from "../../../src/core/medicine/index.ts";
import { createWorkbench } from "../../../src/shell/store/createWorkbench.ts";
import type { WorkbenchSetting } from "../../../src/shell/store/storeContext.ts";
import { caseOf } from "../storage/fakeBrowser.ts";
import { HandRunner } from "./handRunner.ts";
import { MemoryRepository } from "./memoryRepository.ts";

export async function startWorkbench(change: Partial<WorkbenchSetting> = {}, repository = new MemoryRepository()) {
  const runner = new HandRunner();
  const fitter = new HandRunner();
  let ids = 0;
  const workbench = createWorkbench({
    repository,
    runner,
    fitter,
    clock: () => 5_000,
    newId: () => `new-${++ids}`,
    demos: {},
    builtInRecords: BUILT_IN_RECORDS,
    ...change,
  });
  await workbench.getState().start();
  return { workbench, repository, runner, fitter, state: workbench.getState, open: () => workbench.getState().open! };
}

/** Started, with a stored case "a" open. */
export async function startOpen(label = "Harbour ward") {
  const repository = new MemoryRepository();
  repository.store(caseOf("a", label));
  const started = await startWorkbench({}, repository);
  await started.state().openCase("a");
  return started;
}

/** Lets everything that waits for a settled promise run. */
export async function turns(): Promise<void> {
  for (let turn = 0; turn < 20; turn++) await Promise.resolve();
}
