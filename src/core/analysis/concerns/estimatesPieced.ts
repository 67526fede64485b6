import { type ConcernRule, concern } from "../concernRule.ts";
import { sourceText } from "../typicalModel.ts";

/** The record's figures were taken from several studies: they were never estimated together, so nobody has seen them predict together. */
export const estimatesPieced: ConcernRule = ({ case: { medicine, levels, fit } }) => {
  const { from, text, source } = medicine.estimates;
  if (from !== "pieced-together") return [];
  const isFitted = fit.use === "individual" && levels.some((level) => level.excluded === undefined);
  return [
    concern(
      "figures-pieced-together",
      isFitted ? "check" : "note",
      { kind: "medicine" },
      { name: medicine.name, text, source: sourceText(medicine, source), isFitted },
    ),
  ];
};
