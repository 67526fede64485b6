import { describe, expect, expectTypeOf, test } from "vitest";
import {
  type LinearDisposition,
  type ModelDisposition,
  modelProfile,
  modelUnitResponse,
} from "../../../../src/core/kinetics/index.ts";

const SATURABLE = { kind: "saturable", vmax: 20, km: 4, volume: 45 } as const;
const PRODUCT = { absorption: { kind: "first-order", ka: 0.8 }, bioavailability: 0.9, lag: 0.5 } as const;

describe("superposition is refused by type", () => {
  test("a saturable disposition is a model, and no linear one", () => {
    expectTypeOf<typeof SATURABLE>().toExtend<ModelDisposition>();
    expectTypeOf<typeof SATURABLE>().not.toExtend<LinearDisposition>();
    expectTypeOf<LinearDisposition["kind"]>().toEqualTypeOf<"one-compartment" | "two-compartment">();
    // @ts-expect-error The type checker refuses this call; were it to let it through, this line would be the error.
    modelUnitResponse(SATURABLE, PRODUCT, [1]);
  });
});

test.each([
  { kind: "one-compartment", clearance: 3, volume: 30 },
  { kind: "two-compartment", clearance: 3, volume: 20, exchange: 6, peripheralVolume: 50 },
] satisfies LinearDisposition[])(
  "$kind: scaled and added up it is the profile, to 1e-13 of the largest level",
  (disposition) => {
    const doses = [
      { time: 0, amount: 300 },
      { time: 12, amount: 150 },
      { time: 20, amount: 450 },
    ];
    const at = Array.from({ length: 60 }, (_, i) => i + 0.5);
    const sum = at.map((time) =>
      doses.reduce((level, dose) => {
        const since = time - dose.time;
        return level + (since > 0 ? dose.amount * modelUnitResponse(disposition, PRODUCT, [since])[0]! : 0);
      }, 0),
    );
    const dispositions = [{ from: Number.NEGATIVE_INFINITY, disposition }];
    const levels = modelProfile({ dispositions, inputs: [{ ...PRODUCT, doses }] }, at);
    const largest = Math.max(...levels);
    for (const [i, level] of levels.entries()) {
      expect(Math.abs(level - sum[i]!) / largest).toBeLessThanOrEqual(1e-13);
    }
  },
);
