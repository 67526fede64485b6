/**
 * Splits dose text into words. A comma that is not between digits is a word of its own; "300mg" becomes "300" and "mg";
 * a full stop at the end of a word is dropped. "1,5" stays whole, so that it is refused as one number.
 */
export function doseTextWords(text: string): string[] {
  return text
    .replace(/[\u00a0\u202f]/g, " ")
    .replace(/;/g, ",")
    .replace(/,(?!\d)|(?<!\d),|(?<=:\d\d),/g, " , ")
    .split(/\s+/)
    .map((word) => (/^(?:[a-z]\.){2,}$/i.test(word) ? word : word.replace(/\.+$/, "")))
    .flatMap(splitUnit)
    .filter((word) => word !== "");
}

/** Ordinals ("4th") and 12-hour times ("8pm") stay whole: they are read, and refused, as such. */
function splitUnit(word: string): string[] {
  const match = /^(-?\d+(?:[.,]\d+)?)([\p{L}%].*)$/u.exec(word);
  if (!match || /^(?:st|nd|rd|th|[ap]\.?m\.?)$/i.test(match[2] ?? "")) return [word];
  return [match[1] ?? "", match[2] ?? ""];
}
