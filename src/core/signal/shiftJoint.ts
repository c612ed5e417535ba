import { type JointLayout, pairIndex } from "./jointMoments.ts";

/**
 * Sums about a given point in place of the row's own mean; they add up plainly from row to row. With d the mean
 * less the point and n the weight,
 *     Σ(x-p) = n d,   Σ(x-p)(y-q) = M2 + n d e,   Σ(x-p)³ = M3 + 3 d M2 + n d³,
 *     Σ(x-p)⁴ = M4 + 4 d M3 + 6 d² M2 + n d⁴
 * @param row    joint moments
 * @param about  the point, one number a sequence
 * @param out    out: in the layout of the row, the means replaced by Σ(x-p)
 */
export function shiftJoint(
  row: Float64Array,
  layout: JointLayout,
  about: ArrayLike<number>,
  out: Float64Array,
): void {
  const n = row[0];
  const { sequences, mean, second, third, fourth } = layout;
  out[0] = n;
  for (let a = 0; a < sequences; a++) {
    const d = row[mean + a] - about[a];
    const m2 = row[second + pairIndex(sequences, a, a)];
    const m3 = row[third + a];
    out[mean + a] = n * d;
    out[third + a] = m3 + 3 * d * m2 + n * d ** 3;
    out[fourth + a] = row[fourth + a] + 4 * d * m3 + 6 * d * d * m2 + n * d ** 4;
    for (let b = a; b < sequences; b++) {
      const at = second + pairIndex(sequences, a, b);
      out[at] = row[at] + n * d * (row[mean + b] - about[b]);
    }
  }
}
