import type { WelchTotals } from "./welchDensity.ts";

/** What one of two sequences brings to their co-spectrum. */
export interface CrossSide {
  /** Σ Re X_0 and Σ Re X_1 over the segments. */
  readonly edges: Float64Array;
  /** What is left of its mean in the summed samples. */
  readonly mean: number;
}

/**
 * One-sided co-spectral density from Welch sums,
 *     C(f) = 2 dt Σ Re(X_f conj Y_f) / (K Σw²),   Σw² = 3/8 size,
 * halved at f = 0 and at Nyquist, so that Σ C df over all bins estimates the covariance. The means are taken out
 * afterwards and exactly, as in welchDensity.
 * @param totals  segments, their size, and Σ Re(X_f conj Y_f) in place of the power
 * @param step    time between samples, s; > 0
 * @returns       bins 0 … size/2; zeros without a segment
 * @see   Welch (1967), IEEE Trans. Audio Electroacoust. 15, 70; Bendat & Piersol (2010) §11.6
 */
export function crossDensity(
  totals: Omit<WelchTotals, "edges">,
  step: number,
  x: CrossSide,
  y: CrossSide,
): Float64Array {
  const { size, segments, power } = totals;
  const density = new Float64Array(power.length);
  if (segments === 0) return density;
  const scale = (2 * step) / (segments * 0.375 * size);
  for (let f = 0; f < power.length; f++) density[f] = power[f] * scale;
  const without = (bin: 0 | 1, weight: number) => {
    const [dx, dy] = [x.mean * weight, y.mean * weight];
    return (power[bin] - dx * y.edges[bin] - dy * x.edges[bin] + segments * dx * dy) * scale;
  };
  // a constant d adds d size/2 to X_0 and -d size/4 to X_1
  density[0] = without(0, size / 2) / 2;
  density[1] = without(1, -size / 4);
  density[power.length - 1] /= 2;
  return density;
}
