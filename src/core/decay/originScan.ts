import type { OriginScan } from "../decayArgument.ts";
import type { Flight } from "../decayResult.ts";
import { placeAlong, placeBack } from "./flightCourse.ts";
import { straightLine } from "./straightLine.ts";

/** Origins tried, and how far upstream of the first station in spans of all. */
const origins = { count: 200, reach: 2 };

/**
 * The classical scan: for each x0 the best line of ln q in ln(x - x0), all stations alike, and the scatter about it.
 * Places are closer together near the first station, where the scatter changes fastest.
 * @param places x of the stations, rising, four or more
 * @param q > 0
 * @param flight the course the law runs along; null: x
 * @returns rms of the residuals of ln q; null with stations at one x
 * @see     Comte-Bellot & Corrsin (1966), J. Fluid Mech. 25, 657
 */
export function originScan(
  places: readonly number[],
  q: readonly number[],
  flight: Flight | null = null,
): OriginScan | null {
  const x = places.map((place) => placeAlong(flight, place));
  const span = x[x.length - 1] - x[0];
  if (!(span > 0)) return null;
  const y = q.map(Math.log);
  const x0: number[] = [];
  const rms: number[] = [];
  for (let i = 0; i < origins.count; i++) {
    const share = 1 - i / origins.count;
    const at = x[0] - span * origins.reach * share ** 2;
    const line = straightLine(
      x.map((place) => Math.log(place - at)),
      y,
      null,
    );
    if (line === null) continue;
    x0.push(placeBack(flight, at));
    rms.push(Math.sqrt(line.sum / x.length));
  }
  return { x0, rms };
}
