import { expect, test } from "vitest";
import { type Fault, type Files, faultText, lineAt, readFiles } from "./sourceFiles.ts";

/** Put together from halves, so that this file does not hold them. */
const FORBIDDEN: readonly RegExp[] = [
  new RegExp(["lec", "ture"].join(""), "gi"),
  new RegExp(["trans", "cript"].join(""), "gi"),
  // Places on one machine.
  new RegExp(`(?<![\\w.])/${["(work", "home", "root", "Users", "tmp)"].join("|")}/`, "g"),
  new RegExp(`\\b[A-Z]:${"\\\\"}Users`, "g"),
  new RegExp(["\\.\\.", "shared\\b"].join("/"), "g"),
];

const TEXT = /\.(ts|tsx|mts|mjs|js|json|css|html|md|svg|csv|txt|webmanifest)$|^(run|\.gitignore|\.npmrc)$/;

function wordFaults(files: Files): Fault[] {
  return Object.entries(files).flatMap(([file, text]) =>
    FORBIDDEN.flatMap((pattern) =>
      [...text.matchAll(pattern)].map((match) => ({ file, line: lineAt(text, match.index), rule: `"${match[0]}"` })),
    ),
  );
}

test("no word that may not stand in the project, and no place on one machine", () => {
  const files = readFiles(".", TEXT);
  expect(Object.keys(files).length).toBeGreaterThan(50);
  expect(wordFaults(files).map(faultText)).toEqual([]);
});

test("planted ones are named", () => {
  const planted = [
    ["Lec", "tures"].join(""),
    ["trans", "cript"].join(""),
    ["", "home", "someone"].join("/"),
    ["C:", "Users"].join("\\"),
    ["..", "shared", "x"].join("/"),
  ];
  expect(
    wordFaults({ "a.md": planted.join("\n") })
      .map(({ line }) => line)
      .sort(),
  ).toEqual([1, 2, 3, 4, 5]);
  expect(wordFaults({ "a.ts": 'import "../home/x.ts"; const url = "https://example.org/work"; // a/tmp/b' })).toEqual(
    [],
  );
});
