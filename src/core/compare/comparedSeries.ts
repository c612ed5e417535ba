import type { CaseInput, ComparedQuantity } from "../comparison.ts";
import { adoptsDecay } from "../decay/deriveStations.ts";
import { relativeError } from "../decay/relativeError.ts";
import { straightLine } from "../decay/straightLine.ts";
import { isEstimate } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";

/** One quantity of one case along its stations, ready to be compared and resampled. */
export interface ComparedSeries {
  readonly x: readonly number[];
  /** ln of the value. */
  readonly logarithm: readonly number[];
  /** Its own standard error; null where nothing tells one. */
  readonly error: readonly number[] | null;
  /** Index of the station among the fitted points; -1 where it was not fitted. */
  readonly point: readonly number[];
  /** Powers of what it is made of where it follows the fitted quantity or the dissipation of the law. */
  readonly byQ: number;
  readonly byEpsilon: number;
}

/** Powers of uu and epsilon in the scales that an adopted decay fixes. */
const decayPowers: Partial<Record<ComparedQuantity, { byQ: number; byEpsilon: number }>> = {
  lambda: { byQ: 1 / 2, byEpsilon: -1 / 2 },
  eta: { byQ: 0, byEpsilon: -1 / 4 },
  Re_lambda: { byQ: 1, byEpsilon: -1 / 2 },
};

/**
 * A quantity of a case at the stations compared.
 * Tu moves with the fitted energy, Tu ~ q^(1/2); what an adopted decay fixes moves with the law; all else by its own
 * sampling error, or where stations carry none, by its scatter about a straight line in logarithms.
 * @param stations those compared, in order of x
 * @returns        the series; the reason where fewer than two stations carry the quantity
 */
export function comparedSeries(
  input: CaseInput,
  stations: readonly StationResult[],
  quantity: ComparedQuantity,
): ComparedSeries | string {
  const known = stations.flatMap((station) => {
    const value = station[quantity];
    return isEstimate(value) && value.value > 0 ? [{ station, value }] : [];
  });
  if (known.length < 2) {
    const absent = stations.map((station) => station[quantity]).find((value) => !isEstimate(value));
    const why = absent && !isEstimate(absent) ? absent.why : "fewer than two stations carry it";
    return `${input.name}: ${why}`;
  }
  const x = known.map(({ station }) => station.x);
  const logarithm = known.map(({ value }) => Math.log(value.value));
  const errors = known.map(({ value }) => relativeError(value)).filter((error) => error !== null);
  const fitted = input.decay.points.filter((point) => point.used).map((point) => point.x);
  const point = x.map((at) => fitted.indexOf(at));
  return {
    x,
    logarithm,
    error: errors.length === x.length ? errors : scatter(x, logarithm),
    point,
    ...follows(input, known[0].station, quantity, point),
  };
}

function follows(
  { decay, decaySettings }: CaseInput,
  station: StationResult,
  quantity: ComparedQuantity,
  point: readonly number[],
): { byQ: number; byEpsilon: number } {
  const none = { byQ: 0, byEpsilon: 0 };
  if (point.some((index) => index < 0)) return none;
  if (quantity === "Tu" && decay.quantity !== "q") return { byQ: 1 / 2, byEpsilon: 0 };
  const powers = decayPowers[quantity];
  const taken = station.epsilon.value !== null && station.epsilon.value === station.epsilon_decay.value;
  return powers && (taken || adoptsDecay(station, decaySettings)) ? powers : none;
}

/** One error for all stations: the scatter about a line in ln x; null with fewer than four. */
function scatter(x: readonly number[], logarithm: readonly number[]): number[] | null {
  if (x.length < 4) return null;
  const along = x.every((at) => at > 0) ? x.map(Math.log) : x;
  const line = straightLine(along, logarithm, null);
  return line === null ? null : x.map(() => Math.sqrt(line.sum / line.freedom));
}
