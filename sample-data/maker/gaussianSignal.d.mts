export type Spectrum = (k: number) => number;

export function interpolatedSpectrum(k1: Float64Array, E: Float64Array): Spectrum;
export function foldedSpectrum(spectrum: Spectrum, nyquist: number): Spectrum;
export function gaussianCoefficients(
  spectrum: Spectrum,
  form: { readonly size: number; readonly spacing: number; readonly gaussian: () => number },
): Float64Array;
export function signalPair(first: Float64Array, second: Float64Array): [Float64Array, Float64Array];
