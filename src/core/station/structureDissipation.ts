import type { JoinedCorrelation } from "./joinCorrelations.ts";

/** Constant of the second-order longitudinal structure function in an inertial range. */
const constant = 2.0;

/**
 * A lower bound of the dissipation from the second-order structure function,
 *     max over r of (D_LL(r)/2.0)^(3/2)/r,   D_LL = 2 (uu - R(r)),   r = U τ, from lambda to L11
 * (at Re_lambda 100 some 0.6 of the dissipation).
 * @param correlation of the station; its first component is u
 * @param from        lambda/U, s
 * @param to          T_int, s
 * @param speed       U, m/s
 * @returns           m²/s³; null where no lag lies between
 * @see   Pope (2000) §6.2
 */
export function dissipationFromStructure(
  correlation: JoinedCorrelation,
  from: number,
  to: number,
  speed: number,
): number | null {
  const [covariance] = correlation.covariance;
  let best: number | null = null;
  const last = Math.min(covariance.length - 1, Math.floor(to / correlation.step));
  for (let lag = Math.max(1, Math.ceil(from / correlation.step)); lag <= last; lag++) {
    const square = 2 * (covariance[0] - covariance[lag]);
    const bound = (square / constant) ** 1.5 / (speed * lag * correlation.step);
    if (best === null || bound > best) best = bound;
  }
  return best;
}
