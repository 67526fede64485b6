import type { Figure } from "../src/core/medicine/index.ts";
import { type Quantity, quantityPrint } from "../src/core/units/index.ts";
import { markdownTable, markdownText } from "./markdown.ts";

/** Figures and statements of a record's page, each with where it is from. */

export type Provenance = { readonly source: string; readonly basis: string; readonly note?: string | undefined };
export const PROVENANCE = ["source", "basis", "note"] as const;

export function figuresTable(figures: readonly (readonly [string, Figure | undefined])[]): string {
  return markdownTable(["", "value", ...PROVENANCE], figureRows(figures));
}

export function figureRows(figures: readonly (readonly [string, Figure | undefined])[]): string[][] {
  return figures.flatMap(([words, figure]) =>
    figure ? [[words, quantityText(figure), ...provenanceCells(figure)]] : [],
  );
}

export function statements(list: readonly (Provenance & { readonly text: string })[]): string {
  return list.map((each) => `- ${statement(each)}`).join("\n");
}

/** A figure inside a cell: "6 h (`source`, seen; its note)". */
export function sourcedText(figure: Figure): string {
  const note = figure.note === undefined ? "" : `; ${markdownText(figure.note)}`;
  return `${quantityText(figure)} (${provenanceText(figure)}${note})`;
}

export function statement(each: Provenance & { readonly text: string }): string {
  return `${markdownText(each.text)} (${provenanceText(each)})${each.note ? ` Note: ${markdownText(each.note)}` : ""}`;
}

function provenanceText({ source, basis }: Provenance): string {
  return `\`${source}\`, ${basis}`;
}

export function provenanceCells({ source, basis, note }: Provenance): string[] {
  return [`\`${source}\``, basis, markdownText(note ?? "")];
}

export function quantityText(quantity: Quantity, significant?: number): string {
  return quantityPrint(quantity, { style: "screen", ...(significant !== undefined && { significant }) });
}

/** "peripheralVolume" as words. */
export function spaced(name: string): string {
  return name.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);
}
