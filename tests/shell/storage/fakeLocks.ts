type Callback = (lock: Lock | null) => unknown;

interface Wait {
  readonly tab: object;
  readonly grant: () => void;
}

/** Web Locks of one browser, exclusive mode only, after the Web Locks specification: granted in order, held until the callback's promise settles, given up when the tab dies. */
export function createFakeLocks() {
  const held = new Map<string, object>();
  const waiting = new Map<string, Wait[]>();

  const give = (name: string): void => {
    held.delete(name);
    waiting.get(name)?.shift()?.grant();
  };

  /** What one tab sees; `die` drops its locks and its places in line. */
  function tab() {
    const self = {};
    const run = async (name: string, callback: Callback): Promise<unknown> => {
      held.set(name, self);
      try {
        return await callback({ name, mode: "exclusive" });
      } finally {
        if (held.get(name) === self) give(name);
      }
    };
    const request = async (name: string, options: LockOptions, callback: Callback): Promise<unknown> => {
      await new Promise((resolve) => setTimeout(resolve));
      if (options.signal?.aborted) throw new DOMException("aborted", "AbortError");
      if (!held.has(name)) return run(name, callback);
      if (options.ifAvailable) return callback(null);
      await new Promise<void>((resolve, reject) => {
        const wait: Wait = { tab: self, grant: resolve };
        const line = waiting.get(name) ?? [];
        waiting.set(name, [...line, wait]);
        options.signal?.addEventListener("abort", () => {
          waiting.set(
            name,
            (waiting.get(name) ?? []).filter((each) => each !== wait),
          );
          reject(new DOMException("aborted", "AbortError"));
        });
      });
      return run(name, callback);
    };
    return {
      manager: { request } as unknown as LockManager,
      die(): void {
        for (const [name, line] of waiting)
          waiting.set(
            name,
            line.filter((each) => each.tab !== self),
          );
        for (const [name, holder] of [...held]) if (holder === self) give(name);
      },
    };
  }

  return { tab, isHeld: (name: string): boolean => held.has(name) };
}
