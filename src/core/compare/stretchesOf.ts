/** Stations of each case that one stretch holds at least. */
const fewest = 3;

/**
 * Stretches of a common range, in order, each as short as it can be with three stations of either case on it: one begins
 * at every station's place, and the last one runs to the end of the range.
 * @param sides    ascending places of the stations of either case
 * @param range    both ends of the range
 * @returns        [from, to] of each; none where the range holds fewer than three stations of a case
 */
export function stretchesOf(
  sides: readonly ArrayLike<number>[],
  [low, high]: readonly [number, number],
): (readonly [number, number])[] {
  const inside = sides.map((side) => Array.from(side).filter((at) => at >= low && at <= high));
  const places = [...new Set(inside.flat())].sort((a, b) => a - b);
  const found: (readonly [number, number])[] = [];
  for (const from of places) {
    const ends = inside.map((side) => side.filter((at) => at >= from)[fewest - 1]);
    if (ends.some((end) => end === undefined)) break;
    found.push([from, Math.max(...ends)]);
  }
  const last = found.at(-1);
  if (last !== undefined) found[found.length - 1] = [last[0], high];
  return found;
}
