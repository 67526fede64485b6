import { readFileSync } from "node:fs";
import {
  type AfterOneDose,
  type LevelPoint,
  type NoncompartmentalOptions,
  noncompartmental,
  type TerminalCandidate,
  terminalCandidates,
} from "../../src/core/noncompartmental/index.ts";
import { relativeError } from "./workedExample.ts";

interface Line {
  readonly n: number;
  readonly tStart: number;
  readonly tEnd: number;
  readonly lambdaZ: number;
  readonly intercept: number;
  readonly r2: number;
  readonly adjR2: number;
}

/** The figures of one subject as the fixture names them. */
export interface ReferenceFigures {
  readonly cmax: number;
  readonly tmax: number;
  readonly tlast: number;
  readonly clast: number;
  readonly clastPredicted: number;
  readonly auc0tLinear: number;
  readonly auc0tLinUpLogDown: number;
  readonly aumc0tLinear: number;
  readonly aumc0tLinUpLogDown: number;
  readonly lambdaZ: {
    readonly chosenBestAdjR2: Line;
    readonly chosenMostPointsWithin1e_4: Line;
    readonly candidates: readonly Line[];
  };
  readonly halfLife: number;
  readonly aucInfLinear_clastObs: number;
  readonly aucInfLinUpLogDown_clastObs: number;
  readonly aucInfLinear_clastPred: number;
  readonly aucInfLinUpLogDown_clastPred: number;
  readonly extrapPercentLinear: number;
  readonly extrapPercentLinUpLogDown: number;
  readonly clOverF_fromLinUpLogDown_clastObs: number | null;
  readonly vzOverF_fromLinUpLogDown_clastObs: number | null;
  readonly aumcInfLinUpLogDown_clastObs: number;
  readonly mrtInfLinUpLogDown_clastObs: number;
}

export interface ReferenceSubject {
  readonly subject: string;
  /** null where the data do not name one. */
  readonly dose: number | null;
  readonly points: readonly LevelPoint[];
  readonly nca: ReferenceFigures;
}

const read = (name: string) => readFileSync(new URL(`../fixtures/${name}`, import.meta.url), "utf8");

export function noncompartmentalFixture(name: "theoph" | "indometh"): ReferenceSubject[] {
  const { subjects } = JSON.parse(read(`${name}_fits.json`)) as {
    subjects: { subject: string; dose_mg_per_kg?: number; nca: ReferenceFigures }[];
  };
  const rows = read(`${name}.csv`)
    .trim()
    .split(/\r?\n/)
    .slice(1)
    .map((line) => line.replaceAll('"', "").split(","));
  return subjects.map(({ subject, dose_mg_per_kg, nca }) => ({
    subject,
    dose: dose_mg_per_kg ?? null,
    points: rows
      .filter(([id]) => id === subject)
      .map((cells) => ({ time: Number(cells.at(-2)), value: Number(cells.at(-1)) })),
    nca,
  }));
}

/** Every figure of the reference that is further off than `tolerance` (relative), or not there; names with the error. */
export function referenceFaults({ points, dose, nca }: ReferenceSubject, tolerance: number): string[] {
  const analysed = (method: NoncompartmentalOptions["method"], tieWithin: number): AfterOneDose => {
    const found = noncompartmental(points, { dose: dose ?? 1, method, tieWithin });
    if (!found.ok) throw new Error(found.issues.map(({ code }) => code).join(", "));
    return found.value;
  };
  const logDown = analysed("linear-up-log-down", 0);
  const linear = analysed("linear", 0);
  const tied = analysed("linear-up-log-down", 1e-4);
  const lines = (name: string, found: TerminalCandidate | undefined, wanted: Line): [string, number, number][] => [
    [`${name}.n`, found?.indices.length ?? 0, wanted.n],
    [`${name}.tStart`, points[found?.indices[0] ?? -1]?.time ?? Number.NaN, wanted.tStart],
    [`${name}.tEnd`, points[found?.indices.at(-1) ?? -1]?.time ?? Number.NaN, wanted.tEnd],
    [`${name}.lambdaZ`, found?.rate ?? Number.NaN, wanted.lambdaZ],
    [`${name}.intercept`, found?.intercept ?? Number.NaN, wanted.intercept],
    [`${name}.r2`, found?.rSquared ?? Number.NaN, wanted.r2],
    [`${name}.adjR2`, found?.adjustedRSquared ?? Number.NaN, wanted.adjR2],
  ];
  const candidates = terminalCandidates(points);
  const { lambdaZ } = nca;
  const rows: [string, number, number | null][] = [
    ["cmax", logDown.cmax, nca.cmax],
    ["tmax", logDown.tmax, nca.tmax],
    ["tlast", logDown.tlast, nca.tlast],
    ["clast", logDown.clast, nca.clast],
    ["clastPredicted", logDown.clastPredicted, nca.clastPredicted],
    ["auc0tLinear", logDown.auc.linear, nca.auc0tLinear],
    ["auc0tLinUpLogDown", logDown.auc["linear-up-log-down"], nca.auc0tLinUpLogDown],
    ["aumc0tLinear", logDown.aumc.linear, nca.aumc0tLinear],
    ["aumc0tLinUpLogDown", logDown.aumc["linear-up-log-down"], nca.aumc0tLinUpLogDown],
    ["halfLife", logDown.halfLife, nca.halfLife],
    ["aucInfLinear_clastObs", linear.observed.auc, nca.aucInfLinear_clastObs],
    ["aucInfLinUpLogDown_clastObs", logDown.observed.auc, nca.aucInfLinUpLogDown_clastObs],
    ["aucInfLinear_clastPred", linear.predicted.auc, nca.aucInfLinear_clastPred],
    ["aucInfLinUpLogDown_clastPred", logDown.predicted.auc, nca.aucInfLinUpLogDown_clastPred],
    ["extrapPercentLinear", linear.observed.extrapolatedShare * 100, nca.extrapPercentLinear],
    ["extrapPercentLinUpLogDown", logDown.observed.extrapolatedShare * 100, nca.extrapPercentLinUpLogDown],
    ["clOverF_fromLinUpLogDown_clastObs", logDown.observed.clearance, nca.clOverF_fromLinUpLogDown_clastObs],
    ["vzOverF_fromLinUpLogDown_clastObs", logDown.observed.volume, nca.vzOverF_fromLinUpLogDown_clastObs],
    ["aumcInfLinUpLogDown_clastObs", logDown.observed.aumc, nca.aumcInfLinUpLogDown_clastObs],
    ["mrtInfLinUpLogDown_clastObs", logDown.observed.mrt, nca.mrtInfLinUpLogDown_clastObs],
    ["candidates", candidates.length, lambdaZ.candidates.length],
    ...lines("chosenBestAdjR2", logDown.terminal, lambdaZ.chosenBestAdjR2),
    ...lines("chosenMostPointsWithin1e_4", tied.terminal, lambdaZ.chosenMostPointsWithin1e_4),
    ...lambdaZ.candidates.flatMap((wanted, i) => lines(`candidates[${i}]`, candidates[i], wanted)),
  ];
  const compared = new Set(rows.map(([name]) => name));
  const forgotten = Object.keys(nca).filter((name) => name !== "lambdaZ" && !compared.has(name));
  if (forgotten.length > 0) return forgotten.map((name) => `${name}: not compared`);
  return rows.flatMap(([name, found, wanted]) => {
    if (wanted === null) return [];
    const error = relativeError(found, wanted);
    return error <= tolerance ? [] : [`${name}: ${found}, reference ${wanted}, relative error ${error}`];
  });
}
