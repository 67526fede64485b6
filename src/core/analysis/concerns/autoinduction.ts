import { quantityConvert } from "../../units/index.ts";
import { type ConcernRule, concern } from "../concernRule.ts";
import { sourceText } from "../typicalModel.ts";

const DAY_H = 24;

/** The medicine speeds up its own elimination and the course is younger than the record says that takes: clearance will still rise. */
export const autoinduction: ConcernRule = ({ case: value, given, clock }) => {
  const { autoinduction: effect } = value.medicine;
  if (!effect) return [];
  const settledD = effect.settledAfter ? quantityConvert(effect.settledAfter, "d") : null;
  const firstH = given.find((mark) => mark.countedMg > 0)?.atH ?? null;
  const courseD = firstH === null ? 0 : (clock.nowH - firstH) / DAY_H;
  if (settledD !== null && courseD >= settledD) return [];
  return [
    concern(
      "autoinduction-unsettled",
      settledD === null ? "note" : "check",
      { kind: "medicine" },
      {
        name: value.medicine.name,
        text: effect.text,
        settledD,
        courseD: firstH === null ? null : courseD,
        source: sourceText(value.medicine, effect.source),
        basis: effect.basis,
      },
    ),
  ];
};
