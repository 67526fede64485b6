import { SECURITY_HEADERS } from "./contentSecurityPolicy.ts";

/**
 * Keeps the whole program on this machine, so that it opens and works with no network and no server.
 * The build fills in the two constants (.ci/offlineBuild.ts).
 */
declare const self: ServiceWorkerGlobalScope;
declare const PRECACHE_LIST: readonly { readonly path: string; readonly sha256: string }[];
declare const BUILD_ID: string;

const precache = PRECACHE_LIST;
const CACHE_PREFIX = "ebbline-program-";
const CACHE_NAME = CACHE_PREFIX + BUILD_ID;
const start = new URL("./", self.location.href);
const startPage = new URL("index.html", start);

/** `Vary` must not matter: a host that answers `Vary: Origin` would otherwise hide module scripts from an offline page. */
const MATCH: CacheQueryOptions = { ignoreVary: true };

self.addEventListener("install", (event) => {
  // No skipWaiting here: a new version never arrives under an open case. It waits until the user agrees.
  event.waitUntil(storeProgram());
});

self.addEventListener("activate", (event) => {
  event.waitUntil(dropOldPrograms().then(() => self.clients.claim()));
});

self.addEventListener("message", (event) => {
  if (event.data === "take-over") event.waitUntil(self.skipWaiting());
  if (event.data === "claim") event.waitUntil(self.clients.claim());
});

self.addEventListener("fetch", (event) => {
  event.respondWith(answer(event.request).catch(() => Response.error()));
});

/** All files or none, each byte for byte what was built: half a deployment is never taken. */
async function storeProgram(): Promise<void> {
  const cache = await caches.open(CACHE_NAME);
  try {
    await Promise.all(precache.map((file) => storeFile(cache, file.path, file.sha256)));
  } catch (fault) {
    await caches.delete(CACHE_NAME);
    throw fault;
  }
}

async function storeFile(cache: Cache, path: string, sha256: string): Promise<void> {
  const url = new URL(path, start);
  const response = await fetch(url, { cache: "reload", credentials: "same-origin" });
  if (!response.ok) throw new Error(`${path}: answered ${response.status}`);
  const bytes = await response.arrayBuffer();
  if ((await hexDigest(bytes)) !== sha256) throw new Error(`${path}: not the file that was built`);
  const type = response.headers.get("Content-Type");
  await cache.put(url, new Response(bytes, { headers: type === null ? {} : { "Content-Type": type } }));
}

async function hexDigest(bytes: ArrayBuffer): Promise<string> {
  const digest = new Uint8Array(await crypto.subtle.digest("SHA-256", bytes));
  return Array.from(digest, (byte) => byte.toString(16).padStart(2, "0")).join("");
}

/**
 * The version before this one is kept: another tab may still run it and ask for a part it has not loaded yet.
 * Cache names come in order of creation.
 */
async function dropOldPrograms(): Promise<void> {
  const older = (await caches.keys()).filter((name) => name.startsWith(CACHE_PREFIX) && name !== CACHE_NAME);
  await Promise.all(older.slice(0, -1).map((name) => caches.delete(name)));
}

async function answer(request: Request): Promise<Response> {
  const url = new URL(request.url);
  // The worker's own answer to a foreign request, from the page or from a web worker, whatever policy they run under.
  if (url.origin !== self.location.origin || request.method !== "GET") return Response.error();
  if (request.mode === "navigate") return answerNavigation(url);
  return withHeaders((await find(url)) ?? (await fetch(request)));
}

async function answerNavigation(url: URL): Promise<Response> {
  const isStart = url.pathname === start.pathname || url.pathname === startPage.pathname;
  if (isStart) return withHeaders((await find(startPage)) ?? (await fetch(startPage)));
  const file = await find(new URL(url.pathname, url));
  return file ? withHeaders(file) : Response.redirect(start.href);
}

async function find(url: URL): Promise<Response | undefined> {
  const own = await caches.open(CACHE_NAME);
  const found = await own.match(url, MATCH);
  if (found) return found;
  for (const name of await caches.keys()) {
    if (!name.startsWith(CACHE_PREFIX) || name === CACHE_NAME) continue;
    const kept = await (await caches.open(name)).match(url, MATCH);
    if (kept) return kept;
  }
  return undefined;
}

function withHeaders(response: Response): Response {
  const headers = new Headers(response.headers);
  for (const [name, value] of Object.entries(SECURITY_HEADERS)) headers.set(name, value);
  return new Response(response.body, { status: response.status, statusText: response.statusText, headers });
}
