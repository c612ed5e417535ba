import type { Flight } from "../decayResult.ts";
import { isEstimate, type Quantity } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";

/**
 * The time of flight of a stream as a length: turbulence decays in its own time, and
 *     s = x1 + Us integral from x1 to x of dx/U
 * is that time at one speed Us. U is straight between stations, so that between two of them
 *     s = si + Us ln(U/Ui)/U',   U' = (Uj - Ui)/(xj - xi)
 * and the U of the first station holds upstream of it, that of the last beyond it. Where U is constant and Us, s is x.
 * @param stations in order of x; those without a U above zero are passed over
 * @param speed    Us, m/s
 * @returns        null where no station carries a U
 * @see            Comte-Bellot & Corrsin (1966), J. Fluid Mech. 25, 657
 */
export function flightCourse(stations: readonly StationResult[], speed: number): Flight | null {
  const knots = stations.flatMap(({ x, U }) => (isEstimate(U) && U.value > 0 ? [{ x, U: U.value }] : []));
  const places = knots.filter(({ x }, i) => i === 0 || x > knots[i - 1].x);
  if (places.length === 0 || !(speed > 0)) return null;
  const [x, U] = [places.map((knot) => knot.x), places.map((knot) => knot.U)];
  const s = [x[0]];
  for (let i = 1; i < x.length; i++)
    s.push(s[i - 1] + flown((x[i] - x[i - 1]) / U[i - 1], U[i] / U[i - 1] - 1) * speed);
  return { x, U, s, speed };
}

/** The time over a stretch whose U ends `growth` higher, from what it would take at the U of its beginning. */
function flown(atFirst: number, growth: number): number {
  return growth === 0 ? atFirst : (atFirst * Math.log1p(growth)) / growth;
}

/** What a law runs along at x: s, or x itself without a course. */
export function placeAlong(flight: Flight | null, x: number): number {
  if (flight === null) return x;
  const { U, s, speed } = flight;
  const { at, distance, perLength } = stretchOf(flight, flight.x, x);
  return s[at] + speed * flown(distance / U[at], perLength * distance);
}

/** The x of a place along a law. */
export function placeBack(flight: Flight | null, s: number): number {
  if (flight === null) return s;
  const { x, U, speed } = flight;
  const { at, distance, perLength } = stretchOf(flight, flight.s, s);
  const asFirst = (distance * U[at]) / speed;
  return x[at] + (perLength === 0 ? asFirst : Math.expm1(perLength * asFirst) / perLength);
}

/** ds/dx = Us/U at x; 1 without a course. */
export function rateAlong(flight: Flight | null, x: number): number {
  if (flight === null) return 1;
  const { at, distance, perLength } = stretchOf(flight, flight.x, x);
  return flight.speed / (flight.U[at] * (1 + perLength * distance));
}

/** The knot a place counts from, how far it lies beyond it, and how much of its U the stream gains per length there. */
function stretchOf({ x, U }: Flight, knots: readonly number[], place: number) {
  const last = knots.length - 1;
  if (place <= knots[0]) return { at: 0, distance: place - knots[0], perLength: 0 };
  if (place >= knots[last]) return { at: last, distance: place - knots[last], perLength: 0 };
  let at = 0;
  while (knots[at + 1] <= place) at++;
  const perLength = (U[at + 1] / U[at] - 1) / (x[at + 1] - x[at]);
  return { at, distance: place - knots[at], perLength };
}

/** A place along a law with its interval, carried back to x. */
export function quantityBack(flight: Flight | null, place: Quantity): Quantity {
  if (flight === null || !isEstimate(place)) return place;
  const back = (end: number | null) => (end === null ? null : placeBack(flight, end));
  const { value, low, high, error } = place;
  const x = placeBack(flight, value);
  return {
    ...place,
    value: x,
    low: back(low),
    high: back(high),
    ...(error ? { error: { ...error, standard: error.standard / rateAlong(flight, x) } } : {}),
  };
}
