/**
 * A spectrum averaged over bands of equal width in ln k1: dense bins at the upper end become one point a band.
 * @param perDecade bands a decade; a band with one bin keeps it as it is
 */
export function bandAverage(
  k1: Float64Array,
  E: Float64Array,
  perDecade: number,
): { k1: number[]; E: number[] } {
  const out = { k1: [] as number[], E: [] as number[] };
  let [count, sumK, sumE, band] = [0, 0, 0, Number.NaN];
  const flush = () => {
    if (count > 0) {
      out.k1.push(sumK / count);
      out.E.push(sumE / count);
    }
    [count, sumK, sumE] = [0, 0, 0];
  };
  for (let i = 0; i < k1.length; i++) {
    if (!(k1[i] > 0)) continue;
    const here = Math.floor(Math.log10(k1[i]) * perDecade);
    if (here !== band) flush();
    band = here;
    count++;
    sumK += k1[i];
    sumE += E[i];
  }
  flush();
  return out;
}
