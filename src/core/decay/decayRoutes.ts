import type { DecayRoute, FlightFit, RouteDisagreement } from "../decayArgument.ts";
import type { DecayPoint, DecayResult, DecaySettings, Flight } from "../decayResult.ts";
import { bare, isEstimate, missing, type Quantity } from "../quantity.ts";
import { chiSquareTail } from "../signal/distributions/chiSquareTail.ts";
import { fitWindow, windowQuantity } from "./fitWindow.ts";
import { placeAlong, quantityBack } from "./flightCourse.ts";
import { relativeLine, zeroOfLine } from "./relativeLine.ts";
import { studentReach } from "./studentReach.ts";

/**
 * Every way to n and x0 in use, side by side over the same window: where they part beyond their intervals, the law,
 * the errors or what a way takes for granted does not hold.
 * @param decay  fitted
 * @param flight the fit along the time of flight; null where U is as good as constant
 * @see          Comte-Bellot & Corrsin (1966), J. Fluid Mech. 25, 657; Mohamed & LaRue (1990), J. Fluid Mech. 219, 195;
 *               Krogstad & Davidson (2010), J. Fluid Mech. 642, 373
 */
export function decayRoutes(
  decay: DecayResult,
  settings: DecaySettings,
  flight: FlightFit | null,
): DecayRoute[] {
  const points = decay.points.filter((point) => point.used);
  const course = decay.flight ?? null;
  const equal = points.map((point) => ({ ...point, smoothedError: null }));
  const free = { ...settings, x0: null, n: null };
  const others = "no law of decay enters: epsilon is that of the measured gradients";
  return [
    {
      key: "joint",
      name: "joint fit of A, n and x0",
      ...joint(points, decay, settings),
      note: jointNote(decay),
    },
    {
      key: "origin-scan",
      name: "scan of x0 for the least scatter",
      ...fitted(equal, { ...free, residuals: "log" }, course),
      note: "all stations weigh alike; the scatter makes the interval",
    },
    straightLineRoute(points, settings.n ?? decay.law?.n ?? null, settings.n !== null, course),
    {
      key: "lambda",
      name: "straight line of Lambda²",
      ...decay.lambda_route,
      note: others,
    },
    { key: "epsilon", name: "fall of epsilon", ...decay.epsilon_route, note: others },
    heldRoute("origin-zero", "x0 held at 0", points, { ...free, x0: 0 }, course),
    ...(settings.x0 === null || settings.x0 === 0
      ? []
      : [heldRoute("origin-held", "x0 held as given", points, { ...free, x0: settings.x0 }, course)]),
    ...(settings.otherX0 == null
      ? []
      : [heldRoute("origin-other", "x0 held elsewhere", points, { ...free, x0: settings.otherX0 }, course)]),
    ...otherCoordinate(points, decay, free, flight),
  ];
}

/** The joint fit along the coordinate that was not adopted, where U tells the two apart. */
function otherCoordinate(
  points: readonly DecayPoint[],
  decay: DecayResult,
  free: DecaySettings,
  flight: FlightFit | null,
): DecayRoute[] {
  if (flight === null) return [];
  const note = `U varies by ${(100 * flight.variation).toFixed(1)} % along the window`;
  return decay.flight
    ? [{ key: "along-x", name: "joint fit along x", ...fitted(points, free), note }]
    : [{ key: "flight", name: "joint fit along the time of flight", n: flight.n, x0: flight.x0, note }];
}

/** The adopted fit given its window, or where that holds a number, one with all of them free. */
function joint(points: readonly DecayPoint[], decay: DecayResult, settings: DecaySettings) {
  return settings.x0 === null && settings.n === null
    ? decay.given_window
    : fitted(points, { ...settings, x0: null, n: null }, decay.flight);
}

function jointNote({ windowChosen, weights, flight }: DecayResult): string {
  const errors = weights === "sampling" ? "weighted by sampling errors" : "all stations weigh alike";
  const along = flight ? "along the time of flight; " : "";
  return `${along}${errors}${windowChosen === "auto" ? "; interval given the window" : ""}`;
}

function fitted(
  points: readonly DecayPoint[],
  settings: DecaySettings,
  flight: Flight | null = null,
): { n: Quantity; x0: Quantity } {
  const window = fitWindow(points, settings, flight);
  if ("refused" in window) return { n: missing(window.refused), x0: missing(window.refused) };
  return { n: windowQuantity(window, "n"), x0: windowQuantity(window, "x0") };
}

function heldRoute(
  key: "origin-zero" | "origin-held" | "origin-other",
  name: string,
  points: readonly DecayPoint[],
  settings: DecaySettings,
  course: Flight | null,
): DecayRoute {
  const note = "its interval leaves out that x0 is not known";
  if (points.length > 0 && (settings.x0 ?? 0) >= points[0].x) {
    const none = missing("the origin would lie at or beyond the first station");
    return { key, name, n: none, x0: none, note };
  }
  return { key, name, ...fitted(points, settings, course), note };
}

/** (1/q)^(1/n) = A^(-1/n) (x - x0)/ell: with n held a straight line whose zero is x0. */
function straightLineRoute(
  points: readonly DecayPoint[],
  n: number | null,
  given: boolean,
  course: Flight | null,
): DecayRoute {
  const name = "straight line of (U²/q)^(1/n), n held";
  const key = "straight-line";
  if (n === null || points.length < 3) {
    const none = missing(n === null ? "there is no exponent to hold" : "fewer than three stations");
    return { key, name, n: none, x0: none, note: "" };
  }
  const held = bare(n, "held, not fitted");
  const note = given ? "n as given" : "n as fitted; its error is left out of the interval of x0";
  const errors = points.map((point) => point.smoothedError).filter((error) => error !== null);
  const told = errors.length === points.length;
  const line = relativeLine(
    points.map(({ x }) => placeAlong(course, x)),
    // scaled to the first station, so that no power over- or underflows
    points.map(({ q }) => (points[0].q / q) ** (1 / n)),
    told ? errors.map((error) => error / n) : null,
  );
  if (line === null || !(line.slope > 0))
    return { key, name, n: held, x0: missing("it does not grow along these stations"), note };
  const known = told && chiSquareTail(line.sum, line.freedom) >= 0.05;
  const x0 = zeroOfLine(
    line,
    studentReach(known ? null : line.freedom),
    known ? 1 : line.sum / line.freedom,
    "its slope is not told from zero: any origin fits",
  );
  return { key, name, n: held, x0: quantityBack(course, x0), note };
}

/**
 * Pairs of routes whose 95 % intervals of n, or of x0, have no value in common. What a route holds is no finding of it
 * and is not compared.
 */
export function routeDisagreements(routes: readonly DecayRoute[]): RouteDisagreement[] {
  return (["n", "x0"] as const).flatMap((of) =>
    routes.flatMap((a, i) =>
      routes
        .slice(i + 1)
        .filter((b) => meet(a[of], b[of]) === false)
        .map((b): RouteDisagreement => ({ routes: [a.key, b.key], of })),
    ),
  );
}

/** Whether two intervals have a value in common; an open side reaches without end; null where either has none. */
export function meet(a: Quantity, b: Quantity): boolean | null {
  if (![a, b].every((one) => isEstimate(one) && (one.low !== null || one.high !== null))) return null;
  const [low, high] = [Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY];
  if (!isEstimate(a) || !isEstimate(b)) return null;
  return (a.low ?? low) <= (b.high ?? high) && (b.low ?? low) <= (a.high ?? high);
}
