import type { MarkerStorage } from "../../../src/shell/storage/lossMarker.ts";

/** A localStorage in memory. */
export function createFakeStorage(): MarkerStorage & { clear(): void; keys(): string[] } {
  const entries = new Map<string, string>();
  return {
    get length() {
      return entries.size;
    },
    key: (index) => [...entries.keys()][index] ?? null,
    getItem: (key) => entries.get(key) ?? null,
    setItem: (key, value) => void entries.set(key, value),
    removeItem: (key) => void entries.delete(key),
    clear: () => entries.clear(),
    keys: () => [...entries.keys()],
  };
}
