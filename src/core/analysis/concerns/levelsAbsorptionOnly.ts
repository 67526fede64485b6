import { instantText } from "../../time/index.ts";
import { absorbedAfter } from "../absorbedAfter.ts";
import { type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { usedLevels } from "../usedLevels.ts";

/** Every used level was drawn while the last dose was still coming in. */
export const levelsAbsorptionOnly: ConcernRule = (context) => {
  const { given, model } = context;
  const used = usedLevels(context);
  if (used.length === 0 || !model) return [];
  const isAbsorbing = used.every((level) => {
    const last = given.filter((mark) => mark.countedMg > 0 && mark.atH < level.atH).at(-1);
    const product = model.products.find((each) => each.product === last?.product);
    if (!product || level.afterDoseH === null) return false;
    return level.afterDoseH < product.lag.value + absorbedAfter(product.absorption);
  });
  const times = used.map((level) => instantText(clockMs(context, level.atH), context.case.timeZone, "dayClock"));
  return isAbsorbing ? [concern("levels-absorption-only", "check", { kind: "case" }, { times })] : [];
};
