import type { TargetWindow } from "../../core/case/index.ts";
import type { MedicineRecord, RecordWindow } from "../../core/medicine/index.ts";
import { medicinesWords } from "../../core/messages/index.ts";
import { numberPrint, quantityConvert, quantityPrint, type UnitCode } from "../../core/units/index.ts";
import type { WardWindow } from "../../shell/store/workbenchState.ts";

/** Characters a case's basis may hold. */
const BASIS_LONGEST = 400;

/** A window that can be chosen as it stands. */
export interface OfferedWindow {
  readonly id: string;
  readonly label: string;
  readonly from: "record" | "ward";
  /** Where it comes from, without the label. */
  readonly origin: string;
  readonly window: TargetWindow;
}

export function windowOffers(record: MedicineRecord, ward: readonly WardWindow[]): readonly OfferedWindow[] {
  return [
    ...record.windows.map((window) => ({
      id: `record ${window.id}`,
      label: window.label,
      from: "record" as const,
      origin: recordOrigin(record, window),
      window: {
        quantity: window.quantity,
        low: window.low,
        high: window.high,
        ...(window.drawFrom && { drawFrom: hours(window.drawFrom) }),
        ...(window.drawTo && { drawTo: hours(window.drawTo) }),
        basis: `${window.label}: ${recordOrigin(record, window)}`.slice(0, BASIS_LONGEST),
      },
    })),
    ...ward
      .filter((one) => one.medicine === record.id)
      .map(({ id, window }) => ({
        id: `ward ${id}`,
        label: `${numberPrint(window.low.value)} to ${quantityPrint(window.high, { style: "screen" })}`,
        from: "ward" as const,
        origin: window.basis,
        window,
      })),
  ];
}

function hours(figure: { readonly value: number; readonly unit: UnitCode }) {
  return { value: quantityConvert(figure, "h"), unit: "h" as const };
}

/** Which of the offers a case's window is, word for word; null when it was typed. */
export function windowOfferOf(window: TargetWindow, offers: readonly OfferedWindow[]): OfferedWindow | null {
  const key = (one: TargetWindow) =>
    JSON.stringify([one.quantity, one.low, one.high, one.drawFrom, one.drawTo, one.basis]);
  return offers.find((offer) => key(offer.window) === key(window)) ?? null;
}

/** "ARUP Laboratories, Test 0090265 Theophylline (seen in the source)" */
function recordOrigin(record: MedicineRecord, window: RecordWindow): string {
  const source = record.sources[window.source];
  const named = [source?.authors, source?.title, source?.year].filter((part) => part !== undefined).join(", ");
  return `${named || window.source} (${medicinesWords.bases[window.basis]})`;
}
