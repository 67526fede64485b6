import { configure, render } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import type { ReactNode } from "react";
import { derive } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { BUILT_IN_RECORDS } from "../../../src/core/medicine/index.ts";
import { createWorkbench } from "../../../src/shell/store/createWorkbench.ts";
import type { AnalysisRunner } from "../../../src/shell/store/ports.ts";
import { WorkbenchProvider } from "../../../src/view/useWorkbench.ts";
import { MemoryRepository } from "../../shell/store/memoryRepository.ts";

// A second is near when two cores share the whole suite.
configure({ asyncUtilTimeout: 10_000 });

/** The real analysis of the typical patient, at once and in the page. */
const runner: AnalysisRunner = {
  where: "page",
  run: async (value, options) => ({ ok: true, analysis: derive(value, options) }),
};

/** The fit is the longest part of it, and most screens are not about it: for them the fit goes on and on. */
const fitPending: AnalysisRunner = { where: "page", run: () => new Promise(() => {}) };

interface Setting {
  readonly repository?: MemoryRepository;
  /** Stored and opened before the screen is drawn. */
  readonly open?: Case;
  readonly demos?: Readonly<Record<string, unknown>>;
  /** In place of the real analysis. */
  readonly runner?: AnalysisRunner;
}

/** A screen over the real store, with a repository in memory. */
export async function renderWorkbench(screen: ReactNode, setting: Setting = {}) {
  const repository = setting.repository ?? new MemoryRepository();
  let ids = 0;
  const workbench = createWorkbench({
    repository,
    runner: setting.runner ?? runner,
    fitter: setting.runner ?? fitPending,
    clock: () => Date.parse("2026-03-04T12:00:00Z"),
    newId: () => `new-${++ids}`,
    demos: setting.demos ?? {},
    builtInRecords: BUILT_IN_RECORDS,
  });
  if (setting.open) repository.store(setting.open);
  await workbench.getState().start();
  if (setting.open) await workbench.getState().openCase(setting.open.id);
  const user = userEvent.setup();
  const view = render(<WorkbenchProvider store={workbench}>{screen}</WorkbenchProvider>);
  return {
    ...view,
    user,
    workbench,
    repository,
    state: workbench.getState,
    value: () => workbench.getState().open!.value,
  };
}
