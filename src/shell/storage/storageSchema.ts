/** Shapes of the stored rows, schema version 1. Add, don't rename; a retired name never returns (docs/storage.md). */
export const DATABASE_NAME = "ebbline";

/** Counts up with every change of the rows' meaning. Kept in `meta`, because Dexie opens a newer database from older code without an error. */
export const STORAGE_SCHEMA = 1;
/** The oldest schema version whose code can still read what this version writes. */
export const STORAGE_MIN_READER = 1;

export const STORES = {
  cases: "id",
  settings: "key",
  windows: "[medicine+id]",
  medicines: "id",
  meta: "key",
} as const;

export interface CaseRow {
  readonly id: string;
  readonly label: string;
  readonly medicine: string;
  readonly demo: boolean;
  /** Epoch milliseconds. */
  readonly savedAt: number;
  /** Counts the saves of this case, from 1. */
  readonly revision: number;
  /** SHA-256 of `text`, hex. */
  readonly checksum: string;
  /** The case as casePrint wrote it: read back by the parser that reads an imported file. */
  readonly text: string;
}

export interface SettingRow {
  readonly key: string;
  readonly value: unknown;
}

export interface WindowRow {
  readonly medicine: string;
  readonly id: string;
  readonly window: unknown;
}

export interface MedicineRow {
  readonly id: string;
  readonly savedAt: number;
  readonly record: unknown;
}

export interface MetaRow {
  readonly key: "database";
  /** Made anew with every new database: tells an emptied database from the one before. */
  readonly id: string;
  readonly schema: number;
  readonly minReader: number;
  readonly createdAt: number;
}

/** null when the row is missing or is not one of ours. */
export function metaRowRead(value: unknown): MetaRow | null {
  if (typeof value !== "object" || value === null) return null;
  const { id, schema, minReader, createdAt } = value as Partial<Record<keyof MetaRow, unknown>>;
  if (typeof id !== "string" || typeof schema !== "number" || typeof minReader !== "number") return null;
  return { key: "database", id, schema, minReader, createdAt: typeof createdAt === "number" ? createdAt : 0 };
}
