import { expect, test } from "vitest";
import { type Files, readFiles } from "./sourceFiles.ts";

const MOST_LINES = 400;

/** Files allowed to be longer, each with its reason. */
const REASONS: Readonly<Record<string, string>> = {};

function longFiles(files: Files): string[] {
  return Object.entries(files)
    .filter(([, text]) => text.trimEnd().split("\n").length > MOST_LINES)
    .map(([file]) => file);
}

const files = {
  ...readFiles("src", /\.(ts|tsx|css)$/),
  ...readFiles("tests", /\.(ts|tsx)$/),
  ...readFiles(".ci", /\.(mjs|ts)$/),
};

test(`no file is longer than ${MOST_LINES} lines without a reason, and no reason outlives its file's length`, () => {
  expect(Object.keys(files).length).toBeGreaterThan(50);
  expect(longFiles(files).sort()).toEqual(Object.keys(REASONS).sort());
});

test("a file of 401 lines is named, one of 400 is not", () => {
  const planted = { "src/long.ts": "x\n".repeat(MOST_LINES + 1), "src/short.ts": "x\n".repeat(MOST_LINES) };
  expect(longFiles(planted)).toEqual(["src/long.ts"]);
});
