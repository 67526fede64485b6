import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { FILE_SCHEMAS, fileSchemaPrint } from "../../../src/core/case/fileSchemas.ts";

describe("the published JSON Schemas", () => {
  // After a change of a schema: node .ci/schema.mjs
  it.each(FILE_SCHEMAS)("$file is what the validator makes now", ({ file, make }) => {
    expect(readFileSync(new URL(`../../../${file}`, import.meta.url), "utf8")).toBe(fileSchemaPrint(make()));
  });

  it("refuse unknown fields at every level", () => {
    let objects = 0;
    const visit = (schema: unknown, path: string): void => {
      if (typeof schema !== "object" || schema === null) return;
      if ("properties" in schema) {
        objects += 1;
        expect([path, (schema as { additionalProperties?: unknown }).additionalProperties]).toEqual([path, false]);
      }
      for (const [key, each] of Object.entries(schema)) visit(each, `${path}/${key}`);
    };
    for (const { make } of FILE_SCHEMAS) visit(make(), "");
    expect(objects).toBeGreaterThan(30);
  });
});
