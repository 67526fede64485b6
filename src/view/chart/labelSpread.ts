/**
 * Moves labels apart so that none overlaps: keeps their order, a minimum distance, and the bounds as far as they allow.
 * Returns the new positions in the order given.
 */
export function labelSpread(positions: readonly number[], distance: number, top: number, bottom: number): number[] {
  const order = positions.map((_, index) => index).sort((a, b) => positions[a]! - positions[b]!);
  const placed = order.map((index) => positions[index]!);
  for (let i = 0; i < placed.length; i++) {
    const floor = i === 0 ? top : placed[i - 1]! + distance;
    placed[i] = Math.max(placed[i]!, floor);
  }
  for (let i = placed.length - 1; i >= 0; i--) {
    const ceiling = i === placed.length - 1 ? bottom : placed[i + 1]! - distance;
    placed[i] = Math.min(placed[i]!, ceiling);
  }
  const result = new Array<number>(positions.length);
  order.forEach((index, rank) => {
    result[index] = placed[rank]!;
  });
  return result;
}
