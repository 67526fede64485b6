import type { FirstOrderAbsorption, ModelInput, ZeroOrderAbsorption } from "./absorption.ts";
import type { ModelDisposition, ModelHistory } from "./modelHistory.ts";

/**
 * What happens in a history, for the cross-check. Made apart from the events of the closed forms, and more plainly, so that a fault
 * in those shows.
 */
export interface CrossCheckScript {
  readonly depots: readonly { readonly ka: number; readonly gives: readonly { at: number; mg: number }[] }[];
  /** Inputs at a constant rate. */
  readonly windows: readonly { from: number; to: number; mgPerH: number }[];
  /** h, ascending, no two alike: every instant at which something happens. */
  readonly breaks: readonly number[];
  dispositionAt(time: number): ModelDisposition;
}

type Release = readonly [absorption: FirstOrderAbsorption | ZeroOrderAbsorption, part: number, delay: number];

function releasesOf({ absorption, lag }: ModelInput): Release[] {
  if (absorption.kind !== "mixed") return [[absorption, 1, lag]];
  const { fastFraction, fastKa, slow, slowLag } = absorption;
  return [
    [{ kind: "first-order", ka: fastKa }, fastFraction, lag],
    [slow, 1 - fastFraction, lag + slowLag],
  ];
}

export function crossCheckScriptOf({ dispositions, inputs }: ModelHistory): CrossCheckScript {
  const depots: { ka: number; gives: { at: number; mg: number }[] }[] = [];
  const windows: { from: number; to: number; mgPerH: number }[] = [];
  for (const input of inputs) {
    for (const [absorption, part, delay] of releasesOf(input)) {
      const given = input.doses.map(({ time, amount }) => ({
        at: time + delay,
        mg: amount * input.bioavailability * part,
      }));
      if (absorption.kind === "first-order") depots.push({ ka: absorption.ka, gives: given });
      else {
        const { duration } = absorption;
        for (const { at, mg } of given) windows.push({ from: at, to: at + duration, mgPerH: mg / duration });
      }
    }
  }
  const instants = [
    ...depots.flatMap(({ gives }) => gives.map(({ at }) => at)),
    ...windows.flatMap(({ from, to }) => [from, to]),
    ...dispositions.slice(1).map(({ from }) => from),
  ];
  return {
    depots,
    windows,
    breaks: [...new Set(instants)].sort((a, b) => a - b),
    dispositionAt: (time) => (dispositions.findLast(({ from }) => from <= time) ?? dispositions[0]!).disposition,
  };
}
