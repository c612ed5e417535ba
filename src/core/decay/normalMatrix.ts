import type { CentredLaw, Held, LawProblem } from "./lawProblem.ts";

/**
 * J'J and J'r of a law into the problem's `matrix` and `gradient`, rows in the order c, b, kappa,
 * from the derivatives its last evaluation left in the scratch. The row of what is not free is that of the unit
 * matrix with gradient zero, so that a step leaves it alone.
 * What is held ties the others: with n held b = n kappa, with A held c = ln A + (b/kappa) ln(kappa ell).
 */
export function normalMatrix(problem: LawProblem, law: CentredLaw, held: Held): void {
  const { byC, byB, byKappa, residual, count, matrix, gradient } = problem;
  const freeC = held.lnA === null;
  const freeB = held.n === null;
  const freeKappa = held.x0 === null;
  const { levelByB, levelByKappa, slopeByKappa } = ties(problem, law, held);
  let cc = 0;
  let cb = 0;
  let ck = 0;
  let bb = 0;
  let bk = 0;
  let kk = 0;
  let rc = 0;
  let rb = 0;
  let rk = 0;
  for (let i = 0; i < count; i++) {
    const r = residual[i];
    const k = freeKappa ? byKappa[i] + slopeByKappa * byB[i] + levelByKappa * byC[i] : 0;
    const s = freeB ? byB[i] + levelByB * byC[i] : 0;
    const c = freeC ? byC[i] : 0;
    cc += c * c;
    cb += c * s;
    ck += c * k;
    bb += s * s;
    bk += s * k;
    kk += k * k;
    rc += c * r;
    rb += s * r;
    rk += k * r;
  }
  matrix[0] = freeC ? cc : 1;
  matrix[4] = freeB ? bb : 1;
  matrix[8] = freeKappa ? kk : 1;
  matrix[1] = matrix[3] = cb;
  matrix[2] = matrix[6] = ck;
  matrix[5] = matrix[7] = bk;
  gradient[0] = rc;
  gradient[1] = rb;
  gradient[2] = rk;
}

/** How c and b move with what is left free where A or n is held. */
function ties({ length }: LawProblem, { b, kappa }: CentredLaw, { lnA, n }: Held) {
  const slopeByKappa = n ?? 0;
  if (lnA === null) return { levelByB: 0, levelByKappa: 0, slopeByKappa };
  const shift = Math.log(kappa * length);
  const levelByKappa = (b / kappa ** 2) * (n === null ? 1 - shift : 1);
  return { levelByB: shift / kappa, levelByKappa, slopeByKappa };
}
