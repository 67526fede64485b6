import { recordClaims } from "./recordClaims.ts";

/*
 * Copy of the label of the delayed-release tablet, Tables 10 and 11: clearance 9.39 L/h in patients, 7.5 in volunteers, half-life 31 h
 * (CV 40 %) in volunteers. 300 mg a day averages 1.33 mg/L. Volume after a drip 261 L (226 to 295) over a bioavailability of 0.54;
 * 7.5 · 31 / ln 2 = 335 L by mouth.
 * Window: ASHP, Appendix A; in umol/L by 700.79 g/mol.
 */
recordClaims({
  record: "posaconazole",
  patient: {},
  averages: [
    {
      what: "300 mg a day",
      product: "tablet-delayed",
      dose: { value: 300, unit: "mg" },
      everyH: 24,
      wanted: 1.33,
      unit: "mg/L",
    },
  ],
  spans: [
    { of: "clearance", low: 7.5, high: 9.39, source: "label, volunteers and patients" },
    { of: "volume", low: 334, high: 295 / 0.54, source: "label, by mouth and after a drip" },
    { of: "halfLife", low: 31 * 0.6, high: 31 * 1.4, source: "label, mean and CV" },
  ],
  windows: [{ window: "0.7-1.8", low: 0.999, high: 2.57, unit: "umol/L" }],
});
