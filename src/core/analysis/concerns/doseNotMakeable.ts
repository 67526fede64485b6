import { doseLabelledMg, productOf } from "../../medicine/index.ts";
import { tabletsFor } from "../../regimen/index.ts";
import { type ConcernRule, concern } from "../concernRule.ts";

/** An option's dose that can't be made up exactly from the strengths in the record. */
export const doseNotMakeable: ConcernRule = ({ case: value }) =>
  value.options.flatMap((option) =>
    option.lines.flatMap((line) => {
      const product = productOf(value.medicine, line.product);
      const mg = doseLabelledMg(line.amount, product);
      if (product.form === "liquid" || !mg.ok) return [];
      const strengths = product.strengths.map((strength) => strength.value);
      return tabletsFor(mg.value, strengths, product.divisible)
        ? []
        : [
            concern(
              "dose-not-makeable",
              "check",
              { kind: "option", id: `${option.id}/${line.id}` },
              {
                option: option.id,
                amountMg: mg.value,
                product: product.name,
                strengths,
                divisible: product.divisible,
              },
            ),
          ];
    }),
  );
