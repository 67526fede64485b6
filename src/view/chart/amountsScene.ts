import { area, line } from "d3-shape";
import type { AmountsOverTime } from "../../core/analysis/index.ts";
import type { ClockScale } from "./clockScale.ts";
import { concentrationScale } from "./concentrationScale.ts";
import { labelSpread } from "./labelSpread.ts";

export type AmountsPart = "eliminated" | "peripheral" | "body" | "gut";

export interface AmountsScene {
  /** From the bottom up. */
  readonly bands: readonly { readonly part: AmountsPart; readonly path: string; readonly labelY: number }[];
  /** F × dose taken: the upper edge, drawn from the doses alone. */
  readonly edge: string;
  readonly ticks: readonly { readonly value: number; readonly y: number }[];
  readonly top: number;
  readonly bottom: number;
}

/** Bottom up: what is gone carries what is left, so that the upper edge is all that was taken. */
const ORDER: readonly AmountsPart[] = ["eliminated", "peripheral", "body", "gut"];
const LABEL_ROOM = 15;

/** Where the dose is, as stacked bands over the shared clock. A part that never holds anything is left out. */
export function amountsScene(
  timesH: readonly number[],
  amounts: AmountsOverTime,
  clock: ClockScale,
  top: number,
  bottom: number,
): AmountsScene {
  const scale = concentrationScale("linear", Math.max(0, ...amounts.taken), top, bottom, 3);
  const floor = timesH.map(() => 0);
  const parts = ORDER.filter((part) => part !== "peripheral" || amounts.peripheral.some((mg) => mg > 0));
  const bands = parts.map((part) => {
    const low = [...floor];
    amounts[part].forEach((mg, i) => {
      floor[i] = floor[i]! + mg;
    });
    const high = [...floor];
    const path = area<number>()
      .x((_, i) => clock.x(timesH[i]!))
      .y0((_, i) => scale.y(low[i]!))
      .y1((_, i) => scale.y(high[i]!))([...timesH]);
    return { part, path: path ?? "", middle: (scale.y(low.at(-1) ?? 0) + scale.y(high.at(-1) ?? 0)) / 2 };
  });
  const spread = labelSpread(
    bands.map((band) => band.middle),
    LABEL_ROOM,
    top,
    bottom,
  );
  return {
    bands: bands.map(({ part, path }, i) => ({ part, path, labelY: spread[i]! })),
    edge:
      line<number>()
        .x((_, i) => clock.x(timesH[i]!))
        .y((mg) => scale.y(mg))([...amounts.taken]) ?? "",
    ticks: scale.ticks,
    top,
    bottom,
  };
}

/** Even points of the drawing, and each dose from both sides, so that the steps stand upright. */
const POINTS = 400;
/** h: nothing at the scale of a screen. */
const JUST_AFTER = 1e-4;

export function amountsTimes(fromH: number, toH: number, dosesH: readonly number[]): number[] {
  const times = new Set<number>([toH]);
  for (let i = 0; i < POINTS; i++) times.add(fromH + (i * (toH - fromH)) / POINTS);
  for (const at of dosesH) for (const time of [at, at + JUST_AFTER]) if (time > fromH && time < toH) times.add(time);
  return [...times].sort((a, b) => a - b);
}
