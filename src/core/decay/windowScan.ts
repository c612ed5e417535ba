import type { ScannedWindow, WindowScan } from "../decayArgument.ts";
import type { DecayPoint, DecayResult, DecaySettings } from "../decayResult.ts";
import { missing } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import { commonBlocks } from "./commonBlocks.ts";
import { criterion } from "./criterion.ts";
import { endConditions } from "./endConditions.ts";
import { fitWindow, type Refusal, type WindowFit, windowQuantity } from "./fitWindow.ts";
import { laterStarts } from "./laterWindows.ts";
import { lawDistance } from "./lawDistance.ts";
import { startConditions } from "./startConditions.ts";
import { withCommonBlocks } from "./withCommonBlocks.ts";

/**
 * n and x0 with their intervals against the first and against the last station used, all other things as adopted;
 * beside it from where to where physics allows a law.
 * @param stations derived, in order of x
 * @param decay    of the same stations
 * @param settings what is held, residuals; extent: lateral size of the domain
 * @see            Mohamed & LaRue (1990), J. Fluid Mech. 219, 195
 */
export function windowScan(
  stations: readonly StationResult[],
  decay: DecayResult,
  settings: DecaySettings,
): WindowScan {
  const points = decay.points.filter(({ x }) => settings.x0 === null || x > settings.x0);
  const xs = stations.map(({ x }) => x);
  const first = points.findIndex((point) => point.used);
  const last = first + points.filter((point) => point.used).length - 1;
  const places = new Set(points.map(({ x }) => x));
  const fitted = stations.filter(({ x }) => places.has(x));
  // a second station at one x, without the quantity, would put the blocks out of step with the points
  const blocks = fitted.length === points.length ? commonBlocks(fitted, decay, settings) : null;
  const united = unitedStarts(points.slice(first, last + 1), decay).map((after) => first + after);
  const scanned = (from: number, to: number, varying: number): ScannedWindow => {
    const inUnion = to === last && united.includes(from);
    const at = { x: points[varying].x, stations: to - from + 1, inUnion };
    if (from === first && to === last) return { ...at, ...decay.given_window, p: decay.p, adopted: true };
    const window = fitWindow(points.slice(from, to + 1), settings, decay.flight);
    return { ...at, ...numbersOf(withCommonBlocks(window, blocks, from)), adopted: false };
  };
  const none = first < 0;
  return {
    first: none ? [] : points.slice(0, last + 1).map((_, from) => scanned(from, last, from)),
    last: none ? [] : points.slice(first).map((_, i) => scanned(first, first + i, first + i)),
    start: startConditions(stations).map((condition) => criterion(xs, condition)),
    end: endConditions(stations, settings.extent ?? null).map((end) => criterion(xs, end, "end")),
  };
}

/** Starts whose intervals an automatic window's n and x0 unite, by their order in the window; none of a given one. */
function unitedStarts(window: readonly DecayPoint[], { law, windowChosen }: DecayResult): number[] {
  if (law === null || windowChosen !== "auto" || window.length === 0) return [];
  return laterStarts(
    window.map(({ x }) => lawDistance(law, x)),
    0,
  );
}

function numbersOf(fitted: WindowFit | Refusal): Pick<ScannedWindow, "n" | "x0" | "p"> {
  if ("refused" in fitted) {
    const none = missing(fitted.refused);
    return { n: none, x0: none, p: null };
  }
  return { n: windowQuantity(fitted, "n"), x0: windowQuantity(fitted, "x0"), p: fitted.p };
}
