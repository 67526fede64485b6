import { type BrowserContext, chromium, type Page } from "@playwright/test";
import { LAUNCH_OPTIONS, PAGE_OPTIONS } from "./browserOptions.ts";
import { type Guard, guardContext } from "./guard.ts";

export interface PersistentBrowser {
  readonly context: BrowserContext;
  readonly page: Page;
  readonly guard: Guard;
  /** SIGKILL to the browser process itself, without any warning to it. Resolves when it is gone. */
  kill(): Promise<void>;
  close(): Promise<void>;
}

/** A browser whose storage lives in `profile` and outlasts it. */
export async function launchPersistent(profile: string, baseURL: string): Promise<PersistentBrowser> {
  const context = await chromium.launchPersistentContext(profile, { ...LAUNCH_OPTIONS, ...PAGE_OPTIONS, baseURL });
  const guard = await guardContext(context, baseURL);
  const page = context.pages()[0] ?? (await context.newPage());
  const browserProcess = await readBrowserProcess(context);
  let isOpen = true;
  const gone = new Promise<void>((done) => {
    context.on("close", () => {
      isOpen = false;
      done();
    });
  });
  return {
    context,
    page,
    guard,
    async kill() {
      process.kill(browserProcess, "SIGKILL");
      await gone;
      await waitUntilGone(browserProcess);
    },
    async close() {
      if (isOpen) await context.close();
    },
  };
}

async function readBrowserProcess(context: BrowserContext): Promise<number> {
  const browser = context.browser();
  if (!browser) throw new Error("this browser names no process to kill");
  const session = await browser.newBrowserCDPSession();
  const { processInfo } = await session.send("SystemInfo.getProcessInfo");
  await session.detach();
  const own = processInfo.find((entry) => entry.type === "browser");
  if (!own) throw new Error("this browser names no process to kill");
  return own.id;
}

async function waitUntilGone(id: number): Promise<void> {
  for (let waited = 0; waited < 100; waited += 1) {
    try {
      process.kill(id, 0);
    } catch {
      return;
    }
    await new Promise((done) => setTimeout(done, 50));
  }
  throw new Error(`the browser process ${id} did not end`);
}
