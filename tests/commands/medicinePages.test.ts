import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { markdownTable, markdownText } from "../../.ci/markdown.ts";
import { medicinePage } from "../../.ci/medicinePage.ts";
import { LEFT_OUT, medicinePages } from "../../.ci/medicinePages.ts";
import { BUILT_IN_RECORDS, recordById, recordFigures } from "../../src/core/medicine/index.ts";

const project = new URL("../../", import.meta.url);
const pages = medicinePages();

describe("the pages of the medicine records", () => {
  // After a change of a record: node .ci/schema.mjs
  it.each([...pages.keys()])("%s is what the records make now", (path) => {
    expect(readFileSync(new URL(path, project), "utf8")).toBe(pages.get(path));
  });

  it("are one a record and no more", () => {
    const written = readdirSync(new URL("docs/medicines", project)).map((name) => `docs/medicines/${name}`);
    expect(written.sort()).toEqual([...pages.keys()].filter((path) => path.startsWith("docs/medicines/")).sort());
    expect(written.length).toBe(BUILT_IN_RECORDS.length);
  });

  it.each(BUILT_IN_RECORDS)("$name: every statement, note and source stands on its page", (record) => {
    const page = medicinePage(record);
    const said = [
      ...[...record.doseLimits, ...record.sampling, ...record.cautions, record.population, record.estimates],
      ...recordFigures(record),
    ].flatMap((each) => [("text" in each && each.text) || "", each.note ?? "", `\`${each.source}\``]);
    const titles = Object.values(record.sources).map((each) => each.title);
    for (const text of [...said, ...titles]) {
      expect(page).toContain(text.startsWith("`") ? text : markdownText(text));
    }
  });

  it("say that nobody has reviewed a record, and who has", () => {
    const record = recordById("tacrolimus")!;
    expect(medicinePage(record)).toContain("**Not independently reviewed.**");
    const reviewed = { ...record, review: { status: "reviewed" as const, by: "A. Person", on: "2026-05-01" } };
    expect(medicinePage(reviewed)).toContain("**Reviewed by A. Person on 2026-05-01.**");
    expect(medicinePage(reviewed)).not.toContain("Not independently");
  });

  it("name a medicine as left out only while it has no record", () => {
    const names = LEFT_OUT.flatMap(([name]) => name.split(", "));
    expect(names.filter((name) => recordById(name))).toEqual([]);
  });
});

describe("markdown", () => {
  it("lets no sign of a text act", () => {
    expect(markdownText("CYP3A5 *1/*3 | a_b [c] `d` <e>")).toBe("CYP3A5 \\*1/\\*3 \\| a\\_b \\[c\\] \\`d\\` \\<e\\>");
  });

  it("leaves out a column without a word, and a table without rows", () => {
    expect(markdownTable(["a", "b"], [["1", ""]])).toBe("| a |\n| --- |\n| 1 |");
    expect(markdownTable(["a", "b"], [])).toBe("");
  });
});
