import { describe, expect, it } from "vitest";
import { type Product, productAbsorption, productOf, recordById } from "../../../src/core/medicine/index.ts";

const plain = productOf(recordById("demoxiline")!, "tablet");
const twoPhase = productOf(recordById("demoxiline")!, "capsule-two-phase");
const figure = (value: number, unit: "h" | "/h") => ({ value, unit, source: "invented", basis: "invented" }) as const;

function without<K extends keyof Product>(product: Product, key: K): Product {
  const { [key]: _, ...rest } = product;
  return rest as Product;
}

describe("productAbsorption", () => {
  it("first-order where no input is stated", () => {
    expect(productAbsorption(plain)).toEqual({ kind: "first-order", ka: 1 });
  });

  it("zero-order", () => {
    const even: Product = {
      ...without(plain, "absorptionRate"),
      input: { kind: "zero-order", duration: figure(6, "h") },
    };
    expect(productAbsorption(even)).toEqual({ kind: "zero-order", duration: 6 });
  });

  it("mixed, the slow part over a duration or by a rate", () => {
    const mixed = { kind: "mixed", fastFraction: 0.3, fastKa: 1, slowLag: 0.5 };
    expect(productAbsorption(twoPhase)).toEqual({ ...mixed, slow: { kind: "zero-order", duration: 8 } });
    if (twoPhase.input?.kind !== "mixed") throw new Error("not mixed");
    const { slowDuration: _, ...input } = twoPhase.input;
    expect(productAbsorption({ ...twoPhase, input: { ...input, slowRate: figure(0.2, "/h") } })).toEqual({
      ...mixed,
      slow: { kind: "first-order", ka: 0.2 },
    });
  });

  it("a product no record could hold throws, naming what is missing", () => {
    expect(() => productAbsorption(without(plain, "absorptionRate"))).toThrow(/absorptionRate.*"tablet"/);
    if (twoPhase.input?.kind !== "mixed") throw new Error("not mixed");
    const { slowDuration: _, ...input } = twoPhase.input;
    expect(() => productAbsorption({ ...twoPhase, input })).toThrow(RangeError);
  });
});
