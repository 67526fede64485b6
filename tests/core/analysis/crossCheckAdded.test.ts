import { describe, expect, it } from "vitest";
import { type Analysis, crossCheckAdded, derive } from "../../../src/core/analysis/index.ts";
import { demoCase } from "../../fixtures/demoCase.ts";

const value = demoCase("adjustment");
const fitted = derive(value, { isFitted: true });
const codes = ({ concerns }: Analysis) => concerns.map(({ code }) => code);

describe("a cross-check put into a fitted result", () => {
  it("gives what both at once give", () => {
    const checked = derive(value, { isCrossChecked: true });
    expect(checked.crossCheck).not.toBeNull();
    expect(crossCheckAdded(fitted, checked)).toEqual(derive(value, { isFitted: true, isCrossChecked: true }));
  });

  it("puts its concern first, once, and takes it away when the next one agrees", () => {
    const typical = derive(value);
    const apart: Analysis = {
      ...typical,
      crossCheck: { worst: 0.01, where: "given", isAgreed: false },
      concerns: [
        { ...typical.concerns[0]!, code: "roads-differ", gravity: "stop", data: { worst: 0.01, where: "given" } },
        ...typical.concerns,
      ],
    };
    const once = crossCheckAdded(fitted, apart);
    expect(codes(once)).toEqual(["roads-differ", ...codes(fitted)]);
    expect(codes(crossCheckAdded(once, apart))).toEqual(codes(once));
    expect(crossCheckAdded(once, derive(value, { isCrossChecked: true }))).toEqual(
      derive(value, { isFitted: true, isCrossChecked: true }),
    );
  });
});
