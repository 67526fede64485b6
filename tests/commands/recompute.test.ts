import { spawnSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, expect, test, vi } from "vitest";
import { PROJECT } from "../../.ci/install.mjs";
import { recompute } from "../../src/app/recompute.ts";

// Each run starts Node and loads the program's source afresh: two seconds, ten times that on a busy machine.
vi.setConfig({ testTimeout: 120_000 });

const COMMAND = join(PROJECT, ".ci", "recompute.mjs");
const DEMO = join(PROJECT, "demo-data", "adjustment.ebbline.json");
const folder = mkdtempSync(join(tmpdir(), "ebbline-recompute-"));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

function run(words: readonly string[], env: NodeJS.ProcessEnv = {}) {
  const { npm_lifecycle_event: _, ...rest } = process.env;
  return spawnSync(process.execPath, [COMMAND, ...words], { cwd: folder, encoding: "utf8", env: { ...rest, ...env } });
}

function write(name: string, content: string | Uint8Array): string {
  writeFileSync(join(folder, name), content);
  return name;
}

test("prints the figures of a case as JSON and nothing else, the same as the program's own pipeline", () => {
  const { status, stdout, stderr } = run([DEMO]);
  expect({ status, stderr }).toEqual({ status: 0, stderr: "" });
  const own = recompute(readFileSync(DEMO, "utf8"));
  if (!own.ok) throw new Error(own.lines.join("\n"));
  expect(JSON.parse(stdout)).toEqual(JSON.parse(JSON.stringify(own.output)));
  expect(JSON.parse(stdout).fingerprint).toMatch(/^[0-9a-f]{64}$/);
});

test("a relative name is meant from where the user stands, also through npm", () => {
  write("case.ebbline.json", readFileSync(DEMO));
  const through = spawnSync(process.execPath, [COMMAND, "case.ebbline.json"], {
    cwd: PROJECT,
    encoding: "utf8",
    env: { ...process.env, npm_lifecycle_event: "recompute", INIT_CWD: folder },
  });
  expect({ status: through.status, stderr: through.stderr }).toEqual({ status: 0, stderr: "" });
});

test.each([
  ["no file named", [], /^usage: /],
  ["two files named", ["a.json", "b.json"], /^usage: /],
  ["a missing file", ["none.json"], /^none\.json: cannot be read \(ENOENT\)\n$/],
  ["a folder", ["."], /^\.: cannot be read \(EISDIR\)\n$/],
  [
    "a file that is no text",
    [write("bytes.json", new Uint8Array([0x7b, 0xff, 0xfe, 0x7d]))],
    /^bytes\.json: is not UTF-8 text\n$/,
  ],
  ["an empty file", [write("empty.json", "")], /^.+\n$/],
  ["half a file", [write("half.json", readFileSync(DEMO, "utf8").slice(0, 700))], /^.+\n$/],
  ["another JSON", [write("other.json", '{"a": 1}')], /^.+\n/],
])("%s: one line a fault on stderr, nothing on stdout, exit 2", (_, words, lines) => {
  const { status, stdout, stderr } = run(words);
  expect({ status, stdout }).toEqual({ status: 2, stdout: "" });
  expect(stderr).toMatch(lines);
  expect(stderr).not.toMatch(/\bat .*:\d+:\d+|Error:/);
});
