import type { Browser, Page } from "@playwright/test";

/** What the page's main thread did meanwhile, ms. */
export interface MainThread {
  /** Its longest task by the clock: what a frame had to wait, the machine's other work included. */
  readonly longestTask: number;
  /** The longest task's own time on the processor. */
  readonly longestWork: number;
  /** The longest wait between two frames. */
  readonly longestGap: number;
}

interface TraceEvent {
  readonly name: string;
  readonly ph: string;
  readonly pid: number;
  readonly tid: number;
  readonly ts: number;
  readonly dur?: number;
  readonly tdur?: number;
  readonly args?: { readonly name?: string; readonly data?: { readonly url?: string } };
}

/** Watches the main thread while `work` goes on: the browser's own trace, in which every task stands with its length by the clock and on the processor. */
export async function watchMainThread(browser: Browser, page: Page, work: () => Promise<void>): Promise<MainThread> {
  await browser.startTracing(page, { categories: ["toplevel", "disabled-by-default-devtools.timeline", "__metadata"] });
  await page.evaluate(() => {
    const watch = { gap: 0, last: performance.now(), isOver: false };
    Object.assign(window, { frameWatch: watch });
    const frame = () => {
      const now = performance.now();
      watch.gap = Math.max(watch.gap, now - watch.last);
      watch.last = now;
      if (!watch.isOver) requestAnimationFrame(frame);
    };
    requestAnimationFrame(frame);
  });
  await work();
  const longestGap = await page.evaluate(() => {
    const { frameWatch } = window as unknown as { frameWatch: { gap: number; isOver: boolean } };
    frameWatch.isOver = true;
    return frameWatch.gap;
  });
  const trace = JSON.parse((await browser.stopTracing()).toString("utf8")) as { traceEvents: TraceEvent[] };
  const events = trace.traceEvents;
  const mains = new Set(
    events
      .filter(({ name, args }) => name === "thread_name" && args?.name === "CrRendererMain")
      .map(({ pid, tid }) => `${pid}/${tid}`),
  );
  const tasks = events.filter(
    ({ name, ph, pid, tid }) =>
      ph === "X" && (name === "RunTask" || name === "ThreadControllerImpl::RunTask") && mains.has(`${pid}/${tid}`),
  );
  if (tasks.length === 0) throw new Error("the trace holds no task of the main thread");
  if (!tasks.some(({ tdur }) => tdur !== undefined && tdur > 0)) throw new Error("the trace holds no processor time");
  const longest = (of: (task: TraceEvent) => number) =>
    tasks.reduce((most, task) => Math.max(most, of(task)), 0) / 1_000;
  return { longestTask: longest(({ dur }) => dur ?? 0), longestWork: longest(({ tdur }) => tdur ?? 0), longestGap };
}
