/** The part of the clock the bench shows, elapsed hours. View state: outside history, outside the case. */
export interface BenchSpan {
  readonly fromH: number;
  readonly toH: number;
}

const SHORTEST_H = 6;

/** What is shown of a case at first: the last four days of the past and the first five of the future, or all if it is less. */
export function spanStart(whole: BenchSpan, nowH: number): BenchSpan {
  return spanWithin(whole, { fromH: Math.max(whole.fromH, nowH - 4 * 24), toH: Math.min(whole.toH, nowH + 5 * 24) });
}

/** `span` moved and cut to lie inside `whole`. */
export function spanWithin(whole: BenchSpan, span: BenchSpan): BenchSpan {
  const length = Math.min(Math.max(span.toH - span.fromH, SHORTEST_H), whole.toH - whole.fromH);
  const fromH = Math.min(Math.max(span.fromH, whole.fromH), whole.toH - length);
  return { fromH, toH: fromH + length };
}

/** Narrower (factor below 1) or wider about `aroundH`. */
export function spanZoomed(whole: BenchSpan, span: BenchSpan, factor: number, aroundH: number): BenchSpan {
  const length = (span.toH - span.fromH) * factor;
  const share = (aroundH - span.fromH) / (span.toH - span.fromH);
  const fromH = aroundH - share * length;
  return spanWithin(whole, { fromH, toH: fromH + length });
}

/** Moved by a share of its own length; negative is earlier. */
export function spanMoved(whole: BenchSpan, span: BenchSpan, share: number): BenchSpan {
  const by = (span.toH - span.fromH) * share;
  return spanWithin(whole, { fromH: span.fromH + by, toH: span.toH + by });
}
