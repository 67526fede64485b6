import type { Case } from "./caseSchema.ts";

/**
 * Every field name of a case, in the order in which they are printed wherever they stand. A test holds it against the schema.
 * Names that are not here (the keys of a record's sources) follow in alphabetical order.
 */
export const FIELD_ORDER: readonly string[] = (
  "format version id index recordVersion name invented label demo timeZone now at kind " +
  "patient sex age height observations factors from to detail effect onset " +
  "medicine review status by on copyOf matrix molarMass displayUnit sources title authors year place estimates " +
  "kinetics variability clearance maximumRate halfMaximum volume exchange peripheralVolume apparent " +
  "absorptionRate input duration fastFraction slowRate slowDuration slowLag saltFactor salt residualProportional residualAdditive " +
  "correlations between population products product form release strengths concentration divisible swallowWhole lag bioavailability " +
  "windows toxicFrom toxicAt limits maximumSingleDose maximumDailyDose earliestSample steadyStateAfter doseLimits sampling interactions " +
  "autoinduction settledAfter cautions parameter factor formula text category setting number ranges covariate use " +
  "window quantity low high drawFrom drawTo value unit given levels options lines amount start repeat every count clock days weekdays except " +
  "chosen confirmed excluded source basis note fit residualModel notes"
).split(" ");

const RANK: ReadonlyMap<string, number> = new Map(FIELD_ORDER.map((name, i) => [name, i]));

/**
 * The case as its file: UTF-8 JSON, two spaces deep, fields in a fixed order, a newline at the end.
 * The same case gives the same text however it came about, and reading the text gives the same case.
 */
export function casePrint(value: Case): string {
  // A replacement character that the user did type is escaped: bare, it means that decoding lost something (jsonRead).
  return `${JSON.stringify(inOrder(value), null, 2).replaceAll("\ufffd", "\\ufffd")}\n`;
}

function inOrder(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(inOrder);
  if (typeof value !== "object" || value === null) return value;
  const rank = (key: string) => RANK.get(key) ?? RANK.size;
  const entries = Object.entries(value).sort(([a], [b]) => rank(a) - rank(b) || (a < b ? -1 : 1));
  return Object.fromEntries(entries.map(([key, each]) => [key, inOrder(each)]));
}
