import { chiSquareTail } from "../../signal/distributions/chiSquareTail.ts";
import type { LineMaterial } from "./lineMaterial.ts";

/** Integral scales in a stretch whose mean is compared with the others'. */
const perStretch = 4;
const mostStretches = 16;

/**
 * Probability that means of u as different along the line as these come from one homogeneous flow: those of stretches
 * of four integral scales or more, each with se² = 2 uu L11/(its length in all independent snapshots).
 * @returns null where the line is too short for two stretches
 */
export function lineHomogeneity({ lines, spectra, scales, sampling, all }: LineMaterial): number | null {
  const c = lines.components.indexOf("u");
  if (spectra === null || scales.scale === null || c < 0 || !(all.whole.uu > 0)) return null;
  const size = lines.points.length;
  const stretches = Math.min(mostStretches, Math.floor(spectra.length / (perStretch * scales.scale)));
  if (stretches < 2) return null;
  const sums = new Float64Array(stretches);
  const counts = new Float64Array(stretches);
  for (const part of lines.parts) {
    if (part.spectra === null) continue;
    const { profile, lines: count } = part.spectra;
    for (let i = 0; i < size; i++) {
      const at = Math.floor((i * stretches) / size);
      sums[at] += profile[c][i] + count * (part.reference[c] - lines.means[c]);
      counts[at] += count;
    }
  }
  const independent = (sampling.independent * spectra.length) / stretches;
  const variance = (2 * all.whole.uu * scales.scale) / independent;
  const chi2 = sums.reduce((sum, value, i) => sum + (value / counts[i]) ** 2 / variance, 0);
  return chiSquareTail(chi2, stretches - 1);
}
