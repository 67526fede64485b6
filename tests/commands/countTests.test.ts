import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, expect, test } from "vitest";
import { countPlaywright, countVitest } from "../../.ci/countTests.mjs";

const folder = mkdtempSync(join(tmpdir(), "ebbline-count-"));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

let written = 0;
function report(content: unknown): string {
  written += 1;
  const file = join(folder, `${written}.json`);
  writeFileSync(file, typeof content === "string" ? content : JSON.stringify(content));
  return file;
}

const file = (status: string, ...tests: string[]) => ({
  status,
  assertionResults: tests.map((each) => ({ status: each })),
});
const vitest = (...testResults: unknown[]) => report({ testResults });
const playwright = (stats: Record<string, number>) =>
  report({ stats: { expected: 0, unexpected: 0, flaky: 0, skipped: 0, ...stats } });

test.each([
  [
    "passed, failed and skipped tests",
    () =>
      countVitest(
        vitest(file("passed", "passed", "passed"), file("failed", "failed", "passed", "skipped", "todo")),
        "ended with exit code 1",
      ),
    [3, 1, 2],
  ],
  [
    "a file that could not be loaded",
    () => countVitest(vitest(file("passed", "passed"), file("failed")), "ended with exit code 1"),
    [1, 1, 0],
  ],
  [
    "an error outside any test",
    () => countVitest(vitest(file("passed", "passed")), "ended with exit code 1"),
    [1, 1, 0],
  ],
  ["a run without any test", () => countVitest(vitest(), undefined), [0, 1, 0]],
  ["only skipped tests", () => countVitest(vitest(file("passed", "skipped")), undefined), [0, 1, 1]],
  ["no report", () => countVitest(join(folder, "none.json"), undefined), [0, 1, 0]],
  ["half a report", () => countVitest(report('{"testResults": ['), undefined), [0, 1, 0]],
  ["a stopped run", () => countVitest(vitest(file("passed", "passed")), "stopped after 10 minutes"), [1, 1, 0]],
  [
    "browser tests",
    () => countPlaywright(playwright({ expected: 5, unexpected: 1, skipped: 2 }), "ended with exit code 1"),
    [5, 1, 2],
  ],
  [
    "a browser test that passed when repeated",
    () => countPlaywright(playwright({ expected: 5, flaky: 1 }), undefined),
    [5, 1, 0],
  ],
  ["browser tests that could not start", () => countPlaywright(playwright({}), "ended with exit code 1"), [0, 1, 0]],
])("counts %s", (_, count, [passed, failed, skipped]) => {
  expect(count()).toEqual({ passed, failed, skipped });
});
