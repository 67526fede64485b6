import { expect, test } from "vitest";
import { purityFaults } from "./corePurity.ts";
import { faultText, readFiles } from "./sourceFiles.ts";

test("core asks for no clock, chance, locale or storage", () => {
  const files = readFiles("src/core", /\.ts$/);
  expect(Object.keys(files).length).toBeGreaterThan(20);
  expect(purityFaults(files).map(faultText)).toEqual([]);
});

test.each([
  ["Date.now", "const x = Date.now();"],
  ["new Date", "const x = new Date(0);"],
  ["Date()", "const x = Date();"],
  ["Math.random", "const x = Math.random();"],
  ["Temporal.Now", "const x = Temporal.Now.instant();"],
  ["localStorage", 'localStorage.getItem("x");'],
  ["globalThis", 'const x = globalThis["Date"];'],
  ["performance", "const x = performance.now();"],
  ["crypto", "const x = crypto.randomUUID();"],
  ["toLocaleString", "const x = (1).toLocaleString();"],
  ["localeCompare", 'const x = "a".localeCompare("b");'],
  ["Intl", "const x = new Intl.NumberFormat();"],
  ["localStorage", "const x = { localStorage };"],
])("a planted %s is named", (word, text) => {
  expect(purityFaults({ "src/core/case/a.ts": `\n${text}` }).map(faultText)).toEqual([
    `src/core/case/a.ts:2 ${word}: core asks for no clock, chance, locale or storage`,
  ]);
});

test("words and fields of the same name are not", () => {
  const text =
    'const now = "Date.now()"; // new Date\nconst x = { crypto: 1, performance: 2 }; x.crypto + x.performance;';
  expect(purityFaults({ "src/core/case/a.ts": text, "src/core/time/b.ts": "new Intl.DateTimeFormat();" })).toEqual([]);
});
