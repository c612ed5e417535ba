import type { CentredLaw, Held, LawProblem } from "./lawProblem.ts";

/** J'J and J'r of the free numbers, in the order c, b, kappa; `free` says which those are. */
export interface NormalMatrix {
  readonly free: readonly ("c" | "b" | "kappa")[];
  /** Row-major, free.length squared. */
  readonly matrix: number[];
  readonly gradient: number[];
}

/**
 * The normal equations of a law from the derivatives its last evaluation left in the scratch.
 * What is held ties the others: with n held b = n kappa, with A held c = ln A + (b/kappa) ln(kappa ell).
 */
export function normalMatrix(problem: LawProblem, law: CentredLaw, held: Held): NormalMatrix {
  const { byC, byB, byKappa, residual, count } = problem;
  const { b, kappa } = law;
  const freeC = held.lnA === null;
  const freeB = held.n === null;
  const freeKappa = held.x0 === null;
  const shift = Math.log(kappa * problem.length);
  const levelByB = freeC ? 0 : shift / kappa;
  const levelByKappa = freeC ? 0 : freeB ? (b / kappa ** 2) * (1 - shift) : b / kappa ** 2;
  const slopeByKappa = held.n ?? 0;
  const free = [...(freeC ? ["c"] : []), ...(freeB ? ["b"] : []), ...(freeKappa ? ["kappa"] : [])];
  const size = free.length;
  const matrix = new Array<number>(size * size).fill(0);
  const gradient = new Array<number>(size).fill(0);
  const row = new Array<number>(size).fill(0);
  for (let i = 0; i < count; i++) {
    let at = 0;
    if (freeC) row[at++] = byC[i];
    if (freeB) row[at++] = byB[i] + levelByB * byC[i];
    if (freeKappa) row[at++] = byKappa[i] + slopeByKappa * byB[i] + levelByKappa * byC[i];
    for (let j = 0; j < size; j++) {
      gradient[j] += row[j] * residual[i];
      for (let k = 0; k <= j; k++) matrix[j * size + k] += row[j] * row[k];
    }
  }
  for (let j = 0; j < size; j++) for (let k = 0; k < j; k++) matrix[k * size + j] = matrix[j * size + k];
  return { free: free as NormalMatrix["free"], matrix, gradient };
}
