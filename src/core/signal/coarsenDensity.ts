/**
 * A spectrum on the bins of shorter segments: the sum over each wider bin, its two outermost points by half, over
 * its width. The integral stays what it was; the first and the last bin are half as wide, and not doubled.
 * @param density  bins 0 … size/2
 * @param size     samples a segment it was made with
 * @param target   samples a segment wanted; a power of two, ≤ size
 * @returns        bins 0 … target/2; the same array where nothing changes
 */
export function coarsenDensity(density: Float64Array, size: number, target: number): Float64Array {
  const ratio = size / target;
  if (ratio === 1) return density;
  const coarse = new Float64Array(target / 2 + 1);
  for (let bin = 0; bin < coarse.length; bin++) {
    const centre = bin * ratio;
    let sum = 0;
    for (let f = centre - ratio / 2; f <= centre + ratio / 2; f++) {
      if (f < 0 || f >= density.length) continue;
      const share = Math.abs(f - centre) === ratio / 2 ? 0.5 : 1;
      sum += share * density[f];
    }
    coarse[bin] = sum / ratio;
  }
  return coarse;
}
