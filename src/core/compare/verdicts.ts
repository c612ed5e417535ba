import type { Verdict } from "../comparison.ts";
import { normalCdf } from "../signal/distributions/normalCdf.ts";

/** A mean ratio as its logarithm with the standard error of that. */
export interface LogRatio {
  readonly logarithm: number;
  readonly standard: number;
}

export interface Judgement {
  readonly verdict: Verdict;
  readonly p_equivalent: number;
  readonly p_different: number;
}

/**
 * Verdicts on several ratios at a tolerance d. Equivalent: the 90 % interval lies inside [1/(1 + d), 1 + d] (two
 * one-sided tests at 5 %); different: it lies wholly outside; else undecided. Each claim's p is adjusted over the
 * quantities by Holm's method, and a verdict needs 0.05 of the adjusted p.
 * @param ratios    those that could be formed
 * @param tolerance d, > 0
 * @see             Schuirmann (1987), J. Pharmacokinet. Biopharm. 15, 657; Holm (1979), Scand. J. Statist. 6, 65
 */
export function verdicts(ratios: readonly LogRatio[], tolerance: number): Judgement[] {
  const margin = Math.log1p(tolerance);
  // by how many standard errors the ratio lies inside the margin; beyond it this is negative
  const inside = ratios.map(({ logarithm, standard }) => {
    const room = margin - Math.abs(logarithm);
    return standard > 0 ? room / standard : room >= 0 ? 40 : -40;
  });
  const equivalent = holm(inside.map((room) => normalCdf(-room)));
  const different = holm(inside.map((room) => normalCdf(room)));
  return ratios.map((_, i) => {
    const [p_equivalent, p_different] = [equivalent[i], different[i]];
    const verdict = p_equivalent <= 0.05 ? "equivalent" : p_different <= 0.05 ? "different" : "undecided";
    return { verdict, p_equivalent, p_different };
  });
}

/** Holm's adjusted p: the i-th smallest of m times m - i, none below the one before it. */
function holm(p: readonly number[]): number[] {
  const order = p.map((_, i) => i).sort((a, b) => p[a] - p[b]);
  const adjusted = new Array<number>(p.length).fill(1);
  let least = 0;
  order.forEach((at, rank) => {
    least = Math.min(1, Math.max(least, (p.length - rank) * p[at]));
    adjusted[at] = least;
  });
  return adjusted;
}
