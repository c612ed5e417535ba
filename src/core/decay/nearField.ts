import { studentTail } from "../signal/distributions/studentTail.ts";
import type { CommonBlocks } from "./commonBlocks.ts";
import { evaluateLaw } from "./evaluateLaw.ts";
import type { WindowFit } from "./fitWindow.ts";

/** What speaks for a near field that is not yet gone where a window begins. */
export interface NearField {
  /** Departure of q at the first station from the law, as far as a dying term tells it: a share of q. */
  readonly excess: number;
  /** The same in its own standard errors. */
  readonly size: number;
  /** Probability of one at least as large on a pure law, the best of all decay lengths taken. */
  readonly p: number;
}

/** Decay lengths that are tried, in distances of the first station from the origin. */
const lengths = [0.5, 1, 2];

/**
 * Whether the stations of a window ask for a term that dies out along it,
 *     ln q = ln A - n ln(x - x0) + B exp(-(x - x1)/L),   L = 1/2, 1 and 2 times x1 - x0
 * as the departure from a near field does: the score of B at B = 0, with A, n and x0 free, over its standard error. Where
 * the scatter tells the errors it is taken over what is left of it with the term, and where stations were sampled
 * together over what their common blocks make of the score. A drift of n along the starts of a window is the same seen
 * from the other side.
 * @param window a law, in log or linear residuals
 * @param blocks of its stations; null: each station for itself
 * @returns      the length with the largest score, its p times the number of lengths (Bonferroni); null where n or x0 is
 *               held, since a term would then show that it is held elsewhere, and where the stations do not tell such a
 *               term from A, n and x0
 * @see          Rao (1948), Proc. Camb. Phil. Soc. 44, 50
 */
export function nearField(window: WindowFit, blocks: CommonBlocks | null = null): NearField | null {
  const { fit } = window;
  const { problem, law, held } = fit;
  if (fit.freedom < 2 || held.n !== null || held.x0 !== null) return null;
  evaluateLaw(problem, law, held);
  const basis = orthonormal([problem.byC, problem.byB, problem.byKappa]);
  const reach = problem.first - fit.x0;
  const found = lengths.flatMap((share) => {
    const term = problem.d.map(
      (d, i) => problem.byC[i] * Math.exp(-(d - (problem.first - problem.centre)) / (share * reach)),
    );
    const rest = without(without(term, basis), basis);
    const norm = Math.sqrt(dot(rest, rest));
    // what A, n and x0 can make of the term leaves nothing to see it by
    if (!(norm > 1e-6 * Math.sqrt(dot(term, term)))) return [];
    const direction = rest.map((value) => value / norm);
    return [{ score: dot(direction, problem.residual), norm, direction }];
  });
  const judged = found.map(({ score, norm, direction }) => {
    const { standard, freedom } = errorOf(score, direction, window, blocks);
    const size = standard > 0 ? score / standard : 0;
    return {
      excess: score / norm,
      size,
      p: Math.min(1, lengths.length * studentTail(Math.abs(size), freedom)),
    };
  });
  if (judged.length === 0) return null;
  return judged.reduce((best, one) => (Math.abs(one.size) > Math.abs(best.size) ? one : best));
}

/** Standard error of the score along a direction, and its freedom. */
function errorOf(
  score: number,
  direction: Float64Array,
  { fit, scattered }: WindowFit,
  blocks: CommonBlocks | null,
): { standard: number; freedom: number | null } {
  const { problem, residualSum, freedom } = fit;
  const own = scattered
    ? { standard: Math.sqrt(Math.max(residualSum - score * score, 0) / (freedom - 1)), freedom: freedom - 1 }
    : { standard: 1, freedom: null };
  if (blocks === null) return own;
  const scores = blocks.moves.map((moves) =>
    direction.reduce((sum, value, i) => sum + value * problem.byC[i] * moves[i], 0),
  );
  const mean = scores.reduce((sum, value) => sum + value / scores.length, 0);
  const square = scores.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  const together = Math.sqrt(((blocks.groups - 1) / blocks.groups) * square);
  return scattered && own.standard > together ? own : { standard: together, freedom: blocks.groups - 1 };
}

function orthonormal(columns: readonly Float64Array[]): Float64Array[] {
  const basis: Float64Array[] = [];
  for (const column of columns) {
    const rest = without(without(column, basis), basis);
    const norm = Math.sqrt(dot(rest, rest));
    basis.push(rest.map((value) => value / norm));
  }
  return basis;
}

/** A column without its part along a basis; twice over, it is orthogonal to the last digit. */
function without(column: Float64Array, basis: readonly Float64Array[]): Float64Array {
  const rest = column.slice();
  for (const one of basis) {
    const share = dot(rest, one);
    for (let i = 0; i < rest.length; i++) rest[i] -= share * one[i];
  }
  return rest;
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i] * b[i];
  return sum;
}
