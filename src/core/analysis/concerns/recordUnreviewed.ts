import { unverifiedFigures } from "../../medicine/index.ts";
import { type ConcernRule, concern } from "../concernRule.ts";

export const recordUnreviewed: ConcernRule = ({ case: { medicine } }) =>
  medicine.review.status === "reviewed"
    ? []
    : [
        concern(
          "record-not-reviewed",
          "note",
          { kind: "medicine" },
          { name: medicine.name, recordVersion: medicine.recordVersion, ...unverifiedFigures(medicine) },
        ),
      ];
