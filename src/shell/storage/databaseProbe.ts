import { type MetaRow, metaRowRead } from "./storageSchema.ts";

export type Probe =
  /** No database of the name. `dataLoss`: the browser says it threw one away (Chromium only). */
  | { readonly kind: "absent"; readonly dataLoss: string | null }
  /** `meta` is null when the database does not carry our identity. */
  | { readonly kind: "present"; readonly meta: MetaRow | null }
  | { readonly kind: "unavailable"; readonly detail: string };

/**
 * Looks at the database before Dexie does, and leaves it untouched. Two things can only be learnt here: whether the browser deleted a damaged
 * database (`dataLoss` on the upgrade event; to Dexie it would look like a first run), and which schema wrote it (Dexie opens a newer
 * one without an error and would even add the stores it misses).
 */
export function databaseProbe(indexedDB: IDBFactory | null, name: string): Promise<Probe> {
  if (!indexedDB) return Promise.resolve({ kind: "unavailable", detail: "IndexedDB is missing" });
  return new Promise((resolve) => {
    let absent: Probe | null = null;
    let request: IDBOpenDBRequest;
    try {
      request = indexedDB.open(name);
    } catch (error) {
      resolve({ kind: "unavailable", detail: errorText(error) });
      return;
    }
    request.onupgradeneeded = (event) => {
      const { dataLoss, dataLossMessage } = event as { dataLoss?: string; dataLossMessage?: string };
      const lost = dataLoss !== undefined && dataLoss !== "none";
      absent = { kind: "absent", dataLoss: lost ? dataLossMessage || dataLoss : null };
      request.transaction?.abort(); // so that nothing is created yet
    };
    request.onerror = (event) => {
      event.preventDefault();
      resolve(absent ?? { kind: "unavailable", detail: errorText(request.error) });
    };
    request.onsuccess = () => {
      const database = request.result;
      database.onversionchange = () => database.close();
      readMeta(database)
        .then(resolve, (error) => resolve({ kind: "unavailable", detail: errorText(error) }))
        .finally(() => database.close());
    };
  });
}

function readMeta(database: IDBDatabase): Promise<Probe> {
  if (!database.objectStoreNames.contains("meta")) return Promise.resolve({ kind: "present", meta: null });
  return new Promise((resolve, reject) => {
    const transaction = database.transaction("meta", "readonly");
    const request = transaction.objectStore("meta").get("database");
    request.onsuccess = () => resolve({ kind: "present", meta: metaRowRead(request.result) });
    transaction.onabort = () => reject(transaction.error ?? request.error ?? new Error("the read was aborted"));
  });
}

export function errorText(error: unknown): string {
  return error instanceof Error || error instanceof DOMException
    ? `${error.name}: ${error.message}`.trim()
    : String(error);
}
