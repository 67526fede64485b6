import { describe, expect, it } from "vitest";
import { CASE_MIGRATIONS, caseMigrate, type MigrationStep } from "../../../src/core/case/caseMigrate.ts";
import { CASE_VERSION } from "../../../src/core/case/index.ts";

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
