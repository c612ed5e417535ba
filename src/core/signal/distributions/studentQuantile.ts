import { invertTail } from "./invertTail.ts";
import { logGamma } from "./logGamma.ts";
import { normalQuantile } from "./normalQuantile.ts";
import { studentTail } from "./studentTail.ts";

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
  const front = Math.exp(logGamma((freedom + 1) / 2) - logGamma(freedom / 2)) / Math.sqrt(freedom * Math.PI);
  return invertTail(
    {
      tail: (t) => studentTail(t, freedom),
      density: (t) => 2 * front * Math.exp((-(freedom + 1) / 2) * Math.log1p((t * t) / freedom)),
    },
    2 * (1 - p),
    normalQuantile(p),
  );
}
