import FFT from "fft.js";

/** A tabulated spectrum between its points: straight in ln E against ln k1, flat below the first, nothing above the last. */
export function interpolatedSpectrum(k1, E) {
  const last = k1.length - 1;
  const perStep = last / Math.log(k1[last] / k1[0]);
  return (k) => {
    if (k <= k1[0]) return E[0];
    const place = Math.log(k / k1[0]) * perStep;
    const i = Math.floor(place);
    if (i >= last || E[i] <= 0 || E[i + 1] <= 0) return 0;
    return E[i] * (E[i + 1] / E[i]) ** (place - i);
  };
}

/**
 * The spectrum that samples at a spacing show: what lies above the Nyquist wavenumber is folded back below it,
 * as in any record taken without a filter. So the variance stays whole.
 */
export function foldedSpectrum(spectrum, nyquist) {
  return (k) => {
    let sum = spectrum(k);
    for (let fold = 1; fold < 16; fold++) {
      const added = spectrum(2 * fold * nyquist - k) + spectrum(2 * fold * nyquist + k);
      sum += added;
      if (added <= 1e-12 * sum) break;
    }
    return sum;
  };
}

/**
 * Fourier coefficients of a stationary Gaussian signal of `size` samples at `spacing`: independent, of random
 * amplitude and phase, the variance of each the spectrum's share of its bin. The mean is one of them: a record cut
 * from the signal has a mean that varies as that of a real one.
 * @param {(k: number) => number} spectrum one-sided, ∫ E dk = variance
 * @returns {Float64Array} interleaved re, im; all `size` bins, conjugate-symmetric
 */
export function gaussianCoefficients(spectrum, { size, spacing, gaussian }) {
  const dk = (2 * Math.PI) / (size * spacing);
  const coefficients = new Float64Array(2 * size);
  coefficients[0] = gaussian() * Math.sqrt((spectrum(0) * dk) / 2);
  coefficients[size] = gaussian() * Math.sqrt((spectrum((size / 2) * dk) * dk) / 2);
  for (let j = 1; j < size / 2; j++) {
    const amplitude = Math.sqrt(spectrum(j * dk) * dk) / 2;
    const re = gaussian() * amplitude;
    const im = gaussian() * amplitude;
    coefficients[2 * j] = re;
    coefficients[2 * j + 1] = im;
    coefficients[2 * (size - j)] = re;
    coefficients[2 * (size - j) + 1] = -im;
  }
  return coefficients;
}

/** Two real signals from their coefficients by one complex transform: the second rides on the imaginary part. */
export function signalPair(first, second) {
  const size = first.length / 2;
  const joined = new Float64Array(2 * size);
  for (let j = 0; j < size; j++) {
    joined[2 * j] = (first[2 * j] - second[2 * j + 1]) * size;
    joined[2 * j + 1] = (first[2 * j + 1] + second[2 * j]) * size;
  }
  const out = new Float64Array(2 * size);
  new FFT(size).inverseTransform(out, joined);
  const pair = [new Float64Array(size), new Float64Array(size)];
  for (let i = 0; i < size; i++) {
    pair[0][i] = out[2 * i];
    pair[1][i] = out[2 * i + 1];
  }
  return pair;
}
