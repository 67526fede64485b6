import { type DraftGroup, type DraftNode, draftTyped } from "../../../core/medicine/index.ts";
import { recordWords } from "../../../core/messages/index.ts";
import { figureNew } from "./DraftFigure.tsx";
import { DraftList } from "./DraftList.tsx";
import { DraftSection } from "./DraftSection.tsx";
import { useDraft } from "./draftContext.ts";
import { entryId } from "./entryId.ts";
import { ProductFields } from "./ProductFields.tsx";

export function ProductsSection() {
  const { groupAt } = useDraft();
  return (
    <DraftSection id="products" heading={recordWords.section.products} roots={["products"]}>
      <DraftList path={["products"]} entry={recordWords.product1} entryNew={productNew}>
        {(path, index) => (
          <>
            <h4>{draftTyped(groupAt(path)?.name) || recordWords.partOf(recordWords.product1, index + 1)}</h4>
            <ProductFields path={path} />
          </>
        )}
      </DraftList>
    </DraftSection>
  );
}

function productNew(list: readonly DraftNode[]): DraftGroup {
  return {
    id: entryId("product", list),
    name: "",
    form: "tablet",
    release: "immediate",
    strengths: [figureNew("mg")],
    divisible: "unknown",
    swallowWhole: false,
    absorptionRate: figureNew("/h"),
    lag: figureNew("h"),
    bioavailability: figureNew("1"),
  };
}
