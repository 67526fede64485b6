import { createHash } from "node:crypto";
import { readdirSync, readFileSync, writeFileSync } from "node:fs";
import { dirname, join, relative, sep } from "node:path";
import { build, type Plugin } from "vite";
import { META_POLICY, SECURITY_HEADERS } from "../src/shell/offline/contentSecurityPolicy.ts";

export const WORKER_FILE = "serviceWorker.js";
/** For whoever serves the files; read by .ci/serve.mjs, never by the page. */
export const HEADERS_FILE = "headers.json";

/** Puts the policy into the page, right after the charset and before anything it must bind. */
export function policyIntoPage(): Plugin {
  const charset = '<meta charset="utf-8" />';
  return {
    name: "ebbline-policy",
    apply: "build",
    transformIndexHtml: {
      order: "post",
      handler(html) {
        if (!html.includes(charset)) throw new Error(`index.html lacks ${charset}`);
        return html.replace(
          charset,
          `${charset}\n    <meta http-equiv="Content-Security-Policy" content="${META_POLICY}" />`,
        );
      },
    },
  };
}

/** After the page is built: lists every file with its digest and builds the service worker that keeps them. */
export function offlineWorker(workerSource: string): Plugin {
  let outDir = "";
  return {
    name: "ebbline-offline",
    apply: "build",
    enforce: "post",
    configResolved(config) {
      outDir = config.build.outDir;
    },
    // Not closeBundle: that also runs after a failed build, and its own failure would hide the first.
    writeBundle: {
      order: "post",
      sequential: true,
      async handler() {
        const files = listFiles(outDir);
        const buildId = digest(files.map((file) => `${file.sha256} ${file.path}`).join("\n")).slice(0, 12);
        await build({
          configFile: false,
          root: dirname(workerSource),
          publicDir: false,
          logLevel: "warn",
          define: { PRECACHE_LIST: JSON.stringify(files), BUILD_ID: JSON.stringify(buildId) },
          build: {
            outDir,
            emptyOutDir: false,
            target: "es2022",
            rolldownOptions: { input: workerSource, output: { format: "iife", entryFileNames: WORKER_FILE } },
          },
        });
        writeFileSync(join(outDir, HEADERS_FILE), `${JSON.stringify(SECURITY_HEADERS, null, 2)}\n`);
      },
    },
  };
}

function listFiles(directory: string): { path: string; sha256: string }[] {
  return readdirSync(directory, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => join(entry.parentPath, entry.name))
    .map((file) => ({ path: relative(directory, file).split(sep).join("/"), sha256: digest(readFileSync(file)) }))
    .filter((file) => file.path !== WORKER_FILE && file.path !== HEADERS_FILE)
    .sort((a, b) => (a.path < b.path ? -1 : 1));
}

function digest(content: string | Buffer): string {
  return createHash("sha256").update(content).digest("hex");
}
