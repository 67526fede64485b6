import type { Basis, MedicineRecord } from "../../core/medicine/index.ts";
import { recordWords } from "../../core/messages/index.ts";
import { GravityMark } from "../ui/GravityMark.tsx";
import { sourceNumber, sourceShort } from "./recordRows.ts";

export interface RecordProvenanceProps {
  readonly record: Pick<MedicineRecord, "sources">;
  readonly source: string;
  readonly basis: Basis;
}

/** The source by number and short name, then how the figure is known; what nobody looked up carries a mark. */
export function RecordProvenance({ record, source, basis }: RecordProvenanceProps) {
  return (
    <span className="record-page-provenance">
      {sourceShort(record, source)} [{sourceNumber(record, source)}]
      <span className={basis === "memory" ? "record-page-basis record-page-basis-memory" : "record-page-basis"}>
        {basis === "memory" ? <GravityMark gravity="check" /> : null} {recordWords.bases[basis]}
      </span>
    </span>
  );
}
