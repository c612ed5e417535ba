import { invertTail } from "./invertTail.ts";
import { normalCdf } from "./normalCdf.ts";

/**
 * Quantile of the standard normal distribution: the x with Φ(x) = p.
 * @param p  from 0 to 1
 * @returns  x; -Infinity and Infinity at the ends
 */
export function normalQuantile(p: number): number {
  if (p === 0.5) return 0;
  if (p > 0.5) return -normalQuantile(1 - p);
  return -invertTail(
    {
      tail: (x) => 2 * normalCdf(-x),
      density: (x) => Math.sqrt(2 / Math.PI) * Math.exp((-x * x) / 2),
    },
    2 * p,
    1,
  );
}
