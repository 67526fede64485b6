import { quantityConvert } from "../../units/index.ts";
import { type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { concentrationWindow } from "../optionReadings.ts";
import { windowDrawn } from "../windowDrawn.ts";
import { windowDrawH } from "../windowTiming.ts";
import { windowSidesForAlbumin } from "./phenytoinAlbumin.ts";

/**
 * The latest level in use that was drawn when the window is meant lies outside it. Above is to be looked at before the next dose; below is
 * what the options are for. Nothing where the toxic limit is reached: levelToxic says so; nor of phenytoin below it as measured but not once
 * corrected for a low albumin: phenytoinAlbumin says so.
 */
export const levelOutsideWindow: ConcernRule = (context) => {
  const { window, medicine, timeZone } = context.case;
  const ends = concentrationWindow(context.case);
  if (!window || !ends) return [];
  const latest = context.levels
    .filter(({ excluded, atH }) => excluded === null && atH <= context.clock.nowH)
    .filter((level) => windowDrawn(context, level)?.kind === "as-meant")
    .reduce<(typeof context.levels)[number] | null>((last, each) => (last && last.atH > each.atH ? last : each), null);
  if (!latest) return [];
  const { measured, belowLimit } = latest;
  const isAbove = measured > ends.high && !belowLimit;
  // Below an assay's limit is below the window only if the limit is.
  const isBelow = belowLimit ? measured <= ends.low : measured < ends.low;
  const { toxicFrom } = medicine;
  const isToxic = toxicFrom !== undefined && measured >= quantityConvert(toxicFrom, "mg/L", medicine.molarMass.value);
  if ((!isAbove && !isBelow) || (isAbove && isToxic)) return [];
  const sides = windowSidesForAlbumin(context, latest.id);
  if (isBelow && sides && sides.correctedSide !== "below") return [];
  const data = {
    atMs: clockMs(context, latest.atH),
    zone: timeZone,
    measured,
    belowLimit,
    quantity: window.quantity,
    afterDoseH: windowDrawH(context.case),
    low: ends.low,
    high: ends.high,
  };
  const about = { kind: "level", id: latest.id } as const;
  return [
    isAbove ? concern("level-above-window", "check", about, data) : concern("level-below-window", "note", about, data),
  ];
};
