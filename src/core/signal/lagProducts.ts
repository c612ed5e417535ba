import { realFourier } from "./realFourier.ts";

/** Sums of products x_i x_(i-l), l = 0 … limit - 1, of a sequence that arrives in chunks. */
export interface LagProducts {
  /**
   * Takes the next samples: a whole chunk, or a shorter one at the very end or beside a restart.
   * @param place  where in its chunk the first of them stands
   */
  add(x: Float64Array, from: number, to: number, place?: number): void;
  /** Adds what was summed since the last call to `row`, every stride-th lag, and starts afresh. */
  flush(row: Float64Array): void;
  /** What follows has no products with what came before. */
  restart(): void;
}

/**
 * Lag products by Fourier transforms of zero-padded chunks of C samples. With X_c the transform of chunk c,
 * of 2C points, the products whose later sample lies in chunk c are, for lags pC … (p+1)C - 1, the inverse of
 *     X_c conj(X_(c-p)) + (-1)^f X_c conj(X_(c-p-1))
 * and all of it adds up before one inverse is taken. Nothing wraps round: the sums are those of the definition.
 * @param limit   lags, a power of two, ≥ 2
 * @param chunk   largest C, a power of two; the least of both is used
 * @param stride  every stride-th lag is handed out; a divisor of limit
 */
export function startLagProducts(limit: number, chunk: number, stride: number): LagProducts {
  const size = Math.min(limit, chunk);
  const parts = limit / size;
  const fourier = realFourier(2 * size);
  const bins = 2 * (size + 1);
  const past = Array.from({ length: parts + 1 }, () => new Float64Array(bins));
  const sums = Array.from({ length: parts }, () => new Float64Array(bins));
  const padded = new Float64Array(2 * size);
  const lags = new Float64Array(size);
  let newest = 0;

  return {
    add(x, from, to, place = 0) {
      for (let start = from, at = place % size; start < to; at = 0) {
        const end = Math.min(start + size - at, to);
        padded.fill(0, 0, size);
        padded.set(x.subarray(start, end), at);
        start = end;
        newest = (newest + parts) % (parts + 1);
        past[newest].set(fourier.forward(padded).subarray(0, bins));
        for (let p = 0; p < parts; p++) {
          const near = past[(newest + p) % (parts + 1)];
          const far = past[(newest + p + 1) % (parts + 1)];
          addProducts(sums[p], past[newest], near, far);
        }
      }
    },
    flush(row) {
      for (let p = 0; p < parts; p++) {
        fourier.inverse(sums[p], lags);
        sums[p].fill(0);
        // stride and size are powers of two: a stride longer than a part keeps the first lag of some parts only
        const first = (stride - ((p * size) % stride)) % stride;
        for (let l = first; l < size; l += stride) row[(p * size + l) / stride] += lags[l];
      }
    },
    restart() {
      for (const transform of past) transform.fill(0);
    },
  };
}

/** sum += x conj(near + (-1)^f far), bin by bin; two bins a turn, so that no sign is carried along. */
function addProducts(sum: Float64Array, x: Float64Array, near: Float64Array, far: Float64Array): void {
  const length = sum.length;
  for (let i = 0; i < length; i += 4) {
    const re = near[i] + far[i];
    const im = near[i + 1] + far[i + 1];
    sum[i] += x[i] * re + x[i + 1] * im;
    sum[i + 1] += x[i + 1] * re - x[i] * im;
    if (i + 2 >= length) break;
    const oddRe = near[i + 2] - far[i + 2];
    const oddIm = near[i + 3] - far[i + 3];
    sum[i + 2] += x[i + 2] * oddRe + x[i + 3] * oddIm;
    sum[i + 3] += x[i + 3] * oddRe - x[i + 2] * oddIm;
  }
}
