import FFT from "fft.js";
import { assert } from "../failure.ts";
import { realFourier } from "./realFourier.ts";

/** Discrete Fourier transform of real sequences of one length, whatever the length; work arrays are reused. */
export interface AnyFourier {
  readonly size: number;
  /** X_f = Σ x_n e^(-2πi f n/size) for f = 0 … ⌊size/2⌋, interleaved re, im; valid until the next call. */
  forward(input: Float64Array): Float64Array;
}

const plans = new Map<number, AnyFourier>();

/**
 * The transform of one length, planned once. Lengths that are no power of two go by Bluestein's identity
 * f n = (f² + n² - (f - n)²)/2, which makes the sum a convolution:
 *     X_f = w_f Σ (x_n w_n) conj(w_(f-n)),   w_n = e^(-πi n²/size)
 * @param size  ≥ 2
 * @see   Bluestein (1970), IEEE Trans. Audio Electroacoust. 18, 451
 */
export function anyFourier(size: number): AnyFourier {
  const known = plans.get(size);
  if (known) return known;
  assert(size >= 2 && Number.isInteger(size), `a transform of ${size} points`);
  const plan = Number.isInteger(Math.log2(size)) ? realFourier(size) : chirpTransform(size);
  plans.set(size, plan);
  return plan;
}

function chirpTransform(size: number): AnyFourier {
  const length = 2 ** Math.ceil(Math.log2(2 * size));
  const fft = new FFT(length);
  const chirp = new Float64Array(2 * size);
  for (let n = 0; n < size; n++) {
    // n² modulo 2 size: the angle of a large square would have lost its digits
    const angle = (Math.PI * ((n * n) % (2 * size))) / size;
    chirp[2 * n] = Math.cos(angle);
    chirp[2 * n + 1] = -Math.sin(angle);
  }
  const kernel = kernelOf(fft, chirp, size, length);
  const work = new Float64Array(2 * length);
  const spectrum = new Float64Array(2 * length);
  const out = new Float64Array(2 * (Math.floor(size / 2) + 1));

  function forward(input: Float64Array): Float64Array {
    work.fill(0);
    for (let n = 0; n < size; n++) {
      work[2 * n] = input[n] * chirp[2 * n];
      work[2 * n + 1] = input[n] * chirp[2 * n + 1];
    }
    fft.transform(spectrum, work);
    multiply(spectrum, kernel);
    fft.inverseTransform(work, spectrum);
    for (let f = 0; 2 * f < out.length; f++) {
      const [re, im, cos, sin] = [work[2 * f], work[2 * f + 1], chirp[2 * f], chirp[2 * f + 1]];
      out[2 * f] = re * cos - im * sin;
      out[2 * f + 1] = re * sin + im * cos;
    }
    return out;
  }
  return { size, forward };
}

/** Transform of conj(w_n), n = -(size - 1) … size - 1, laid out cyclically. */
function kernelOf(fft: FFT, chirp: Float64Array, size: number, length: number): Float64Array {
  const wave = new Float64Array(2 * length);
  for (let n = 0; n < size; n++) {
    for (const at of n === 0 ? [0] : [n, length - n]) {
      wave[2 * at] = chirp[2 * n];
      wave[2 * at + 1] = -chirp[2 * n + 1];
    }
  }
  const kernel = new Float64Array(2 * length);
  fft.transform(kernel, wave);
  return kernel;
}

function multiply(into: Float64Array, by: Float64Array): void {
  for (let i = 0; i < into.length; i += 2) {
    const re = into[i] * by[i] - into[i + 1] * by[i + 1];
    into[i + 1] = into[i] * by[i + 1] + into[i + 1] * by[i];
    into[i] = re;
  }
}
