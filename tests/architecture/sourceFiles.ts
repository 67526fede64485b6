import { readdirSync, readFileSync } from "node:fs";
import { join, relative, sep } from "node:path";
import { fileURLToPath } from "node:url";

/** Path from the project's top, with forward slashes, to text. */
export type Files = Readonly<Record<string, string>>;

export interface Fault {
  readonly file: string;
  readonly line: number;
  /** Which rule is broken, and by what. */
  readonly rule: string;
}

export const PROJECT = fileURLToPath(new URL("../..", import.meta.url));

/** What a person did not write, or what is no text. */
const SKIPPED_FOLDERS = new Set(["node_modules", "dist", "test-results", ".git", ".vite"]);

/** Every file of the project under `folder` whose name fits, by its path from the project's top. */
export function listFiles(folder: string, name: RegExp): string[] {
  const walk = (directory: string): string[] =>
    readdirSync(directory, { withFileTypes: true }).flatMap((entry) => {
      if (entry.isDirectory()) return SKIPPED_FOLDERS.has(entry.name) ? [] : walk(join(directory, entry.name));
      return entry.isFile() && name.test(entry.name) ? [join(directory, entry.name)] : [];
    });
  return walk(join(PROJECT, folder))
    .map((file) => relative(PROJECT, file).split(sep).join("/"))
    .sort();
}

export function readFiles(folder: string, name: RegExp): Files {
  return Object.fromEntries(listFiles(folder, name).map((file) => [file, readFileSync(join(PROJECT, file), "utf8")]));
}

export function faultText({ file, line, rule }: Fault): string {
  return `${file}:${line} ${rule}`;
}

export function lineAt(text: string, offset: number): number {
  return text.slice(0, offset).split("\n").length;
}
