/**
 * Solves a symmetric positive definite system of three by Cholesky's method, scaled to a unit diagonal.
 * @param matrix  row-major 3 × 3
 * @param damping added to each element of the scaled diagonal
 * @param right   right-hand side
 * @param out     receives the solution
 * @returns       false where the matrix is singular to working precision
 */
export function solveSymmetric(
  matrix: ArrayLike<number>,
  damping: number,
  right: ArrayLike<number>,
  out: Float64Array,
): boolean {
  const s0 = 1 / Math.sqrt(matrix[0]);
  const s1 = 1 / Math.sqrt(matrix[4]);
  const s2 = 1 / Math.sqrt(matrix[8]);
  const diagonal = 1 + damping;
  const l00 = Math.sqrt(diagonal);
  const l10 = (matrix[3] * s1 * s0) / l00;
  const l20 = (matrix[6] * s2 * s0) / l00;
  const pivot1 = diagonal - l10 * l10;
  if (!(pivot1 > smallestPivot)) return false;
  const l11 = Math.sqrt(pivot1);
  const l21 = (matrix[7] * s2 * s1 - l20 * l10) / l11;
  const pivot2 = diagonal - l20 * l20 - l21 * l21;
  if (!(pivot2 > smallestPivot)) return false;
  const l22 = Math.sqrt(pivot2);
  const y0 = (right[0] * s0) / l00;
  const y1 = (right[1] * s1 - l10 * y0) / l11;
  const y2 = (right[2] * s2 - l20 * y0 - l21 * y1) / l22;
  const z2 = y2 / l22;
  const z1 = (y1 - l21 * z2) / l11;
  const z0 = (y0 - l10 * z1 - l20 * z2) / l00;
  out[0] = z0 * s0;
  out[1] = z1 * s1;
  out[2] = z2 * s2;
  return Number.isFinite(out[0] + out[1] + out[2]);
}

const smallestPivot = 1e-14;

/** Inverse of a symmetric positive definite 3 × 3 matrix, row-major; null where it is singular. */
export function inverseOfSymmetric(matrix: ArrayLike<number>): number[] | null {
  const column = new Float64Array(3);
  const inverse = new Array<number>(9).fill(0);
  for (let at = 0; at < 3; at++) {
    const unit = [0, 0, 0];
    unit[at] = 1;
    if (!solveSymmetric(matrix, 0, unit, column)) return null;
    for (let row = 0; row < 3; row++) inverse[3 * row + at] = column[row];
  }
  return inverse;
}
