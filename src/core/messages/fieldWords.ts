/** Words the fields themselves say, whatever screen they stand on. */
export const fieldWords = {
  understood: (words: string) => `understood as ${words}`,
  twice: (which: "first" | "second", clock: string) => `The ${which} one, ${clock}`,
  close: "Close",
  done: "Done",
  gravity: { stop: "Stop", check: "Check", note: "Note" },
} as const;
