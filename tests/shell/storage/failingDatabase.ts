import { IDBObjectStore, IDBTransaction } from "fake-indexeddb";
import { vi } from "vitest";

interface Aborting {
  _abort(name: string): void;
}

/**
 * From now on operations on object stores are counted, and the nth fails, or the nth and every later one. `atCommit`: the operation itself succeeds and
 * its transaction fails afterwards, as a full disk shows itself; otherwise the request fails.
 */
export function failOperation(
  nth: number,
  isForEver: boolean,
  error: string,
  atCommit: boolean,
): { counted: () => number } {
  let count = 0;
  for (const name of ["get", "getAll", "put", "add", "delete"] as const) {
    const real = IDBObjectStore.prototype[name] as (this: IDBObjectStore, ...args: unknown[]) => IDBRequest;
    vi.spyOn(IDBObjectStore.prototype, name).mockImplementation(function (this: IDBObjectStore, ...args: unknown[]) {
      count += 1;
      const isFailing = isForEver ? count >= nth : count === nth;
      if (isFailing && !atCommit) throw new DOMException("simulated", error);
      const request = real.apply(this, args);
      const { transaction } = this;
      if (isFailing) request.addEventListener("success", () => queueMicrotask(() => abort(transaction, error)));
      return request;
    } as never);
  }
  return { counted: () => count };
}

function abort(transaction: unknown, error: string): void {
  if (!(transaction instanceof IDBTransaction)) throw new Error("not a transaction of fake-indexeddb");
  (transaction as unknown as Aborting)._abort(error);
}
