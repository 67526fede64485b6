/** Fixed words of the medicines screen. */
export const recordWords = {
  undo: "Undo",
} as const;
