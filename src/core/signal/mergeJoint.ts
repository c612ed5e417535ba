import { type JointLayout, pairIndex } from "./jointMoments.ts";

/**
 * Adds one row of joint moments to another, as if all samples had been taken together. With d the difference of
 * the means, n the weights and M the centred sums,
 *     M2 = M2a + M2b + d² na nb/n
 *     M3 = M3a + M3b + d³ na nb (na - nb)/n² + 3 d (na M2b - nb M2a)/n
 *     M4 = M4a + M4b + d⁴ na nb (na² - na nb + nb²)/n³ + 6 d² (na² M2b + nb² M2a)/n² + 4 d (na M3b - nb M3a)/n
 * @param into  in and out: row a
 * @param from  row b
 * @see   Chan, Golub & LeVeque (1983), Am. Stat. 37, 242; Pébay (2008), Sandia report SAND2008-6212
 */
export function mergeJoint(into: Float64Array, from: Float64Array, layout: JointLayout): void {
  const na = into[0];
  const nb = from[0];
  const n = na + nb;
  // two empty rows have no mean
  if (!(n > 0)) return;
  const { sequences, mean, second } = layout;
  for (let a = 0; a < sequences; a++) mergeHigher(into, from, layout, a);
  for (let a = 0; a < sequences; a++) {
    const da = from[mean + a] - into[mean + a];
    for (let b = a; b < sequences; b++) {
      const at = second + pairIndex(sequences, a, b);
      into[at] += from[at] + da * (from[mean + b] - into[mean + b]) * ((na * nb) / n);
    }
  }
  for (let a = 0; a < sequences; a++) into[mean + a] += ((from[mean + a] - into[mean + a]) * nb) / n;
  into[0] = n;
}

/** Third and fourth sums: they need the second sums as they stood before the merging. */
function mergeHigher(into: Float64Array, from: Float64Array, layout: JointLayout, a: number): void {
  const na = into[0];
  const nb = from[0];
  const n = na + nb;
  const d = from[layout.mean + a] - into[layout.mean + a];
  const square = layout.second + pairIndex(layout.sequences, a, a);
  const m2a = into[square];
  const m2b = from[square];
  const m3a = into[layout.third + a];
  const m3b = from[layout.third + a];
  const share = (na * nb) / n;
  into[layout.fourth + a] +=
    from[layout.fourth + a] +
    (d ** 4 * share * (na * na - na * nb + nb * nb)) / (n * n) +
    (6 * d * d * (na * na * m2b + nb * nb * m2a)) / (n * n) +
    (4 * d * (na * m3b - nb * m3a)) / n;
  into[layout.third + a] += m3b + (d ** 3 * share * (na - nb)) / n + (3 * d * (na * m2b - nb * m2a)) / n;
}
