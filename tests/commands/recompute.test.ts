import { spawnSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, expect, test, vi } from "vitest";
import { PROJECT } from "../../.ci/install.mjs";
import { recompute } from "../../src/app/recompute.ts";
import { derive } from "../../src/core/analysis/index.ts";
import { caseParse } from "../../src/core/case/index.ts";
import { buildSummary } from "../../src/view/summary/buildSummary.ts";

// Each run starts Node and loads the program's source afresh: two seconds, ten times that on a busy machine.
vi.setConfig({ testTimeout: 120_000 });

const COMMAND = join(PROJECT, ".ci", "recompute.mjs");
const DEMO = join(PROJECT, "demo-data", "adjustment.ebbline.json");
const folder = mkdtempSync(join(tmpdir(), "ebbline-recompute-"));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** The demo case recomputed in this process, once: its levels are fitted. */
let demoOutput: unknown;
function recomputedDemo(): unknown {
  if (demoOutput === undefined) {
    const own = recompute(readFileSync(DEMO, "utf8"));
    if (!own.ok) throw new Error(own.lines.join("\n"));
    demoOutput = JSON.parse(JSON.stringify(own.output));
  }
  return demoOutput;
}

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
  expect(JSON.parse(stdout)).toEqual(recomputedDemo());
  expect(JSON.parse(stdout).fingerprint).toMatch(/^[0-9a-f]{64}$/);
});

interface Interval {
  readonly median: number;
  readonly interval50: readonly [number, number];
  readonly interval90: readonly [number, number];
}

interface Recomputed {
  readonly thisPatient: {
    readonly use: string;
    readonly seed: number;
    readonly halfLife: Interval;
    readonly parameters: Record<string, Interval & { readonly typical: number; readonly mostLikely: number }>;
  };
  readonly options: Record<
    string,
    {
      readonly individual: Record<string, Interval> & {
        readonly chance: Record<string, number>;
        readonly chanceAtSteadyState: Record<string, number>;
        readonly steadyState: Record<string, Interval>;
      };
    }
  >;
  readonly levels: readonly {
    readonly individual: {
      readonly predicted: Interval;
      readonly standardised: number;
      readonly forecast: Interval & { readonly held: boolean };
    };
  }[];
}

/** The figures of a printed cell, without the "90 %" that says what its brackets are. */
const figuresOf = (text: string): readonly number[] =>
  [...text.replace("90 %:", "").matchAll(/\d[\d,]*(?:\.\d+)?/g)].map(([found]) => Number(found.replaceAll(",", "")));
const significant = (value: number) => Number(value.toPrecision(Math.max(3, Math.ceil(Math.log10(Math.abs(value))))));
const hours = (value: number) => Number(value.toFixed(value < 1 ? 2 : 1));
const shown = ({ median, interval90 }: Interval, round = significant) => [median, ...interval90].map(round);

test("every figure of this patient on the sheet is a rounding of one recompute prints", () => {
  const out = recomputedDemo() as Recomputed;
  const parsed = caseParse(readFileSync(DEMO, "utf8"));
  if (!parsed.ok) throw new Error("the demo case does not parse");
  expect(out.thisPatient.use).toBe("individual");
  const analysis = derive(parsed.value, { isFitted: true });
  const sheet = buildSummary({
    case: parsed.value,
    analysis,
    settings: { pageSize: "A4", microgram: "microgram", preparedBy: "" },
    revision: 1,
    saving: { status: "saved", savedAt: 0, detail: "" },
    analysisStatus: { status: "fresh", revision: 1, failure: null, isFitStale: false },
    hasChanges: false,
    isDragging: false,
    printedAtMs: 0,
    programVersion: "0",
  });
  const model = JSON.parse(JSON.stringify(sheet).replaceAll("\u00a0", " ")) as typeof sheet;

  const individual = out.options.A!.individual;
  const { steadyState } = individual;
  const expected = Object.fromEntries(model.expected!.rows.map(({ label, value }) => [label, figuresOf(value)]));
  expect(expected).toEqual({
    Highest: shown(steadyState.peak!),
    Lowest: shown(steadyState.trough!),
    Average: shown(steadyState.average!),
    "AUC in 24 hours": shown(steadyState.auc24!),
    Accumulation: shown(steadyState.accumulation!),
    "90 % of steady state after": shown(steadyState.timeTo90!, hours),
  });

  const share = (chance: number) =>
    chance < 0.01 ? "under 1 %" : chance > 0.99 ? "over 99 %" : `${Math.round(chance * 100)} %`;
  expect(model.hours!.rows.map(({ label, cells }) => [label, cells[0], cells[1], figuresOf(cells[2]!)])).toEqual(
    (["below", "within", "above"] as const).map((side) => [
      side,
      share(individual.chanceAtSteadyState[side]!),
      share(individual.chance[side]!),
      shown(individual[`hours${side.charAt(0).toUpperCase()}${side.slice(1)}`]!, hours),
    ]),
  );

  const own = analysis.options[0]!.individual!;
  expect(own.toxicChance).not.toBeNull();
  expect(individual.chanceToxic).toBe(own.toxicChance);
  expect(individual.lowestBeforeOption).toBe(own.span.lowestBeforeOption);
  expect(individual.shareNeverSteady).toBe(own.shareNeverSteady);

  const { parameters, halfLife } = out.thisPatient;
  expect(model.kinetics.rows.map(({ value }) => figuresOf(value))).toEqual([
    shown(parameters.CL!),
    shown(parameters.V!),
    shown(halfLife, hours),
  ]);
  const grid = model.details.individual!.parameters.rows;
  Object.values(parameters).forEach((parameter, index) => {
    const [typical, , mostLikely, median, half, ninety] = grid[index]!.cells.map(figuresOf);
    expect([typical, mostLikely, median]).toEqual(
      [parameter.typical, parameter.mostLikely, parameter.median].map((each) => [significant(each)]),
    );
    expect([half, ninety]).toEqual([parameter.interval50.map(significant), parameter.interval90.map(significant)]);
  });

  expect(model.levels.rows.map((row) => [figuresOf(row.predicted), figuresOf(row.residual), row.forecast])).toEqual(
    out.levels.map(({ individual: level }) => {
      const [low, high] = level.forecast.interval90.map(significant);
      return [
        shown(level.predicted),
        [Number(Math.abs(level.standardised).toFixed(1))],
        `${low} to ${high} mg per L: ${level.forecast.held ? "held" : "did NOT hold"}`,
      ];
    }),
  );
  expect(model.assumes.some((line) => line.includes(`seed ${out.thisPatient.seed},`))).toBe(true);
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
