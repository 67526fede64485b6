import { IDBFactory, IDBKeyRange } from "fake-indexeddb";
import { type Case, caseNew } from "../../../src/core/case/index.ts";
import { BUILT_IN_RECORDS } from "../../../src/core/medicine/index.ts";
import { createCaseRepository, type RepositorySetting } from "../../../src/shell/storage/createCaseRepository.ts";
import { createFakeChannels } from "./fakeChannels.ts";
import { createFakeFiles } from "./fakeFiles.ts";
import { createFakeLocks } from "./fakeLocks.ts";
import { createFakeStorage } from "./fakeStorage.ts";

export type Repository = ReturnType<typeof createCaseRepository>;

/** One browser profile: what outlives a tab, and a way to open tabs on it. IndexedDB is fake-indexeddb; the rest is in memory. */
export function createFakeBrowser() {
  const tabs: { repository: Repository; locks: ReturnType<ReturnType<typeof createFakeLocks>["tab"]> }[] = [];
  let ids = 0;
  let now = 1_000_000;
  const browser = {
    indexedDB: new IDBFactory(),
    localStorage: createFakeStorage(),
    locks: createFakeLocks(),
    channels: createFakeChannels(),
    files: createFakeFiles(),
    /** A tab. `change` takes away or replaces what the browser has. */
    tab(change: Partial<RepositorySetting> = {}): Repository {
      const locks = browser.locks.tab();
      const repository = createCaseRepository({
        name: "ebbline",
        indexedDB: browser.indexedDB,
        IDBKeyRange,
        localStorage: browser.localStorage,
        locks: locks.manager,
        makeChannel: browser.channels.make,
        openPrivateFiles: browser.files.open,
        newId: () => `id-${++ids}`,
        clock: () => ++now,
        ...change,
      });
      tabs.push({ repository, locks });
      return repository;
    },
    /** Every tab gone without a word, as when the browser is killed. */
    kill(): void {
      for (const { repository, locks } of tabs.splice(0)) {
        repository.close();
        locks.die();
      }
    },
    async ready(change: Partial<RepositorySetting> = {}): Promise<Repository> {
      const repository = browser.tab(change);
      const state = await repository.open();
      if (state.kind !== "ready") throw new Error(`expected a ready storage, got ${JSON.stringify(state)}`);
      return repository;
    },
  };
  return browser;
}

export function caseOf(id: string, label = "Harbour ward"): Case {
  return caseNew({
    id,
    label,
    timeZone: "Europe/Lisbon",
    now: "2026-03-04T09:00:00+00:00",
    medicine: BUILT_IN_RECORDS[0]!,
  });
}

/** A raw look into the database, past everything of ours. */
export async function rawRead(indexedDB: IDBFactory, store: string): Promise<unknown[]> {
  return rawWork(indexedDB, store, "readonly", (of) => of.getAll());
}

export async function rawPut(indexedDB: IDBFactory, store: string, value: unknown): Promise<void> {
  await rawWork(indexedDB, store, "readwrite", (of) => of.put(value));
}

export function requestDone<T>(request: IDBRequest<T>): Promise<T> {
  return new Promise((resolve, reject) => {
    request.onsuccess = () => resolve(request.result);
    request.onerror = () => reject(request.error);
  });
}

async function rawWork<T>(
  indexedDB: IDBFactory,
  store: string,
  mode: IDBTransactionMode,
  work: (of: IDBObjectStore) => IDBRequest<T>,
): Promise<T> {
  const database = await requestDone(indexedDB.open("ebbline"));
  const result = await requestDone(work(database.transaction(store, mode).objectStore(store)));
  database.close();
  return result;
}
