import { errorText } from "./databaseProbe.ts";

export type SaveFailureReason = "quota" | "read-only" | "newer" | "closed" | "failed";
export type SaveOutcome =
  | { readonly ok: true; readonly savedAt: number }
  | { readonly ok: false; readonly reason: SaveFailureReason; readonly detail: string };

/** Thrown inside a write transaction to abort it with a reason of ours. */
export class StorageRefusal extends Error {
  constructor(
    readonly reason: SaveFailureReason,
    detail: string,
  ) {
    super(detail);
    this.name = "StorageRefusal";
  }
}

/** An error and the errors inside it: Dexie answers a full disk with an AbortError whose `inner` is the QuotaExceededError. */
function errorChain(error: unknown): unknown[] {
  const chain: unknown[] = [];
  for (let at = error; at !== null && at !== undefined && !chain.includes(at); at = (at as { inner?: unknown }).inner)
    chain.push(at);
  return chain;
}

const errorName = (error: unknown): string => String((error as { name?: unknown }).name ?? "");

export function errorIsClosed(error: unknown): boolean {
  return errorChain(error).some(
    (each) =>
      ["DatabaseClosedError", "InvalidStateError"].includes(errorName(each)) ||
      /connection to indexed database server lost|database connection is closing/i.test(
        String((each as Error).message),
      ),
  );
}

export function saveFailure(error: unknown): SaveOutcome & { ok: false } {
  const chain = errorChain(error);
  const refusal = chain.find((each) => each instanceof StorageRefusal);
  if (refusal) return { ok: false, reason: refusal.reason, detail: refusal.message };
  const detail = chain.map(errorText).join("; ");
  if (chain.some((each) => errorName(each) === "QuotaExceededError")) return { ok: false, reason: "quota", detail };
  if (errorIsClosed(error)) return { ok: false, reason: "closed", detail };
  return { ok: false, reason: "failed", detail };
}

/** Does `work` and says how it went; nothing is thrown. */
export async function saveAttempt(clock: () => number, work: () => Promise<unknown>): Promise<SaveOutcome> {
  const savedAt = clock();
  try {
    await work();
    return { ok: true, savedAt };
  } catch (error) {
    return saveFailure(error);
  }
}
