import { readFileSync } from "node:fs";

/** One worked example of tests/fixtures/worked_examples.json, which names the source of each. */
export interface WorkedExample {
  readonly id: string;
  readonly topic: string;
  readonly source: string;
  readonly inputs: unknown;
  readonly computed: Readonly<Record<string, unknown>>;
}

const FILE = new URL("../fixtures/worked_examples.json", import.meta.url);

export function workedExample(id: string): WorkedExample {
  const { items } = JSON.parse(readFileSync(FILE, "utf8")) as { items: readonly WorkedExample[] };
  const found = items.find((item) => item.id === id);
  if (!found) throw new RangeError(`id: no worked example "${id}" in the fixture`);
  return found;
}

export function relativeError(found: number, wanted: number): number {
  return Math.abs(found - wanted) / Math.abs(wanted);
}
