/** |found − wanted|/|wanted|; 0 when both are the same, Infinity when either is not a number. */
export function relativeError(found: number, wanted: number): number {
  if (found === wanted) return 0;
  const error = Math.abs(found - wanted) / Math.abs(wanted);
  return Number.isNaN(error) ? Infinity : error;
}

/** Gathers the worst error of each kind and where it was, so that a test can state it beside its bound. */
export class WorstError {
  readonly #worst = new Map<string, { error: number; where: string; count: number }>();

  note(kind: string, error: number, where: string): void {
    const before = this.#worst.get(kind);
    const counted = Number.isNaN(error) ? Infinity : error;
    if (before === undefined) this.#worst.set(kind, { error: counted, where, count: 1 });
    else {
      before.count++;
      if (counted > before.error) {
        before.error = counted;
        before.where = where;
      }
    }
  }

  /** Infinity for a kind that was never noted: a comparison that did not happen is no success. */
  of(kind: string): number {
    return this.#worst.get(kind)?.error ?? Infinity;
  }

  report(title: string): void {
    for (const [kind, { error, where, count }] of this.#worst) {
      console.info(`${title}: ${kind}, worst of ${count}: ${error.toExponential(2)} (${where})`);
    }
  }
}
