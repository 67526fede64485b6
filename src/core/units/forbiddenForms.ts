/** A form that must not stand on a printed order, by its number in the published rules (docs/methods/error-prone-notation.md). */
export interface ForbiddenForm {
  readonly rule: number;
  readonly found: string;
}

const UNIT = "(?:kg|mg|mcg|microgram|micrograms|g|ng|mL|ml|dL|L|mmol|micromol|nmol|units?|h|min|cm|m)";
const ABBREVIATED = "(?:kg|mg|mcg|g|ng|mL|ml|dL|mmol|h|min|cm)";

/** The pattern of each rule. A version number such as 1.0.0 is no decimal; a group of hexadecimal digits is no count. */
const PATTERNS: readonly (readonly [rule: number, pattern: RegExp])[] = [
  [1, /(?<![\d.])\d[\d,]*\.0+(?!\.?\d)/g],
  [2, /(?<![\d.])\d[\d,]*\.\d*[1-9]0+(?!\.?\d)/g],
  [3, /(?<![\d\w.])\.\d+/g],
  [4, /(?<![\w.,])\d{5,}(?!\w)/g],
  [4, new RegExp(`(?<![\\w.,])\\d{4}\\s?${UNIT}\\b`, "g")],
  [6, /(?<![\d.,])0\.\d{1,3}\s?(?:mg|milligram)\b(?!\s?(?:per\b|\/))/g],
  [7, /[\u00b5\u03bc]\w*|\bug\b/g],
  [
    8,
    /\b(?:q\.?o?\.?d\b\.?|o\.?d\b\.?|q\d+[dh]\b|qhs\b|qn\b|hs\b|h\.s\.|b\.?i?\.?d\b\.?|t\.?[id]\.?[ds]\b\.?|q\.?i?\.?d\b\.?|qds\b)/gi,
  ],
  [9, /\bq\s?\d+\s?[ap]m\b/gi],
  [10, /\d\s?(?:IU|iu|U|u)\b|\bIU\b/g],
  [11, /\d\s?cc\b|\bcc\b/gi],
  [12, new RegExp(`\\d${UNIT}\\b`, "g")],
  [12, new RegExp(`\\p{L}{3,}\\d+(?:\\.\\d+)?\\s?${UNIT}\\b`, "gu")],
  [13, new RegExp(`\\d\\s?${ABBREVIATED}\\.(?!\\w)`, "g")],
  [14, /\b(?:MSO4|MgSO4|CBZ|VPA|LTG|PHT)\b/g],
  [15, /[<>\u2264\u2265]/g],
  [16, new RegExp(`\\b${UNIT}\\s?/\\s?(?:\\d+\\s?)?${UNIT}\\b`, "g")],
  [17, /(?<!\d)\d\/\d\s?(?:a\s)?(?:tablets?|tabs?|capsules?)\b/gi],
  [18, /\b[IVX]+\s?(?:mg|mcg|microgram|g|mL|tablets?|capsules?)\b/g],
  [19, /\bD\/C\b/gi],
  [20, /\u2026|\.{3}/g],
];

/** Searches a printed string for forbidden forms: the net under the formatter, for tests over everything that is printed. */
export function forbiddenForms(text: string): readonly ForbiddenForm[] {
  return PATTERNS.flatMap(([rule, pattern]) => [...text.matchAll(pattern)].map((match) => ({ rule, found: match[0] })));
}
