import { BUILT_IN_RECORDS, type MedicineRecord, recordFigures } from "../src/core/medicine/index.ts";
import { numberPrint } from "../src/core/units/index.ts";
import { markdownPage, markdownSection, markdownTable, markdownText } from "./markdown.ts";
import { medicinePage } from "./medicinePage.ts";
import { basisCounts } from "./medicineShare.ts";
import { medicineTypical, PAGE_PATIENT_TEXT } from "./medicineTypical.ts";

/** Medicines looked at and left out, and why: so that nobody adds them from the same figures. */
export const LEFT_OUT: readonly (readonly [string, string])[] = [
  [
    "ciclosporin",
    "The one equation read (Wu 2005) lost its minus signs, and its term for days after the transplant would make clearance negative after about 23 days: how the days are coded must be read in the paper first. A model of two compartments (Press 2010) was read too; its chain of delay is no absorption this program has.",
  ],
  [
    "hydroxychloroquine",
    "Clearance (96 mL/min) and volume (5,522 L in blood) of one study (Tett and others, Br J Clin Pharmacol 1988;26:303-313) give a half-life of 28 days where about 40 are printed there: more compartments are needed than figures were read for. No residual error was read.",
  ],
  [
    "rifampicin",
    "The settled clearance (14.4 L/h, worked out from Smythe and others, Antimicrob Agents Chemother 2012) with the only volume read (33.5 L, a study in Vietnam) gives a half-life of 1.6 h, outside the 2 to 3 h of Ann Lab Med 2017;37:97-107, Table 1. The window is about the level 2 h after a dose, which rests on absorption that was not read; clearance rises with time and falls with the dose; no variability was read.",
  ],
  ["flucytosine", "Clearance was only worked out; three sources disagree on the half-life (2.9, 3 to 6 and 6 h)."],
  ["isoniazid", "Clearance was only worked out from a half-life and the middle of a range of volumes."],
  ["mexiletine", "Clearance was only worked out from a laboratory's volume and half-life; variability is recalled."],
  ["perampanel", "No absorption rate, variability or range was read; the volume is recalled."],
  ["topiramate", "Absorption rate and range are recalled; no residual error was read."],
  [
    "amiodarone, methadone, procainamide, quinidine",
    "No clearance was read that a typical patient could be made from.",
  ],
];

/** docs/medicines.md and one page a record: path from the project's root to text. */
export function medicinePages(records: readonly MedicineRecord[] = BUILT_IN_RECORDS): ReadonlyMap<string, string> {
  return new Map([
    ["docs/medicines.md", indexPage(records)],
    ...records.map((record) => [`docs/medicines/${record.id}.md`, medicinePage(record)] as const),
  ]);
}

function indexPage(records: readonly MedicineRecord[]): string {
  const unreviewed = records.filter(({ review }) => review.status === "not-reviewed").length;
  return markdownPage([
    "# Medicine records",
    "Made by `node .ci/schema.mjs` from `src/core/medicine/records`; a test fails when they differ. What the fields mean and how to add a record: [medicine-record.md](medicine-record.md).",
    unreviewed === records.length
      ? "**None of the records has been reviewed by a second person.** Each says so, on the screen and on every sheet printed from it."
      : `**${unreviewed} of ${records.length} records have not been reviewed by a second person.** Each of these says so.`,
    markdownTable(
      ["record", "what it is", "figures", "of these from memory", "by basis"],
      records.map((record) => [
        `\`${record.id}\``,
        `[${markdownText(whatItIs(record))}](medicines/${record.id}.md)`,
        String(recordFigures(record).length),
        memoryCell(record),
        basisCounts(record)
          .map(([basis, count]) => `${count} ${basis}`)
          .join(", "),
      ]),
    ),
    markdownSection(
      "Typical values",
      `For ${PAGE_PATIENT_TEXT}. Per bioavailability where the record's figures are; kinetics and sources on each record's page.`,
      typicalTable(records),
    ),
    markdownSection("Left out, and why", LEFT_OUT.map(([name, why]) => `- **${name}**: ${why}`).join("\n")),
  ]);
}

function whatItIs({ name, invented, products, estimates }: MedicineRecord): string {
  const forms = products.map((each) => each.name).join(", ");
  const pieced = estimates.from === "one-model" ? "one model" : "pieced together";
  return invented ? `${name}: no such medicine exists` : `${forms}; ${pieced}`;
}

function memoryCell(record: MedicineRecord): string {
  const counts = new Map(basisCounts(record));
  return record.invented ? `${counts.get("invented") ?? 0} invented` : String(counts.get("memory") ?? 0);
}

function typicalTable(records: readonly MedicineRecord[]): string {
  const number = (value: number | undefined) => (value === undefined ? "" : numberPrint(value, { significant: 3 }));
  return markdownTable(
    ["record", "CL (L/h)", "Vmax (mg/h)", "Km (mg/L)", "V or V1 (L)", "Q (L/h)", "V2 (L)", "half-life (h)"],
    records.map((record) => {
      const { values, halfLifeH } = medicineTypical(record);
      return [
        `\`${record.id}\``,
        number(values.clearance),
        number(values.maximumRate),
        number(values.halfMaximum),
        number(values.volume),
        number(values.exchange),
        number(values.peripheralVolume),
        number(halfLifeH ?? undefined),
      ];
    }),
  );
}
