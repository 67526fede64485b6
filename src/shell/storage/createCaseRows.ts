import type { Case } from "../../core/case/index.ts";
import { fail, issue, type Result } from "../../core/result/index.ts";
import type { CaseCopies } from "./caseCopies.ts";
import { type CaseEntry, caseRowEntry, caseRowMake, caseRowRead } from "./caseRow.ts";
import type { ChangeChannel } from "./changeChannel.ts";
import type { Connection } from "./createConnection.ts";
import { errorText } from "./databaseProbe.ts";
import type { LossMarker } from "./lossMarker.ts";
import { type SaveOutcome, StorageRefusal, saveAttempt, saveFailure } from "./saveFailure.ts";
import type { CaseRow } from "./storageSchema.ts";
import type { WriterLocks } from "./writerLocks.ts";

export interface CaseRowsSetting {
  readonly connection: Connection;
  readonly marker: LossMarker;
  readonly copies: CaseCopies;
  readonly channel: ChangeChannel;
  readonly locks: WriterLocks;
  readonly clock: () => number;
}

/** The stored cases. A save is acknowledged when it is on disk, noted outside the database and copied. */
export function createCaseRows({ connection, marker, copies, channel, locks, clock }: CaseRowsSetting) {
  /** Saves counted, as this tab last read or wrote them: a save over a count it has not seen is refused. */
  const seen = new Map<string, number>();
  let copyFaultSaid = false;

  /** One strict transaction; returns the count of this save. */
  function put(row: Omit<CaseRow, "revision">): Promise<number> {
    const last = seen.get(row.id) ?? 0;
    return connection.write(["cases"], async (database) => {
      const cases = database.table<CaseRow, string>("cases");
      const stored = await cases.get(row.id);
      // One save more with the very same text is our own, written just before the browser dropped the connection.
      const isOwn = stored?.revision === last + 1 && stored.checksum === row.checksum;
      if (stored && stored.revision !== last && !isOwn) throw new StorageRefusal("read-only", "other-tab");
      await cases.put({ ...row, revision: last + 1 });
      return last + 1;
    });
  }

  async function write(value: Case): Promise<SaveOutcome> {
    try {
      const row = caseRowMake(value, clock());
      const revision = await put(row);
      seen.set(row.id, revision);
      marker.noteSaved(row.id, revision, row.savedAt);
      await copy({ ...row, revision });
      channel.post("saved", row.id);
      return { ok: true, savedAt: row.savedAt };
    } catch (error) {
      return saveFailure(error);
    }
  }

  async function erase(id: string): Promise<SaveOutcome> {
    const takeBack = marker.noteRemoved(id); // before: the note must never ask for more than there is
    const outcome = await saveAttempt(clock, async () => {
      connection.requireWrites();
      // The copy goes first and must go: left behind, it would bring a removed case back after a loss.
      await copies.remove(id);
      await connection.write(["cases"], (database) => database.table("cases").delete(id));
    });
    if (!outcome.ok) {
      takeBack();
      return outcome;
    }
    seen.delete(id);
    channel.post("removed", id);
    return outcome;
  }

  /** A second copy that fails does not undo a save; it is said once. */
  async function copy(row: CaseRow): Promise<void> {
    try {
      await copies.write(row);
    } catch (error) {
      if (!copyFaultSaid)
        channel.emit({ kind: "fault", issues: [issue("storage-copy-failed", { detail: errorText(error) })] });
      copyFaultSaid = true;
    }
  }

  const asWriter = async (id: string, work: () => Promise<SaveOutcome>): Promise<SaveOutcome> =>
    (await locks.asWriter(id, work)) ?? { ok: false, reason: "read-only", detail: "other-tab" };

  return {
    async list(): Promise<readonly CaseEntry[]> {
      const rows = await connection.read((database) => database.table<CaseRow>("cases").toArray());
      return rows.map(caseRowEntry).sort((a, b) => b.savedAt - a.savedAt);
    },
    async load(id: string): Promise<Result<Case>> {
      let row: CaseRow | undefined;
      try {
        row = await connection.read((database) => database.table<CaseRow, string>("cases").get(id));
      } catch (error) {
        return fail(issue("storage-read-failed", { detail: errorText(error) }));
      }
      if (!row) return fail(issue("storage-case-gone", { id }));
      const read = caseRowRead(row);
      if (read.ok) seen.set(id, row.revision);
      return read;
    },
    save: (value: Case): Promise<SaveOutcome> => asWriter(value.id, () => write(value)),
    remove: (id: string): Promise<SaveOutcome> => asWriter(id, () => erase(id)),
    claim: (id: string, onWriter: () => void) => locks.claim(id, onWriter),
    release: (id: string) => locks.release(id),
  };
}
