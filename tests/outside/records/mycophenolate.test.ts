import { recordClaims } from "./recordClaims.ts";

/*
 * Clin J Am Soc Nephrol 2011;6:656-663, Table 2: clearance 17.0 L/h, volumes 68 and 229 L, exchange 38 L/h.
 * 1 g of mofetil holds 739 mg of mycophenolic acid (molecular formulas, from memory): AUC of a dose 43.5 mg.h/L.
 * With ciclosporin clearance times 1.13. No half-life was read: none is checked.
 */
recordClaims({
  record: "mycophenolate",
  patient: {},
  averages: [
    {
      what: "1 g of mofetil",
      product: "tablet-mofetil",
      dose: { value: 1, unit: "g" },
      everyH: 12,
      wanted: 43.5,
      unit: "mg.h/L",
    },
    {
      what: "1 g of mofetil with ciclosporin",
      product: "capsule-mofetil",
      dose: { value: 1, unit: "g" },
      everyH: 12,
      interaction: "ciclosporin",
      wanted: 43.5 / 1.13,
      unit: "mg.h/L",
    },
  ],
  spans: [
    { of: "clearance", low: 16.95, high: 17.05, source: "Table 2" },
    { of: "volume", low: 67.5, high: 68.5, source: "Table 2" },
    { of: "peripheralVolume", low: 228.5, high: 229.5, source: "Table 2" },
  ],
  windows: [{ window: "auc24-60-120", low: 2 * 30, high: 2 * 60, unit: "mg.h/L" }],
});
