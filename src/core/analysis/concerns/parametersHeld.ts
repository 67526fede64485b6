import { type ConcernRule, concern } from "../concernRule.ts";

/** Figures the record states no variation between patients for: the levels leave them alone, and no interval has their doubt in it. */
export const parametersHeld: ConcernRule = ({ fit, model }) => {
  if (fit.kind !== "fitted" || !model) return [];
  const isFitted = (symbol: string) => fit.fit.parameters.some((each) => each.symbol === symbol);
  const held = model.parameters
    .filter(({ symbol }) => !isFitted(symbol))
    .map(({ words }) => words.charAt(0).toLowerCase() + words.slice(1));
  const parameters = isFitted("ka") ? held : [...held, "absorption rate"];
  return parameters.length === 0 ? [] : [concern("parameters-held", "note", { kind: "case" }, { parameters })];
};
