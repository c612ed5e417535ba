import { studentQuantile } from "../signal/distributions/studentQuantile.ts";

/** Found once for each whole number of degrees: the search for a quantile takes longer than a fit. */
const found = new Map<number | null, number>();

/**
 * Standard errors to each side of a 95 % interval, Student's t at 97.5 %; its square is the drop of F(1, freedom) at 95 %.
 * @param freedom degrees of freedom, > 0; null is the normal distribution
 */
export function studentReach(freedom: number | null): number {
  if (freedom !== null && !Number.isInteger(freedom)) return studentQuantile(0.975, freedom);
  const before = found.get(freedom);
  if (before !== undefined) return before;
  const reach = studentQuantile(0.975, freedom);
  found.set(freedom, reach);
  return reach;
}
