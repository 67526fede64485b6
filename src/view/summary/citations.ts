import type { Traced } from "../../core/analysis/index.ts";
import type { MedicineRecord } from "../../core/medicine/index.ts";
import { summaryDetailWords as words } from "../../core/messages/index.ts";

type Statement = MedicineRecord["cautions"][number] | MedicineRecord["sampling"][number];

/** The sources of a record that a summary cites, numbered in the order they are met. */
export interface Citations {
  /** Where a figure comes from, and how it is known. */
  readonly ofFigure: (figure: Traced) => string;
  /** The same of a figure as it stands in the record. */
  readonly ofRecord: (figure: Pick<Statement, "source" | "basis">) => string;
  /** A statement of the record with the number of its source. */
  readonly ofStatement: (statement: Statement) => string;
  /** What was cited so far, in the order of its numbers. */
  readonly list: () => readonly string[];
}

export function citations({ sources }: MedicineRecord): Citations {
  const cited: string[] = [];
  const number = (text: string): number => {
    if (!cited.includes(text)) cited.push(text);
    return cited.indexOf(text) + 1;
  };
  const isCitable = (text: string) => Object.keys(sources).some((id) => sourceText(sources, id) === text);
  return {
    ofFigure: ({ source, basis }) =>
      OWN_BASES.includes(basis) && !isCitable(source)
        ? source
        : words.sourceAndBasis(words.numbered(number(source)), BASES[basis] ?? basis),
    ofRecord: ({ source, basis }) =>
      words.sourceAndBasis(words.numbered(number(sourceText(sources, source))), BASES[basis] ?? basis),
    ofStatement: (statement) => words.cited(marked(statement), number(sourceText(sources, statement.source))),
    list: () => cited,
  };
}

/** Figures of the case itself or worked out from others have no literature behind them. */
const OWN_BASES: readonly string[] = ["entered", "derived"];

/** A statement nobody has read in its source carries a mark. */
function marked(statement: Statement): string {
  return isUnverified(statement) ? words.marked(statement.text) : statement.text;
}

export function isUnverified({ basis }: Statement): boolean {
  return basis !== "seen" && basis !== "derived";
}

const BASES: Readonly<Record<string, string>> = words.bases;

/** The words a figure of the analysis carries as its source (core/analysis writes them the same way). */
function sourceText(sources: MedicineRecord["sources"], id: string): string {
  const source = sources[id];
  return source
    ? [source.authors, source.title, source.year, source.place].filter((part) => part !== undefined).join(", ")
    : id;
}
