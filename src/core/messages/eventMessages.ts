import type { MessageFunction } from "./messageFunction.ts";

type Data = Parameters<MessageFunction>[0];

/** Sentences about an event being entered: what happened to the patient, and what it does to the kinetics. */
export const eventMessages: Readonly<Record<string, MessageFunction>> = {
  "event-kind-missing": () => "Choose what happened.",
  "event-name-missing": () => "Write what it was, so that the lane and the summary can name it.",
  "event-ends-first": ({ from, to }: Data) =>
    `It ends at ${String(to)}, not after it begins, ${String(from)}: check both times, or leave the end empty.`,
  "event-before-dose": ({ at, first }: Data) =>
    `${String(at)} starts before the first dose given (${String(first)}): give the time from which it holds for this course, or enter earlier doses. The words can say since when.`,
  "event-before-option": ({ at, first }: Data) =>
    `${String(at)} starts before the first dose of any option (${String(first)}), and no dose is given yet: give the time from which it holds for this course, or enter earlier doses. The words can say since when.`,
  "event-clearance": ({ found, low, high }: Data) =>
    `${String(found)} % of usual clearance can't be used: write ${String(low)} to ${String(high)} %. 60 % means clearance falls to 60 % of usual; 150 %, that it rises by half.`,
  "event-volume": ({ found, low, high }: Data) =>
    `${String(found)} % of usual volume can't be used: write ${String(low)} to ${String(high)} %.`,
  "event-no-change": () => "100 % of usual changes nothing: write another figure, or leave it empty.",
  "event-onset": ({ found, most }: Data) =>
    `An onset of ${String(found)} days can't be used: write whole days from 1 to ${String(most)}, or leave it empty for an effect that is there at once.`,
  "event-onset-alone": () => "An onset needs an effect: write the per cent of usual clearance too, or leave it empty.",
};
