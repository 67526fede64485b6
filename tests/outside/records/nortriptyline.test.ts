import { recordClaims } from "./recordClaims.ts";

/*
 * Swiss product information, kinetics (ch.oddb.org, registration 69554): clearance 30.6 (SD 6.9) L/h, volume 1,633 (SD 268) L,
 * bioavailability 0.51, half-life 25.5 h (16 to 38), peak at 5.5 h. 100 mg of the hydrochloride a day, 0.878 of it nortriptyline,
 * averages 61.0 ng/mL.
 * Windows: Mayo Clinic Laboratories, test NOTRP; cardiac toxicity: Trinity Muscatine; in nmol/L by 263.38 g/mol.
 */
recordClaims({
  record: "nortriptyline",
  patient: {},
  averages: [
    {
      what: "100 mg of the hydrochloride a day",
      product: "capsule",
      dose: { value: 100, unit: "mg" },
      everyH: 24,
      wanted: 61,
      unit: "ug/L",
    },
    {
      what: "the same as 50 mL of solution",
      product: "solution",
      dose: { value: 50, unit: "mL" },
      everyH: 24,
      wanted: 61,
      unit: "ug/L",
    },
  ],
  spans: [
    { of: "clearance", low: 30.6 - 6.9, high: 30.6 + 6.9, source: "Swiss product information" },
    { of: "volume", low: 1633 - 268, high: 1633 + 268, source: "Swiss product information" },
    { of: "halfLife", low: 16, high: 38, source: "Swiss product information" },
  ],
  windows: [
    { window: "70-170", low: 266, high: 645, unit: "nmol/L" },
    { window: "toxicFrom", low: 1900, unit: "nmol/L" },
  ],
});
