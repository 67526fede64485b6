/** One writer a case over all tabs. */
export interface WriterLocks {
  /** How it is kept: by the browser's Web Locks, by asking the other tabs (probedLocks.ts), or only by the revision check of every save. */
  readonly guard: "locks" | "probe" | "none";
  /** A reader stays in line; `onWriter` is called when its turn comes. */
  claim(id: string, onWriter: () => void): Promise<"writer" | "reader">;
  release(id: string): Promise<void>;
  /** Runs `work` as the writer of the case, for its length only if it was not the writer before. `null`: another tab writes this case. */
  asWriter<T>(id: string, work: () => Promise<T>): Promise<T | null>;
  close(): void;
}

interface Claim {
  isWriter: boolean;
  role: Promise<"writer" | "reader">;
  /** Gives the lock back, or leaves the line. */
  leave: () => Promise<void>;
}

export function lockName(id: string): string {
  return `ebbline-case-${id}`;
}

export function createWriterLocks(locks: LockManager): WriterLocks {
  const claims = new Map<string, Claim>();

  /** Takes the lock when free, or at once when `isInLine` is false; it is held until `leave`. */
  const take = (id: string, isInLine: boolean, onAnswer: (isGranted: boolean) => void) => {
    const abort = new AbortController();
    let free = () => abort.abort();
    const options: LockOptions = isInLine ? { signal: abort.signal } : { ifAvailable: true };
    const done = locks
      .request(lockName(id), options, (lock) => {
        onAnswer(lock !== null);
        if (!lock) return undefined;
        return new Promise<void>((resolve) => {
          free = resolve;
        });
      })
      .catch((error: unknown) => {
        if ((error as { name?: string }).name !== "AbortError") throw error;
      });
    const leave = async (): Promise<void> => {
      free();
      await done;
    };
    return { done, leave };
  };

  const makeClaim = (id: string, onWriter: () => void): Claim => {
    const claim: Claim = { isWriter: false, role: Promise.resolve("reader"), leave: async () => {} };
    const waitInLine = (): void => {
      claim.leave = take(id, true, () => {
        claim.isWriter = true;
        onWriter();
      }).leave;
    };
    claim.role = new Promise((resolve, reject) => {
      const first = take(id, false, (isGranted) => {
        claim.isWriter = isGranted;
        if (!isGranted && claims.get(id) === claim) waitInLine();
        resolve(isGranted ? "writer" : "reader");
      });
      claim.leave = first.leave;
      first.done.catch(reject);
    });
    return claim;
  };

  return {
    guard: "locks",
    claim(id, onWriter) {
      if (claims.has(id)) throw new RangeError(`claim: this tab already claims the case "${id}"; release it first`);
      const claim = makeClaim(id, onWriter);
      claims.set(id, claim);
      return claim.role;
    },
    async release(id) {
      const claim = claims.get(id);
      if (!claim) return;
      claims.delete(id);
      await claim.role;
      await claim.leave();
    },
    async asWriter(id, work) {
      if (claims.get(id)?.isWriter) return work();
      return locks.request(lockName(id), { ifAvailable: true }, async (lock) => (lock ? work() : null));
    },
    close() {
      for (const claim of claims.values()) void claim.role.then(() => claim.leave());
      claims.clear();
    },
  };
}

/** A browser with neither Web Locks nor BroadcastChannel: every tab writes, and a save over a revision it has not read is refused. */
export function createUnguardedLocks(): WriterLocks {
  return {
    guard: "none",
    claim: async () => "writer",
    release: async () => {},
    asWriter: (_id, work) => work(),
    close() {},
  };
}
