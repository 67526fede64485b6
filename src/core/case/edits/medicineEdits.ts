import type { MedicineRecord } from "../../medicine/index.ts";
import type { DoseLine } from "../../regimen/index.ts";
import type { Case, TargetWindow } from "../caseSchema.ts";

/** Edits of the medicine and the target window. */
export const medicineEdits = {
  /**
   * Takes another record. `products` maps product ids of the old record to those of the new; a line whose product is neither mapped
   * nor in the new record is the caller's mistake. The window goes when the medicine is another one: it was chosen for the old.
   */
  medicineSet: (
    value: Case,
    { record, products = {} }: { record: MedicineRecord; products?: Readonly<Record<string, string>> },
  ): Case => {
    const withProduct = (line: DoseLine): DoseLine => {
      const product = Object.hasOwn(products, line.product) ? (products[line.product] as string) : line.product;
      if (!record.products.some((each) => each.id === product)) {
        throw new RangeError(
          `products: dose line "${line.id}" is of product "${product}", which "${record.id}" does not have`,
        );
      }
      return product === line.product ? line : { ...line, product };
    };
    const { window: _, ...rest } = value;
    return {
      ...(record.id === value.medicine.id ? value : rest),
      medicine: record,
      given: value.given.map(withProduct),
      options: value.options.map((each) => ({ ...each, lines: each.lines.map(withProduct) })),
    };
  },
  windowSet: (value: Case, { window }: { window: TargetWindow | null }): Case => {
    const { window: _, ...rest } = value;
    return window === null ? rest : { ...value, window };
  },
};
