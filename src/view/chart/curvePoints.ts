/** Points of a curve inside the span, with its ends interpolated on the span's edges. */
export function curvePoints(
  curve: { readonly timesH: ArrayLike<number>; readonly values: ArrayLike<number> },
  fromH: number,
  toH: number,
): [number, number][] {
  const points: [number, number][] = [];
  const between = (i: number, hours: number): [number, number] => {
    const t0 = curve.timesH[i - 1]!;
    const t1 = curve.timesH[i]!;
    const share = t1 > t0 ? (hours - t0) / (t1 - t0) : 0;
    return [hours, curve.values[i - 1]! + share * (curve.values[i]! - curve.values[i - 1]!)];
  };
  for (let i = 0; i < curve.timesH.length; i++) {
    const hours = curve.timesH[i]!;
    if (hours < fromH) continue;
    if (points.length === 0 && i > 0 && hours > fromH) points.push(between(i, fromH));
    if (hours > toH) {
      if (i > 0) points.push(between(i, toH));
      break;
    }
    points.push([hours, curve.values[i]!]);
  }
  return points;
}
