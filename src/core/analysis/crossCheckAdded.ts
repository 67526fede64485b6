import type { Analysis, Concern } from "./analysisTypes.ts";

/**
 * A result with the cross-check of another analysis of the same case put into it: what it found, and its concern, which is the gravest
 * there is and so stands first. The check is of the typical patient's figures, and no fit is worked out a second time for it.
 */
export function crossCheckAdded(to: Analysis, checked: Analysis): Analysis {
  const isOfCheck = ({ code }: Concern): boolean => code === "roads-differ";
  return {
    ...to,
    crossCheck: checked.crossCheck,
    concerns: [...checked.concerns.filter(isOfCheck), ...to.concerns.filter((concern) => !isOfCheck(concern))],
  };
}
