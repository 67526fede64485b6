import { logGamma } from "./logGamma.ts";

/**
 * The natural logarithm of the density of Student's t distribution in one or more dimensions, standardised.
 *
 * Formula: ln Γ((ν + d)/2) − ln Γ(ν/2) − (d/2)·ln(νπ) − ((ν + d)/2)·ln(1 + q/ν), q = z₁² + … + z_d². For a location m and a
 * scale matrix L·Lᵀ take z = L⁻¹(x − m) and subtract ln det L.
 * @param squaredLength q, 0 or more
 * @param degrees ν, above 0
 * @param dimension d, 1 or more
 * @returns the logarithm of the density per unit of z to the power d
 * Outside: RangeError for a negative q or ν not above 0.
 * Accuracy: 1e-14·max(1, |result|) for ν up to 30, 1e-12 up to 1e3 (tests/core/numerics/studentT.test.ts).
 * Source: standard.
 * @example studentTLogDensity(0, 4, 1) // -0.9808292530117262 = ln(3/8)
 */
export function studentTLogDensity(squaredLength: number, degrees: number, dimension = 1): number {
  if (!(squaredLength >= 0)) throw new RangeError(`squaredLength: ${squaredLength}; must be 0 or more`);
  if (!(degrees > 0)) throw new RangeError(`degrees: ${degrees}; must be above 0`);
  return constantOf(degrees, dimension) - ((degrees + dimension) / 2) * Math.log1p(squaredLength / degrees);
}

/** The constant of the last call: a sample asks for the same one thousands of times. */
let last = { degrees: Number.NaN, dimension: Number.NaN, constant: Number.NaN };

function constantOf(degrees: number, dimension: number): number {
  if (degrees !== last.degrees || dimension !== last.dimension) {
    const constant =
      logGamma((degrees + dimension) / 2) - logGamma(degrees / 2) - (dimension / 2) * Math.log(degrees * Math.PI);
    last = { degrees, dimension, constant };
  }
  return last.constant;
}
