/** Throws RangeError naming argument, value, unit and allowed range unless lowest ≤ value ≤ highest. */
export function requireWithin(argument: string, value: number, unit: string, lowest: number, highest: number): void {
  if (!(value >= lowest && value <= highest)) {
    throw new RangeError(`${argument}: ${value} ${unit}; allowed ${lowest} to ${highest} ${unit}`);
  }
}
