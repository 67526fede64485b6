import { recordClaims } from "./recordClaims.ts";

/*
 * Clearance 3.57 L/h, central volume 40.2 L: Antimicrob Agents Chemother 2021;65:e01381-21, abstract; 3.81 L/h: the study of Mumbai.
 * 600 mg a day: AUC 168 mg.h/L. Half-life: 7.8 h from that study, about 5 h recalled from labelling (from memory, unverified).
 * Windows: the same study; Pea and others 2010 (from memory, unverified); in umol/L by 337.35 g/mol.
 */
recordClaims({
  record: "linezolid",
  patient: {},
  averages: [
    {
      what: "600 mg a day",
      product: "tablet",
      dose: { value: 600, unit: "mg" },
      everyH: 24,
      wanted: 168,
      unit: "mg.h/L",
    },
    {
      what: "600 mg a day of the suspension, 30 mL",
      product: "suspension",
      dose: { value: 30, unit: "mL" },
      everyH: 24,
      wanted: 168 / 24,
      unit: "mg/L",
    },
  ],
  spans: [
    { of: "clearance", low: 3.57, high: 3.81, source: "two studies" },
    { of: "volume", low: 40.1, high: 40.3, source: "South African study 2021" },
    { of: "halfLife", low: 5, high: 7.85, source: "recalled labelling to South African study 2021" },
  ],
  windows: [
    { window: "once-daily-ceiling", low: 0, high: 5.93, unit: "umol/L" },
    { window: "twice-daily", low: 5.93, high: 20.7, unit: "umol/L" },
  ],
});
