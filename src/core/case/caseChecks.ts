import { doseMg, productOf, windowChecks, windowDrawChecks } from "../medicine/index.ts";
import { type DoseLine, doseLineCount, MOST_DOSES } from "../regimen/index.ts";
import { type Issue, issue } from "../result/index.ts";
import type { Case, Level, Option } from "./caseSchema.ts";
import { duplicateIds } from "./duplicateIds.ts";
import { patientChecks } from "./patientChecks.ts";

type Path = readonly (string | number)[];

/** What the shape can't say: names that must be unique or known, amounts a product can give, windows and times in order. */
export function caseChecks(value: Case): Issue[] {
  const { patient, window, levels, options, given } = value;
  return [
    ...patientChecks(patient),
    ...(window ? windowIssues(window) : []),
    ...duplicateIds(levels, ["levels"]),
    ...levels.flatMap(levelChecks),
    ...laneChecks(given, value, ["given"]),
    ...optionChecks(options),
    ...options.flatMap((option, i) => laneChecks(option.lines, value, ["options", i, "lines"])),
  ];
}

function windowIssues(window: NonNullable<Case["window"]>): Issue[] {
  const faults = [...windowChecks(window, ["window"]), ...windowDrawChecks(window, ["window"])];
  return faults.map(({ code, data, path }) => issue(code === "record-range" ? "window-draw-hours" : code, data, path));
}

function levelChecks({ quantity }: Level, i: number): Issue[] {
  if (quantity.value > 0) return [];
  return [
    issue("level-not-positive", { found: quantity.value, unit: quantity.unit }, ["levels", i, "quantity", "value"]),
  ];
}

function optionChecks(options: readonly Option[]): Issue[] {
  const issues = duplicateIds(options, ["options"]);
  options.forEach(({ id }, i) => {
    if (id === "given") issues.push(issue("option-named-given", {}, ["options", i, "id"]));
  });
  const chosen = options.filter((each) => each.chosen).map((each) => each.id);
  if (chosen.length > 1) issues.push(issue("options-two-chosen", { chosen }, ["options"]));
  return issues;
}

function laneChecks(lines: readonly DoseLine[], value: Case, path: Path): Issue[] {
  return [
    ...duplicateIds(lines, path),
    ...lines.flatMap((line, i) =>
      lineChecks(line, value).map((each) => ({ ...each, path: [...path, i, ...each.path] })),
    ),
  ];
}

function lineChecks(line: DoseLine, { medicine, timeZone }: Case): Issue[] {
  if (!medicine.products.some((each) => each.id === line.product)) {
    const allowed = medicine.products.map((each) => each.id);
    return [issue("line-product-unknown", { product: line.product, medicine: medicine.name, allowed }, ["product"])];
  }
  const repeat = repeatChecks(line);
  if (repeat.length > 0) return repeat;
  const product = productOf(medicine, line.product);
  const amountIssues = (amount: DoseLine["amount"], path: Path): Issue[] => {
    const mg = doseMg(amount, product);
    return mg.ok ? [] : mg.issues.map((each) => ({ ...each, path: [...path, ...each.path] }));
  };
  const except = line.except ?? [];
  const doses = doseLineCount(line, timeZone);
  const tooMany = Number.isFinite(doses) && doses > MOST_DOSES;
  return [
    ...amountIssues(line.amount, ["amount"]),
    ...(tooMany ? [issue("line-too-many-doses", { found: doses, most: MOST_DOSES }, ["repeat"])] : []),
    ...except.flatMap((each, i) => (each.amount ? amountIssues(each.amount, ["except", i, "amount"]) : [])),
    ...exceptionChecks(line, doses),
  ];
}

function repeatChecks({ repeat }: DoseLine): Issue[] {
  if (!repeat) return [];
  if ("every" in repeat) {
    const { value, unit } = repeat.every;
    return value > 0 ? [] : [issue("line-interval", { found: value, unit }, ["repeat", "every", "value"])];
  }
  const twice = repeat.clock.filter((each, i) => repeat.clock.indexOf(each) < i);
  return twice.length === 0 ? [] : [issue("line-clock-twice", { found: twice[0] }, ["repeat", "clock"])];
}

function exceptionChecks(line: DoseLine, doses: number): Issue[] {
  const issues: Issue[] = [];
  const seen = new Set<number>();
  line.except?.forEach(({ index, status, at, amount }, i) => {
    const path = ["except", i];
    if (index >= doses) issues.push(issue("exception-beyond-line", { index, doses }, [...path, "index"]));
    if (seen.has(index)) issues.push(issue("exception-twice", { index }, [...path, "index"]));
    seen.add(index);
    if (status === "missed" && (at !== undefined || amount !== undefined)) {
      issues.push(issue("exception-missed-with-time", { index }, path));
    }
    if (status !== "missed" && at === undefined) issues.push(issue("exception-without-time", { index, status }, path));
  });
  return issues;
}
