import type { Factor } from "../case/index.ts";
import { instantMs, instantText } from "../time/index.ts";
import { numberPrint } from "../units/index.ts";

/** Fixed words of the events lane and its panel. */
export const eventWords = {
  lane: "Events",
  kinds: {
    "interacting-medicine": "interacting medicine",
    smoking: "smoking",
    meal: "meal",
    vomiting: "vomiting",
    other: "something else",
  },
  add: "Add an event",
  list: "Events of this case",
  none: "No event entered yet.",
  change: "Change",
  changing: "Change this event",
  save: "Save the change",
  remove: "Remove",
  cancel: "Cancel",
  actions: "actions",
  kind: "What happened",
  kindPrompt: "Choose …",
  name: "In words",
  nameHelp: "For example: clarithromycin 500 mg twice daily; stopped smoking; high-fat breakfast.",
  from: "From",
  to: "Until",
  toHelp: "Left empty: it goes on.",
  effect: "What it does to the kinetics, if anything",
  effectHelp:
    "The figures are your own unless you take one from the record. They are used as they stand and printed with where they come from. Left empty, the event is shown and changes nothing.",
  interaction: "From the medicine record",
  interactionPrompt: "None taken: your own figures",
  interactionHelp: "Fills in the fields below. Change one of them and it is your own figure again.",
  interactionChoice: (medicine: string, parameter: "clearance" | "volume", percent: string) =>
    `${medicine}: ${parameter} ${percent} % of usual`,
  sourceRecord: (medicine: string, source: string, basis: string) =>
    `from the record, ${medicine}: ${source} (${basis})`,
  sourceIs: (source: string) => `Taken ${source}.`,
  clearance: "Clearance, of usual",
  volume: "Volume, of usual",
  onset: "Onset",
  onsetHelp: "Whole days until it is fully there; empty: at once. It is over at once when the event ends.",
  clearanceIs: (factor: number, percent: string) =>
    factor < 1
      ? `clearance falls to ${percent} % of usual`
      : factor > 1
        ? `clearance rises to ${percent} % of usual`
        : "clearance stays as usual",
  vomitedDose:
    "A dose that was vomited or partly taken is entered at that dose, under Doses given, as the share that counts.",
  noEffect: "none",
  head: { what: "what", from: "from", until: "until", effect: "effect on the kinetics" },
  goesOn: "goes on",
  changesAt: "kinetics change at the thin lines",
  creatinine: "creatinine",
  weight: "weight",
  albumin: "albumin",
} as const;

/** Fixed words of the row that shows where the dose is. */
export const amountsWords = {
  show: "where the dose is",
  hide: "hide where it is",
  title: "Where the dose is",
  unit: "mg, stacked",
  gut: "gut",
  body: "body",
  central: "blood side",
  peripheral: "tissues",
  eliminated: "eliminated",
  given: "doses given",
  option: (id: string) => `option ${id}`,
  sum: (taken: string, at: string) => `Together they are F × dose taken, the upper edge: ${taken} mg by ${at}.`,
} as const;

export function eventName({ kind, detail }: Factor): string {
  return detail.trim() || eventWords.kinds[kind];
}

const percent = (factor: number) => numberPrint(factor * 100, { significant: 4 });

/** "clearance 60 % of usual over 2 days, volume 110 %"; null when the event changes nothing. */
export function eventEffectWords({ effect }: Factor): string | null {
  if (!effect) return null;
  const days = effect.onset?.value;
  const onset = days === undefined ? "" : ` over ${numberPrint(days)} ${days === 1 ? "day" : "days"}`;
  const clearance =
    effect.clearance === 1 && effect.volume !== undefined
      ? []
      : [`clearance ${percent(effect.clearance)} % of usual${onset}`];
  const volume = effect.volume === undefined ? [] : [`volume ${percent(effect.volume)} % of usual`];
  return [...clearance, ...volume].join(", ");
}

/** "clarithromycin, from Tue 3 March, 08:00": an event as it stands in its lane. */
export function eventLine(factor: Factor, zone: string): string {
  const words = (iso: string) => instantText(instantMs(iso), zone, "dayClock");
  const isMoment = isEventMoment(factor);
  const until = factor.to === undefined ? "" : ` to ${words(factor.to)}`;
  return `${eventName(factor)}, ${isMoment ? "" : "from "}${words(factor.from)}${until}`;
}

/** A meal or vomiting without an end and without an effect is over at once; everything else goes on until its end. */
export function isEventMoment({ kind, to, effect }: Factor): boolean {
  return (kind === "meal" || kind === "vomiting") && to === undefined && effect === undefined;
}
