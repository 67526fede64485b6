import adjustment from "../../demo-data/adjustment.ebbline.json";
import kidney from "../../demo-data/kidney.ebbline.json";
import lithium from "../../demo-data/lithium.ebbline.json";
import modifiedRelease from "../../demo-data/modified-release.ebbline.json";
import saturable from "../../demo-data/saturable.ebbline.json";
import start from "../../demo-data/start.ebbline.json";
import { deriveSteps } from "../core/analysis/index.ts";
import { BUILT_IN_RECORDS } from "../core/medicine/index.ts";
import { createCaseRepository } from "../shell/storage/createCaseRepository.ts";
import { DATABASE_NAME } from "../shell/storage/storageSchema.ts";
import { createWorkbench, type Workbench } from "../shell/store/createWorkbench.ts";
import type { AnalysisRunner, CaseRepository } from "../shell/store/ports.ts";
import { createAnalysisClient } from "../shell/workers/createAnalysisClient.ts";
import { newId } from "./newId.ts";

/** Makes storage, worker and store of what this browser has, and hands the first two to the third. */
export function compose(): Workbench {
  const clock = Date.now;
  const repository: CaseRepository = createCaseRepository({
    name: DATABASE_NAME,
    indexedDB: globalThis.indexedDB ?? null,
    IDBKeyRange: globalThis.IDBKeyRange,
    localStorage: markerStorage(),
    // Locks and private files exist only on https and on this computer's own address.
    locks: (navigator.locks as LockManager | undefined) ?? null,
    makeChannel: "BroadcastChannel" in globalThis ? (name) => new BroadcastChannel(name) : null,
    openPrivateFiles: canKeepFiles() ? () => navigator.storage.getDirectory() : null,
    newId,
    clock,
  });
  const makeRunner = (): AnalysisRunner =>
    createAnalysisClient({
      startWorker: () =>
        new Worker(new URL("../shell/workers/analysis.worker.ts", import.meta.url), { type: "module" }),
      loadDeriveSteps: async () => deriveSteps,
    });
  const [runner, fitter] = [makeRunner(), makeRunner()];
  const demos = { start, adjustment, modifiedRelease, saturable, kidney, lithium };
  return createWorkbench({ repository, runner, fitter, clock, newId, demos, builtInRecords: BUILT_IN_RECORDS });
}

/** Reading the property alone can throw where the browser forbids storage. */
function markerStorage(): Storage | null {
  try {
    return globalThis.localStorage;
  } catch {
    return null;
  }
}

/** Private files, and a way to write them that replaces a file whole. */
function canKeepFiles(): boolean {
  return (
    typeof navigator.storage?.getDirectory === "function" &&
    "FileSystemFileHandle" in globalThis &&
    "createWritable" in FileSystemFileHandle.prototype
  );
}
