/** The origin private file system in memory: one level of folders, a file replaced whole when its writable is closed. */
export function createFakeFiles() {
  const folders = new Map<string, Map<string, string>>();
  let failure: Error | null = null;

  const fileHandle = (files: Map<string, string>, name: string) => ({
    kind: "file",
    name,
    getFile: async () => ({ text: async () => files.get(name) ?? "" }),
    async createWritable() {
      if (failure) throw failure;
      let written = "";
      return {
        write: async (text: string) => {
          written += text;
        },
        close: async () => void files.set(name, written),
      };
    },
  });

  const folderHandle = (files: Map<string, string>) => ({
    async getFileHandle(name: string) {
      if (!files.has(name)) files.set(name, "");
      return fileHandle(files, name);
    },
    async removeEntry(name: string) {
      if (failure) throw failure;
      if (!files.delete(name)) throw new DOMException("no such file", "NotFoundError");
    },
    async *values() {
      for (const name of files.keys()) yield fileHandle(files, name);
    },
  });

  const root = {
    async getDirectoryHandle(name: string) {
      const files = folders.get(name) ?? new Map<string, string>();
      folders.set(name, files);
      return folderHandle(files);
    },
  };

  return {
    open: async () => root as unknown as FileSystemDirectoryHandle,
    files: (): Map<string, string> => folders.get("ebbline-copies") ?? new Map(),
    /** From now on every write and removal fails so. */
    fail: (error: Error | null): void => {
      failure = error;
    },
    clear: (): void => folders.clear(),
  };
}
