/**
 * Times several things in one process, one after the other in every round, and keeps the best round of each: what the
 * machine did besides hits all of them alike, and the best round least of all. Microseconds a call.
 */
export function timeInTurn<K extends string>(
  cases: Readonly<Record<K, () => void>>,
  rounds: number,
  callsARound = 1,
): Record<K, number> {
  const names = Object.keys(cases) as K[];
  const best = Object.fromEntries(names.map((name) => [name, Infinity])) as Record<K, number>;
  for (let round = 0; round < rounds; round++) {
    for (const name of names) {
      const start = performance.now();
      for (let call = 0; call < callsARound; call++) cases[name]();
      best[name] = Math.min(best[name], ((performance.now() - start) * 1000) / callsARound);
    }
  }
  return best;
}
