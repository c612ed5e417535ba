import type { DecayResult } from "../core/decayResult.ts";
import { fQuantile } from "../core/signal/distributions/fQuantile.ts";
import { studentQuantile } from "../core/signal/distributions/studentQuantile.ts";

/** A closed curve in the plane of n and x0/ℓ. */
export interface Region {
  readonly n: readonly number[];
  readonly x0: readonly number[];
}

const around = 72;

/**
 * Joint region of n and x0/ℓ by the covariance of the fit: the ellipse
 *     dᵀ C⁻¹ d = 2 F(2, ν),   ν from the fit's own Student t
 * @param share 0.68 or 0.95
 * @returns     null where n or x0 was held: then there is no region but an interval
 * @see         Draper and Smith (1998), joint confidence regions
 */
export function jointRegion(decay: DecayResult, share: number): Region | null {
  const { law } = decay;
  if (law === null) return null;
  const [varX0, , both, varN] = [4, 5, 5, 8].map((at) => law.covariance[at]);
  if (!(varX0 > 0 && varN > 0 && varX0 * varN > both * both)) return null;
  const freedom = freedomOf(law.quantile, decay.stations);
  const radius = Math.sqrt(freedom === null ? -2 * Math.log(1 - share) : 2 * fQuantile(share, 2, freedom));
  const sdN = Math.sqrt(varN);
  const slope = both / sdN;
  const rest = Math.sqrt(varX0 - slope * slope);
  const angles = Array.from({ length: around + 1 }, (_, i) => (2 * Math.PI * i) / around);
  return {
    n: angles.map((angle) => law.n + radius * sdN * Math.cos(angle)),
    x0: angles.map(
      (angle) => (law.x0 + radius * (slope * Math.cos(angle) + rest * Math.sin(angle))) / law.length,
    ),
  };
}

/** Degrees of freedom whose 97.5 % point of Student's t this is; null for the normal's. */
function freedomOf(quantile: number, stations: number): number | null {
  if (quantile < studentQuantile(0.975, null) * (1 + 1e-6)) return null;
  let [few, many] = [1, Math.max(10 * stations, 1000)];
  while (many - few > 0.01) {
    const middle = (few + many) / 2;
    if (studentQuantile(0.975, middle) > quantile) few = middle;
    else many = middle;
  }
  return (few + many) / 2;
}
