import { posix } from "node:path";
import { type ImportLine, importLines } from "./importLines.ts";
import type { Fault, Files } from "./sourceFiles.ts";

/** The table of docs/decisions/layers.md as code: who may name whom. */

const LAYERS: Readonly<Record<string, readonly string[]>> = {
  app: ["app", "view", "shell/store", "shell/storage", "shell/workers", "shell/offline", "core"],
  view: ["view", "shell/store", "core"],
  "shell/store": ["shell/store", "core"],
  "shell/storage": ["shell/storage", "core"],
  "shell/workers": ["shell/workers", "core"],
  "shell/offline": ["shell/offline"],
  core: ["core"],
};

/** Core's folders from the bottom up. A folder names only folders of a lower row. */
const CORE_ROWS: readonly (readonly string[])[] = [
  ["result"],
  ["units", "time", "numerics"],
  ["kinetics", "noncompartmental", "patient"],
  ["regimen"],
  ["medicine"],
  ["estimation"],
  ["decision"],
  ["case"],
  ["analysis"],
  ["messages"],
];

const SCREENS = ["bench", "cases", "medicines", "settings", "summary", "working"];

const BRIDGE = "src/view/useWorkbench.ts";

/** Where each package may be named. A package that is not here may be named nowhere. */
const PACKAGES: Readonly<Record<string, readonly string[]>> = {
  react: ["src/view/", "src/app/"],
  "react-dom": ["src/view/", "src/app/"],
  "react-aria-components": ["src/view/", "src/app/"],
  "@internationalized/date": ["src/view/"],
  "@fontsource/atkinson-hyperlegible": ["src/view/style/"],
  zustand: ["src/shell/store/", BRIDGE],
  dexie: ["src/shell/storage/"],
  "d3-scale": ["src/view/chart/", "src/view/bench/"],
  "d3-shape": ["src/view/chart/"],
  mathjs: ["src/core/units/", "src/core/medicine/"],
  "temporal-polyfill": ["src/core/time/"],
  "@noble/hashes": ["src/core/case/", "src/core/analysis/", "src/shell/storage/"],
  zod: ["src/core/", "src/app/", "src/shell/workers/", "src/shell/storage/"],
};

/** Data beside the code, and the layers that may take it: the demo cases, and the version. */
const OUTSIDE_DATA: Readonly<Record<string, readonly string[]>> = {
  "demo-data/": ["app"],
  "package.json": ["app", "view"],
};

/** Every import line that breaks a rule, with the line named. `files`: the files of src, path from the project's top to text. */
export function importFaults(files: Files): Fault[] {
  return Object.entries(files).flatMap(([file, text]) => {
    const own: Fault[] = [];
    if (/^src\/(shell|view|app)\/.*index\.tsx?$/.test(file))
      own.push({ file, line: 1, rule: "shell, view and app have no index file" });
    for (const line of importLines(file, text)) {
      for (const rule of lineFaults(file, line)) own.push({ file, line: line.line, rule });
    }
    return own;
  });
}

function lineFaults(file: string, line: ImportLine): string[] {
  const { specifier } = line;
  if (specifier === null) return ["a computed import cannot be checked"];
  if (!specifier.startsWith(".")) return packageFaults(file, specifier);
  if (!/\.\w+$/.test(specifier)) return [`${specifier}: an import carries its file's ending`];
  const target = posix.join(posix.dirname(file), specifier);
  return [...layerFaults(file, target), ...coreFaults(file, target), ...viewFaults(file, target, line.isTypeOnly)].map(
    (rule) => `${specifier}: ${rule}`,
  );
}

function packageFaults(file: string, specifier: string): string[] {
  const name = specifier.split("/", specifier.startsWith("@") ? 2 : 1).join("/");
  const places = PACKAGES[name];
  if (!places) return [`${name}: not a package src may use`];
  return places.some((place) => file.startsWith(place)) ? [] : [`${name}: only in ${places.join(", ")}`];
}

function layerFaults(file: string, target: string): string[] {
  const from = layerOf(file);
  if (!from) return ["the importing file lies in no layer"];
  if (!target.startsWith("src/")) {
    const isAllowed = Object.entries(OUTSIDE_DATA).some(
      ([place, layers]) => target.startsWith(place) && layers.includes(from),
    );
    return isAllowed ? [] : ["leaves src"];
  }
  const to = layerOf(target);
  if (!to) return ["leads to no layer"];
  return LAYERS[from]?.includes(to) ? [] : [`${from} may not import ${to}`];
}

function layerOf(path: string): string | undefined {
  const [, first = "", second = ""] = path.split("/");
  return [first, `${first}/${second}`].find((name) => name in LAYERS);
}

function coreFaults(file: string, target: string): string[] {
  const to = coreFolder(target);
  if (to === null) return [];
  const from = coreFolder(file);
  if (from === to) return [];
  const faults = target === `src/core/${to}/index.ts` ? [] : [`core/${to} is entered by its index.ts only`];
  if (from === null) return faults;
  if (coreRow(from) === -1) return [...faults, `core/${from} has no row in the order of core's folders`];
  if (coreRow(to) === -1) return [...faults, `core/${to} has no row in the order of core's folders`];
  if (coreRow(to) >= coreRow(from)) faults.push(`core/${from} may not import core/${to}: not below it`);
  return faults;
}

function coreFolder(path: string): string | null {
  return /^src\/core\/([^/]+)\//.exec(path)?.[1] ?? null;
}

function coreRow(folder: string): number {
  return CORE_ROWS.findIndex((row) => row.includes(folder));
}

function viewFaults(file: string, target: string, isTypeOnly: boolean): string[] {
  if (!file.startsWith("src/view/")) return [];
  if (target.startsWith("src/shell/store/") && !isTypeOnly && file !== BRIDGE) {
    return ["only useWorkbench.ts reaches the store; others take its types"];
  }
  const from = viewFolder(file);
  const to = viewFolder(target);
  if (from === null || from === to) return [];
  if (to !== null && SCREENS.includes(to)) {
    return [
      SCREENS.includes(from)
        ? `screens never import each other (${from}, ${to})`
        : `view/${from} may not import a screen (${to})`,
    ];
  }
  return from === "ui" && target === BRIDGE ? ["view/ui takes props only"] : [];
}

function viewFolder(path: string): string | null {
  return /^src\/view\/([^/]+)\//.exec(path)?.[1] ?? null;
}
