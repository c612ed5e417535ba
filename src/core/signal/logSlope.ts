/**
 * Slope of ln y against ln i over a range of bins, by least squares with weights 1/i: every bin weighs as its share
 * of the logarithm.
 * @param y     values at i = 0, 1 …; those that are not positive are passed over
 * @param from  first bin, ≥ 1
 * @param to    last bin
 * @returns     -Infinity with fewer than two usable bins
 */
export function logSlope(y: Float64Array, from: number, to: number): number {
  let weight = 0;
  let sx = 0;
  let sy = 0;
  let sxx = 0;
  let sxy = 0;
  for (let i = from; i <= to; i++) {
    if (!(y[i] > 0)) continue;
    const w = 1 / i;
    const lx = Math.log(i);
    const ly = Math.log(y[i]);
    weight += w;
    sx += w * lx;
    sy += w * ly;
    sxx += w * lx * lx;
    sxy += w * lx * ly;
  }
  const spread = weight * sxx - sx * sx;
  return spread > 0 ? (weight * sxy - sx * sy) / spread : -Infinity;
}
