import { isEstimate, type Quantity } from "../quantity.ts";
import { relativeError } from "./relativeError.ts";

/** A positive quantity along the stations as ln value over a rising coordinate. */
export interface LogSeries {
  readonly x: readonly number[];
  readonly s: readonly number[];
  readonly logarithm: readonly number[];
  /** Standard error of each logarithm; null: not all carry one. */
  readonly error: readonly number[] | null;
}

/** ln value at a place as a sum over stations: what its error is propagated through. */
export interface LogPlace {
  readonly logarithm: number;
  /** Share of each of the two stations beside it. */
  readonly shares: readonly { readonly at: number; readonly share: number }[];
}

/**
 * @param xs     stations in order of x
 * @param values one for each; missing ones and those not above zero are passed over
 * @param along  the coordinate interpolation is linear in: ln(x - x0), ln x or x
 */
export function logSeries(
  xs: readonly number[],
  values: readonly Quantity[],
  along: (x: number) => number,
): LogSeries {
  const known = values.flatMap((value, i) =>
    isEstimate(value) && value.value > 0 && Number.isFinite(along(xs[i]))
      ? [{ x: xs[i], logarithm: Math.log(value.value), error: relativeError(value) }]
      : [],
  );
  const errors = known.map(({ error }) => error).filter((error) => error !== null);
  return {
    x: known.map(({ x }) => x),
    s: known.map(({ x }) => along(x)),
    logarithm: known.map(({ logarithm }) => logarithm),
    error: errors.length === known.length ? errors : null,
  };
}

/** ln value at x on the straight line between the stations beside it; null outside the stations that carry it. */
export function logPlace({ x, s, logarithm }: LogSeries, at: number, along: number): LogPlace | null {
  const last = x.length - 1;
  if (last < 0 || at < x[0] || at > x[last]) return null;
  const right = Math.min(
    Math.max(
      x.findIndex((place) => place >= at),
      1,
    ),
    last,
  );
  if (last === 0) return { logarithm: logarithm[0], shares: [{ at: 0, share: 1 }] };
  const share = (along - s[right - 1]) / (s[right] - s[right - 1]);
  return {
    logarithm: (1 - share) * logarithm[right - 1] + share * logarithm[right],
    shares: [
      { at: right - 1, share: 1 - share },
      { at: right, share },
    ],
  };
}

/** Variance of sum of shares times ln value; null where the stations carry no errors. */
export function sharesVariance({ error }: LogSeries, shares: LogPlace["shares"]): number | null {
  if (error === null) return null;
  const total = new Map<number, number>();
  for (const { at, share } of shares) total.set(at, (total.get(at) ?? 0) + share);
  return [...total].reduce((sum, [at, share]) => sum + (share * error[at]) ** 2, 0);
}
