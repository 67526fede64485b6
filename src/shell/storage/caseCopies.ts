import { textChecksum } from "./caseRow.ts";
import type { CaseRow } from "./storageSchema.ts";

/** How long any of it may take, ms. The copies are a safeguard: one that hangs must keep no save from being acknowledged and no opening from ending. */
const WAIT = 2_000;

/**
 * A second copy of every case, outside IndexedDB: one file a case in the origin private file system. A browser that deletes a damaged
 * IndexedDB leaves these alone. Each write goes to a swap file that replaces the old one when closed, so a copy is whole or the one before.
 */
export interface CaseCopies {
  readonly isAvailable: boolean;
  write(row: CaseRow): Promise<void>;
  remove(id: string): Promise<void>;
  /** Those that are whole: a copy whose checksum is wrong is left where it is and not returned. */
  read(): Promise<readonly CaseRow[]>;
}

export type OpenDirectory = () => Promise<FileSystemDirectoryHandle>;

const FOLDER = "ebbline-copies";
const SUFFIX = ".json";

export function createCaseCopies(openRoot: OpenDirectory | null): CaseCopies {
  if (!openRoot) return { isAvailable: false, write: async () => {}, remove: async () => {}, read: async () => [] };
  let folder: Promise<FileSystemDirectoryHandle> | null = null;
  const openFolder = (): Promise<FileSystemDirectoryHandle> => {
    folder ??= openRoot().then((root) => root.getDirectoryHandle(FOLDER, { create: true }));
    folder.catch(() => {
      folder = null;
    });
    return folder;
  };
  // An id comes from a file as well: only what can't be read as a path becomes a file name.
  const fileName = (id: string): string => encodeURIComponent(id).replaceAll(".", "%2E") + SUFFIX;

  const copies: CaseCopies = {
    isAvailable: true,
    async write(row) {
      const file = await (await openFolder()).getFileHandle(fileName(row.id), { create: true });
      const writable = await file.createWritable();
      await writable.write(JSON.stringify(row));
      await writable.close();
    },
    async remove(id) {
      await (await openFolder()).removeEntry(fileName(id)).catch((error: unknown) => {
        if ((error as { name?: string }).name !== "NotFoundError") throw error;
      });
    },
    async read() {
      const rows: CaseRow[] = [];
      for await (const handle of (await openFolder()).values()) {
        if (handle.kind !== "file" || !handle.name.endsWith(SUFFIX)) continue;
        const row = copyRead(await (await (handle as FileSystemFileHandle).getFile()).text());
        if (row) rows.push(row);
      }
      return rows;
    },
  };
  return {
    isAvailable: true,
    write: (row) => within(WAIT, copies.write(row)),
    remove: (id) => within(WAIT, copies.remove(id)),
    read: () => within(WAIT, copies.read()),
  };
}

/** `work`, or a rejection once it has taken longer than `wait` ms. */
async function within<T>(wait: number, work: Promise<T>): Promise<T> {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const late = new Promise<never>((_, reject) => {
    timer = setTimeout(() => reject(new Error(`no answer within ${wait} ms`)), wait);
  });
  return Promise.race([work, late]).finally(() => clearTimeout(timer));
}

function copyRead(text: string): CaseRow | null {
  try {
    const row = JSON.parse(text) as Partial<CaseRow> | null;
    const isWhole =
      typeof row?.id === "string" &&
      typeof row.text === "string" &&
      Number.isInteger(row.revision) &&
      row.checksum === textChecksum(row.text);
    return isWhole ? (row as CaseRow) : null;
  } catch {
    return null;
  }
}
