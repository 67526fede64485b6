import { execFileSync } from "node:child_process";
import { mkdirSync, readdirSync } from "node:fs";
import { dirname, join } from "node:path";
import type { Page } from "@playwright/test";

export interface PrintedSheets {
  readonly pdf: string;
  /** Words of each sheet, laid out as printed. */
  readonly texts: readonly string[];
  /** A PNG file of each sheet. */
  readonly pictures: readonly string[];
}

const DOTS_PER_INCH = 100;

/** Prints the page as its own @page rules say into `pdf`, and reads it back as text and pictures with poppler. */
export async function printPage(page: Page, pdf: string): Promise<PrintedSheets> {
  mkdirSync(dirname(pdf), { recursive: true });
  await page.pdf({ path: pdf, preferCSSPageSize: true, tagged: true, printBackground: true });
  const text = execFileSync("pdftotext", ["-layout", pdf, "-"], { encoding: "utf8" });
  // pdftotext ends each sheet with a form feed.
  const texts = text.split("\f").slice(0, -1);
  const stem = pdf.replace(/\.pdf$/, "");
  execFileSync("pdftoppm", ["-png", "-r", String(DOTS_PER_INCH), pdf, stem]);
  const pictures = readdirSync(dirname(pdf))
    .map((name) => join(dirname(pdf), name))
    .filter((name) => name.startsWith(`${stem}-`) && name.endsWith(".png"))
    .sort();
  if (pictures.length !== texts.length) throw new Error(`${texts.length} sheets of text, ${pictures.length} pictures`);
  return { pdf, texts, pictures };
}
