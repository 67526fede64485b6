import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { issueMessage } from "../../../src/core/messages/index.ts";
import { FILE_BYTES_MOST, FILE_DEPTH_MOST, jsonRead } from "../../../src/core/result/index.ts";

function fault(text: string): { code: string; sentence: string } {
  const read = jsonRead(text);
  if (read.ok) throw new Error(`read: ${text.slice(0, 80)}`);
  expect(read.issues).toHaveLength(1);
  return { code: read.issues[0]!.code, sentence: issueMessage(read.issues[0]!) };
}

describe("jsonRead", () => {
  it("reads what the built-in parser reads, to the same value", () => {
    fc.assert(
      fc.property(fc.jsonValue({ maxDepth: 6 }), fc.nat({ max: 4 }), (value, spaces) => {
        const text = JSON.stringify(value, null, spaces);
        fc.pre(!/"(__proto__|constructor|prototype)"\s*:/.test(text) && !text.includes("\ufffd"));
        expect(jsonRead(text)).toEqual({ ok: true, value: JSON.parse(text) });
      }),
      { seed: 1, numRuns: 500 },
    );
  }, 30_000);

  it("agrees with the built-in parser on what is not JSON", () => {
    const pieces = [
      "{",
      "}",
      "[",
      "]",
      ":",
      ",",
      '"a"',
      '"\\u0041"',
      '"\\x"',
      "1",
      "-",
      "-0",
      "01",
      "1.",
      ".5",
      "1e5",
      "1e",
      "+1",
      "true",
      "tru",
      "null",
      " ",
      "\n",
      "\u00a0",
      "'a'",
      "\t",
      "\u0001",
      "//",
    ];
    fc.assert(
      fc.property(fc.array(fc.constantFrom(...pieces), { minLength: 1, maxLength: 8 }), (parts) => {
        const text = parts.join("");
        let expected: { value: unknown } | null = null;
        try {
          expected = { value: JSON.parse(text) };
        } catch {}
        const read = jsonRead(text);
        if (!expected) expect(read.ok).toBe(false);
        // What it refuses and the built-in parser takes: a field given twice, a number that becomes Infinity ("1e5" and "01" make 1e501).
        else if (!read.ok) expect(["file-field-twice", "file-number-too-large"]).toContain(read.issues[0]!.code);
        else expect(read.value).toEqual(expected.value);
      }),
      { seed: 2, numRuns: 5000 },
    );
  }, 30_000);

  it.each([
    ['{"a": 1, "a": 2}', "file-field-twice", '"a"'],
    ['{"a": {"b": 1, "\\u0062": 2}}', "file-field-twice", '"b"'],
    ['{"__proto__": {}}', "file-field-refused", '"__proto__"'],
    ['{"\\u005f_proto__": {}}', "file-field-refused", '"__proto__"'],
    ['{"constructor": 1}', "file-field-refused", '"constructor"'],
    ['{"a": {"prototype": 1}}', "file-field-refused", '"prototype"'],
    ['{"a": 1e999}', "file-number-too-large", "1e999"],
    ['{"a": "\ufffd"}', "file-lost-character", "line 1, column 8"],
    ["\ufffd{}", "file-lost-character", "line 1, column 1"],
    ['{\n  "a": 1;\n}', "file-corrupt", '";" does not belong at line 2, column 9'],
    ['{"a": 1} x', "file-corrupt", '"x" does not belong at line 1, column 10'],
    ['{"a": 01}', "file-corrupt", "column 8"],
    ['{"a": "x\ny"}', "file-corrupt", "line 1, column 9"],
    ["<html>", "file-corrupt", '"<"'],
    ['{"a": NaN}', "file-corrupt", '"N"'],
    ["", "file-empty", "empty"],
    [" \n\t", "file-empty", "empty"],
    ["\ufeff", "file-empty", "empty"],
  ])("%j: %s", (text, code, words) => {
    const found = fault(text);
    expect(found.code).toBe(code);
    expect(found.sentence).toContain(words);
  });

  it.each([
    '{"a": 1',
    '{"a": ',
    '{"a"',
    "{",
    "[1,",
    '"abc',
    '"ab\\',
    '"ab\\u00',
    "tr",
    "[1.",
    "[1e",
    "[1e-",
    "[-",
    "nul",
    '{"a": 1,',
  ])("%j is cut off", (text) => {
    expect(fault(text).code).toBe("file-truncated");
    expect(fault(text).sentence).toContain("cut off");
  });

  it("takes a byte order mark", () => {
    expect(jsonRead('\ufeff{"a": 1}')).toEqual({ ok: true, value: { a: 1 } });
  });

  it("an escaped replacement character is a character like any other", () => {
    expect(jsonRead('"\\ufffd"')).toEqual({ ok: true, value: "\ufffd" });
  });

  it("keeps to its depth", () => {
    const nested = (depth: number) => "[".repeat(depth) + "]".repeat(depth);
    expect(jsonRead(nested(FILE_DEPTH_MOST)).ok).toBe(true);
    expect(fault(nested(FILE_DEPTH_MOST + 1)).code).toBe("file-too-deep");
    expect(fault("[".repeat(200_000)).code).toBe("file-too-deep");
    expect(fault('{"a":'.repeat(200_000)).code).toBe("file-too-deep");
  });

  it("keeps to its size, counted in bytes of UTF-8", () => {
    const ofBytes = (character: string, bytes: number, count: number) =>
      `"${character.repeat(count)}${"x".repeat(FILE_BYTES_MOST - 2 - bytes * count)}"`;
    for (const [character, bytes] of [
      ["x", 1],
      ["é", 2],
      ["€", 3],
      ["𝛼", 4],
    ] as const) {
      const text = ofBytes(character, bytes, 1000);
      expect(new TextEncoder().encode(text)).toHaveLength(FILE_BYTES_MOST);
      expect(jsonRead(text).ok).toBe(true);
      expect(fault(`${text} `).code).toBe("file-too-large");
    }
    expect(fault("x".repeat(FILE_BYTES_MOST * 2)).code).toBe("file-too-large");
  }, 60_000);

  it("makes objects that reach no prototype", () => {
    const read = jsonRead('{"toString": 1, "hasOwnProperty": 2}');
    expect(read).toEqual({ ok: true, value: { toString: 1, hasOwnProperty: 2 } });
    expect(({} as { polluted?: unknown }).polluted).toBeUndefined();
  });
});
