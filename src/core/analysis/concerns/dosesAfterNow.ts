import { type ConcernRule, concern } from "../concernRule.ts";

/** Doses on the wrong side of the now line: shown, not counted. */
export const dosesAfterNow: ConcernRule = ({ given, options }) => {
  const late = given.filter((mark) => mark.status === "after-now").length;
  return [
    ...(late > 0 ? [concern("given-after-now", "check", { kind: "given" }, { count: late })] : []),
    ...options.flatMap((option) => {
      const early = option.doses.filter((mark) => mark.status === "before-now").length;
      return early > 0
        ? [concern("option-before-now", "check", { kind: "option", id: option.id }, { count: early })]
        : [];
    }),
  ];
};
