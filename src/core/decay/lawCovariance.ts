import type { CentredLaw, Held, LawProblem } from "./lawProblem.ts";
import { normalMatrix } from "./normalMatrix.ts";
import { inverseOfSymmetric } from "./solveSymmetric.ts";

/**
 * Covariance of (ln A, x0, n) at a minimum: (J'J)⁻¹ of the law about its centre, carried over by
 *     x0 = x_c - 1/kappa,   n = b/kappa,   ln A = c - n ln(kappa ell)
 * @param law the minimum; the problem's scratch must be that of its evaluation
 * @returns   row-major 3 × 3 for errors of one; rows and columns of what is held are zero;
 *            null where the stations cannot tell the free numbers apart
 */
export function lawCovariance(problem: LawProblem, law: CentredLaw, held: Held): number[] | null {
  normalMatrix(problem, law, held);
  const inverse = inverseOfSymmetric(problem.matrix);
  if (inverse === null) return null;
  const { b, kappa } = law;
  const n = b / kappa;
  const shift = Math.log(kappa * problem.length);
  const exponentByKappa = held.n === null ? -n / kappa : 0;
  /** Derivatives of ln A, x0 and n (columns) by c, b and kappa (rows), as far as these are free. */
  const derivatives = [
    held.lnA === null ? [1, 0, 0] : [0, 0, 0],
    held.n === null ? [-shift / kappa, 0, 1 / kappa] : [0, 0, 0],
    held.x0 === null ? [-n / kappa - shift * exponentByKappa, 1 / kappa ** 2, exponentByKappa] : [0, 0, 0],
  ];
  const covariance = new Array<number>(9).fill(0);
  for (let row = 0; row < 3; row++)
    for (let column = 0; column < 3; column++)
      for (let j = 0; j < 3; j++)
        for (let k = 0; k < 3; k++)
          covariance[3 * row + column] += derivatives[j][row] * inverse[3 * j + k] * derivatives[k][column];
  return covariance;
}
