import { issue } from "../../core/result/index.ts";
import type { CaseCopies } from "./caseCopies.ts";
import type { ChangeChannel } from "./changeChannel.ts";
import type { Connection } from "./createConnection.ts";
import { errorText } from "./databaseProbe.ts";
import type { LossMarker } from "./lossMarker.ts";
import { StorageRefusal } from "./saveFailure.ts";
import { type CaseRow, STORAGE_SCHEMA } from "./storageSchema.ts";
import type { StorageState } from "./storageState.ts";
import { casesBehind, type Loss, storageVerdict } from "./storageVerdict.ts";

/** An open that takes longer is said to be blocked, ms: a request queued behind another tab's waiting upgrade gets no event at all. */
const OPEN_WAIT = 5_000;

export interface Opening {
  /** "blocked" when it can't finish now; "unblocked" is emitted when it later does. */
  open(): Promise<StorageState>;
  /** Puts back what second copies hold, then takes the database as it is for the one expected. Returns how many cases were put back. */
  acceptLoss(): Promise<number>;
}

/** Opens the database and says what was found, against what was noted outside it. */
export function createOpening(
  connection: Connection,
  marker: LossMarker,
  copies: CaseCopies,
  channel: ChangeChannel,
): Opening {
  let state: StorageState | null = null;
  let opening: Promise<StorageState> | null = null;

  function open(): Promise<StorageState> {
    if (state && (state.kind === "ready" || connection.hasEnded())) return Promise.resolve(state);
    opening ??= openNow()
      .catch((error: unknown): StorageState => ({ kind: "unavailable", detail: errorText(error) }))
      .then(settle);
    return orBlocked(opening);
  }

  function settle(found: StorageState): StorageState {
    opening = null;
    state = found;
    if (found.kind === "newer") connection.forbidWrites(new StorageRefusal("newer", `schema ${found.found}`));
    else if (found.kind !== "ready") connection.forbidWrites(new StorageRefusal("closed", found.kind));
    return found;
  }

  function orBlocked(result: Promise<StorageState>): Promise<StorageState> {
    return new Promise((resolve) => {
      let isBlocked = false;
      const block = (): void => {
        isBlocked = true;
        resolve({ kind: "blocked" });
      };
      const timer = setTimeout(block, OPEN_WAIT);
      connection.onBlocked(block);
      void result.then((found) => {
        clearTimeout(timer);
        if (isBlocked) channel.emit({ kind: "unblocked" });
        else resolve(found);
      });
    });
  }

  async function openNow(): Promise<StorageState> {
    connection.disconnect();
    const noted = marker.read(); // before the database: another tab may be saving meanwhile
    const copied = noted ? [] : await copies.read().catch(() => []); // without a marker a second copy is the only witness that there was work
    const probe = await connection.probe();
    const verdict = storageVerdict(probe, noted, copied.length);
    if (verdict.kind === "unavailable") return verdict;
    if (verdict.kind === "newer") {
      if (verdict.readable) await connection.connect("read");
      return { ...verdict, known: STORAGE_SCHEMA };
    }
    if (verdict.kind === "lost") {
      if (probe.kind === "absent" && probe.dataLoss) marker.noteLoss(probe.dataLoss); // the browser says it only once
      if (probe.kind === "present") await connection.connect("write");
      return lost(verdict.loss);
    }
    await connection.connect("write");
    const identity = await connection.identity();
    const rows = await readRows();
    if (!identity && rows.length > 0)
      return lost({ extent: "all", cases: null, lastSavedAt: null, detail: "the database has no identity" });
    let behind = casesBehind(noted?.heads ?? revisionsOf(copied), revisionsOf(rows));
    if (noted) behind = behind.filter((id) => marker.read()?.heads.has(id)); // one another tab removed meanwhile is not lost
    if (behind.length > 0) {
      const detail = "cases are missing or stand at an earlier save";
      return lost({ extent: "some", cases: behind.length, lastSavedAt: noted?.lastSavedAt ?? null, detail });
    }
    const found = identity ?? (await connection.identityMake());
    if (noted?.database !== found) marker.rewrite(found, STORAGE_SCHEMA, rows);
    connection.permitWrites(found);
    return { kind: "ready" };
  }

  async function lost(loss: Loss): Promise<StorageState> {
    return { kind: "lost", ...loss, recoverable: (await restorable()).length };
  }

  /** Second copies of cases the database does not hold, or holds at an earlier save. */
  async function restorable(): Promise<readonly CaseRow[]> {
    const stored = revisionsOf(connection.isConnected() ? await readRows() : []);
    const copied = await copies.read().catch((error: unknown): readonly CaseRow[] => {
      channel.emit({ kind: "fault", issues: [issue("storage-copies-unread", { detail: errorText(error) })] });
      return [];
    });
    return copied.filter((copy) => (stored.get(copy.id) ?? -1) < copy.revision);
  }

  async function acceptLoss(): Promise<number> {
    if (state?.kind !== "lost") return 0;
    if (!connection.isConnected()) await connection.connect("write");
    const identity = (await connection.identity()) ?? (await connection.identityMake());
    connection.permitWrites(identity);
    const restored = await restorable();
    await connection.write(["cases"], (database) => database.table<CaseRow>("cases").bulkPut([...restored]));
    marker.rewrite(identity, STORAGE_SCHEMA, await readRows());
    state = { kind: "ready" };
    return restored.length;
  }

  const readRows = (): Promise<readonly CaseRow[]> =>
    connection.read((database) => database.table<CaseRow>("cases").toArray());

  return { open, acceptLoss };
}

const revisionsOf = (rows: readonly CaseRow[]) => new Map(rows.map(({ id, revision }) => [id, revision]));
