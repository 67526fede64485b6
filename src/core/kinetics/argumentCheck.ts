/** Throws the one kind of error a wrong argument gets: name, value, unit, what is allowed. */
export function argumentRefuse(name: string, value: unknown, unit: string, allowed: string): never {
  throw new RangeError(`${name} is ${String(value)}${unit === "" ? "" : ` ${unit}`}; allowed: ${allowed}`);
}

export function argumentFinite(name: string, value: number, unit: string): void {
  if (!Number.isFinite(value)) argumentRefuse(name, value, unit, "any finite number");
}

export function argumentAboveZero(name: string, value: number, unit: string): void {
  if (!(value > 0 && value < Infinity)) argumentRefuse(name, value, unit, "a finite number above 0");
}

export function argumentNotNegative(name: string, value: number, unit: string): void {
  if (!(value >= 0 && value < Infinity)) argumentRefuse(name, value, unit, "a finite number, 0 or more");
}

export function argumentFraction(name: string, value: number): void {
  if (!(value >= 0 && value <= 1)) argumentRefuse(name, value, "", "0 to 1");
}
