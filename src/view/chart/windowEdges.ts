/** Two numbers nearer than this run into each other, units of the drawing. */
const LINE_HEIGHT = 15;

/** Where the numbers of the window's upper and lower edge stand: at their lines, or pulled apart where those are too near. */
export function windowEdges({
  top,
  bottom,
}: {
  readonly top: number;
  readonly bottom: number;
}): readonly [number, number] {
  const apart = Math.max(0, (LINE_HEIGHT - (bottom - top)) / 2);
  return [top - apart, bottom + apart];
}
