import { fileURLToPath } from "node:url";
import optimizeLocales from "@react-aria/optimize-locales-plugin";
import react from "@vitejs/plugin-react";
import { defineConfig } from "vitest/config";
import { offlineWorker, policyIntoPage } from "./.ci/offlineBuild.ts";
import { DEVELOPMENT_POLICY, SECURITY_HEADERS } from "./src/shell/offline/contentSecurityPolicy.ts";

const at = (path: string) => fileURLToPath(new URL(path, import.meta.url));

export default defineConfig({
  root: at("./src"),
  publicDir: at("./public"),
  // Relative addresses: the built folder works wherever a host puts it.
  base: "./",
  server: { host: "127.0.0.1", headers: { ...SECURITY_HEADERS, "Content-Security-Policy": DEVELOPMENT_POLICY } },
  preview: { host: "127.0.0.1", headers: SECURITY_HEADERS },
  build: {
    outDir: at("./dist"),
    emptyOutDir: true,
    target: "es2022",
    // Nothing inlined: the policy allows fonts and scripts from files only.
    assetsInlineLimit: 0,
    modulePreload: { polyfill: false },
    chunkSizeWarningLimit: 1500,
    rolldownOptions: { checks: { pluginTimings: false } },
  },
  worker: { format: "es" },
  plugins: [
    { ...optimizeLocales.vite({ locales: ["en-GB"] }), enforce: "pre" },
    react(),
    policyIntoPage(),
    offlineWorker(at("./src/shell/offline/serviceWorker.ts")),
  ],
  test: {
    root: at("."),
    allowOnly: false,
    // Left to itself the runner keeps one of two cores free.
    maxWorkers: 2,
    projects: [
      {
        test: {
          name: "unit",
          root: at("."),
          environment: "node",
          // Pure code shares its modules from file to file: reading them anew for each took most of the time.
          isolate: false,
          testTimeout: 30_000,
          include: ["tests/{core,shell,architecture,commands}/**/*.test.ts"],
        },
      },
      {
        test: {
          name: "outside",
          root: at("."),
          environment: "node",
          isolate: false,
          testTimeout: 30_000,
          include: ["tests/outside/**/*.test.ts"],
        },
      },
      {
        plugins: [react()],
        test: {
          name: "component",
          root: at("."),
          environment: "jsdom",
          isolate: false,
          include: ["tests/{view,app}/**/*.test.{ts,tsx}"],
          setupFiles: ["tests/view/setup.ts"],
          testTimeout: 20_000,
        },
      },
      {
        test: {
          name: "bench",
          root: at("."),
          environment: "node",
          include: [],
          benchmark: { include: ["tests/bench/**/*.bench.ts"] },
        },
      },
    ],
  },
});
