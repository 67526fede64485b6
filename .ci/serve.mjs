import { createReadStream, existsSync, readFileSync, statSync } from "node:fs";
import { createServer } from "node:http";
import { extname, join, resolve, sep } from "node:path";

/** A static server for the built program: answers on this machine only, files of one folder only. */

const HOST = "127.0.0.1";
const HIGHEST_PORT = 65_535;

/** @type {Readonly<Record<string, string>>} */
const MEDIA_TYPES = {
  ".css": "text/css; charset=utf-8",
  ".html": "text/html; charset=utf-8",
  ".js": "text/javascript; charset=utf-8",
  ".json": "application/json; charset=utf-8",
  ".png": "image/png",
  ".svg": "image/svg+xml",
  ".txt": "text/plain; charset=utf-8",
  ".webmanifest": "application/manifest+json; charset=utf-8",
  ".woff": "font/woff",
  ".woff2": "font/woff2",
};

/** The build puts a digest into these names, so a name never changes its content. */
const HASHED_NAME = /^\/assets\/.+-[\w-]{8}\.\w+$/;

/**
 * @typedef {object} RunningServer
 * @property {string} url with a closing slash
 * @property {number} port
 * @property {() => Promise<void>} close
 */

/**
 * Serves `folder` on `port`, or with `seekPort` on the next free one. Port 0 means any.
 * @param {{ folder: string, port: number, seekPort?: boolean, onTaken?: (port: number) => void }} options
 * @returns {Promise<RunningServer>}
 */
export async function startServer({ folder, port, seekPort = false, onTaken = () => {} }) {
  const root = resolve(folder);
  const headers = readHeaders(root);
  for (let tried = port; tried <= HIGHEST_PORT; tried += 1) {
    const server = createServer((request, response) => answer(root, headers, request, response));
    const fault = await listen(server, tried);
    if (!fault) {
      const address = server.address();
      const own = typeof address === "object" && address ? address.port : tried;
      return { url: `http://${HOST}:${own}/`, port: own, close: () => closeServer(server) };
    }
    if (fault.code !== "EADDRINUSE" || !seekPort) throw fault;
    onTaken(tried);
  }
  throw new Error(`no free port from ${port} on`);
}

/**
 * @param {string} root
 * @returns {Record<string, string>}
 */
function readHeaders(root) {
  const file = join(root, "headers.json");
  if (!existsSync(file)) throw new Error(`${file} is missing: run "npm run build" first`);
  return JSON.parse(readFileSync(file, "utf8"));
}

/**
 * @param {import("node:http").Server} server
 * @param {number} port
 * @returns {Promise<NodeJS.ErrnoException | undefined>}
 */
function listen(server, port) {
  return new Promise((done) => {
    server.once("error", done);
    server.listen(port, HOST, () => {
      server.off("error", done);
      done(undefined);
    });
  });
}

/**
 * @param {import("node:http").Server} server
 * @returns {Promise<void>}
 */
function closeServer(server) {
  return new Promise((done) => {
    server.close(() => done());
    server.closeAllConnections();
  });
}

/**
 * @param {string} root
 * @param {Record<string, string>} headers
 * @param {import("node:http").IncomingMessage} request
 * @param {import("node:http").ServerResponse} response
 */
function answer(root, headers, request, response) {
  for (const [name, value] of Object.entries(headers)) response.setHeader(name, value);
  if (request.method !== "GET" && request.method !== "HEAD") {
    response.setHeader("Allow", "GET, HEAD");
    return refuse(response, 405, "only GET and HEAD");
  }
  const path = readPath(request.url ?? "/");
  if (path === undefined) return refuse(response, 400, "not a readable address");
  const file = findFile(root, path);
  if (file) return sendFile(request.method, path, file, response);
  if (isNavigation(request)) {
    // The page's own addresses are relative, so it is only served from its own place.
    response.setHeader("Location", "/");
    return refuse(response, 302, "see /");
  }
  return refuse(response, 404, "no such file");
}

/**
 * The path of a request with its escapes undone, or undefined.
 * @param {string} target
 */
function readPath(target) {
  try {
    const path = decodeURIComponent(target.split(/[?#]/, 1)[0] ?? "");
    return path.startsWith("/") && !path.includes("\0") && !path.includes("\\") ? path : undefined;
  } catch {
    return undefined;
  }
}

/**
 * @param {string} root
 * @param {string} path
 */
function findFile(root, path) {
  const file = resolve(root, `.${path.endsWith("/") ? `${path}index.html` : path}`);
  if (!file.startsWith(root + sep)) return undefined;
  const found = statSync(file, { throwIfNoEntry: false });
  return found?.isFile() ? { file, size: found.size } : undefined;
}

/** @param {import("node:http").IncomingMessage} request */
function isNavigation(request) {
  const mode = request.headers["sec-fetch-mode"];
  return mode ? mode === "navigate" : (request.headers.accept ?? "").includes("text/html");
}

/**
 * @param {string} method
 * @param {string} path
 * @param {{ file: string, size: number }} found
 * @param {import("node:http").ServerResponse} response
 */
function sendFile(method, path, { file, size }, response) {
  response.writeHead(200, {
    "Content-Type": MEDIA_TYPES[extname(file)] ?? "application/octet-stream",
    "Content-Length": size,
    "Cache-Control": HASHED_NAME.test(path) ? "public, max-age=31536000, immutable" : "no-cache",
  });
  if (method === "HEAD") {
    response.end();
    return;
  }
  const stream = createReadStream(file);
  stream.on("error", () => response.destroy());
  response.on("close", () => stream.destroy());
  stream.pipe(response);
}

/**
 * @param {import("node:http").ServerResponse} response
 * @param {number} status
 * @param {string} text
 */
function refuse(response, status, text) {
  response.writeHead(status, { "Content-Type": "text/plain; charset=utf-8", "Cache-Control": "no-store" });
  response.end(`${text}\n`);
}
