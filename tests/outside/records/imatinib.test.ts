import { recordClaims } from "./recordClaims.ts";

/*
 * Clearance 14.3 L/h, volume 347 L: Widmer and others, Br J Clin Pharmacol 2006;62:97-112, abstract. 400 mg a day averages 1,170 ng/mL.
 * Other studies: 252 L and 14 L/h (Schmidli and others, Br J Clin Pharmacol 2005;60:35-44), 222 L and 9.25 L/h
 * (Pharmacogenomics 2019;20:251-260): half-lives 12.5 and 16.6 h. Half-life 18 h: Davis Drug Guide 2024.
 * Windows: Eastern Health Pathology, test 2297; in nmol/L by 493.61 g/mol.
 */
recordClaims({
  record: "imatinib",
  patient: {},
  averages: [
    {
      what: "400 mg a day",
      product: "tablet",
      dose: { value: 400, unit: "mg" },
      everyH: 24,
      wanted: 1170,
      unit: "ug/L",
    },
  ],
  spans: [
    { of: "clearance", low: 9.25, high: 14.3, source: "three studies" },
    { of: "volume", low: 222, high: 347, source: "three studies" },
    { of: "halfLife", low: 12.5, high: 18, source: "Schmidli 2005 to Davis 2024" },
  ],
  windows: [
    { window: "cml", low: 2030, high: 4050, unit: "nmol/L" },
    { window: "gist", low: 2230, high: 4050, unit: "nmol/L" },
  ],
});
