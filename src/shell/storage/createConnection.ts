import type { Dexie } from "dexie";
import type { ChangeChannel } from "./changeChannel.ts";
import { createDatabase, createDatabaseReader, type DatabaseSetting, metaRowMake } from "./createDatabase.ts";
import { databaseProbe, type Probe } from "./databaseProbe.ts";
import { errorIsClosed, StorageRefusal } from "./saveFailure.ts";
import { metaRowRead, STORAGE_SCHEMA } from "./storageSchema.ts";

/** How long a tab that is being superseded may finish its writes, ms. */
const DRAIN_WAIT = 2_000;

export type Access = "read" | "write";

/** The one connection of this tab: made, watched, opened again when the browser drops it, and given up when another tab needs it. */
export interface Connection {
  probe(): Promise<Probe>;
  connect(access: Access): Promise<void>;
  disconnect(): void;
  isConnected(): boolean;
  /** From here on writes are allowed, into the database of this identity only. `null` forbids them, with the reason. */
  permitWrites(identity: string): void;
  forbidWrites(refusal: StorageRefusal): void;
  /** Throws the refusal while writes are forbidden, for work that goes with a write but not into the database. */
  requireWrites(): void;
  /** True once this tab has given the database up: only a reload helps. */
  hasEnded(): boolean;
  identity(): Promise<string | null>;
  /** Gives a database without identity a new one. */
  identityMake(): Promise<string>;
  read<T>(work: (database: Dexie) => PromiseLike<T>): Promise<T>;
  /** One strict transaction over the tables named. Throws StorageRefusal when this tab may not write. */
  write<T>(tables: readonly string[], work: (database: Dexie) => PromiseLike<T>): Promise<T>;
  onBlocked(listener: () => void): void;
}

export function createConnection(setting: DatabaseSetting, channel: ChangeChannel): Connection {
  let database: Dexie | null = null;
  let access: Access = "read";
  let permitted: string | null = null;
  let refusal = new StorageRefusal("closed", "not open");
  let hasEnded = false;
  let inFlight = 0;
  let blocked: () => void = () => {};

  async function connect(wanted: Access): Promise<void> {
    access = wanted;
    const made = wanted === "write" ? createDatabase(setting) : createDatabaseReader(setting);
    made.on("blocked", () => blocked());
    made.on("versionchange", (event) => {
      void supersede(event.newVersion === null);
      return false; // Dexie's own answer would close at once, cutting off the last write
    });
    // Our own disconnect forgets the database before it closes it, so only a connection the browser dropped passes here.
    made.on("close", () => {
      if (database === made) setTimeout(() => database === made && channel.emit({ kind: "gone" }));
    });
    await made.open();
    database = made;
  }

  function disconnect(): void {
    const old = database;
    database = null;
    old?.close({ disableAutoOpen: true });
  }

  function end(reason: StorageRefusal): StorageRefusal {
    hasEnded = true;
    permitted = null;
    refusal = reason;
    disconnect();
    return reason;
  }

  /** Another tab wants the database, at a newer version or to delete it. Writes under way, and those waiting behind them, may finish first. */
  async function supersede(isDeletion: boolean): Promise<void> {
    if (hasEnded) return;
    const start = setting.clock();
    do await new Promise((resolve) => setTimeout(resolve, 10));
    while (inFlight > 0 && setting.clock() - start < DRAIN_WAIT);
    end(
      isDeletion
        ? new StorageRefusal("closed", "the database was deleted")
        : new StorageRefusal("newer", "a newer version took over"),
    );
    channel.emit({ kind: isDeletion ? "gone" : "superseded" });
  }

  /** Runs `work`; a connection the browser dropped is opened again once, if the same database still stands there. */
  async function read<T>(work: (database: Dexie) => PromiseLike<T>): Promise<T> {
    if (!database) throw refusal;
    try {
      return await work(database);
    } catch (error) {
      if (hasEnded || !errorIsClosed(error)) throw error;
    }
    const probe = await databaseProbe(setting.indexedDB, setting.name);
    if (probe.kind !== "present" || (permitted !== null && probe.meta?.id !== permitted))
      throw end(new StorageRefusal("closed", "the database is no longer there"));
    disconnect();
    await connect(access);
    return work(database);
  }

  function requireWrites(): void {
    if (permitted === null) throw refusal;
  }

  async function write<T>(tables: readonly string[], work: (database: Dexie) => PromiseLike<T>): Promise<T> {
    requireWrites();
    inFlight += 1;
    try {
      return await read((current) =>
        current.transaction("rw", [...tables, "meta"], async () => {
          // Read in the same transaction: neither a newer version nor a database made anew can slip in between.
          const meta = metaRowRead(await current.table("meta").get("database"));
          if (meta && meta.schema > STORAGE_SCHEMA) throw new StorageRefusal("newer", `schema ${meta.schema}`);
          if (meta?.id !== permitted) throw new StorageRefusal("closed", "the database is another one");
          return work(current);
        }),
      );
    } catch (error) {
      if (error instanceof StorageRefusal && error.reason === "newer" && !hasEnded) {
        end(error);
        channel.emit({ kind: "superseded" });
      }
      throw error;
    } finally {
      inFlight -= 1;
    }
  }

  return {
    probe: () => databaseProbe(setting.indexedDB, setting.name),
    connect,
    disconnect,
    isConnected: () => database !== null,
    permitWrites(identity) {
      permitted = identity;
    },
    forbidWrites(reason) {
      permitted = null;
      refusal = reason;
    },
    requireWrites,
    hasEnded: () => hasEnded,
    identity: () => read(async (current) => metaRowRead(await current.table("meta").get("database"))?.id ?? null),
    async identityMake() {
      const row = metaRowMake(setting.newId(), setting.clock());
      await read((current) => current.transaction("rw", "meta", () => current.table("meta").put(row)));
      return row.id;
    },
    read,
    write,
    onBlocked(listener) {
      blocked = listener;
    },
  };
}
