import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { connect } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { startServer } from "../../.ci/serve.mjs";
import { SECURITY_HEADERS } from "../../src/shell/offline/contentSecurityPolicy.ts";

let top = "";
let folder = "";
let server: Awaited<ReturnType<typeof startServer>>;

beforeAll(async () => {
  top = mkdtempSync(join(tmpdir(), "ebbline-serve-"));
  folder = join(top, "dist");
  mkdirSync(join(folder, "assets"), { recursive: true });
  mkdirSync(join(top, "dist-secret"));
  writeFileSync(join(top, "secret.txt"), "secret");
  writeFileSync(join(top, "dist-secret", "secret.txt"), "secret");
  writeFileSync(join(folder, "headers.json"), JSON.stringify(SECURITY_HEADERS));
  writeFileSync(join(folder, "index.html"), "<p>page</p>");
  writeFileSync(join(folder, "serviceWorker.js"), "0");
  writeFileSync(join(folder, "manifest.webmanifest"), "{}");
  writeFileSync(join(folder, "icon.svg"), "<svg/>");
  writeFileSync(join(folder, "assets", "index-Ab3_-xYz.js"), "0");
  writeFileSync(join(folder, "assets", "font-BbWidj28.woff2"), "0");
  server = await startServer({ folder, port: 0 });
});
afterAll(async () => {
  await server.close();
  rmSync(top, { recursive: true, force: true });
});

/** The whole answer to a request target sent as it is: fetch would tidy it first. */
function sendRaw(target: string, header = "Accept: */*"): Promise<string> {
  return new Promise((done, fail) => {
    let answer = "";
    const socket = connect(server.port, "127.0.0.1", () =>
      socket.write(`GET ${target} HTTP/1.1\r\nHost: x\r\nConnection: close\r\n${header}\r\n\r\n`),
    );
    socket.on("data", (data) => {
      answer += data;
    });
    socket.on("close", () => done(answer));
    socket.on("error", fail);
  });
}

test.each([
  ["", "text/html; charset=utf-8", "no-cache"],
  ["index.html", "text/html; charset=utf-8", "no-cache"],
  ["serviceWorker.js", "text/javascript; charset=utf-8", "no-cache"],
  ["manifest.webmanifest", "application/manifest+json; charset=utf-8", "no-cache"],
  ["icon.svg", "image/svg+xml", "no-cache"],
  ["assets/index-Ab3_-xYz.js", "text/javascript; charset=utf-8", "public, max-age=31536000, immutable"],
  ["assets/font-BbWidj28.woff2", "font/woff2", "public, max-age=31536000, immutable"],
])("/%s has its media type and may be kept as long as is right", async (path, type, caching) => {
  const response = await fetch(server.url + path);
  expect(response.status).toBe(200);
  expect(response.headers.get("Content-Type")).toBe(type);
  expect(response.headers.get("Cache-Control")).toBe(caching);
});

test.each([
  "/../secret.txt",
  "/%2e%2e/secret.txt",
  "/..%2fsecret.txt",
  "/assets/../../secret.txt",
  "/../dist-secret/secret.txt",
  "/%2e%2e%2fdist-secret/secret.txt",
  "//etc/hostname",
  "/..\\secret.txt",
  "/%5c..%5csecret.txt",
])("%s gives nothing from outside the folder", async (target) => {
  const answer = await sendRaw(target);
  expect(answer).toMatch(/^HTTP\/1\.1 (400|404) /);
  expect(answer).not.toContain("\nsecret");
});

test.each([
  ["/%", 400],
  ["/a%00b", 400],
  ["/assets", 404],
  ["/assets/", 404],
  ["/nothing.js", 404],
])("%s is answered with %d", async (target, status) => {
  expect(await sendRaw(target)).toMatch(new RegExp(`^HTTP/1\\.1 ${status} `));
});

test.each(["Sec-Fetch-Mode: navigate", "Accept: text/html,*/*"])(
  "an unknown address leads a person to the page (%s)",
  async (header) => {
    const answer = await sendRaw("/some/page", header);
    expect(answer).toMatch(/^HTTP\/1\.1 302 /);
    expect(answer).toMatch(/\r\nLocation: \/\r\n/);
  },
);

test.each(["Sec-Fetch-Mode: cors", "Sec-Fetch-Mode: no-cors\r\nAccept: text/html", "Accept: */*"])(
  "an unknown address is refused to anything else (%s)",
  async (header) => {
    expect(await sendRaw("/some/page", header)).toMatch(/^HTTP\/1\.1 404 /);
  },
);

test("only GET and HEAD are answered", async () => {
  const head = await fetch(server.url, { method: "HEAD" });
  expect([head.status, head.headers.get("Content-Length"), await head.text()]).toEqual([200, "11", ""]);
  for (const method of ["POST", "PUT", "DELETE", "OPTIONS"])
    expect((await fetch(server.url, { method })).status, method).toBe(405);
});

describe("every answer", () => {
  test.each(["", "assets/index-Ab3_-xYz.js", "nothing", "%"])("/%s carries the security headers", async (path) => {
    const response = await fetch(server.url + path);
    for (const [name, value] of Object.entries(SECURITY_HEADERS)) expect(response.headers.get(name), name).toBe(value);
  });
});

test("a taken port is said, and the next free one used when asked to", async () => {
  const taken: number[] = [];
  const second = await startServer({ folder, port: server.port, seekPort: true, onTaken: (port) => taken.push(port) });
  expect(taken[0]).toBe(server.port);
  expect(second.port).toBeGreaterThan(server.port);
  await second.close();
  await expect(startServer({ folder, port: server.port })).rejects.toThrow(/EADDRINUSE/);
});

test("a folder without a built program is refused", async () => {
  await expect(startServer({ folder: top, port: 0 })).rejects.toThrow(/headers\.json is missing/);
});
