import type { Result } from "../../core/result/index.ts";
import { numberPlain, type Quantity, quantityRead, type UnitCode } from "../../core/units/index.ts";

/** What stands in a quantity field: the text exactly as typed, and the unit chosen beside it. */
export interface QuantityDraft<U extends UnitCode> {
  readonly text: string;
  readonly unit: U;
}

export function quantityDraft<U extends UnitCode>(value: Quantity<U> | null, unit: U): QuantityDraft<U> {
  return value === null ? { text: "", unit } : { text: numberPlain(value.value), unit: value.unit };
}

/** A unit typed after the number ("180 lb") counts before the one chosen beside the field. */
export function quantityDraftRead<U extends UnitCode>(
  draft: QuantityDraft<U>,
  units: readonly U[],
): Result<Quantity<U>> {
  return quantityRead(draft.text, { units, defaultUnit: draft.unit });
}

export function isDraftEmpty(draft: QuantityDraft<UnitCode>): boolean {
  return draft.text.trim() === "";
}
