/** A sentence as Testing Library sees text on the page: no-break spaces count as spaces there. */
export function asText(sentence: string): string {
  return sentence.replaceAll("\u00a0", " ");
}
