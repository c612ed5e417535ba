import type { DecaySettings, Flight } from "../decayResult.ts";
import { bare, type Quantity } from "../quantity.ts";
import { chiSquareTail } from "../signal/distributions/chiSquareTail.ts";
import { fitPowerLaw, type PowerLawFit } from "./fitPowerLaw.ts";
import { placeAlong, quantityBack } from "./flightCourse.ts";
import type { JackknifedLaw } from "./jackknifeLaw.ts";
import { profileInterval } from "./profileInterval.ts";
import { studentReach } from "./studentReach.ts";

/** A law fitted to the stations of one window, with all that is said given that window. */
export interface WindowFit {
  /** Its x0 is a place along what the law runs along. */
  readonly fit: PowerLawFit;
  /** The course the law runs along; null: x. */
  readonly flight: Flight | null;
  /** Probability of a larger chi-square; null with equal weights. */
  readonly p: number | null;
  /** Whether the errors are told by the residuals: equal weights, or a chi-square that fails at 5 %. */
  readonly scattered: boolean;
  /** Variance of one weighted residual: 1 where errors are known. */
  readonly variance: number;
  /** Rise of the sum of squares at the ends of a 95 % interval. */
  readonly drop: number;
  /** 97.5 % point that belongs to the covariance. */
  readonly quantile: number;
  /** Where the stations were sampled together: what their common blocks tell. */
  readonly together?: JackknifedLaw;
}

/** One station as a fit sees it. */
export interface FitPoint {
  readonly x: number;
  readonly q: number;
  /** Standard error of ln q; null in all of them: equal weights. */
  readonly smoothedError: number | null;
}

/** Why no law could be fitted. */
export interface Refusal {
  readonly refused: string;
}

const numerals = ["no station", "one station", "two stations", "three stations", "four stations"];

/**
 * The law of one window, or why there is none.
 * @param points   stations of the window, in order of x
 * @param settings residuals, what is held, ell
 * @param flight   the course the law runs along; null: x
 */
export function fitWindow(
  points: readonly FitPoint[],
  settings: DecaySettings,
  flight: Flight | null = null,
): WindowFit | Refusal {
  const tooFew = refusalOfCount(points, settings);
  if (tooFew !== null) return { refused: tooFew };
  const errors = points.map((point) => point.smoothedError).filter((error) => error !== null);
  const fit = fitPowerLaw(
    {
      x: points.map((point) => placeAlong(flight, point.x)),
      q: points.map((point) => point.q),
      error: errors.length === points.length ? errors : null,
    },
    {
      residuals: settings.residuals,
      x0: settings.x0 === null ? null : placeAlong(flight, settings.x0),
      n: settings.n,
      length: settings.referenceLength ?? 1,
    },
  );
  if (fit.exponential)
    return {
      refused: "the stations in the window fall like an exponential: no finite virtual origin fits best",
    };
  if (!fit.converged || !isSound(fit))
    return { refused: "the stations in the window do not tell A, n and x0 apart" };
  if (!(fit.n > 0)) return { refused: "the quantity does not fall along the window" };
  const p = fit.errorsKnown ? chiSquareTail(fit.residualSum, fit.freedom) : null;
  const scattered = p === null || p < 0.05;
  const variance = scattered ? fit.residualSum / fit.freedom : 1;
  const quantile = studentReach(scattered ? fit.freedom : null);
  return {
    fit,
    flight,
    p,
    scattered,
    variance,
    drop: variance * quantile ** 2,
    quantile,
  };
}

/** Whether A, n, x0 and their covariance can all be written down. */
function isSound({ A, n, x0, residualSum, unitCovariance }: PowerLawFit): boolean {
  return (
    A > 0 && unitCovariance !== null && [A, n, x0, residualSum, ...unitCovariance].every(Number.isFinite)
  );
}

/** The words of a refusal for too few stations; null where there are enough. */
function refusalOfCount(points: readonly FitPoint[], { x0, n }: DecaySettings): string | null {
  const needed = 4 - (x0 === null ? 0 : 1) - (n === null ? 0 : 1);
  const places = new Set(points.map((point) => point.x)).size;
  if (places >= needed) return null;
  const lie = places === 1 ? "lies" : "lie";
  const law =
    x0 === null && n === null
      ? "a law with a free virtual origin needs four"
      : x0 === null
        ? "a law with its exponent held needs three"
        : n === null
          ? "a law with its virtual origin held needs three"
          : "a law with origin and exponent held needs two";
  return `${numerals[places]} ${lie} in the window, and ${law}`;
}

/** Places of A (as ln A), x0 and n on the diagonal of a covariance. */
const diagonal = { A: 0, x0: 4, n: 8 } as const;

/**
 * By how much the variance of one number exceeds what the fit itself makes of it, and the freedom behind that: 1 but
 * where stations were sampled together and common blocks tell more. A misfit shows in the scatter alone, so that the
 * larger of both counts where chi-square fails.
 */
export function inflation(
  { fit, variance, scattered, together }: WindowFit,
  key: keyof typeof diagonal,
): { ratio: number; freedom: number | null } {
  const own = (fit.unitCovariance?.[diagonal[key]] ?? 0) * variance;
  const plain = { ratio: 1, freedom: scattered ? fit.freedom : null };
  if (together === undefined || !(own > 0)) return plain;
  const ratio = together.covariance[diagonal[key]] / own;
  return scattered && ratio < 1 ? plain : { ratio, freedom: together.freedom };
}

/**
 * One number of the law with its profile interval given the window; where stations were sampled together the drop is
 * t² times the ratio of the jackknife's variance to that of the fit.
 * @returns n (1), x0 (as a place in x, whatever the law runs along) or A (unit of q); without an interval where it was held
 */
export function windowQuantity(window: WindowFit, key: "n" | "x0" | "A"): Quantity {
  const { fit, variance, flight } = window;
  const value = fit[key];
  const asPlace = (quantity: Quantity) => (key === "x0" ? quantityBack(flight, quantity) : quantity);
  if (key !== "A" && fit.held[key] !== null) return asPlace(bare(value, "held, not fitted"));
  const { ratio, freedom } = inflation(window, key);
  const drop = window.together === undefined ? window.drop : studentReach(freedom) ** 2 * ratio * variance;
  const ends = profileInterval(fit, key, drop);
  const standard = Math.sqrt((fit.unitCovariance?.[diagonal[key]] ?? 0) * variance * ratio);
  const scale: "log" | "linear" = key === "A" ? "log" : "linear";
  return asPlace({ value, ...ends, error: { standard, freedom, scale } });
}
