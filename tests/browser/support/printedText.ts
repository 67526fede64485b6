/** Words of a printed sheet on one line. */
export const flat = (text: string): string => text.replace(/\s+/g, " ");

/** Room for a line of the column beside, in letters. */
const BESIDE = 120;

/** A sentence as it stands in the text of a sheet, where lines of the column beside may come between any two of its words. */
export function acrossColumns(sentence: string): RegExp {
  const words = sentence.split(" ").map((word) => word.replace(/[.*+?^${}()|[\]\\]/g, "\\$&"));
  return new RegExp(words.join(`(?: | .{0,${BESIDE}}? )`));
}
