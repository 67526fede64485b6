import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { CASE_MIGRATIONS, caseMigrate, type MigrationStep } from "../../../src/core/case/caseMigrate.ts";
import { CASE_VERSION } from "../../../src/core/case/index.ts";
import { record0001 } from "../../../src/core/medicine/index.ts";

describe("caseMigrate", () => {
  it("has one step for every version but the first", () => {
    expect(CASE_MIGRATIONS).toHaveLength(CASE_VERSION - 1);
  });

  it("leaves the newest version as it is", () => {
    const value = { format: "ebbline-case", version: CASE_VERSION, extra: 1 };
    const migrated = caseMigrate(value);
    expect(migrated.ok && migrated.value).toBe(value);
  });

  // Two steps made up for the test: what a third version would look like.
  const steps: readonly MigrationStep[] = [
    ({ name, ...rest }) => ({ ...rest, version: 2, label: name }),
    (value) => ({ ...value, version: 3, tags: [] }),
  ];

  it("takes each version through the steps from its own on, in order", () => {
    const newest = { ok: true, value: { format: "ebbline-case", version: 3, label: "x", tags: [] } };
    expect(caseMigrate({ format: "ebbline-case", version: 1, name: "x" }, steps)).toEqual(newest);
    expect(caseMigrate({ format: "ebbline-case", version: 2, label: "x" }, steps)).toEqual(newest);
    expect(caseMigrate({ format: "ebbline-case", version: 3, label: "x", tags: [] }, steps)).toEqual(newest);
  });

  it("refuses what is newer than its last step", () => {
    expect(caseMigrate({ format: "ebbline-case", version: 4 }, steps)).toMatchObject({
      ok: false,
      issues: [{ code: "case-newer", data: { found: 4, known: 3 } }],
    });
  });

  it("does not touch what it was given", () => {
    const value = Object.freeze({ format: "ebbline-case", version: 1, name: "x" });
    caseMigrate(value, steps);
    expect(value).toEqual({ format: "ebbline-case", version: 1, name: "x" });
  });
});

describe("step 1, version 1 to 2", () => {
  const stored = (): Record<string, unknown> =>
    JSON.parse(readFileSync(new URL("../../stored/case-version-1.ebbline.json", import.meta.url), "utf8"));

  it("takes the medicine record along and leaves the rest as it was", () => {
    const before = stored();
    const migrated = caseMigrate(before);
    if (!migrated.ok) throw new Error("refused");
    const { version, medicine, ...rest } = migrated.value;
    const { version: _, medicine: record, ...same } = stored();
    expect(version).toBe(2);
    expect(rest).toEqual(same);
    expect(medicine).toEqual(record0001(record as Record<string, unknown>));
    expect(before).toEqual(stored());
  });

  it.each([undefined, null, 1, [], { version: 3 }, { version: 2 }])(
    "hands %j on for the schema to refuse",
    (medicine) => {
      const migrated = caseMigrate({ format: "ebbline-case", version: 1, medicine });
      expect(migrated.ok && migrated.value.medicine).toBe(medicine);
    },
  );
});
