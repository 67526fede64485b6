import { recordClaims } from "./recordClaims.ts";

/*
 * Final saliva-plasma model, 2020, Table 4 (pmc.ncbi.nlm.nih.gov/articles/PMC7304296): clearance 4.56 L/h, volume 60.7 L,
 * bioavailability 0.849, a linear approximation. 200 mg twice a day averages 3.10 mg/L.
 * Half-life: about 6 h at 200 mg by mouth, longer at higher levels (MIMS Vietnam). No upper end is printed: twice 6 h is our bound.
 * Windows: Mayo Clinic Laboratories, test VORI; in umol/L by 349.32 g/mol.
 */
recordClaims({
  record: "voriconazole",
  patient: {},
  averages: [
    {
      what: "200 mg twice a day",
      product: "tablet",
      dose: { value: 200, unit: "mg" },
      everyH: 12,
      wanted: 3.1,
      unit: "mg/L",
    },
    {
      what: "200 mg twice a day as 5 mL of suspension",
      product: "suspension",
      dose: { value: 5, unit: "mL" },
      everyH: 12,
      wanted: 3.1,
      unit: "mg/L",
    },
  ],
  spans: [
    { of: "clearance", low: 4.55, high: 4.57, source: "Table 4" },
    { of: "volume", low: 60.6, high: 60.8, source: "Table 4" },
    { of: "halfLife", low: 6, high: 12, source: "MIMS Vietnam; upper end ours" },
  ],
  windows: [{ window: "1-5.5", low: 2.86, high: 15.7, unit: "umol/L" }],
});
