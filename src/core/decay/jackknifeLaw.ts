import { jackknife } from "../signal/jackknife.ts";
import type { CommonBlocks } from "./commonBlocks.ts";
import { evaluateLaw } from "./evaluateLaw.ts";
import type { WindowFit } from "./fitWindow.ts";
import type { CentredLaw, LawProblem } from "./lawProblem.ts";
import { minimiseLaw } from "./minimiseLaw.ts";

/** Covariance of a law's numbers told by leaving stretches of time out of all stations at once. */
export interface JackknifedLaw {
  /** Of (ln A, x0, n), row-major 3 × 3. */
  readonly covariance: readonly number[];
  /** Groups less one; of records that repeat themselves, groups in one period less one. */
  readonly freedom: number;
}

/** A refit is followed to this share of a standard error. */
const refitTolerance = 1e-4;

/**
 * The law refitted without each group of common blocks in turn, at the weights of the whole: stations sampled together
 * share the same eddies, so that neither their errors nor their scatter about the law tell how well it is known.
 * @param fitted a law whose stations are those of the blocks, in the same order
 * @param from   index of its first station among those of the blocks
 * @returns      null where a refit has no law
 * @see          Busing, Meijer & van der Leeden (1999), Stat. Comput. 9, 3
 */
export function jackknifeLaw({ fit }: WindowFit, blocks: CommonBlocks, from: number): JackknifedLaw | null {
  const { problem, held } = fit;
  const measured = problem.y.slice();
  const replicates = [0, 1, 2].map(() => new Float64Array(blocks.groups));
  let sound = true;
  blocks.moves.forEach((moves, group) => {
    for (let i = 0; i < problem.count; i++) {
      const move = moves[from + i];
      problem.y[i] = problem.linear ? measured[i] * Math.exp(move) : measured[i] + move;
    }
    const { law, converged } = minimiseLaw(problem, fit.law, held, refitTolerance);
    sound &&= converged;
    numbersOf(problem, law).forEach((value, at) => {
      replicates[at][group] = value;
    });
  });
  // the problem is the fit's own: it is left as it was found
  problem.y.set(measured);
  evaluateLaw(problem, fit.law, held);
  if (!sound) return null;
  const whole = numbersOf(problem, fit.law);
  const covariance = new Array<number>(9).fill(0);
  for (let a = 0; a < 3; a++)
    for (let b = 0; b <= a; b++) {
      const sum = varianceOf(whole, replicates, blocks.weights, a, b, 1);
      const difference = varianceOf(whole, replicates, blocks.weights, a, b, -1);
      if (sum === null || difference === null) return null;
      covariance[3 * a + b] = covariance[3 * b + a] = (sum - difference) / 4;
    }
  // of a record that repeats itself the error is that of one period, as for a station's own
  const { groups, repeats = 1 } = blocks;
  const factor = repeats > 1 ? repeats / (1 - repeats / groups) : 1;
  return {
    covariance: covariance.map((value) => factor * value),
    freedom: Math.max(1, groups / repeats - 1),
  };
}

/** ln A, x0, n. */
function numbersOf({ centre, length }: LawProblem, { c, b, kappa }: CentredLaw): number[] {
  const n = b / kappa;
  return [c - n * Math.log(kappa * length), centre - 1 / kappa, n];
}

/** Jackknife variance of a + sign b: the covariance follows from both signs. */
function varianceOf(
  whole: readonly number[],
  replicates: readonly Float64Array[],
  weights: Float64Array,
  a: number,
  b: number,
  sign: 1 | -1,
): number | null {
  const joined = replicates[a].map((value, j) => value + sign * replicates[b][j]);
  const error = jackknife(whole[a] + sign * whole[b], joined, weights);
  return error === null ? null : error.standard ** 2;
}
