import { type Issue, issue } from "../../core/result/index.ts";
import { createCaseCopies, type OpenDirectory } from "./caseCopies.ts";
import { createChangeChannel, type MakeChannel, type StorageChange } from "./changeChannel.ts";
import { createCaseRows } from "./createCaseRows.ts";
import { createConnection } from "./createConnection.ts";
import type { DatabaseSetting } from "./createDatabase.ts";
import { createOpening } from "./createOpening.ts";
import { createWardRows } from "./createWardRows.ts";
import { createLossMarker, type MarkerStorage } from "./lossMarker.ts";
import { createProbedLocks } from "./probedLocks.ts";
import type { StorageState } from "./storageState.ts";
import { createUnguardedLocks, createWriterLocks, type WriterLocks } from "./writerLocks.ts";

/** What of the browser the repository stands on; null for what is missing. */
export interface RepositorySetting extends DatabaseSetting {
  readonly localStorage: MarkerStorage | null;
  readonly locks: LockManager | null;
  readonly makeChannel: MakeChannel | null;
  readonly openPrivateFiles: OpenDirectory | null;
}

/** The store's CaseRepository, over IndexedDB, Web Locks, BroadcastChannel, localStorage and the private file system. */
export function createCaseRepository(setting: RepositorySetting) {
  const channel = createChangeChannel(setting.makeChannel);
  const marker = createLossMarker(setting.localStorage);
  const copies = createCaseCopies(setting.openPrivateFiles);
  const locks = locksOf(setting);
  const connection = createConnection(setting, channel);
  const opening = createOpening(connection, marker, copies, channel);
  const say = (...issues: readonly Issue[]): void => {
    if (issues.length > 0) channel.emit({ kind: "fault", issues });
  };

  return {
    ...createCaseRows({ connection, marker, copies, channel, locks, clock: setting.clock }),
    ...createWardRows(connection, channel, setting.clock),
    async open(): Promise<StorageState> {
      const state = await opening.open();
      if (state.kind === "ready") {
        if (locks.guard !== "locks") say(issue("storage-no-locks"));
        if (!copies.isAvailable) say(issue("storage-no-copies"));
      }
      return state;
    },
    async acceptLoss(): Promise<void> {
      const restored = await opening.acceptLoss();
      if (restored > 0) say(issue("storage-restored", { cases: restored }));
    },
    subscribe: (listener: (change: StorageChange) => void): (() => void) => channel.subscribe(listener),
    /** Gives everything back: for tests, which open many in one process. */
    close(): void {
      connection.disconnect();
      channel.close();
      locks.close();
    },
  };
}

function locksOf({ locks, makeChannel, newId }: RepositorySetting): WriterLocks {
  if (locks) return createWriterLocks(locks);
  return makeChannel ? createProbedLocks(makeChannel, newId) : createUnguardedLocks();
}
