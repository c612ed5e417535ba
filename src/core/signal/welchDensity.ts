/** Sums of a Welch estimate, as startWelch leaves them. */
export interface WelchTotals {
  readonly size: number;
  readonly segments: number;
  readonly power: Float64Array;
  readonly edges: Float64Array;
}

/**
 * One-sided spectral density from Welch sums,
 *     E(f) = 2 dt Σ|X_f|² / (K Σw²),   Σw² = 3/8 size,
 * the factor 2 left out at f = 0 and at Nyquist, so that Σ E df over all bins estimates the variance.
 * The mean is taken out afterwards and exactly: a constant d adds d size/2 to X_0 and -d size/4 to X_1.
 * @param totals  Welch sums about some constant
 * @param step    time between samples, s; > 0
 * @param mean    what is left of the mean in the summed samples
 * @returns       density at f = i/(size step), i = 0 … size/2, (unit of x)² s; zeros without a segment
 * @see   Welch (1967), IEEE Trans. Audio Electroacoust. 15, 70
 */
export function welchDensity(totals: WelchTotals, step: number, mean: number): Float64Array {
  const { size, segments, power, edges } = totals;
  const density = new Float64Array(power.length);
  if (segments === 0) return density;
  const scale = (2 * step) / (segments * 0.375 * size);
  const zero = (mean * size) / 2;
  const first = (mean * size) / 4;
  for (let f = 0; f < power.length; f++) density[f] = power[f] * scale;
  density[0] = (power[0] - 2 * zero * edges[0] + segments * zero * zero) * (scale / 2);
  density[1] = (power[1] + 2 * first * edges[1] + segments * first * first) * scale;
  density[power.length - 1] /= 2;
  return density;
}
