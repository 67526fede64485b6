import { type DispositionSpan, modelBothReadings, modelHalfLife } from "../kinetics/index.ts";
import type { Model, NamedFigure, Traced } from "./analysisTypes.ts";
import type { ModelAtNow } from "./typicalModel.ts";

/** Which symbol of the record stands for which number of a disposition. */
const NUMBERS: Readonly<Record<string, string>> = { CL: "clearance", V: "volume", V1: "volume", Vmax: "vmax" };

/**
 * The model with what changes on the case clock: its figures are those of the final state, to which steady state refers,
 * so that every figure shown can be checked with the figures beside it.
 */
export function finalModel(atNow: ModelAtNow, dispositions: readonly DispositionSpan[]): Model {
  const { disposition } = dispositions.at(-1)!;
  const numbers = disposition as unknown as Readonly<Record<string, number>>;
  const parameters = atNow.parameters.map((parameter): NamedFigure => {
    const name = NUMBERS[parameter.symbol];
    const final = name === undefined ? undefined : numbers[name];
    if (final === undefined || final === parameter.figure.value) return parameter;
    return { ...parameter, figure: afterEvents(parameter, final) };
  });
  const figureOf = (symbol: string) => parameters.find((parameter) => parameter.symbol === symbol)?.figure ?? null;
  const clearance = figureOf("CL");
  const volume = figureOf("V") ?? figureOf("V1")!;
  const halfLifeH = modelHalfLife(disposition);
  const ke = clearance === null ? null : clearance.value / volume.value;
  return {
    kind: atNow.kind,
    products: atNow.products.map((product) => ({
      ...product,
      readings: modelBothReadings(disposition, product.absorption, product.bioavailability.value, product.lag.value),
    })),
    distributionEndH: atNow.distributionEndH,
    parameters,
    clearance,
    volume,
    eliminationRate:
      clearance === null || ke === null
        ? null
        : derived(ke, "/h", "CL / V", [
            { name: "CL", value: clearance.value, unit: "L/h" },
            { name: "V", value: volume.value, unit: "L" },
          ]),
    halfLife:
      halfLifeH === null || ke === null
        ? null
        : disposition.kind === "one-compartment"
          ? derived(halfLifeH, "h", "ln 2 / ke", [{ name: "ke", value: ke, unit: "/h" }])
          : derived(halfLifeH, "h", "ln 2 / the slower of the two exponential rates", []),
    dispositions,
  };
}

function afterEvents({ symbol, figure }: NamedFigure, final: number): Traced {
  return {
    ...figure,
    value: final,
    formula: `(${figure.formula}) * events`,
    inputs: [...figure.inputs, { name: "events", value: final / figure.value, unit: "1" }],
    source: `${figure.source}; effect of the events on ${symbol}: as entered with them`,
  };
}

function derived(value: number, unit: Traced["unit"], formula: string, inputs: Traced["inputs"]): Traced {
  return { value, unit, formula, inputs, source: "definition", basis: "derived" };
}
