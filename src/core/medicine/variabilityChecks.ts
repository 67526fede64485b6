import { type Kinetics, kineticsFormulas } from "./kineticsKinds.ts";
import { type MedicineRecord, VARIED, type VariedName } from "./medicineRecord.ts";
import { type Bounds, boundsFaults, duplicateFaults, type FaultPath, type RecordFault } from "./recordFault.ts";

const VARIATION: Bounds = { unit: "%", above: 0, most: 500 };
const PATH: FaultPath = ["variability"];

/** Variabilities of parameters the record has, in range; correlations between two of them that are stated, and possible together. */
export function variabilityChecks({
  variability,
  kinetics,
}: Pick<MedicineRecord, "variability" | "kinetics">): RecordFault[] {
  const possible = variedNames(kinetics);
  const faults: RecordFault[] = VARIED.flatMap((name) => {
    const figure = variability[name];
    if (figure === undefined) return [];
    if (!possible.includes(name))
      return [{ code: "record-variability", path: [...PATH, name], data: { name, possible } }];
    return boundsFaults(figure, VARIATION, [...PATH, name]);
  });
  const correlations = correlationChecks(variability);
  return [
    ...faults,
    ...boundsFaults(variability.residualProportional, VARIATION, [...PATH, "residualProportional"]),
    ...boundsFaults(variability.residualAdditive, { unit: "mg/L", above: 0 }, [...PATH, "residualAdditive"]),
    ...correlations,
    ...(correlations.length === 0 ? definiteChecks(variability) : []),
  ];
}

function variedNames(kinetics: Kinetics): readonly string[] {
  return [...kineticsFormulas({ kinetics }).map(({ name }) => name), "absorptionRate", "bioavailability"];
}

function correlationChecks({ correlations = [], ...stated }: MedicineRecord["variability"]): RecordFault[] {
  const at = [...PATH, "correlations"];
  const faults: RecordFault[] = duplicateFaults(correlations, at, ({ between }) => [...between].sort().join(" and "));
  correlations.forEach((correlation, i) => {
    const [first, second] = correlation.between;
    const missing = correlation.between.filter((name) => stated[name] === undefined);
    if (first === second || missing.length > 0) {
      const data = { first, second, missing: [...new Set(missing)] };
      faults.push({ code: "record-correlation-between", path: [...at, i, "between"], data });
    }
    faults.push(...boundsFaults(correlation, { unit: "1", above: -1, below: 1 }, [...at, i]));
  });
  return faults;
}

/** Correlations that no set of numbers could have: their matrix is not positive definite. */
function definiteChecks({ correlations = [] }: MedicineRecord["variability"]): RecordFault[] {
  const names: readonly VariedName[] = [...new Set(correlations.flatMap(({ between }) => between))];
  const between = (a: VariedName, b: VariedName) =>
    a === b ? 1 : (correlations.find((each) => each.between.includes(a) && each.between.includes(b))?.value ?? 0);
  // Cholesky: a pivot that is not above 0 says that the matrix is not positive definite.
  const lower: number[][] = [];
  for (const [i, a] of names.entries()) {
    const row: number[] = [];
    for (const [j, b] of names.slice(0, i + 1).entries()) {
      const other = lower[j] ?? row;
      const rest = between(a, b) - row.reduce((sum, each, k) => sum + each * (other[k] ?? 0), 0);
      if (i === j && !(rest > 0)) return [{ code: "record-correlations", path: [...PATH, "correlations"], data: {} }];
      row.push(i === j ? Math.sqrt(rest) : rest / (other[j] as number));
    }
    lower.push(row);
  }
  return [];
}
