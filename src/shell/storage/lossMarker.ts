/**
 * What was in the database, noted outside IndexedDB (localStorage), so that a database the browser emptied is never taken for a first run.
 * One key for the database, and one a case: a case has one writer over all tabs, so tabs never overwrite each other's note.
 * A save notes the case after it is on disk, a removal forgets it before: at whatever moment the browser dies, the note asks
 * for no more than the database holds. Holds ids and numbers only, no label and nothing of a patient.
 */
export interface Marker {
  readonly database: string;
  readonly schema: number;
  /** Epoch milliseconds of the last change noted. */
  readonly lastSavedAt: number | null;
  /** Saves counted, by case id. */
  readonly heads: ReadonlyMap<string, number>;
  /** A loss the browser reported once and the user has not accepted yet. */
  readonly loss: string | null;
}

export type MarkerStorage = Pick<Storage, "getItem" | "setItem" | "removeItem" | "key" | "length">;

const MARKER_KEY = "ebbline-marker";
const HEAD_PREFIX = "ebbline-head-";

export interface LossMarker {
  read(): Marker | null;
  /** The database as it is now becomes what is expected. */
  rewrite(database: string, schema: number, rows: readonly { id: string; revision: number; savedAt: number }[]): void;
  noteLoss(detail: string): void;
  noteSaved(id: string, revision: number, savedAt: number): void;
  /** Returns how to take it back, for a removal that failed. */
  noteRemoved(id: string): () => void;
}

/** `storage` null: not available; then nothing is noted and a loss is seen only where the browser reports it. */
export function createLossMarker(storage: MarkerStorage | null): LossMarker {
  // A full or forbidden localStorage must not stop a save: the marker then asks for less than there is, which raises no false alarm.
  const attempt = (work: (storage: MarkerStorage) => unknown): void => {
    if (!storage) return;
    try {
      work(storage);
    } catch {}
  };

  const headKeys = (of: MarkerStorage): string[] =>
    Array.from({ length: of.length }, (_, index) => of.key(index)).filter(
      (key) => key?.startsWith(HEAD_PREFIX) === true,
    ) as string[];

  const readMain = (of: MarkerStorage) => {
    try {
      const value: unknown = JSON.parse(of.getItem(MARKER_KEY) ?? "null");
      return typeof value === "object" && value !== null ? (value as Record<string, unknown>) : null;
    } catch {
      return null;
    }
  };

  return {
    read() {
      let marker: Marker | null = null;
      attempt((of) => {
        const main = readMain(of);
        const heads = new Map<string, number>();
        let lastSavedAt = typeof main?.lastSavedAt === "number" ? main.lastSavedAt : null;
        for (const key of headKeys(of)) {
          const [revision, savedAt] = (of.getItem(key) ?? "").split(" ").map(Number);
          heads.set(key.slice(HEAD_PREFIX.length), Number.isFinite(revision) ? revision! : 0);
          if (Number.isFinite(savedAt)) lastSavedAt = Math.max(lastSavedAt ?? 0, savedAt!);
        }
        if (!main && heads.size === 0) return;
        marker = {
          database: typeof main?.database === "string" ? main.database : "",
          schema: typeof main?.schema === "number" ? main.schema : 0,
          loss: typeof main?.loss === "string" ? main.loss : null,
          lastSavedAt,
          heads,
        };
      });
      return marker;
    },

    rewrite(database, schema, rows) {
      attempt((of) => {
        for (const key of headKeys(of)) of.removeItem(key);
        for (const { id, revision, savedAt } of rows) of.setItem(HEAD_PREFIX + id, `${revision} ${savedAt}`);
        const lastSavedAt = rows.reduce<number | null>(
          (latest, { savedAt }) => Math.max(latest ?? savedAt, savedAt),
          null,
        );
        of.setItem(MARKER_KEY, JSON.stringify({ database, schema, lastSavedAt }));
      });
    },

    noteLoss: (detail) => attempt((of) => of.setItem(MARKER_KEY, JSON.stringify({ ...readMain(of), loss: detail }))),
    noteSaved: (id, revision, savedAt) => attempt((of) => of.setItem(HEAD_PREFIX + id, `${revision} ${savedAt}`)),
    noteRemoved(id) {
      let before: string | null = null;
      attempt((of) => {
        before = of.getItem(HEAD_PREFIX + id);
        of.removeItem(HEAD_PREFIX + id);
      });
      return () => attempt((of) => before !== null && of.setItem(HEAD_PREFIX + id, before));
    },
  };
}
