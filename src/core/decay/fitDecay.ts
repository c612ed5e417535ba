import type { DecayPoint, DecayResult, DecaySettings, PowerLaw } from "../decayResult.ts";
import { missing, scaled } from "../quantity.ts";
import type { StationResult } from "../stationResult.ts";
import { commonBlocks } from "./commonBlocks.ts";
import { decayFlags } from "./decayFlags.ts";
import { type DecayPoints, decayPoints, decaySpeed, type RawPoint } from "./decayPoints.ts";
import { decayWindow } from "./decayWindow.ts";
import { epsilonRoute } from "./epsilonRoute.ts";
import { inflation, type Refusal, type WindowFit, windowQuantity } from "./fitWindow.ts";
import { placeBack, rateAlong } from "./flightCourse.ts";
import { growthExponent } from "./growthExponent.ts";
import { hypotheses } from "./hypotheses.ts";
import { lambdaRoute } from "./lambdaRoute.ts";
import { laterWindows } from "./laterWindows.ts";
import { nearFieldSigns } from "./nearFieldSigns.ts";
import { studentReach } from "./studentReach.ts";
import { unionOfWindows } from "./unionOfWindows.ts";
import { unlikeProbes } from "./unlikeProbes.ts";
import { withCommonBlocks } from "./withCommonBlocks.ts";

/**
 * The decay of one case: its window, the law q = A ((x - x0)/ell)^(-n) fitted there with the intervals of n, x0
 * and A, and beside it the routes that do not use the law.
 * @param stations reduced stations in any order
 * @param settings window, what is held, residuals, weights, ell, reference speed
 * @returns        n (1), x0 (unit of x), A (1 for k and uu, the unit of q for q); all missing, with the reason and the
 *                 flag "law-refused", where the window holds no law
 * @see            Comte-Bellot & Corrsin (1966), J. Fluid Mech. 25, 657; Mohamed & LaRue (1990), J. Fluid Mech. 219, 195
 */
export function fitDecay(stations: readonly StationResult[], settings: DecaySettings): DecayResult {
  const found = decayPoints(stations, settings);
  // no law reaches upstream of a held origin
  const points = found.points.filter(({ x }) => settings.x0 === null || x > settings.x0);
  const { window, flight } = decayWindow(points, settings);
  const used = points.slice(window.first, window.last + 1);
  const usedStations = used.map(({ station }) => station);
  const speed = decaySpeed(usedStations, found.quantity, settings);
  const perSpeed = 1 / (speed ?? 1) ** 2;
  const blocks = commonBlocks(usedStations, found, settings);
  const candidates = settings.window === "auto" ? laterWindows(points, window, settings) : [window.fitted];
  const windows = candidates.map((fitted, from) => withCommonBlocks(fitted, blocks, from));
  const [fitted] = windows;
  const law = "refused" in fitted ? null : powerLaw(fitted, perSpeed);
  const result: DecayResult = {
    quantity: found.quantity,
    assumption: found.assumption,
    residuals: settings.residuals,
    weights: found.weights,
    window: windowEnds(used, settings),
    windowChosen: settings.window === "auto" ? "auto" : "given",
    windowReason: window.reason,
    stations: used.length,
    speed,
    coordinate: settings.along === "t" ? "t" : flight === null ? "x" : "flight",
    flight,
    ...numbers(windows, perSpeed),
    together: blocks === null ? null : { groups: blocks.groups, correlation: blocks.correlation },
    lambda_route: lambdaRoute(usedStations, settings, flight),
    epsilon_route: epsilonRoute(usedStations, settings, flight),
    growth: { m: growth(usedStations, law) },
    hypotheses: hypotheses(windows, settings),
    law,
    near_field: law === null || "refused" in fitted ? null : nearFieldSigns(fitted, blocks, points, window),
    points: found.points.map((point) => decayPoint(point, perSpeed, used.includes(point))),
    flags: [],
  };
  const flags = decayFlags(result, window, usedStations, settings);
  return { ...result, flags: [...flags, ...unlikeProbes(stations, found)] };
}

function windowEnds(used: readonly RawPoint[], { window }: DecaySettings): readonly [number, number] {
  if (used.length > 0) return [used[0].x, used[used.length - 1].x];
  return window === "auto" ? [0, 0] : window;
}

/** Everything that follows from the law, or the reason why there is none. */
function numbers(windows: readonly (WindowFit | Refusal)[], perSpeed: number) {
  const [fitted] = windows;
  if ("refused" in fitted) {
    const none = missing(fitted.refused);
    const given_window = { n: none, x0: none };
    const nulls = { correlation_n_x0: null, chi2_reduced: null, p: null };
    return { n: none, x0: none, A: none, given_window, ...nulls, iterations: 0, converged: false };
  }
  const { fit, p } = fitted;
  const given_window = { n: windowQuantity(fitted, "n"), x0: windowQuantity(fitted, "x0") };
  const alone = windows.length === 1;
  return {
    n: alone ? given_window.n : unionOfWindows(windows, "n"),
    x0: alone ? given_window.x0 : unionOfWindows(windows, "x0"),
    A: scaled(windowQuantity(fitted, "A"), perSpeed),
    given_window,
    correlation_n_x0: fit.correlation,
    chi2_reduced: fit.errorsKnown && fit.freedom > 0 ? fit.residualSum / fit.freedom : null,
    p,
    iterations: fit.iterations,
    converged: fit.converged,
  };
}

function powerLaw(window: WindowFit, perSpeed: number): PowerLaw {
  const { fit, variance, flight } = window;
  const { ratio, freedom } = inflation(window, "n");
  const blocksTell = window.together !== undefined && ratio !== 1;
  const own = (fit.unitCovariance ?? []).map((value) => value * variance);
  const x0 = placeBack(flight, fit.x0);
  const covariance = blocksTell ? (window.together?.covariance ?? own) : own;
  return {
    A: fit.A * perSpeed,
    x0,
    n: fit.n,
    length: fit.length,
    covariance: withOriginInX(covariance, rateAlong(flight, x0)),
    quantile: studentReach(freedom),
    freedom,
    flight,
  };
}

/** Row and column of x0 carried from what the law runs along to x: over ds/dx each. */
function withOriginInX(covariance: readonly number[], rate: number): number[] {
  return covariance.map(
    (value, at) => value / (Math.floor(at / 3) === 1 ? rate : 1) / (at % 3 === 1 ? rate : 1),
  );
}

function growth(stations: readonly StationResult[], law: PowerLaw | null) {
  if (law === null) return missing("there is no law to take the origin from");
  return growthExponent(
    stations.map(({ x }) => x),
    stations.map(({ L11 }) => L11),
    law,
  );
}

function decayPoint(point: DecayPoints["points"][number], perSpeed: number, used: boolean): DecayPoint {
  const { x, q, error, smoothedError } = point;
  return { x, q: q * perSpeed, error, smoothedError, used };
}
