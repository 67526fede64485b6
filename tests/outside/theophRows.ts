import { readFileSync } from "node:fs";

/** One level of R's data set Theoph: theophylline after one oral dose, 11 levels in each of 12 subjects. */
export interface TheophRow {
  readonly subject: string;
  /** mg/kg */
  readonly dose: number;
  /** h after the dose. */
  readonly time: number;
  /** mg/L */
  readonly level: number;
}

const fixture = (name: string): string => readFileSync(new URL(`../fixtures/${name}`, import.meta.url), "utf8");

export const theophRows: readonly TheophRow[] = fixture("theoph.csv")
  .trim()
  .split(/\r?\n/)
  .slice(1)
  .map((line) => line.replaceAll('"', "").split(","))
  .map(([subject = "", , dose, time, level]) => ({
    subject,
    dose: Number(dose),
    time: Number(time),
    level: Number(level),
  }));

/** What a fixture of fits to the data holds. */
export const theophFits = <Fits>(name: string): Fits => JSON.parse(fixture(name)) as Fits;
