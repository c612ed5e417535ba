import type { Bootstrap } from "../decayArgument.ts";
import { estimate, type Quantity } from "../quantity.ts";
import { seededRandom } from "../signal/seededRandom.ts";
import type { CommonBlocks } from "./commonBlocks.ts";
import { drawStations } from "./drawStations.ts";
import { evaluateLaw } from "./evaluateLaw.ts";
import type { WindowFit } from "./fitWindow.ts";
import { placeBack, quantityBack } from "./flightCourse.ts";
import { minimiseLaw } from "./minimiseLaw.ts";

export const bootstrapDefaults = { refits: 1000 };

/** The first draws, enough to see their shape. */
const cloudPoints = 400;

/** A refit is followed to this share of a standard error. */
const refitTolerance = 1e-3;

/**
 * Percentiles of n and x0 over refits of stations drawn anew: about the fitted law, each with its own sampling error,
 * or with the scatter where that is what tells the errors; stations sampled together all at once, by their common blocks.
 * Shown beside the profile, not adopted.
 * The seed follows from the places of the stations.
 * @param window a law
 * @param blocks of its stations; null: each station for itself
 * @returns      2.5 and 97.5 % points; a side is open where more than 2.5 % of the draws fall like an exponential
 * @see          Efron & Tibshirani (1993), An Introduction to the Bootstrap, ch. 13
 */
export function bootstrapLaw(
  { fit, variance, flight }: WindowFit,
  blocks: CommonBlocks | null = null,
  { refits } = bootstrapDefaults,
): Bootstrap {
  const { problem, law, held } = fit;
  evaluateLaw(problem, law, held);
  const measured = problem.y.slice();
  const fitted = measured.map((value, i) => value - problem.residual[i] / problem.w[i]);
  const root = Math.sqrt(variance);
  const error = problem.w.map((weight) => root / weight);
  const random = seededRandom(seedOf(problem.d));
  const [n, x0]: [number[], number[]] = [[], []];
  let withoutLaw = 0;
  const moves = new Float64Array(problem.count);
  for (let draw = 0; draw < refits; draw++) {
    drawStations(blocks, error, random, moves);
    const scaled = blocks !== null && problem.linear;
    for (let i = 0; i < problem.count; i++)
      problem.y[i] = scaled ? fitted[i] * Math.exp(moves[i]) : fitted[i] + moves[i];
    const found = minimiseLaw(problem, law, held, refitTolerance);
    if (found.exponential || !found.converged) {
      withoutLaw++;
      continue;
    }
    n.push(found.law.b / found.law.kappa);
    x0.push(held.x0 ?? problem.centre - 1 / found.law.kappa);
  }
  problem.y.set(measured);
  evaluateLaw(problem, law, held);
  const shown = {
    n: n.slice(0, cloudPoints),
    x0: x0.slice(0, cloudPoints).map((place) => placeBack(flight, place)),
  };
  // draws without a law stand for an origin without end upstream and an n without end
  return {
    refits,
    withoutLaw,
    n: percentiles(fit.n, n, 0, withoutLaw),
    x0: quantityBack(flight, percentiles(fit.x0, x0, withoutLaw, 0)),
    cloud: shown,
  };
}

function percentiles(value: number, draws: readonly number[], below: number, above: number): Quantity {
  const sorted = [
    ...new Array<number>(below).fill(Number.NEGATIVE_INFINITY),
    ...[...draws].sort((a, b) => a - b),
    ...new Array<number>(above).fill(Number.POSITIVE_INFINITY),
  ];
  const at = (share: number) => sorted[Math.round(share * (sorted.length - 1))];
  return estimate(value, at(0.025), at(0.975));
}

function seedOf(places: Float64Array): number {
  return places.reduce((hash, place) => Math.imul(hash, 31) ^ Math.round(1e6 * place), 17) >>> 0;
}
