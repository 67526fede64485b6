import { recordFigures } from "../../medicine/index.ts";
import { type ConcernContext, type ConcernRule, concern } from "../concernRule.ts";

/** Figures the prediction stands on that nobody has read in their source: kinetics, products in use, a molar mass that is needed, the window. */
export const memoryFigures: ConcernRule = (context) => {
  const { medicine } = context.case;
  const inUse = recordFigures(medicine).filter(({ basis, path }) => basis === "memory" && isInUse(context, path));
  if (inUse.length === 0) return [];
  const names = inUse.map(({ path }) => ({
    path,
    ...(path[0] === "products" ? { product: medicine.products[Number(path[1])]?.name ?? "" } : {}),
  }));
  return [concern("figures-from-memory", "check", { kind: "medicine" }, { name: medicine.name, names })];
};

function isInUse({ case: value, given, options }: ConcernContext, path: readonly (string | number)[]): boolean {
  const { medicine, window, levels } = value;
  switch (path[0]) {
    case "kinetics":
    case "toxicFrom":
      return true;
    case "variability":
      return value.fit.use === "individual" && levels.length > 0;
    case "molarMass":
      return [...levels.map((level) => level.quantity.unit), window?.low.unit, medicine.displayUnit].some((unit) =>
        unit?.includes("mol"),
      );
    case "earliestSample":
    case "steadyStateAfter":
      return levels.length > 0;
    case "products": {
      const id = medicine.products[Number(path[1])]?.id;
      return [...given, ...options.flatMap((option) => option.doses)].some((mark) => mark.product === id);
    }
    case "windows": {
      const own = medicine.windows[Number(path[1])];
      return own !== undefined && own.low.value === window?.low.value && own.high.value === window.high.value;
    }
    default:
      return false;
  }
}
