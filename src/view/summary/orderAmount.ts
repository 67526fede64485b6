import { doseLabelledMg, type MedicineRecord, type Product } from "../../core/medicine/index.ts";
import { listWords, summaryOrderWords as words } from "../../core/messages/index.ts";
import { type DoseAmount, tabletsFor } from "../../core/regimen/index.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** A dose as it is taken from the pack. */
export interface OrderAmount {
  /** One line a strength. */
  readonly products: readonly string[];
  /** "1 tablet", "1 tablet of 300 mg and half a tablet of 200 mg, taken together,", "30 mL (300 mg)" */
  readonly take: string;
  /** The same with every strength named, to stand in a sentence: "1 tablet of 300 mg". */
  readonly named: string;
  /** "300 mg" */
  readonly mass: string;
  /** Why it can't be made up, or null. */
  readonly notMakeable: string | null;
}

export function orderAmount(
  amount: DoseAmount,
  product: Product,
  record: MedicineRecord,
  print: SummaryPrint,
): OrderAmount {
  const mg = doseLabelledMg(amount, product);
  const mass = mg.ok ? print.exact({ value: mg.value, unit: "mg" }) : print.exact(amount);
  return product.form === "liquid"
    ? liquidAmount(amount, product, record, print, mg.ok ? mg.value : null, mass)
    : piecesAmount(product, product.form, record, print, mg.ok ? mg.value : null, mass);
}

function piecesAmount(
  product: Product,
  form: "tablet" | "capsule",
  record: MedicineRecord,
  print: SummaryPrint,
  mg: number | null,
  mass: string,
): OrderAmount {
  const strengths = product.strengths.map((strength) => strength.value);
  const made = mg === null ? null : tabletsFor(mg, strengths, product.divisible);
  const strengthText = (value: number) => print.exact({ value, unit: "mg" });
  if (!made) {
    const listed = [...strengths].sort((a, b) => a - b).map(strengthText);
    return {
      products: [words.productPlain(record.name, product.name)],
      take: mass,
      named: mass,
      mass,
      notMakeable: words.notMakeable(mass, listed, product.divisible === "half", form),
    };
  }
  const parts = made.map(({ strengthMg, count }) =>
    words.ofStrength(words.pieces(count, form), strengthText(strengthMg)),
  );
  const [only] = made;
  return {
    products: made.map(({ strengthMg }) => words.product(record.name, strengthText(strengthMg), product.name)),
    take: made.length === 1 && only ? words.pieces(only.count, form) : words.together(parts),
    named: listWords(parts),
    mass,
    notMakeable: null,
  };
}

/** A millilitre fraction finer than this can't be read on an oral syringe; the volume is rounded to it in print. */
const VOLUME_DECIMALS = 2;
const CONCENTRATION_SIGNIFICANT = 4;
/** A product name such as "oral solution 80 mg in 15 mL" needs no second statement. */
const STATES_CONCENTRATION = /\d\s*mg in \d/;

function liquidAmount(
  amount: DoseAmount,
  product: Product,
  record: MedicineRecord,
  print: SummaryPrint,
  mg: number | null,
  mass: string,
): OrderAmount {
  const { concentration } = product;
  if (!concentration || mg === null) {
    return {
      products: [words.productPlain(record.name, product.name)],
      take: mass,
      named: mass,
      mass,
      notMakeable: null,
    };
  }
  const perMl = words.concentration(
    print.quantity(concentration.value, "mg", { significant: CONCENTRATION_SIGNIFICANT }),
    print.exact({ value: 1, unit: "mL" }),
  );
  const volume =
    amount.unit === "mL"
      ? print.exact(amount)
      : print.quantity(mg / concentration.value, "mL", { decimals: VOLUME_DECIMALS });
  return {
    products: [
      STATES_CONCENTRATION.test(product.name)
        ? words.productPlain(record.name, product.name)
        : words.liquid(record.name, product.name, perMl),
    ],
    take: words.liquidTake(volume, mass),
    named: words.liquidTake(volume, mass),
    mass,
    notMakeable: null,
  };
}
