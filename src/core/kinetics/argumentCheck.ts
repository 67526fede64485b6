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

/** Decay over an interval between these can be told from none and from all of it, with room for every product formed of it. */
const LEAST_DECAY = 1e-150;
const MOST_DECAY = 1e150;

/** A repeat has a steady state in double precision only where rate × interval stays within those bounds. */
export function argumentInterval(name: string, interval: number, rate: number): void {
  argumentAboveZero(name, interval, "h");
  const decay = interval * rate;
  if (!(decay >= LEAST_DECAY && decay <= MOST_DECAY)) {
    argumentRefuse(name, interval, "h", `${LEAST_DECAY / rate} to ${MOST_DECAY / rate} h for a rate of ${rate} /h`);
  }
}

export function argumentFraction(name: string, value: number): void {
  if (!(value >= 0 && value <= 1)) argumentRefuse(name, value, "", "0 to 1");
}
