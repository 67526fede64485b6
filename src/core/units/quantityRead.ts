import { fail, issue, type Result, succeed } from "../result/index.ts";
import { numberRead } from "./numberRead.ts";
import type { Quantity, UnitCode } from "./quantity.ts";
import { unitWordRead } from "./unitWordRead.ts";

export interface QuantityReadOptions<U extends UnitCode> {
  /** Units this field takes. */
  readonly units: readonly U[];
  /** Unit of a bare number. Without it a bare number is refused. */
  readonly defaultUnit?: U;
}

/** Reads "58 kg", "1.1 mg/dL", "97 µmol/L": a strict number (see `numberRead`), then a unit's code or spoken word. */
export function quantityRead<U extends UnitCode>(text: string, options: QuantityReadOptions<U>): Result<Quantity<U>> {
  const trimmed = text.replace(/^[ \t]+|[ \t]+$/g, "");
  // The number is what stands before the first letter, % or [; an exponent's e belongs to the number, so that it is refused as one.
  const numberPart = /^[^\p{L}%[/]*(?:(?<=\d\.?)e[+-]?\d+)?/iu.exec(trimmed)?.[0] ?? "";
  const unitPart = trimmed.slice(numberPart.length).trim();
  const number = numberRead(numberPart.replace(/[\u00a0\u202f]+$/, ""));
  if (!number.ok) return number;

  if (unitPart === "") {
    if (options.defaultUnit === undefined)
      return fail(issue("quantity-no-unit", { text: trimmed, units: options.units }));
    return succeed({ value: number.value, unit: options.defaultUnit });
  }
  const unit = unitWordRead(unitPart);
  const allowed = options.units.find((code) => code === unit);
  if (allowed !== undefined) return succeed({ value: number.value, unit: allowed });
  const code = unit === null ? "quantity-unknown-unit" : "quantity-unit-refused";
  return fail(issue(code, { text: trimmed, unit: unitPart, units: options.units }));
}
