import type { Product } from "./medicineRecord.ts";
import { type Bounds, boundsFaults, duplicateFaults, type FaultPath, type RecordFault } from "./recordFault.ts";

const POSITIVE_MG: Bounds = { unit: "mg", above: 0 };
const HOURS: Bounds = { unit: "h", above: 0 };

/** A product that makes sense: what it holds, how it is absorbed, and a salt that is named where there is a salt factor. */
export function productChecks(product: Product, isApparent: boolean, path: FaultPath): RecordFault[] {
  const isLiquid = product.form === "liquid";
  const isContentRight = isLiquid
    ? product.strengths.length === 0 && product.concentration !== undefined
    : product.strengths.length > 0 && product.concentration === undefined;
  const faults: RecordFault[] = isContentRight
    ? []
    : [{ code: "record-product-content", path, data: { product: product.name, isLiquid } }];
  if (product.saltFactor !== undefined && product.salt === undefined) {
    faults.push({ code: "record-salt", path: [...path, "salt"], data: { product: product.name } });
  }
  const bioavailability: Bounds = isApparent ? { unit: "1", least: 1, most: 1 } : { unit: "1", above: 0, most: 1 };
  return [
    ...faults,
    ...duplicateFaults(product.strengths, [...path, "strengths"], (each) => String(each.value)),
    ...product.strengths.flatMap((each, i) => boundsFaults(each, POSITIVE_MG, [...path, "strengths", i])),
    ...boundsFaults(product.concentration, { unit: "mg/mL", above: 0 }, [...path, "concentration"]),
    ...inputFaults(product, path),
    ...boundsFaults(product.saltFactor, { unit: "1", above: 0, most: 1 }, [...path, "saltFactor"]),
    ...boundsFaults(product.lag, { unit: "h", least: 0 }, [...path, "lag"]),
    ...boundsFaults(product.bioavailability, bioavailability, [...path, "bioavailability"]),
  ];
}

/** An absorption rate where something is absorbed by it and nowhere else; a mixed input's slow part in one way. */
function inputFaults(product: Product, path: FaultPath): RecordFault[] {
  const { absorptionRate, input } = product;
  const isZeroOrder = input?.kind === "zero-order";
  const at = (name: string): FaultPath => [...path, "input", name];
  const faults: RecordFault[] = boundsFaults(absorptionRate, { unit: "/h", above: 0 }, [...path, "absorptionRate"]);
  if ((absorptionRate === undefined) !== isZeroOrder) {
    faults.push({ code: "record-absorption-rate", path, data: { product: product.name, isZeroOrder } });
  }
  if (input?.kind === "zero-order") faults.push(...boundsFaults(input.duration, HOURS, at("duration")));
  if (input?.kind === "mixed") {
    if ((input.slowRate === undefined) === (input.slowDuration === undefined)) {
      const hasBoth = input.slowRate !== undefined;
      faults.push({ code: "record-slow-part", path: [...path, "input"], data: { product: product.name, hasBoth } });
    }
    faults.push(
      ...boundsFaults(input.fastFraction, { unit: "1", least: 0, most: 1 }, at("fastFraction")),
      ...boundsFaults(input.slowRate, { unit: "/h", above: 0 }, at("slowRate")),
      ...boundsFaults(input.slowDuration, HOURS, at("slowDuration")),
      ...boundsFaults(input.slowLag, { unit: "h", least: 0 }, at("slowLag")),
    );
  }
  return faults;
}
