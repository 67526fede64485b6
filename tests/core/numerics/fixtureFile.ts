import { readFileSync } from "node:fs";

/** A reference file, parsed. What it holds and where it comes from stands in tests/fixtures/README.md. */
export function fixtureFile<T>(name: string): T {
  return JSON.parse(readFileSync(new URL(`../../fixtures/${name}`, import.meta.url), "utf8")) as T;
}

/** |found/wanted − 1|; where 0 is wanted, |found|. */
export function relative(found: number, wanted: number): number {
  return wanted === 0 ? Math.abs(found) : Math.abs(found / wanted - 1);
}
