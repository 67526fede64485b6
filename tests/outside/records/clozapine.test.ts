import { recordClaims } from "./recordClaims.ts";

/*
 * Ng and others, J Clin Psychopharmacol 2009, abstract: clearance 18.0 L/h (9.18 to 59.06), 4.5 more in men, 6.0 more in smokers;
 * volume fixed at 7 L/kg. 400 mg a day averages 926 and 585 ng/mL in a woman who does not and a man who does smoke.
 * Volume 6 L/kg: a study of 19 patients (acnpsearch 46804105). Its half-life of 7.6 h is no bound here: its clearance is double.
 * The half-life span is 7 L/kg over the printed range of clearance at 70 kg: ln 2 · 490 / 59.06 to ln 2 · 490 / 9.18 h.
 * Windows: Mayo Clinic Laboratories, test CLZ; University of Iowa pathology handbook; in nmol/L by 326.83 g/mol.
 */
recordClaims({
  record: "clozapine",
  patient: { weight: 70, isFemale: 1 },
  averages: [
    {
      what: "400 mg a day, woman who does not smoke",
      product: "tablet",
      dose: { value: 400, unit: "mg" },
      everyH: 24,
      wanted: 926,
      unit: "ug/L",
    },
    {
      what: "400 mg a day, man who smokes",
      product: "tablet",
      dose: { value: 200, unit: "mg" },
      everyH: 12,
      patient: { weight: 70, isFemale: 0 },
      interaction: "smoking-man",
      wanted: 585,
      unit: "ug/L",
    },
    {
      what: "400 mg a day, woman who smokes: clearance 24 L/h",
      product: "tablet",
      dose: { value: 200, unit: "mg" },
      everyH: 12,
      interaction: "smoking-woman",
      wanted: 694.4,
      unit: "ug/L",
    },
  ],
  spans: [
    { of: "clearance", low: 9.18, high: 59.06, source: "Ng 2009" },
    { of: "volume", low: 6 * 70, high: 7 * 70, source: "6 to 7 L/kg, both studies" },
    { of: "halfLife", low: 5.7, high: 37, source: "Ng 2009, range of clearance" },
  ],
  windows: [{ window: "350-600", low: 1070, high: 1840, unit: "nmol/L" }],
});
