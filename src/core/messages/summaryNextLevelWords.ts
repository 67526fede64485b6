/** When the next level is drawn, on the summary. */
export const summaryNextLevelWords = {
  farOff: (days: string) =>
    `That is ${days} days on: an earlier level for safety may be wanted, by local policy (common practice).`,
  notBefore: (hours: string) => `Never earlier than ${hours} after a dose: distribution is not over.`,
  draw: (day: string, from: string, to: string, since: string) =>
    `${day}, between ${from} and ${to}, before the ${to} dose: the first dose at or after ${since}.`,
  drawAcross: (from: string, to: string, dose: string, since: string) =>
    `Between ${from} and ${to}, before the ${dose} dose: the first dose at or after ${since}.`,
  drawTimed: (day: string, from: string, to: string, dose: string, since: string) =>
    `${day}, between ${from} and ${to}, after the dose of ${dose}: the first dose at or after ${since}.`,
  drawTimedAcross: (from: string, to: string, dose: string, since: string) =>
    `Between ${from} and ${to}, after the dose of ${dose}: the first dose at or after ${since}.`,
  /** What the dose comes at or after. */
  sinceSteady: (when: string) => `90 % of steady state (${when})`,
  sinceRecord: (when: string) => `the end of the record's wait (${when})`,
  recordWait: (record: string, steady: string, whose: "own" | "typical" | null, source: string) =>
    `The record waits ${record} (source ${source}), longer than 90 % of steady state: ${whose === "own" ? `up to ${steady} in this patient (90 % interval)` : `${steady}${whose === "typical" ? " in the typical patient" : ""}`}.`,
  recordTooLong: (record: string, source: string) =>
    `The record waits ${record} after a regimen begins or changes: too long to wait for it. Source ${source}.`,
  longerWait: (own: string, typical: string) =>
    `This patient may take longer than the typical one (up to ${own} to 90 % of steady state, the upper end of the 90 % interval; typical ${typical}): the longer wait is used.`,
  hourNever: (hours: string) =>
    `Here no dose is followed by ${hours} without another: this sample comes sooner after one than the window is for. For a level at that hour a dose has to be held, by local policy.`,
  maybeNever: (share: string) => `With a chance of ${share} a steady state is never reached: do not wait for it alone.`,
  tooLong: (typical: string) => `90 % of steady state may take ${typical}: too long to wait for it.`,
  tooLongOf: ({ typical, own, isOwnLonger }: { typical: string; own: string; isOwnLonger: boolean }) =>
    isOwnLonger
      ? `90 % of steady state may take ${own} in this patient (upper end of the 90 % interval), ${typical} in the typical one: too long to wait for it.`
      : `90 % of steady state may take ${typical} in the typical patient, up to ${own} in this one (upper end of the 90 % interval): too long to wait for it.`,
  typicalNever: (own: string) =>
    `The typical patient never settles under this dose; this patient may take up to ${own} to 90 % of steady state (upper end of the 90 % interval): no time is given.`,
  writeTimes: "Write the time of the last dose and of the sample on the request.",
  noOption: "No option is chosen, so no time can be given.",
  noModel: "There is no prediction, so no time can be given.",
  byQuestion: "Time the next level by the clinical question.",
  endsBefore: (since: string, last: string) =>
    `The last dose of the option (${last}) comes before ${since}. No steady level can be drawn.`,
} as const;
