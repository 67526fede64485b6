import {
  COVARIATES,
  type Figure,
  kineticsFormulas,
  type MedicineRecord,
  type Product,
} from "../src/core/medicine/index.ts";
import { numberPrint, type UnitCode, unitSpoken } from "../src/core/units/index.ts";
import { markdownPage, markdownSection, markdownTable, markdownText } from "./markdown.ts";
import {
  figureRows,
  figuresTable,
  PROVENANCE,
  provenanceCells,
  quantityText,
  sourcedText,
  spaced,
  statement,
  statements,
} from "./medicinePageFigures.ts";
import { concentrationsText, windowsTable } from "./medicinePageWindows.ts";
import { basisShare } from "./medicineShare.ts";
import { medicineTypical, PAGE_PATIENT_TEXT } from "./medicineTypical.ts";

/** The page of one record: every figure with value, unit, source, basis and note, and every statement. */
export function medicinePage(record: MedicineRecord): string {
  return markdownPage([
    `# ${markdownText(record.name)}`,
    reviewText(record),
    [
      `Record \`${record.id}\`, version ${record.recordVersion}. Measured in: ${markdownText(record.matrix)}. Concentrations are shown in ${unitSpoken(record.displayUnit, "screen")}.`,
      `Of its ${basisShare(record)}.`,
      "[All records](../medicines.md) · [what the fields mean](../medicine-record.md)",
    ].join("\n"),
    markdownSection("Where the estimates come from", estimatesText(record)),
    markdownSection("Kinetics", kineticsText(record), kineticsTable(record)),
    markdownSection("Variability", variabilityTable(record)),
    markdownSection("Population", statement(record.population), populationTable(record)),
    markdownSection("Products", productsTable(record)),
    markdownSection("Windows", windowsTable(record)),
    markdownSection("Other figures", otherTable(record)),
    markdownSection("Interactions and other states", interactionsTable(record)),
    markdownSection("Autoinduction", record.autoinduction ? statement(record.autoinduction) : ""),
    markdownSection("Dose", statements(record.doseLimits)),
    markdownSection("Sampling", statements(record.sampling)),
    markdownSection(
      "Cautions",
      record.cautions.map((each) => `- (${markdownText(each.category)}) ${statement(each)}`).join("\n"),
    ),
    markdownSection("Sources", sourcesList(record)),
  ]);
}

function reviewText({ invented, review }: MedicineRecord): string {
  const reviewed =
    review.status === "reviewed"
      ? `**Reviewed${review.by ? ` by ${markdownText(review.by)}` : ""}${review.on ? ` on ${markdownText(review.on)}` : ""}.**`
      : "**Not independently reviewed.** Check every figure that matters against current product information.";
  return invented ? `**Invented: no such medicine exists.** ${reviewed}` : reviewed;
}

function estimatesText({ estimates }: MedicineRecord): string {
  const from =
    estimates.from === "one-model"
      ? "**One model**: estimated together."
      : "**Pieced together** from different studies: not estimated together.";
  return `${from} ${statement(estimates)}`;
}

function kineticsText({ kinetics }: MedicineRecord): string {
  return kinetics.apparent
    ? `Kind \`${kinetics.kind}\`; figures are per bioavailability.`
    : `Kind \`${kinetics.kind}\`; figures are not per bioavailability, which stands with each product.`;
}

function kineticsTable(record: MedicineRecord): string {
  const { values, halfLifeH } = medicineTypical(record);
  const rows = kineticsFormulas(record).map(({ name, symbol, words, formula }) => [
    `${words} (${symbol})`,
    `\`${formula.formula}\``,
    quantityText({ value: values[name] ?? Number.NaN, unit: formula.unit }, 3),
    ...provenanceCells(formula),
  ]);
  const halfLife =
    halfLifeH === null
      ? "no half-life: it grows with the level"
      : `half-life ${numberPrint(halfLifeH, { significant: 3 })} h`;
  return `${markdownTable(["", "formula", "typical", ...PROVENANCE], rows)}\n\nTypical: ${PAGE_PATIENT_TEXT}; ${halfLife}.`;
}

function variabilityTable({ variability }: MedicineRecord): string {
  const { correlations = [], ...figures } = variability;
  return figuresTable([
    ...Object.entries(figures).map(([name, figure]) => [spaced(name), figure] as const),
    ...correlations.map(
      (each) => [`correlation of ${each.between.map(spaced).join(" and ")} (of the logs)`, each] as const,
    ),
  ]);
}

function populationTable({ population }: MedicineRecord): string {
  const rows = population.ranges.map((range) => {
    const unit = COVARIATES[range.covariate];
    const ends = [range.low && `from ${endText(range.low, unit)}`, range.high && `to ${endText(range.high, unit)}`];
    return [spaced(range.covariate), ends.filter(Boolean).join(" "), ...provenanceCells(range)];
  });
  if (population.number)
    rows.unshift(["patients", quantityText(population.number), ...provenanceCells(population.number)]);
  const setting = population.setting ? `Setting: ${markdownText(population.setting)}.` : "";
  return [setting, markdownTable(["", "range", ...PROVENANCE], rows)].filter(Boolean).join("\n\n");
}

function endText(value: number, unit: UnitCode): string {
  return quantityText({ value, unit });
}

function productsTable(record: MedicineRecord): string {
  return record.products
    .map(
      (product) =>
        `### ${markdownText(product.name)}\n\n${productFacts(product)}\n\n${figuresTable(productFigures(product))}`,
    )
    .join("\n\n");
}

function productFacts({ id, form, release, divisible, swallowWhole, salt }: Product): string {
  const division = {
    whole: "not to be divided",
    half: "may be halved",
    unknown: "whether it may be divided is not known",
  };
  const facts = [
    `\`${id}\``,
    form,
    `${release} release`,
    ...(form === "liquid" ? [] : [division[divisible]]),
    ...(swallowWhole ? ["swallow whole"] : []),
    salt === undefined ? "labelled as the active moiety" : `labelled as ${markdownText(salt)}`,
  ];
  return `${facts.join("; ")}.`;
}

function productFigures(product: Product): (readonly [string, Figure | undefined])[] {
  const input = Object.entries(product.input ?? {}).filter(
    (entry): entry is [string, Figure] => typeof entry[1] === "object",
  );
  return [
    ...product.strengths.map((each) => ["strength", each] as const),
    ["concentration", product.concentration],
    ["absorption rate", product.absorptionRate],
    ...input.map(([name, figure]) => [spaced(name), figure] as const),
    ["active part of the labelled amount", product.saltFactor],
    ["lag", product.lag],
    ["bioavailability", product.bioavailability],
  ];
}

function otherTable(record: MedicineRecord): string {
  const { toxicFrom, limits } = record;
  const toxic = toxicFrom && {
    figure: toxicFrom,
    both: `${concentrationsText([toxicFrom], record, "mass")} = ${concentrationsText([toxicFrom], record, "molar")}`,
  };
  const rows = [
    ["molar mass of what is measured", quantityText(record.molarMass), ...provenanceCells(record.molarMass)],
    ...(toxic
      ? [
          [
            record.toxicAt === "trough" ? "toxic from, just before a dose" : "toxic from",
            toxic.both,
            ...provenanceCells(toxic.figure),
          ],
        ]
      : []),
    ...figureRows([
      ["largest single dose, as labelled", limits.maximumSingleDose],
      ["largest daily dose, as labelled", limits.maximumDailyDose],
      ["earliest sample after a dose", record.earliestSample],
      ["steady state after", record.steadyStateAfter],
      ["autoinduction settled after", record.autoinduction?.settledAfter],
    ]),
  ];
  return markdownTable(["", "value", ...PROVENANCE], rows);
}

function interactionsTable(record: MedicineRecord): string {
  return markdownTable(
    ["with", "", "times", "onset", "what it means", ...PROVENANCE],
    record.interactions.map((each) => [
      markdownText(each.medicine),
      each.parameter,
      quantityText(each.factor),
      each.onset ? sourcedText(each.onset) : "",
      markdownText(each.text),
      ...provenanceCells(each.factor),
    ]),
  );
}

function sourcesList(record: MedicineRecord): string {
  return Object.entries(record.sources)
    .map(([id, { authors, title, year, place }]) => {
      const words = [authors, title, year, place].filter((part) => part !== undefined).map(markdownText);
      return `- \`${id}\`: ${words.join(". ")}`;
    })
    .join("\n");
}
