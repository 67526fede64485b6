import { recordClaims } from "./recordClaims.ts";

/*
 * Clearance: Passey and others, Br J Clin Pharmacol 2011;72:948-957, abstract: 38.4 L/h, times 0.71 from day 11 on, (age/50)^-0.4,
 * times 1.69 or 2.00 for one or two working CYP3A5 alleles. 7 mg a day is then 7 / 24 / 27.264 mg/L on average.
 * Volume: Br J Clin Pharmacol 2018;84:1748-1756, Table 2, 411 L at 70 kg.
 * Half-life 4 to 33 h: Royal Liverpool and Broadgreen University Hospitals laboratory, table, 2012.
 * Windows: ARUP Laboratories, test 0090612, 2014; label of tacrolimus capsules, 2020; in nmol/L by 804.03 g/mol.
 */
recordClaims({
  record: "tacrolimus",
  patient: { age: 50, weight: 70 },
  averages: [
    {
      what: "7 mg a day",
      product: "capsule",
      dose: { value: 3.5, unit: "mg" },
      everyH: 12,
      wanted: 10.7,
      unit: "ug/L",
    },
    {
      what: "the same with two working CYP3A5 alleles: half",
      product: "capsule",
      dose: { value: 3.5, unit: "mg" },
      everyH: 12,
      interaction: "cyp3a5-1-1",
      wanted: 10.7 / 2,
      unit: "ug/L",
    },
    {
      what: "the same on days 6 to 10: clearance 38.4 · 0.86",
      product: "capsule",
      dose: { value: 3.5, unit: "mg" },
      everyH: 12,
      interaction: "days-6-10",
      wanted: 7000 / 24 / (38.4 * 0.86),
      unit: "ug/L",
    },
    {
      what: "the same at 75 years: clearance 27.264 / 1.5^0.4 = 23.182 L/h",
      product: "capsule",
      dose: { value: 3.5, unit: "mg" },
      everyH: 12,
      patient: { age: 75, weight: 70 },
      wanted: 12.582,
      unit: "ug/L",
    },
  ],
  spans: [
    { of: "clearance", low: 27.2, high: 27.3, source: "Passey 2011" },
    { of: "volume", low: 410.9, high: 411.1, source: "Table 2 of 2018" },
    { of: "halfLife", low: 4, high: 33, source: "Royal Liverpool 2012" },
  ],
  windows: [
    { window: "kidney-0-3-months", low: 8.71, high: 24.9, unit: "nmol/L" },
    { window: "kidney-later", low: 6.22, high: 18.7, unit: "nmol/L" },
    { window: "heart-0-3-months", low: 12.4, high: 24.9, unit: "nmol/L" },
    { window: "liver", low: 6.22, high: 24.9, unit: "nmol/L" },
  ],
});
