import FFT from "fft.js";
import { gaussianCoefficients, signalPair } from "./gaussianSignal.mjs";
import { seededRandom } from "./random.mjs";

/**
 * Gives a Gaussian signal a skewed derivative and leaves its spectrum as it was. The samples are taken at positions
 * moved along with the signal itself, g(i + δ g(i)), which steepens it as advection would; then every Fourier
 * amplitude is set back to that of g, and only the phases stay.
 * @param {Float64Array} coefficients of g: interleaved, conjugate-symmetric
 * @param {number} delta samples per unit of the signal
 */
export function skewedSignal(coefficients, delta) {
  const size = coefficients.length / 2;
  const [signal] = signalPair(coefficients, new Float64Array(2 * size));
  if (delta === 0) return signal;
  const fft = new FFT(size);
  const phases = new Float64Array(2 * size);
  fft.realTransform(phases, warped(signal, delta));
  fft.completeSpectrum(phases);
  for (let j = 0; j < size; j++) {
    const length = Math.hypot(phases[2 * j], phases[2 * j + 1]);
    const wanted = Math.hypot(coefficients[2 * j], coefficients[2 * j + 1]);
    const factor = length > 0 ? wanted / length : 0;
    phases[2 * j] *= factor;
    phases[2 * j + 1] *= factor;
  }
  return signalPair(phases, new Float64Array(2 * size))[0];
}

/** Four-point Lagrange interpolation at the moved positions, around the ends. */
function warped(signal, delta) {
  const size = signal.length;
  return signal.map((value, i) => {
    const place = i + delta * value;
    const whole = Math.floor(place);
    const s = place - whole;
    const at = (offset) => signal[(((whole + offset) % size) + size) % size];
    return (
      (-s * (s - 1) * (s - 2) * at(-1)) / 6 +
      ((s + 1) * (s - 1) * (s - 2) * at(0)) / 2 -
      ((s + 1) * s * (s - 2) * at(1)) / 2 +
      ((s + 1) * s * (s - 1) * at(2)) / 6
    );
  });
}

/** Skewness of central differences over `lag` samples to either side, around the ends. */
export function differenceSkewness(signal, lag) {
  const size = signal.length;
  let square = 0;
  let cube = 0;
  for (let i = 0; i < size; i++) {
    const difference = signal[(i + lag) % size] - signal[(i - lag + size) % size];
    square += difference ** 2;
    cube += difference ** 3;
  }
  return cube / size / (square / size) ** 1.5;
}

/**
 * The δ that gives central differences of the wanted skewness, by the secant method on a long signal of its own.
 * g and -g are used together: what a finite signal has of skewness by chance cancels.
 * @param {(k: number) => number} spectrum of the signal, folded to its spacing
 * @param {{ size: number, spacing: number, lag: number, wanted: number }} setting lag and size in samples
 */
export function warpForSkewness(spectrum, { size, spacing, lag, wanted }) {
  const { gaussian } = seededRandom(20250601);
  const coefficients = gaussianCoefficients(spectrum, { size, spacing, gaussian });
  const skewness = (delta) =>
    (differenceSkewness(skewedSignal(coefficients, delta), lag) -
      differenceSkewness(skewedSignal(coefficients, -delta), lag)) /
    2;
  const [signal] = signalPair(coefficients, new Float64Array(2 * size));
  const slope = signal.reduce((sum, value, i) => sum + (signal[(i + 1) % size] - value) ** 2, 0) / size;
  // A signal with Gaussian slopes gains 9 δ (rms slope) by the warp, to first order.
  let [a, fa] = [0, -wanted];
  let b = wanted / (9 * Math.sqrt(slope));
  for (let iteration = 0; iteration < 12; iteration++) {
    const fb = skewness(b) - wanted;
    if (Math.abs(fb) < 1e-4) return b;
    [a, b, fa] = [b, b - (fb * (b - a)) / (fb - fa), fb];
  }
  throw new Error(`a derivative skewness of ${wanted} is not reached by the warp`);
}
