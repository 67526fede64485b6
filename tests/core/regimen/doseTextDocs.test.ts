import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { doseLineSentence } from "../../../src/core/messages/index.ts";
import { doseTextRead } from "../../../src/core/regimen/index.ts";
import { doseTextContext, PRODUCTS } from "./doseTextContext.ts";

/** The examples of docs/dose-text.md: what is typed, and the words shown back, one a line, joined by " / ". */
const page = readFileSync(new URL("../../../docs/dose-text.md", import.meta.url), "utf8");
function examples(heading: string): readonly (readonly [string, string])[] {
  const section = page.split(`## ${heading}\n`)[1]?.split("\n## ")[0] ?? "";
  return [...section.matchAll(/^\| `(.+?)` \| (.+?) \|$/gm)].map((match) => [match[1] ?? "", match[2] ?? ""]);
}

describe.each([
  ["In an option", "option", 14],
  ["Among the doses given", "given", 5],
] as const)("docs/dose-text.md, %s", (heading, lane, count) => {
  it("holds its examples", () => {
    expect(examples(heading)).toHaveLength(count);
  });

  it.each(examples(heading))("%s", (text, words) => {
    const context = doseTextContext({ lane });
    const read = doseTextRead(text, context);
    expect(read.ok).toBe(true);
    if (!read.ok) return;
    const shown = read.value.map((line) => doseLineSentence(line, { zone: context.zone, products: PRODUCTS }));
    expect(shown.join(" / ").replaceAll("\u00a0", " ")).toBe(words);
  });
});
