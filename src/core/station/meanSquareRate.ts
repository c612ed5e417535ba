import type { NoiseRule } from "./noiseFloor.ts";
import { tailMoment } from "./spectrumTail.ts";

/**
 * Mean square of the time derivative from a spectrum, noise subtracted, cut by its rule, and the tail added,
 *     <(du/dt)²> = ∫ (2πf)² (E - floor) df up to the cut + ∫ (2πf)² tail df beyond it
 * @param density one-sided density, bins 0 … size/2
 * @param size    samples a segment
 * @param step    time between samples, s; > 0
 * @param rule    noise floor and cut
 * @returns       (unit of u)²/s²; not positive where noise is all there is
 */
export function meanSquareRate(density: Float64Array, size: number, step: number, rule: NoiseRule): number {
  const end = Math.min(rule.cutBin, density.length);
  let sum = 0;
  for (let f = 1; f < end; f++) sum += f * f * (density[f] - rule.floor);
  if (rule.tail !== null) sum += tailMoment(rule.tail);
  const width = 1 / (size * step);
  return (2 * Math.PI * width) ** 2 * sum * width;
}

/**
 * What the window itself adds to that: a Hann window of length T turns a constant variance into
 *     (4/3) (π/T)² uu
 * since ∫w'² / ∫w² is that for w = ½(1 - cos 2πt/T).
 */
export function windowShare(variance: number, size: number, step: number): number {
  return (4 / 3) * (Math.PI / (size * step)) ** 2 * variance;
}
