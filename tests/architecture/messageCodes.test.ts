import { describe, expect, test } from "vitest";
import { CONCERN_CODES, MESSAGE_CODES } from "../../src/core/messages/index.ts";
import { concernCodes, dashedWords, issueCodes } from "./messageCodes.ts";
import { readFiles } from "./sourceFiles.ts";

const sources = readFiles("src", /\.tsx?$/);
const outsideMessages = Object.fromEntries(
  Object.entries(sources).filter(([file]) => !file.startsWith("src/core/messages/")),
);

describe("codes and sentences fit", () => {
  test("every code raised has its sentence", () => {
    const raised = issueCodes(sources);
    expect(raised.length).toBeGreaterThan(20);
    expect(
      raised
        .filter(({ code }) => !MESSAGE_CODES.includes(code))
        .map(({ file, line, code }) => `${file}:${line} ${code}`),
    ).toEqual([]);
  });

  test("every concern raised has its sentence", () => {
    const raised = concernCodes(sources);
    expect(raised.length).toBeGreaterThan(5);
    expect(
      raised
        .filter(({ code }) => !CONCERN_CODES.includes(code))
        .map(({ file, line, code }) => `${file}:${line} ${code}`),
    ).toEqual([]);
  });

  test("every sentence is for a code that is raised", () => {
    const used = dashedWords(outsideMessages);
    const codes = [...MESSAGE_CODES, ...CONCERN_CODES];
    expect(codes.filter((code) => !used.has(code))).toEqual([]);
  });
});

test.each([
  ["a call", 'issue("a-b");'],
  ["a choice", 'issue(x ? "a-b" : y);'],
  ["an object", 'faults.push({ code: "a-b", path, data: {} });'],
  ["a comparison", 'const x = problem?.code === "a-b";'],
  ["a computed issue fed by a call", 'const refuse = (code: string) => issue(code);\nrefuse("a-b");'],
  ["a computed issue fed by a class", 'const f = (x: Fault) => issue(x.code);\nthrow new Fault("a-b", 1);'],
])("the code in %s is seen", (_, text) => {
  expect(issueCodes({ "src/a.ts": text }).map(({ code }) => code)).toEqual(["a-b"]);
});

test("a concern's code is no issue's", () => {
  const files = { "src/a.ts": 'concern("a-b", "check", about);' };
  expect(issueCodes(files)).toEqual([]);
  expect(concernCodes(files)).toEqual([{ file: "src/a.ts", line: 1, code: "a-b" }]);
});
