import { fileURLToPath } from "node:url";
import optimizeLocales from "@react-aria/optimize-locales-plugin";
import react from "@vitejs/plugin-react";
import { defineConfig } from "vitest/config";

const at = (path: string) => fileURLToPath(new URL(path, import.meta.url));

export default defineConfig({
  root: at("./src"),
  publicDir: at("./public"),
  build: { outDir: at("./dist"), emptyOutDir: true, target: "es2022" },
  worker: { format: "es" },
  plugins: [{ ...optimizeLocales.vite({ locales: ["en-GB"] }), enforce: "pre" }, react()],
  test: {
    root: at("."),
    projects: [
      {
        test: { name: "unit", root: at("."), environment: "node", include: ["tests/{core,shell,architecture}/**/*.test.ts"] },
      },
      {
        test: { name: "outside", root: at("."), environment: "node", include: ["tests/outside/**/*.test.ts"] },
      },
      {
        plugins: [react()],
        test: {
          name: "component",
          root: at("."),
          environment: "jsdom",
          include: ["tests/{view,app}/**/*.test.{ts,tsx}"],
          setupFiles: ["tests/view/setup.ts"],
          testTimeout: 20_000,
        },
      },
      {
        test: { name: "bench", root: at("."), environment: "node", include: [], benchmark: { include: ["tests/bench/**/*.bench.ts"] } },
      },
    ],
  },
});
