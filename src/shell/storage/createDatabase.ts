import { Dexie } from "dexie";
import { type MetaRow, STORAGE_MIN_READER, STORAGE_SCHEMA, STORES } from "./storageSchema.ts";

export interface DatabaseSetting {
  readonly name: string;
  readonly indexedDB: IDBFactory | null;
  readonly IDBKeyRange: typeof globalThis.IDBKeyRange;
  readonly newId: () => string;
  readonly clock: () => number;
}

// autoOpen false: a database the browser emptied must not be made anew behind our back.
const always = { autoOpen: false, cache: "disabled", chromeTransactionDurability: "strict" } as const;

/** Every write transaction asks for strict durability: success is reported once the bytes are flushed. */
export function createDatabase(setting: DatabaseSetting): Dexie {
  const database = createDatabaseReader(setting);
  database.version(1).stores(STORES);
  // Same transaction as the creation: a database of ours is never without its identity.
  database.on("populate", (transaction) =>
    transaction.table("meta").add(metaRowMake(setting.newId(), setting.clock())),
  );
  return database;
}

/** Opens whatever stands there, for a database of a newer version: no shape is declared, so Dexie adds nothing to it. */
export function createDatabaseReader({ name, indexedDB, IDBKeyRange }: DatabaseSetting): Dexie {
  if (!indexedDB) throw new RangeError("createDatabase: there is no IndexedDB");
  return new Dexie(name, { indexedDB, IDBKeyRange, ...always });
}

export function metaRowMake(id: string, createdAt: number): MetaRow {
  return { key: "database", id, schema: STORAGE_SCHEMA, minReader: STORAGE_MIN_READER, createdAt };
}
