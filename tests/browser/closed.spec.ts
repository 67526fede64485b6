import { cpSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import { join, relative } from "node:path";
import type { Page } from "@playwright/test";
import { HEADER_POLICY, META_POLICY, SECURITY_HEADERS } from "../../src/shell/offline/contentSecurityPolicy.ts";
import { startForeignServer } from "./support/foreignServer.ts";
import { BUILT_PROGRAM } from "./support/programServer.ts";
import { expect, test } from "./support/test.ts";

/** Incidents a refused foreign request leaves behind. */
const REFUSED = /foreign request|Content Security Policy|policy breach/;

const FILES = readdirSync(BUILT_PROGRAM, { recursive: true, withFileTypes: true })
  .filter((entry) => entry.isFile())
  .map((entry) => relative(BUILT_PROGRAM, join(entry.parentPath, entry.name)));

async function controlled(page: Page): Promise<void> {
  await page.goto("./");
  await page.waitForFunction(() => navigator.serviceWorker.controller !== null);
}

/** A copy of the program with a web worker that tries to fetch what it is told, on a host that sends `headers`. */
function withProbe(folder: string, headers: Readonly<Record<string, string>>): string {
  cpSync(BUILT_PROGRAM, folder, { recursive: true });
  writeFileSync(join(folder, "headers.json"), JSON.stringify(headers));
  writeFileSync(
    join(folder, "probe.js"),
    'onmessage = ({ data }) => fetch(data, { mode: "no-cors" }).then(() => postMessage("answered"), () => postMessage("refused"));',
  );
  return folder;
}

function fetchFromWorker(page: Page, url: string): Promise<unknown> {
  return page.evaluate(
    (target) =>
      new Promise((done) => {
        const worker = new Worker(new URL("probe.js", document.baseURI));
        worker.onmessage = ({ data }) => done(data);
        worker.onerror = () => done("no worker");
        worker.postMessage(target);
      }),
    url,
  );
}

test("the policy names no other origin and forbids code from text", () => {
  for (const policy of [HEADER_POLICY, META_POLICY]) {
    expect(policy).toContain("default-src 'none'");
    expect(policy).not.toMatch(/https?:|wss?:|\*|unsafe/);
  }
  expect(HEADER_POLICY).toContain("frame-ancestors 'none'");
});

test("the page carries the policy itself, before anything it must bind", () => {
  const html = readFileSync(join(BUILT_PROGRAM, "index.html"), "utf8");
  const meta = html.indexOf(`<meta http-equiv="Content-Security-Policy" content="${META_POLICY}"`);
  expect(meta).toBeGreaterThan(0);
  const bound = html.search(/<(script|link|style)\b/);
  expect(bound).toBeGreaterThan(meta);
});

test("every response of the server carries the headers, refusals too", async ({ program }) => {
  expect(FILES.length).toBeGreaterThan(5);
  for (const path of ["", ...FILES, "no-such-file", "%", "assets/"]) {
    const response = await fetch(program.url + path);
    for (const [name, value] of Object.entries(SECURITY_HEADERS)) {
      expect(response.headers.get(name), `${name} on /${path}`).toBe(value);
    }
  }
  const posted = await fetch(program.url, { method: "POST", body: "x" });
  expect(posted.status).toBe(405);
  expect(posted.headers.get("Content-Security-Policy")).toBe(HEADER_POLICY);
});

test("every response of the service worker carries the headers, without any server", async ({ page, program }) => {
  await controlled(page);
  await program.stop();
  const navigation = await page.reload();
  expect(navigation?.fromServiceWorker()).toBe(true);
  expect(await navigation?.headerValue("Content-Security-Policy")).toBe(HEADER_POLICY);
  const kept = FILES.filter((file) => file !== "serviceWorker.js" && file !== "headers.json");
  const answers = await page.evaluate(
    (paths) =>
      Promise.all(
        paths.map(async (path) => {
          const response = await fetch(path);
          return { path, status: response.status, headers: Object.fromEntries(response.headers) };
        }),
      ),
    kept,
  );
  for (const { path, status, headers } of answers) {
    expect(status, path).toBe(200);
    for (const [name, value] of Object.entries(SECURITY_HEADERS))
      expect(headers[name.toLowerCase()], `${name} on ${path}`).toBe(value);
  }
});

test("nothing on the page reaches another origin", async ({ page, guard }) => {
  const foreign = await startForeignServer();
  try {
    await fetch(foreign.url);
    const reachable = foreign.hits();
    expect(reachable, "the foreign server answers whoever comes").toBeGreaterThan(0);

    await controlled(page);
    const outcomes = await page.evaluate(async (url) => {
      const settled = (element: HTMLElement, set: () => void) =>
        new Promise<string>((done) => {
          element.onload = () => done("answered");
          element.onerror = () => done("refused");
          set();
          document.head.append(element);
        });
      const script = document.createElement("script");
      const image = document.createElement("img");
      const style = document.createElement("link");
      style.rel = "stylesheet";
      const socket = new Promise<string>((done) => {
        try {
          const open = new WebSocket(url.replace("http", "ws"));
          open.onopen = () => done("answered");
          open.onerror = () => done("refused");
        } catch {
          done("refused");
        }
      });
      const events = new Promise<string>((done) => {
        const source = new EventSource(url);
        source.onopen = () => done("answered");
        source.onerror = () => {
          source.close();
          done("refused");
        };
      });
      navigator.sendBeacon(url, "x");
      return {
        fetch: await fetch(url, { mode: "no-cors" }).then(
          () => "answered",
          () => "refused",
        ),
        import: await import(/* @vite-ignore */ url).then(
          () => "answered",
          () => "refused",
        ),
        script: await settled(script, () => (script.src = url)),
        image: await settled(image, () => (image.src = url)),
        style: await settled(style, () => (style.href = url)),
        socket: await socket,
        events: await events,
      };
    }, foreign.url);
    for (const [way, outcome] of Object.entries(outcomes)) expect(outcome, way).toBe("refused");
    expect(foreign.hits()).toBe(reachable);
    expect(guard.take(REFUSED).length, "the guard saw the attempts").toBeGreaterThan(0);
  } finally {
    await foreign.close();
  }
});

/** So that only the server's headers stand between a web worker and another origin. */
async function withoutServiceWorker(page: Page): Promise<void> {
  await page.addInitScript(() => {
    Object.defineProperty(navigator.serviceWorker, "register", { value: () => new Promise(() => undefined) });
  });
  await page.goto("./");
  expect(await page.evaluate(() => navigator.serviceWorker.controller)).toBeNull();
}

test("no web worker reaches another origin: by the server's header on the first visit", async ({
  page,
  program,
  guard,
}, testInfo) => {
  const foreign = await startForeignServer();
  try {
    await program.start(withProbe(testInfo.outputPath("with-headers"), SECURITY_HEADERS));
    await withoutServiceWorker(page);
    expect(await fetchFromWorker(page, program.url)).toBe("answered");
    expect(await fetchFromWorker(page, foreign.url)).toBe("refused");
    expect(foreign.hits()).toBe(0);
    guard.take(REFUSED);
  } finally {
    await foreign.close();
  }
});

test("the probe shows a leak where there is one: no headers and no service worker", async ({
  page,
  program,
  guard,
}, testInfo) => {
  const foreign = await startForeignServer();
  try {
    await program.start(withProbe(testInfo.outputPath("bare"), {}));
    await withoutServiceWorker(page);
    // The page's own <meta> policy does not bind its workers. docs/offline.md says so.
    expect(await fetchFromWorker(page, foreign.url)).toBe("answered");
    expect(foreign.hits()).toBe(1);
    expect(guard.take(/foreign request/)).toHaveLength(1);
  } finally {
    await foreign.close();
  }
});

test("no web worker reaches another origin: by the service worker on a host that sends no headers", async ({
  page,
  program,
  guard,
}, testInfo) => {
  const foreign = await startForeignServer();
  try {
    await program.start(withProbe(testInfo.outputPath("without-headers"), {}));
    await controlled(page);
    await page.reload();
    expect(await fetchFromWorker(page, program.url)).toBe("answered");
    expect(await fetchFromWorker(page, foreign.url)).toBe("refused");
    expect(foreign.hits()).toBe(0);
    guard.take(REFUSED);
  } finally {
    await foreign.close();
  }
});

test("another site cannot frame the page", async ({ page, program, guard }) => {
  const foreign = await startForeignServer(`<iframe src="${program.url}"></iframe>`);
  try {
    await page.goto(foreign.url);
    const frame = page.frames()[1];
    await expect.poll(() => frame?.url()).toMatch(/^chrome-error:/);
    guard.take(/foreign request|Content Security Policy/);
  } finally {
    await foreign.close();
  }
});

test("inline script and code made from text are refused", async ({ page, guard }) => {
  await page.goto("./");
  const outcome = await page.evaluate(
    () =>
      new Promise((done) => {
        const inline = document.createElement("script");
        inline.textContent = "window.inlineRan = true";
        document.head.append(inline);
        // Later, because the test's own call is exempt from the policy.
        setTimeout(() => {
          let made = "refused";
          try {
            made = String(new Function("return 'ran'")());
          } catch {
            // Refused, as it should be.
          }
          done({ inline: "inlineRan" in window, made });
        });
      }),
  );
  expect(outcome).toEqual({ inline: false, made: "refused" });
  await expect.poll(() => guard.incidents.join("\n")).toMatch(/script-src/);
  guard.take(/Content Security Policy|policy breach/);
});

test("the guard sees a foreign request, a breach and an uncaught error", async ({ page, guard }) => {
  await page.goto("./");
  await page.evaluate(() => {
    void fetch("http://127.0.0.1:9/").catch(() => undefined);
    setTimeout(() => {
      throw new Error("planted");
    });
    document.body.setAttribute("style", "");
    const style = document.createElement("style");
    style.textContent = "body { color: red }";
    document.head.append(style);
  });
  await expect.poll(() => guard.incidents.join("\n")).toMatch(/planted/);
  await expect.poll(() => guard.incidents.join("\n")).toMatch(/style-src/);
  await expect.poll(() => guard.incidents.join("\n")).toMatch(/connect-src/);
  guard.take(/./);
});
