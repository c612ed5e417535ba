import { inverseOfSymmetric } from "./inverseOfSymmetric.ts";
import type { CentredLaw, Held, LawProblem } from "./lawProblem.ts";
import { normalMatrix } from "./normalMatrix.ts";

/**
 * Covariance of (ln A, x0, n) at a minimum: (J'J)⁻¹ of the law about its centre, carried over by
 *     x0 = x_c - 1/kappa,   n = b/kappa,   ln A = c - n ln(kappa ell)
 * @param law the minimum; the problem's scratch must be that of its evaluation
 * @returns   row-major 3 × 3 for errors of one; rows and columns of what is held are zero;
 *            null where the stations cannot tell the free numbers apart
 */
export function lawCovariance(problem: LawProblem, law: CentredLaw, held: Held): number[] | null {
  const { free, matrix } = normalMatrix(problem, law, held);
  const inverse = inverseOfSymmetric(matrix, free.length);
  if (inverse === null) return null;
  const { b, kappa } = law;
  const n = b / kappa;
  const shift = Math.log(kappa * problem.length);
  const exponentByKappa = held.n === null ? -n / kappa : 0;
  /** Derivatives of ln A, x0, n by each free number. */
  const derivatives = {
    c: [1, 0, 0],
    b: [-shift / kappa, 0, 1 / kappa],
    kappa: [-n / kappa - shift * exponentByKappa, 1 / kappa ** 2, exponentByKappa],
  };
  const covariance = new Array<number>(9).fill(0);
  for (let row = 0; row < 3; row++) {
    for (let column = 0; column < 3; column++) {
      for (let j = 0; j < free.length; j++) {
        for (let k = 0; k < free.length; k++) {
          covariance[3 * row + column] +=
            derivatives[free[j]][row] * inverse[j * free.length + k] * derivatives[free[k]][column];
        }
      }
    }
  }
  return covariance;
}
