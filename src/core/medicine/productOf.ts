import type { MedicineRecord, Product } from "./medicineRecord.ts";

/** The product with this id; a case that was read names no other. */
export function productOf(record: MedicineRecord, id: string): Product {
  const product = record.products.find((each) => each.id === id);
  if (!product) throw new RangeError(`id: "${record.id}" has no product "${id}"`);
  return product;
}
