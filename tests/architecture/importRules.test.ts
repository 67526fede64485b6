import { describe, expect, test } from "vitest";
import { importFaults } from "./importRules.ts";
import { faultText, readFiles } from "./sourceFiles.ts";

const SOURCES = /\.(ts|tsx|css)$/;

describe("imports of src", () => {
  const files = readFiles("src", SOURCES);

  test("are read at all", () => {
    expect(Object.keys(files).length).toBeGreaterThan(20);
  });

  test("go strictly downward, through the doors, and name packages only in their places", () => {
    expect(importFaults(files).map(faultText)).toEqual([]);
  });
});

/** One planted breach a rule: the file, its text, and the line and words that must be named. */
const PLANTED: readonly (readonly [string, string, string, number, string])[] = [
  [
    "core to shell",
    "src/core/case/a.ts",
    'import { x } from "../../shell/store/store.ts";',
    1,
    "core may not import shell/store",
  ],
  [
    "core to view, type import",
    "src/core/case/a.ts",
    '\nimport type { X } from "../../view/ui/X.tsx";',
    2,
    "core may not import view",
  ],
  ["core to app", "src/core/case/a.ts", 'export * from "../../app/compose.ts";', 1, "core may not import app"],
  [
    "store to storage",
    "src/shell/store/a.ts",
    'export { x } from "../storage/database.ts";',
    1,
    "shell/store may not import shell/storage",
  ],
  [
    "storage to store",
    "src/shell/storage/a.ts",
    'import { x } from "../store/store.ts";',
    1,
    "shell/storage may not import shell/store",
  ],
  [
    "workers to storage",
    "src/shell/workers/a.ts",
    'import { x } from "../storage/database.ts";',
    1,
    "shell/workers may not import shell/storage",
  ],
  [
    "offline to core",
    "src/shell/offline/a.ts",
    'import { x } from "../../core/case/index.ts";',
    1,
    "shell/offline may not import core",
  ],
  [
    "view to storage",
    "src/view/bench/a.ts",
    'import { x } from "../../shell/storage/database.ts";',
    1,
    "view may not import shell/storage",
  ],
  ["view to app", "src/view/bench/a.ts", 'import { x } from "../../app/compose.ts";', 1, "view may not import app"],
  ["no layer", "src/other/a.ts", 'import { x } from "../core/case/index.ts";', 1, "lies in no layer"],
  ["out of src", "src/view/bench/a.ts", 'import x from "../../../demo-data/a.json";', 1, "leaves src"],
  [
    "core upward",
    "src/core/units/a.ts",
    'import { x } from "../case/index.ts";',
    1,
    "core/units may not import core/case",
  ],
  [
    "core sideways",
    "src/core/time/a.ts",
    'import { x } from "../units/index.ts";',
    1,
    "core/time may not import core/units",
  ],
  [
    "core to messages",
    "src/core/analysis/a.ts",
    'import { x } from "../messages/index.ts";',
    1,
    "core/analysis may not import core/messages",
  ],
  [
    "result upward",
    "src/core/result/index.ts",
    'import { x } from "../units/index.ts";',
    1,
    "core/result may not import core/units",
  ],
  [
    "core folder without a row",
    "src/core/novelty/a.ts",
    'import { x } from "../units/index.ts";',
    1,
    "core/novelty has no row",
  ],
  [
    "past the door, in core",
    "src/core/case/a.ts",
    'import { x } from "../units/quantity.ts";',
    1,
    "core/units is entered by its index.ts only",
  ],
  [
    "past the door, from view",
    "src/view/ui/a.ts",
    'import type { X } from "../../core/units/quantity.ts";',
    1,
    "core/units is entered by its index.ts only",
  ],
  [
    "screen to screen",
    "src/view/bench/a.tsx",
    'import { X } from "../summary/X.tsx";',
    1,
    "screens never import each other (bench, summary)",
  ],
  [
    "chart to screen",
    "src/view/chart/a.tsx",
    'import { X } from "../bench/X.tsx";',
    1,
    "view/chart may not import a screen (bench)",
  ],
  [
    "ui to the bridge",
    "src/view/ui/a.tsx",
    'import { useWorkbench } from "../useWorkbench.ts";',
    1,
    "view/ui takes props only",
  ],
  [
    "past the bridge",
    "src/view/bench/a.tsx",
    'import { store } from "../../shell/store/store.ts";',
    1,
    "only useWorkbench.ts reaches the store",
  ],
  ["react in core", "src/core/units/a.ts", 'import { useState } from "react";', 1, "react: only in"],
  ["react in shell", "src/shell/store/a.ts", 'import { useState } from "react";', 1, "react: only in"],
  [
    "react-aria in shell",
    "src/shell/store/a.ts",
    'import { Button } from "react-aria-components";',
    1,
    "react-aria-components: only in",
  ],
  ["zustand in view", "src/view/bench/a.ts", 'import { useStore } from "zustand";', 1, "zustand: only in"],
  ["dexie in store", "src/shell/store/a.ts", 'import type Dexie from "dexie";', 1, "dexie: only in"],
  ["d3-scale in ui", "src/view/ui/a.ts", 'import { scaleLinear } from "d3-scale";', 1, "d3-scale: only in"],
  ["d3-shape in bench", "src/view/bench/a.ts", 'import { line } from "d3-shape";', 1, "d3-shape: only in"],
  ["mathjs in kinetics", "src/core/kinetics/a.ts", 'import { exp } from "mathjs/number";', 1, "mathjs: only in"],
  [
    "temporal in case",
    "src/core/case/a.ts",
    'import { Temporal } from "temporal-polyfill";',
    1,
    "temporal-polyfill: only in",
  ],
  [
    "comlink anywhere",
    "src/shell/workers/a.ts",
    'import { wrap } from "comlink";',
    1,
    "comlink: not a package src may use",
  ],
  [
    "node anywhere",
    "src/core/units/a.ts",
    'import { readFileSync } from "node:fs";',
    1,
    "node:fs: not a package src may use",
  ],
  ["an index file in view", "src/view/ui/index.ts", "export const x = 1;", 1, "have no index file"],
  ["without an ending", "src/core/units/a.ts", 'import { x } from "./b";', 1, "carries its file's ending"],
];

/** The same breach in every way a file can name another. */
const WAYS: readonly (readonly [string, string])[] = [
  ["static", 'import { x } from "../case/index.ts";'],
  ["bare", 'import "../case/index.ts";'],
  ["type", 'import type { X } from "../case/index.ts";'],
  ["type specifier", 'import { type X } from "../case/index.ts";'],
  ["re-export", 'export { x } from "../case/index.ts";'],
  ["re-export of all", 'export * from "../case/index.ts";'],
  ["re-export of a type", 'export type { X } from "../case/index.ts";'],
  ["dynamic", 'const x = await import("../case/index.ts");'],
  ["dynamic, template", "const x = await import(`../case/index.ts`);"],
  ["type of an import", 'type X = import("../case/index.ts").X;'],
  ["typeof an import", 'type X = typeof import("../case/index.ts");'],
  ["import equals", 'import x = require("../case/index.ts");'],
  ["require", 'const x = require("../case/index.ts");'],
  ["worker address", 'const x = new URL("../case/index.ts", import.meta.url);'],
  ["glob", 'const x = import.meta.glob("../case/index.ts");'],
  ["query", 'import x from "../case/index.ts?raw";'],
  ["over several lines", 'import {\n  x,\n} from "../case/index.ts";'],
];

describe("a planted breach is named with its file and line", () => {
  test.each(PLANTED)("%s", (_, file, text, line, words) => {
    const faults = importFaults({ [file]: text });
    expect(faults.map(({ file: where, line: at }) => [where, at])).toEqual([[file, line]]);
    expect(faults[0]?.rule).toContain(words);
  });

  test.each(WAYS)("%s import", (_, text) => {
    const faults = importFaults({ "src/core/units/a.ts": `// first line\n${text}` });
    expect(faults.map(faultText)).toEqual([
      expect.stringMatching(/^src\/core\/units\/a\.ts:2 .*core\/units may not import core\/case: not below it$/),
    ]);
  });

  test("a computed import", () => {
    expect(importFaults({ "src/app/a.ts": "const x = await import(name);" }).map(faultText)).toEqual([
      "src/app/a.ts:1 a computed import cannot be checked",
    ]);
  });

  test("a style sheet's import", () => {
    expect(importFaults({ "src/view/ui/a.css": '\n@import "../bench/a.css";' }).map(faultText)).toEqual([
      "src/view/ui/a.css:2 ../bench/a.css: view/ui may not import a screen (bench)",
    ]);
  });
});

test("what is allowed is not named", () => {
  expect(
    importFaults({
      "src/app/main.tsx":
        'import { createRoot } from "react-dom/client";\nimport { x } from "../shell/storage/a.ts";\nimport d from "../../demo-data/a.json";',
      "src/view/useWorkbench.ts":
        'import { useStore } from "zustand";\nimport { store } from "../shell/store/store.ts";',
      "src/view/Workbench.tsx": 'import { Bench } from "./bench/Bench.tsx";',
      "src/view/bench/Bench.tsx":
        'import type { OpenCase } from "../../shell/store/workbenchState.ts";\nimport { useWorkbench } from "../useWorkbench.ts";\nimport { scaleLinear } from "d3-scale";\nimport { Field } from "../ui/Field.tsx";',
      "src/shell/store/store.ts":
        'import { createStore } from "zustand/vanilla";\nimport { x } from "../../core/case/index.ts";',
      "src/core/case/a.ts":
        'import { x } from "../result/index.ts";\nimport { y } from "./b.ts";\nimport z from "./records/c.json";',
      "src/core/messages/a.ts": 'import type { Analysis } from "../analysis/index.ts"; // import x from "react"',
      "src/core/units/a.ts": 'const text = \'import x from "react"\'; /* import("react") */',
    }).map(faultText),
  ).toEqual([]);
});
