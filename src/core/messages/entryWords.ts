/** Fixed words of the panels in which patient, levels, doses, window and case are entered. */

export const windowWords = {
  heading: "Target window",
  choose: "Window of this case",
  own: "A window of your own",
  ownDetail: "for what local policy or the treating team asks",
  fromRecord: "from the medicine record",
  fromWard: "the ward's own",
  none: "No window chosen",
  noneDetail: "The record has none to choose from; enter one below.",
  about: "What the window is about",
  aboutPrompt: "Choose …",
  low: "Low",
  high: "High",
  unit: "Unit",
  basis: "On what basis",
  basisHelp: "Local policy, guideline or reason; it is printed on the summary.",
  set: "Use this window",
  clear: "Take the window away",
  current: "Now used",
  asStored: (low: string, high: string) => `stored as ${low} to ${high}`,
} as const;
