import { type BodyKey, bodyKeys } from "../decayArgument.ts";
import type { DecayResult, DecaySettings } from "../decayResult.ts";
import { bare, isEstimate, missing, type Quantity } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import { lawAt, lawChangeVariance, lawVariance } from "./lawBand.ts";
import { lawDistance } from "./lawDistance.ts";
import { type LogPlace, type LogSeries, logPlace, logSeries, sharesVariance } from "./logSeries.ts";
import { logEstimate } from "./powerProduct.ts";

/** A quantity as a curve along the stream: what it is at a place, and how it changes between two. */
export interface BodyCurve {
  /** ln value; null where nothing is known. */
  readonly logarithm: (x: number) => number | null;
  readonly at: (x: number) => Quantity;
  /** Value at `to` over that at `from`. */
  readonly change: (from: number, to: number) => Quantity;
}

const noErrors = "the stations beside it carry no interval";

/**
 * The quantities a body meets, between stations: on straight lines of ln value over ln(x - x0), and the intensity by the
 * fitted law inside its window.
 * @param stations derived, in order of x
 */
export function bodyCurves(
  stations: readonly StationResult[],
  decay: DecayResult,
  settings: DecaySettings,
): Readonly<Record<BodyKey, BodyCurve>> {
  const xs = stations.map(({ x }) => x);
  const along = coordinate(xs, decay);
  const curves = bodyKeys.map((key) => {
    const values = stations.map((station) => station[key]);
    const reason = values.find((value) => !isEstimate(value));
    return [key, interpolated(logSeries(xs, values, along), along, reason)] as const;
  });
  const all = Object.fromEntries(curves) as Record<BodyKey, BodyCurve>;
  return { ...all, Tu: byLaw(all.Tu, stations, decay, settings, along) };
}

/** ln(x - x0) where all stations lie beyond an origin, else ln x, else x. */
function coordinate(xs: readonly number[], { law }: DecayResult): (x: number) => number {
  if (law !== null && xs[0] > law.x0) return (x) => Math.log(lawDistance(law, x));
  return xs[0] > 0 ? Math.log : (x) => x;
}

function interpolated(
  series: LogSeries,
  along: (x: number) => number,
  reason: Quantity | undefined,
): BodyCurve {
  const place = (x: number) => logPlace(series, x, along(x));
  const none = (x: number) => missing(whyNot(series, x, reason));
  const quantity = (logarithm: number, shares: LogPlace["shares"]) => {
    const variance = sharesVariance(series, shares);
    return variance === null
      ? bare(Math.exp(logarithm), noErrors)
      : logEstimate(Math.exp(logarithm), Math.sqrt(variance), null);
  };
  return {
    logarithm: (x) => place(x)?.logarithm ?? null,
    at: (x) => {
      const found = place(x);
      return found === null ? none(x) : quantity(found.logarithm, found.shares);
    },
    change: (from, to) => {
      const [a, b] = [place(from), place(to)];
      if (a === null || b === null) return none(a === null ? from : to);
      const shares = [...b.shares, ...a.shares.map(({ at, share }) => ({ at, share: -share }))];
      return quantity(b.logarithm - a.logarithm, shares);
    },
  };
}

function whyNot({ x }: LogSeries, at: number, reason: Quantity | undefined): string {
  if (x.length === 0) return reason?.value === null ? reason.why : "no station carries it";
  return at < x[0]
    ? "the place lies before the first station that carries it"
    : "the place lies beyond the last station that carries it";
}

/** The intensity by the law inside its window: Tu = sqrt(2 k/3)/U, or sqrt(uu)/U. */
function byLaw(
  between: BodyCurve,
  stations: readonly StationResult[],
  { law, window, quantity, speed }: DecayResult,
  settings: DecaySettings,
  along: (x: number) => number,
): BodyCurve {
  if (law === null || quantity === "q" || speed === null) return between;
  const xs = stations.map(({ x }) => x);
  const U = logSeries(
    xs,
    stations.map((station) => station.U),
    along,
  );
  // the unit speed of a decay in time makes no intensity
  if (settings.referenceSpeed === null && U.x.length === 0) return between;
  const inside = (x: number) => x >= window[0] && x <= window[1];
  /** ln(Us/Uref) at a place; no station's U: 0. */
  const speedRatio = (x: number) => {
    if (settings.referenceSpeed !== null) return Math.log(speed / settings.referenceSpeed);
    return Math.log(speed) - (logPlace(U, x, along(x))?.logarithm ?? Math.log(speed));
  };
  const logarithm = (x: number) => {
    const q = inside(x) ? lawAt(law, x) : null;
    if (q === null) return between.logarithm(x);
    return Math.log((quantity === "k" ? 2 / 3 : 1) * q) / 2 + speedRatio(x);
  };
  const freedom = law.freedom ?? null;
  return {
    logarithm,
    at: (x) => {
      const value = inside(x) ? logarithm(x) : null;
      if (value === null) return between.at(x);
      return logEstimate(Math.exp(value), Math.sqrt(lawVariance(law, x, 0)) / 2, freedom);
    },
    change: (from, to) => {
      const [a, b] = [from, to].map((x) => (inside(x) ? logarithm(x) : null));
      if (a === null || b === null) return between.change(from, to);
      return logEstimate(Math.exp(b - a), Math.sqrt(lawChangeVariance(law, from, to)) / 2, freedom);
    },
  };
}
