import { describe, expect, it } from "vitest";
import { spanMoved, spanStart, spanWithin, spanZoomed } from "../../../src/view/bench/benchSpan.ts";

const whole = { fromH: -240, toH: 480 };

describe("the part of the clock shown at first", () => {
  it("is four days of the past and five of the future where there is room", () => {
    expect(spanStart(whole, 0, 1000)).toEqual({ fromH: -96, toH: 120 });
  });

  it("is fewer days in the same proportion where there is not, so that each can be named", () => {
    const { fromH, toH } = spanStart(whole, 0, 252);
    expect((toH - fromH) / 24).toBeCloseTo(252 / 56, 10);
    expect(-fromH / toH).toBeCloseTo(4 / 5, 10);
  });

  it("is never less than two days, nor more than there is", () => {
    const { fromH, toH } = spanStart(whole, 0, 10);
    expect((toH - fromH) / 24).toBeCloseTo(2, 10);
    expect(spanStart({ fromH: -12, toH: 24 }, 0, 1000)).toEqual({ fromH: -12, toH: 24 });
    expect(spanStart({ fromH: -12, toH: 480 }, 0, 1000)).toEqual({ fromH: -12, toH: 120 });
  });
});

describe("the part of the clock, moved and zoomed", () => {
  it("keeps its length and stays inside the whole", () => {
    expect(spanMoved(whole, { fromH: 0, toH: 100 }, 0.4)).toEqual({ fromH: 40, toH: 140 });
    expect(spanMoved(whole, { fromH: 400, toH: 480 }, 0.4)).toEqual({ fromH: 400, toH: 480 });
    expect(spanWithin(whole, { fromH: -300, toH: -200 })).toEqual({ fromH: -240, toH: -140 });
  });

  it("zooms about an hour that stays where it is, down to six hours", () => {
    expect(spanZoomed(whole, { fromH: 0, toH: 100 }, 0.5, 50)).toEqual({ fromH: 25, toH: 75 });
    expect(spanZoomed(whole, { fromH: 0, toH: 100 }, 0.5, 0)).toEqual({ fromH: 0, toH: 50 });
    const { fromH, toH } = spanZoomed(whole, { fromH: 0, toH: 8 }, 0.1, 4);
    expect(toH - fromH).toBe(6);
  });
});
