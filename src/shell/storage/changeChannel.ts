import type { Issue } from "../../core/result/index.ts";

export type StorageChange =
  /** Another tab saved or removed a case. */
  | { readonly kind: "saved" | "removed"; readonly id: string }
  /** A newer version took the database over: this tab has closed it. */
  | { readonly kind: "superseded" }
  /** The connection is gone or the database was deleted under us: what was saved may not be there any more. */
  | { readonly kind: "gone" }
  /** The tab that blocked us is gone: call `open` again. */
  | { readonly kind: "unblocked" }
  /** Something to tell the user that belongs to no call. */
  | { readonly kind: "fault"; readonly issues: readonly Issue[] };

export interface ChangeChannel {
  /** To the other tabs. */
  post(kind: "saved" | "removed", id: string): void;
  /** To this tab's own listeners. */
  emit(change: StorageChange): void;
  subscribe(listener: (change: StorageChange) => void): () => void;
  close(): void;
}

export type MakeChannel = (name: string) => BroadcastChannel;

/** `makeChannel` null: the browser has no BroadcastChannel; then other tabs are not told, and see a change when they load. */
export function createChangeChannel(makeChannel: MakeChannel | null): ChangeChannel {
  const listeners = new Set<(change: StorageChange) => void>();
  const channel = makeChannel?.("ebbline-changes") ?? null;
  const emit = (change: StorageChange): void => {
    for (const listener of [...listeners]) listener(change);
  };
  if (channel)
    channel.onmessage = ({ data }: MessageEvent<unknown>) => {
      const { kind, id } = (data ?? {}) as { kind?: unknown; id?: unknown };
      if ((kind === "saved" || kind === "removed") && typeof id === "string") emit({ kind, id });
    };
  return {
    post: (kind, id) => channel?.postMessage({ kind, id }),
    emit,
    subscribe(listener) {
      listeners.add(listener);
      return () => {
        listeners.delete(listener);
      };
    },
    close() {
      listeners.clear();
      channel?.close();
    },
  };
}
