import type { NoiseRule } from "./noiseFloor.ts";

/** Mean squares of central differences over the step, (unit of u)²/s². */
export interface DifferenceRates {
  readonly second: number;
  readonly fourth: number;
}

/**
 * What central differences make of a spectrum: the mean-square derivative less what they lose,
 *     ∫ H(ω)² E df,   H = sin(ω dt)/dt at second order, (8 sin(ω dt) - sin(2ω dt))/(6 dt) at fourth
 * in place of ω, with the noise taken out and the tail put on as for the gradient itself. A difference that lies
 * above this holds noise.
 * @param density  one-sided density, bins 0 … size/2
 * @param size     samples a segment
 * @param step     time between samples, s; > 0
 * @param rule     noise floor, cut and tail
 */
export function differenceRates(
  density: Float64Array,
  size: number,
  step: number,
  rule: NoiseRule,
): DifferenceRates {
  const { tail, floor, cutBin } = rule;
  let [second, fourth] = [0, 0];
  for (let f = 1; f < density.length; f++) {
    const beyond = tail === null ? 0 : tail.level * Math.exp(-tail.rate * (f - tail.from));
    const level = f < cutBin ? density[f] - floor : beyond;
    const angle = (2 * Math.PI * f) / size;
    const sine = Math.sin(angle);
    second += level * sine ** 2;
    fourth += (level * (8 * sine - Math.sin(2 * angle)) ** 2) / 36;
  }
  const factor = 1 / (size * step ** 3);
  return { second: second * factor, fourth: fourth * factor };
}
