/** The part of the clock the bench shows, elapsed hours. View state: outside history, outside the case. */
export interface BenchSpan {
  readonly fromH: number;
  readonly toH: number;
}

const SHORTEST_H = 6;

const DAYS_BEFORE = 4;
const DAYS_AFTER = 5;
const DAYS_LEAST = 2;
/** Room of a day in which its name and the doses of a 12-hourly line can be told apart, px. */
const DAY_ROOM = 56;

/**
 * What is shown of a case at first: the last four days of the past and the first five of the future, or all if it is less; where `width`, px,
 * has no room for so many, as many days as it has, in the same proportion.
 */
export function spanStart(whole: BenchSpan, nowH: number, width: number): BenchSpan {
  const room = Math.max(DAYS_LEAST, width / DAY_ROOM);
  const share = Math.min(1, room / (DAYS_BEFORE + DAYS_AFTER));
  return spanWithin(whole, {
    fromH: Math.max(whole.fromH, nowH - DAYS_BEFORE * share * 24),
    toH: Math.min(whole.toH, nowH + DAYS_AFTER * share * 24),
  });
}

/** `span` moved and cut to lie inside `whole`. */
export function spanWithin(whole: BenchSpan, span: BenchSpan): BenchSpan {
  const length = Math.min(Math.max(span.toH - span.fromH, SHORTEST_H), whole.toH - whole.fromH);
  const fromH = Math.min(Math.max(span.fromH, whole.fromH), whole.toH - length);
  return { fromH, toH: fromH + length };
}

export function spanHas(span: BenchSpan, hours: number): boolean {
  return hours >= span.fromH && hours <= span.toH;
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
