/** Words of marks that are dragged, and of the same by keyboard. */
export const dragWords = {
  timeWas: (was: string, now: string): string => `time was ${was}, now ${now}`,
  valueWas: (was: string, now: string): string => `value was ${was}, now ${now}`,
  doseWas: (was: string, now: string): string => `dose was ${was}, now ${now}`,
  levels: "Measured levels",
  levelName: (place: number): string => `Level ${place}`,
  levelHint:
    "Left and right arrow keys move the time it was drawn by 15 minutes, with Shift by 1 minute. Alt with the up or down arrow key changes the measured value by one step. Enter opens its form. Delete asks for the reason to leave it out.",
} as const;
