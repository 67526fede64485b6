import { describe, expect, it } from "vitest";
import { FIELD_ORDER } from "../../../src/core/case/casePrint.ts";
import { FILE_SCHEMAS } from "../../../src/core/case/fileSchemas.ts";
import { caseParse, casePrint } from "../../../src/core/case/index.ts";
import { sampleCase } from "./sampleCase.ts";

/** The object with its fields in the opposite order, all the way down. */
function reversed(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(reversed);
  if (typeof value !== "object" || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .reverse()
      .map(([key, each]) => [key, reversed(each)]),
  );
}

describe("casePrint", () => {
  it("gives the same text whatever the order of the fields", () => {
    const value = sampleCase();
    const text = casePrint(value);
    expect(casePrint(reversed(value) as typeof value)).toBe(text);
    expect(JSON.stringify(reversed(value))).not.toBe(JSON.stringify(value));
  });

  it("ends with one newline and begins with what it is", () => {
    const text = casePrint(sampleCase());
    expect(text.endsWith("}\n")).toBe(true);
    expect(text.split("\n").slice(0, 4)).toEqual([
      "{",
      '  "format": "ebbline-case",',
      '  "version": 2,',
      '  "id": "sample-1",',
    ]);
  });

  it("brings every text through: quotes, controls, letters of any size, halves of letters, lost characters", () => {
    const value = { ...sampleCase(), notes: 'a"b\\c\n\t\u0000\u007f é € 𝛼 \ud800 \ufffd \u2028 \ufeff </script>' };
    expect(caseParse(casePrint(value))).toEqual({ ok: true, value });
  });

  it("brings every number through", () => {
    const value = structuredClone(sampleCase());
    for (const number of [0.1 + 0.2, 5e-324, 1.7976931348623157e308, 1e21, 1e-7, 123456789.12345679, 2 ** 53 + 2]) {
      value.levels[0]!.quantity.value = number;
      const parsed = caseParse(casePrint(value));
      expect(parsed.ok && parsed.value.levels[0]!.quantity.value).toBe(number);
    }
  });

  it("knows the place of every field of the schema, and of no other", () => {
    const names = new Set<string>();
    const visit = (schema: unknown): void => {
      if (typeof schema !== "object" || schema === null) return;
      if ("properties" in schema) for (const name of Object.keys(schema.properties as object)) names.add(name);
      for (const each of Object.values(schema)) visit(each);
    };
    visit(FILE_SCHEMAS[0]!.make());
    expect([...FIELD_ORDER].sort()).toEqual([...names].sort());
  });
});
