/**
 * Adds the differences of u whose last sample lies in a chunk to a block's row (see differenceFields):
 *     d2 = (u_(i+1) - u_(i-1))/2,   d4 = (8 (u_(i+1) - u_(i-1)) - (u_(i+2) - u_(i-2)))/12,
 *     d  = (u_(i+m) - u_(i-m))/(2 m step)
 * @param sums  out: the six fields of differences
 * @param u     samples, history first
 * @param from  index of the chunk's first sample in `u`
 * @param to    index after its last
 * @param known samples before `from` that belong to the record
 * @param m     half the base of the derivative, in samples
 */
export function addDifferences(
  sums: Float64Array,
  u: Float64Array,
  from: number,
  to: number,
  known: number,
  m: number,
  step: number,
): void {
  const first = from + Math.max(0, 4 - known);
  let square2 = 0;
  let square4 = 0;
  for (let i = first; i < to; i++) {
    const near = u[i - 1] - u[i - 3];
    const fourth = (8 * near - (u[i] - u[i - 4])) / 12;
    square2 += near * near;
    square4 += fourth * fourth;
  }
  sums[0] += Math.max(0, to - first);
  sums[1] += square2 / 4;
  sums[2] += square4;
  const begin = from + Math.max(0, 2 * m - known);
  const scale = 1 / (2 * m * step);
  let square = 0;
  let cube = 0;
  for (let i = begin; i < to; i++) {
    const d = (u[i] - u[i - 2 * m]) * scale;
    square += d * d;
    cube += d * d * d;
  }
  sums[3] += Math.max(0, to - begin);
  sums[4] += square;
  sums[5] += cube;
}
