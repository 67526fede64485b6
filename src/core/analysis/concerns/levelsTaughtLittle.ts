import { type ConcernRule, concern } from "../concernRule.ts";
import { TAUGHT_LITTLE } from "../taughtThresholds.ts";

/** What a steady dose rests on. */
const DECISIVE = new Set(["CL", "Vmax", "Km"]);

/** Parameters whose spread the levels hardly narrowed. A "check" where the dose rests on one of them. */
export const levelsTaughtLittle: ConcernRule = ({ fit }) => {
  if (fit.kind !== "fitted") return [];
  const little = fit.fit.parameters.filter(({ taught, omega }) => omega > 0 && taught < TAUGHT_LITTLE);
  if (little.length === 0) return [];
  const isDecisive = little.some(({ symbol }) => DECISIVE.has(symbol));
  const parameters = little.map(({ words }) => words.charAt(0).toLowerCase() + words.slice(1));
  return [concern("levels-taught-little", isDecisive ? "check" : "note", { kind: "case" }, { parameters, isDecisive })];
};
