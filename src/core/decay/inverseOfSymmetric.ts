/**
 * Inverse of a small symmetric positive definite matrix, by Gauss-Jordan on the matrix scaled to a unit diagonal.
 * @param matrix row-major, size²
 * @returns      row-major inverse; null where the matrix is singular to working precision
 */
export function inverseOfSymmetric(matrix: readonly number[], size: number): number[] | null {
  const scale = Array.from({ length: size }, (_, i) => 1 / Math.sqrt(matrix[i * size + i]));
  if (!scale.every(Number.isFinite)) return null;
  const work = matrix.map((value, at) => value * scale[Math.floor(at / size)] * scale[at % size]);
  const inverse = work.map((_, at) => (Math.floor(at / size) === at % size ? 1 : 0));
  for (let pivot = 0; pivot < size; pivot++) {
    const divisor = work[pivot * size + pivot];
    if (!(divisor > 1e-14)) return null;
    for (let k = 0; k < size; k++) {
      work[pivot * size + k] /= divisor;
      inverse[pivot * size + k] /= divisor;
    }
    for (let row = 0; row < size; row++) {
      if (row === pivot) continue;
      const factor = work[row * size + pivot];
      for (let k = 0; k < size; k++) {
        work[row * size + k] -= factor * work[pivot * size + k];
        inverse[row * size + k] -= factor * inverse[pivot * size + k];
      }
    }
  }
  return inverse.map((value, at) => value * scale[Math.floor(at / size)] * scale[at % size]);
}

/** matrix · vector, for a small square matrix in row-major order. */
export function times(matrix: readonly number[], vector: readonly number[]): number[] {
  const size = vector.length;
  return vector.map((_, row) =>
    vector.reduce((sum, value, column) => sum + matrix[row * size + column] * value, 0),
  );
}
