import FFT from "fft.js";
import { assert } from "../failure.ts";

/** Discrete Fourier transforms of real sequences of one length; work arrays are reused from call to call. */
export interface RealFourier {
  readonly size: number;
  /** X_f = Σ x_n e^(-2πi f n/size) for f = 0 … size/2, interleaved re, im; valid until the next call. */
  forward(input: Float64Array): Float64Array;
  /**
   * The real sequence of a spectrum of conjugate symmetry, divided by size.
   * @param spectrum  bins 0 … size/2, interleaved re, im
   * @param output    filled from its start with at most `size` values
   */
  inverse(spectrum: Float64Array, output: Float64Array): void;
}

const plans = new Map<number, RealFourier>();

/**
 * The transform of one length, planned once.
 * @param size  a power of two, ≥ 2
 */
export function realFourier(size: number): RealFourier {
  const known = plans.get(size);
  if (known) return known;
  assert(
    size >= 2 && Number.isInteger(Math.log2(size)),
    `a transform of ${size} points is not a power of two`,
  );
  const plan = planTransform(size);
  plans.set(size, plan);
  return plan;
}

function planTransform(size: number): RealFourier {
  const fft = new FFT(size);
  const out = new Float64Array(2 * size);
  const hartley = new Float64Array(size);
  const half = size / 2;

  function forward(input: Float64Array): Float64Array {
    fft.realTransform(out, input);
    return out;
  }

  /** Σ_f (Re X - Im X)_f cas(2πfn/size) is the inverse: one real transform in place of a complex one. */
  function inverse(spectrum: Float64Array, output: Float64Array): void {
    hartley[0] = spectrum[0];
    hartley[half] = spectrum[size];
    for (let f = 1; f < half; f++) {
      const re = spectrum[2 * f];
      const im = spectrum[2 * f + 1];
      hartley[f] = re - im;
      hartley[size - f] = re + im;
    }
    fft.realTransform(out, hartley);
    const count = Math.min(size, output.length);
    output[0] = out[0] / size;
    for (let n = 1; n < count && n <= half; n++) output[n] = (out[2 * n] - out[2 * n + 1]) / size;
    // bins above half are the conjugates of those below
    for (let n = half + 1; n < count; n++) {
      const mirror = 2 * (size - n);
      output[n] = (out[mirror] + out[mirror + 1]) / size;
    }
  }
  return { size, forward, inverse };
}
