/**
 * A spectrum averaged over bands of equal width in ln k1: dense bins at the upper end become one point a band.
 * Degrees of freedom add up, less what neighbouring bins of a Hann window share.
 * @param perDecade bands a decade; a band with one bin keeps it as it is
 * @param freedom   degrees of freedom of a bin's chi-square, one for all or one a bin
 */
export function bandAverage(
  k1: Float64Array,
  E: Float64Array,
  perDecade: number,
  freedom: Float64Array | number = 2,
): { k1: number[]; E: number[]; freedom: number[] } {
  const out = { k1: [] as number[], E: [] as number[], freedom: [] as number[] };
  let [count, sumK, sumE, sumF, band] = [0, 0, 0, 0, Number.NaN];
  const flush = () => {
    if (count > 0) {
      out.k1.push(sumK / count);
      out.E.push(sumE / count);
      out.freedom.push(sumF * correlated(count));
    }
    [count, sumK, sumE, sumF] = [0, 0, 0, 0];
  };
  for (let i = 0; i < k1.length; i++) {
    if (!(k1[i] > 0)) continue;
    const here = Math.floor(Math.log10(k1[i]) * perDecade);
    if (here !== band) flush();
    band = here;
    count++;
    sumK += k1[i];
    sumE += E[i];
    sumF += typeof freedom === "number" ? freedom : freedom[i];
  }
  flush();
  return out;
}

/**
 * Share of the summed degrees of freedom that m neighbouring bins of a Hann window leave: the squared correlation of
 * their amplitudes is 4/9 one bin apart and 1/36 two apart.
 * @see Harris (1978), Proc. IEEE 66, 51: correlation 2/3 and 1/6 of the window's shifted kernels
 */
function correlated(m: number): number {
  return m / (m + 2 * (m - 1) * (4 / 9) + (2 * Math.max(m - 2, 0)) / 36);
}
