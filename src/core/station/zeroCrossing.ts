/** Area under a correlation up to its first zero crossing, and where that is. */
export interface ZeroCrossing {
  /** Lag of the crossing in steps of the correlation; null where it does not fall to zero. */
  readonly at: number | null;
  /** Area up to the crossing, or up to the last lag, in the same steps. */
  readonly area: number;
}

/**
 * First zero crossing of a correlation, on the straight line between the two lags around it, and the area
 * before it by the trapezoid rule.
 * @param rho  correlation, rho[0] > 0, one value per lag; any scale
 */
export function zeroCrossing(rho: Float64Array): ZeroCrossing {
  let after = 1;
  while (after < rho.length && rho[after] > 0) after++;
  const whole = after < rho.length;
  const at = whole ? after - 1 + rho[after - 1] / (rho[after - 1] - rho[after]) : null;
  return { at, area: areaUpTo(rho, at ?? rho.length - 1) };
}

/**
 * Area under a correlation from lag 0 to `end` by the trapezoid rule, the last, cut piece on its straight line.
 * Linear in rho, so that areas of blocks add up to that of the record.
 * @param rho  one value per lag
 * @param end  in steps of the correlation, not necessarily whole; beyond the last lag the area stops there
 */
export function areaUpTo(rho: Float64Array, end: number): number {
  const last = Math.min(Math.floor(end), rho.length - 1);
  let area = 0;
  for (let lag = 1; lag <= last; lag++) area += (rho[lag - 1] + rho[lag]) / 2;
  const rest = end - last;
  if (rest <= 0 || last + 1 >= rho.length) return area;
  const height = rho[last] + (rho[last + 1] - rho[last]) * rest;
  return area + (rest * (rho[last] + height)) / 2;
}
