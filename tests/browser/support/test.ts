import { test as base, expect } from "@playwright/test";
import { type Guard, guardContext } from "./guard.ts";
import { launchPersistent, type PersistentBrowser } from "./launchPersistent.ts";
import { type ProgramServer, startProgramServer } from "./programServer.ts";

interface TestFixtures {
  /** The server of the built program; put back in order after each test. */
  program: ProgramServer;
  /** Fails the test on any incident not taken out. Active in every test. */
  guard: Guard;
  /** A browser on a profile folder, to be killed and started again; closed and guarded like `page`. */
  openProfile: (profile: string) => Promise<PersistentBrowser>;
}

export const test = base.extend<TestFixtures, { programServer: ProgramServer }>({
  programServer: [
    // biome-ignore lint/correctness/noEmptyPattern: Playwright reads the fixture's needs from this pattern
    async ({}, use) => {
      const server = await startProgramServer();
      await use(server);
      await server.stop();
    },
    { scope: "worker" },
  ],
  program: async ({ programServer }, use) => {
    await programServer.start();
    await use(programServer);
  },
  baseURL: async ({ program }, use) => use(program.url),
  guard: [
    async ({ context, program }, use) => {
      const guard = await guardContext(context, program.url);
      await use(guard);
      expect(guard.incidents, "incidents on the page").toEqual([]);
    },
    { auto: true },
  ],
  openProfile: async ({ program }, use) => {
    const opened: PersistentBrowser[] = [];
    await use(async (profile) => {
      const browser = await launchPersistent(profile, program.url);
      opened.push(browser);
      return browser;
    });
    for (const browser of opened) await browser.close();
    expect(
      opened.flatMap((browser) => browser.guard.incidents),
      "incidents on a profile's page",
    ).toEqual([]);
  },
});

export { expect };
