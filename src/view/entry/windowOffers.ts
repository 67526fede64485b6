import type { TargetWindow } from "../../core/case/index.ts";
import type { MedicineRecord, RecordWindow } from "../../core/medicine/index.ts";
import { medicinesWords } from "../../core/messages/index.ts";
import { numberPrint, quantityPrint } from "../../core/units/index.ts";
import type { WardWindow } from "../../shell/store/workbenchState.ts";

/** A window that can be chosen as it stands. */
export interface OfferedWindow {
  readonly id: string;
  readonly label: string;
  readonly from: "record" | "ward";
  readonly window: TargetWindow;
}

export function windowOffers(record: MedicineRecord, ward: readonly WardWindow[]): readonly OfferedWindow[] {
  return [
    ...record.windows.map((window) => ({
      id: `record ${window.id}`,
      label: window.label,
      from: "record" as const,
      window: {
        quantity: window.quantity,
        low: window.low,
        high: window.high,
        basis: recordBasis(record, window),
      },
    })),
    ...ward
      .filter((one) => one.medicine === record.id)
      .map(({ id, window }) => ({
        id: `ward ${id}`,
        label: `${numberPrint(window.low.value)} to ${quantityPrint(window.high, { style: "screen" })}`,
        from: "ward" as const,
        window,
      })),
  ];
}

/** Which of the offers a case's window is, word for word; null when it was typed. */
export function windowOfferOf(window: TargetWindow, offers: readonly OfferedWindow[]): OfferedWindow | null {
  const key = (one: TargetWindow) => JSON.stringify([one.quantity, one.low, one.high, one.basis]);
  return offers.find((offer) => key(offer.window) === key(window)) ?? null;
}

/** "ARUP Laboratories, Test 0090265 Theophylline (seen in the source)": at most what a case's basis may hold. */
function recordBasis(record: MedicineRecord, window: RecordWindow): string {
  const source = record.sources[window.source];
  const named = [source?.authors, source?.title, source?.year].filter((part) => part !== undefined).join(", ");
  return `${window.label}: ${named || window.source} (${medicinesWords.bases[window.basis]})`.slice(0, 400);
}
