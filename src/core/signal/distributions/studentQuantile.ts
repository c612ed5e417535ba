import { invertTail } from "./invertTail.ts";
import { logGamma } from "./logGamma.ts";
import { normalQuantile } from "./normalQuantile.ts";
import { studentTail } from "./studentTail.ts";

/** From so many degrees on the series below is exact to rounding, while the tail's gamma functions cancel. */
const nearlyNormal = 2000;

/**
 * Quantile of Student's t.
 * @param p        from 0 to 1; 0.975 for a two-sided interval of 95 %
 * @param freedom  degrees of freedom, > 0; null or Infinity is the normal distribution
 * @returns        t with P(T < t) = p
 */
export function studentQuantile(p: number, freedom: number | null): number {
  if (freedom === null || freedom === Infinity) return normalQuantile(p);
  if (p === 0.5) return 0;
  if (p < 0.5) return -studentQuantile(1 - p, freedom);
  const z = normalQuantile(p);
  if (freedom >= nearlyNormal && z < 6) return expanded(z, freedom);
  const front = Math.exp(logGamma((freedom + 1) / 2) - logGamma(freedom / 2)) / Math.sqrt(freedom * Math.PI);
  return invertTail(
    {
      tail: (t) => studentTail(t, freedom),
      density: (t) => 2 * front * Math.exp((-(freedom + 1) / 2) * Math.log1p((t * t) / freedom)),
    },
    2 * (1 - p),
    z,
  );
}

/**
 * Student's quantile from the normal one z by its series in 1/freedom; the rest is below z^11/freedom^5.
 * @see Abramowitz & Stegun (1964), 26.7.5
 */
function expanded(z: number, freedom: number): number {
  const y = z * z;
  const terms = [
    (z * (y + 1)) / 4,
    (z * ((5 * y + 16) * y + 3)) / 96,
    (z * (((3 * y + 19) * y + 17) * y - 15)) / 384,
    (z * ((((79 * y + 776) * y + 1482) * y - 1920) * y - 945)) / 92160,
  ];
  return z + terms.reduceRight((sum, term) => (sum + term) / freedom, 0);
}
