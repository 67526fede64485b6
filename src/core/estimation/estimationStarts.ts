import type { EstimationProblem } from "./estimationTypes.ts";

/** A start away from the typical patient, in ω. */
const DISPLACED = 0.7;
/** No start lies farther from the typical patient than this, in ω: what the prior all but excludes needs no search. */
const FARTHEST = 3;

const within = (eta: number, omega: number) => Math.max(-FARTHEST * omega, Math.min(FARTHEST * omega, eta));

/**
 * Absorption and elimination rate of the typical patient where exchanging the two gives the same curve: one compartment, first-order
 * absorption. Null for everything else.
 */
export function exchangeableRates({ history }: EstimationProblem): { ka: number; ke: number; volume: number } | null {
  const disposition = history.dispositions[history.dispositions.length - 1]?.disposition;
  const absorption = history.inputs.find(({ doses }) => doses.length > 0)?.absorption;
  if (disposition?.kind !== "one-compartment" || absorption?.kind !== "first-order") return null;
  const { clearance, volume } = disposition;
  return { ka: absorption.ka, ke: clearance / volume, volume };
}

/**
 * The same curve with absorption and elimination exchanged: ka′ = ke, ke′ = ka, V′ = V·ke/ka, the clearance as it is. Null where the
 * model or what differs between patients does not allow it.
 */
export function exchangedEta(problem: EstimationProblem, eta: readonly number[]): number[] | null {
  const rates = exchangeableRates(problem);
  const place = (name: string) => problem.random.findIndex((parameter) => parameter.name === name);
  const ka = place("ka");
  const volume = place("volume");
  if (rates === null || ka < 0 || volume < 0) return null;
  const clearance = place("clearance");
  const lnKa = Math.log(rates.ka) + eta[ka]!;
  const lnKe = Math.log(rates.ke) + (clearance < 0 ? 0 : eta[clearance]!) - eta[volume]!;
  const exchanged = [...eta];
  exchanged[ka] = eta[ka]! + (lnKe - lnKa);
  exchanged[volume] = eta[volume]! + (lnKe - lnKa);
  return exchanged;
}

/**
 * Where the search for the most likely η begins: the typical patient; where the curve can be flip-flop the patient with absorption and
 * elimination exchanged (drawn in to 3 ω); and one displaced to either side in turn.
 */
export function estimationStarts(problem: EstimationProblem): number[][] {
  const { random } = problem;
  const typical = random.map(() => 0);
  const exchanged = exchangedEta(problem, typical);
  const starts = [typical];
  if (exchanged !== null) starts.push(exchanged.map((eta, i) => within(eta, random[i]!.omega)));
  starts.push(random.map(({ omega }, i) => (i % 2 === 0 ? -1 : 1) * Math.min(DISPLACED * omega, 1)));
  return starts;
}
