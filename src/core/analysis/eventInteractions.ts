import type { Case, Factor } from "../case/index.ts";
import type { Interaction } from "../medicine/index.ts";

type Sex = Case["patient"]["sex"];

/**
 * The record's interactions with what an event names: whole words, whatever the case ("Sodium valproate 500 mg" names valproate).
 * "A, B or C" is named by any of them, "two or more of A, B and C" by two, "A with B or C" by A and one of the others. "…, woman" is for a woman.
 */
export function eventInteractions(value: Case, factor: Factor): readonly Interaction[] {
  const said = saidOf(factor);
  if (said === null) return [];
  return interactionsFor(value).filter(({ medicine }) => isNamed(medicine, ` ${wordsOf(said)} `));
}

/** The record's interactions that can be this patient's: those for the other sex are left out. */
export function interactionsFor({ medicine, patient: { sex } }: Case): readonly Interaction[] {
  return medicine.interactions.filter((each) => sex === undefined || (sexOf(each.medicine) ?? sex) === sex);
}

function saidOf({ kind, detail }: Factor): string | null {
  if (kind === "interacting-medicine" || kind === "other") return detail;
  return kind === "smoking" ? `${detail} tobacco smoke` : null;
}

function isNamed(medicine: string, said: string): boolean {
  const least = TWO_OF.test(medicine) ? 2 : 1;
  return medicine
    .replace(FOR_ONE_SEX, "")
    .replace(TWO_OF, "")
    .split(/\bwith\b/i)
    .every((part) => namesIn(part).filter((name) => said.includes(` ${name} `)).length >= least);
}

function namesIn(part: string): readonly string[] {
  return part
    .split(/,|\bor\b|\band\b/i)
    .map(wordsOf)
    .filter((name) => name !== "");
}

const TWO_OF = /^two or more of\b/i;
const FOR_ONE_SEX = /,\s*(woman|man)$/i;

function sexOf(medicine: string): Sex {
  const word = FOR_ONE_SEX.exec(medicine)?.[1]?.toLowerCase();
  return word === undefined ? undefined : word === "woman" ? "female" : "male";
}

function wordsOf(text: string): string {
  return text
    .toLowerCase()
    .split(/[^\p{L}\p{N}*]+/u)
    .filter((word) => word !== "")
    .join(" ");
}
