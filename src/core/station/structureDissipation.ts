import type { ValueContext } from "./stationValues.ts";

/** Constant of the second-order longitudinal structure function in an inertial range. */
const constant = 2.0;

/**
 * Lower bounds of the dissipation from the structure functions, each at the lag where it is largest,
 *     (D_LL/2.0)^(3/2)/r   and   -(5/4) D_LLL/r,   D_LL = <d²>, D_LLL = -<d³>, d = u(t) - u(t - τ), r = U τ
 * since r runs against the time. At Re_lambda 100 the first is some 0.6 of the dissipation. A Gaussian signal has
 * no third moment, and its second bound is about zero.
 * @param sums     of any of the station's blocks
 * @param context  where the sums stand, and the two lags
 * @param U        mean speed, m/s
 * @returns        m²/s³; NaN without increments
 * @see   Pope (2000) §6.2, eqs. (6.30) and (6.88); Kolmogorov (1941)
 */
export function dissipationFromStructure(sums: Float64Array, context: ValueContext, U: number) {
  const { column, structure } = context;
  if (structure === null) return { "epsilon_second-order": Number.NaN, "epsilon_third-order": Number.NaN };
  const mean = (moment: string, count: string) => sums[column[moment]] / sums[column[count]];
  const square = mean("increment_squared", "increments_second");
  const cube = mean("increment_cubed", "increments_third");
  return {
    "epsilon_second-order": (square / constant) ** 1.5 / (U * structure.second),
    "epsilon_third-order": (1.25 * cube) / (U * structure.third),
  };
}
