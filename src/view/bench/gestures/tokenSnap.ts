/** A dragged or nudged dose falls on quarter hours; with the finer step on minutes. */
export const SNAP_MIN = 15;
export const FINE_MIN = 1;

const MINUTE_MS = 60_000;

/** Nearest instant on the step, counted from the epoch (quarter hours of UTC are quarter hours of every zone in use). */
export function tokenSnap(ms: number, isFine: boolean): number {
  const step = (isFine ? FINE_MIN : SNAP_MIN) * MINUTE_MS;
  return Math.round(ms / step) * step;
}

/** The next instant on the step after (or before) `ms`, for arrow keys and buttons. */
export function tokenNudge(ms: number, direction: -1 | 1, isFine: boolean): number {
  const step = (isFine ? FINE_MIN : SNAP_MIN) * MINUTE_MS;
  return direction > 0 ? Math.floor(ms / step) * step + step : Math.ceil(ms / step) * step - step;
}
