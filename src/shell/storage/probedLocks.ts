import type { MakeChannel } from "./changeChannel.ts";
import type { WriterLocks } from "./writerLocks.ts";

/** How long other tabs have to say that they write the case, ms. Messages between tabs of one browser take a few ms; a throttled tab still answers. */
const ANSWER_WAIT = 300;
/** How often a reader asks again, ms: a tab that crashed never says that it let go. */
const ASK_AGAIN = 5_000;

interface Holding {
  state: "asking" | "writer" | "reader";
  readonly token: string;
  onWriter: () => void;
  refused: () => void;
  askAgain: ReturnType<typeof setTimeout> | null;
}

/**
 * For browsers without Web Locks (they need https or localhost): a tab asks the others over a BroadcastChannel and writes when none says it does.
 * Weaker than a lock: a tab frozen by the browser can't answer. What slips through is caught by the revision check of every save,
 * which refuses to write over a revision this tab has not read.
 */
export function createProbedLocks(makeChannel: MakeChannel, newId: () => string): WriterLocks {
  const channel = makeChannel("ebbline-writers");
  const holdings = new Map<string, Holding>();
  const post = (kind: "ask" | "held" | "free", id: string, token: string): void =>
    channel.postMessage({ kind, id, token });

  channel.onmessage = ({ data }: MessageEvent<unknown>) => {
    const { kind, id, token } = (data ?? {}) as { kind?: unknown; id?: unknown; token?: unknown };
    if (typeof id !== "string" || typeof token !== "string") return;
    const own = holdings.get(id);
    if (!own) return;
    if (kind === "ask") {
      // Two ask at once: the smaller token goes first.
      if (own.state === "writer" || (own.state === "asking" && own.token < token)) post("held", id, own.token);
      else if (own.state === "asking") own.refused();
    } else if (kind === "held" && own.state === "asking") own.refused();
    else if (kind === "free" && own.state === "reader") void askAgain(id, own);
  };

  const ask = (id: string, holding: Holding): Promise<"writer" | "reader"> =>
    new Promise((resolve) => {
      holding.state = "asking";
      const finish = (state: "writer" | "reader") => {
        clearTimeout(timer);
        holding.state = state;
        resolve(state);
      };
      const timer = setTimeout(() => finish("writer"), ANSWER_WAIT);
      holding.refused = () => finish("reader");
      post("ask", id, holding.token);
    });

  const waitInLine = (id: string, holding: Holding): void => {
    holding.askAgain = setTimeout(() => void askAgain(id, holding), ASK_AGAIN);
  };

  const askAgain = async (id: string, holding: Holding): Promise<void> => {
    if (holding.askAgain) clearTimeout(holding.askAgain);
    if (holding.state !== "reader" || holdings.get(id) !== holding) return;
    const role = await ask(id, holding);
    if (holdings.get(id) !== holding) return;
    if (role === "writer") holding.onWriter();
    else waitInLine(id, holding);
  };

  const locks: WriterLocks = {
    guard: "probe",
    async claim(id, onWriter) {
      if (holdings.has(id)) throw new RangeError(`claim: this tab already claims the case "${id}"; release it first`);
      const holding: Holding = { state: "asking", token: newId(), onWriter, refused: () => {}, askAgain: null };
      holdings.set(id, holding);
      const role = await ask(id, holding);
      if (role === "reader" && holdings.get(id) === holding) waitInLine(id, holding);
      return role;
    },
    async release(id) {
      const holding = holdings.get(id);
      if (!holding) return;
      holdings.delete(id);
      if (holding.askAgain) clearTimeout(holding.askAgain);
      if (holding.state === "writer") post("free", id, holding.token);
    },
    async asWriter(id, work) {
      if (holdings.get(id)?.state === "writer") return work();
      if (holdings.has(id)) return null;
      if ((await locks.claim(id, () => {})) === "reader") {
        await locks.release(id);
        return null;
      }
      return work().finally(() => locks.release(id));
    },
    close() {
      for (const { askAgain } of holdings.values()) if (askAgain) clearTimeout(askAgain);
      holdings.clear();
      channel.close();
    },
  };
  return locks;
}
