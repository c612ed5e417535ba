import type { DecaySettings, Flight } from "../decayResult.ts";
import { type ChosenWindow, chooseWindow } from "./chooseWindow.ts";
import type { RawPoint } from "./decayPoints.ts";
import { fitWindow } from "./fitWindow.ts";
import { flightCourse } from "./flightCourse.ts";
import { speedVariation, steadySpeed } from "./speedVariation.ts";

/** The window of a law, and the course it runs along. */
export interface DecayWindow {
  readonly window: ChosenWindow;
  /** Null: along x. */
  readonly flight: Flight | null;
}

/**
 * Which stations a law is fitted to, and what it runs along: the time of flight where that is asked for, or where over
 * the window found along x U varies by more than 1 % beyond its sampling errors; else x. Us is the mean U of the window,
 * so that A keeps its meaning.
 * @param points in order of x
 */
export function decayWindow(points: readonly RawPoint[], settings: DecaySettings): DecayWindow {
  const { coordinate = "auto", along } = settings;
  const choose = (flight: Flight | null) =>
    settings.window === "auto"
      ? chooseWindow(points, settings, flight)
      : givenWindow(points, settings, flight);
  const stations = points.map(({ station }) => station);
  const course = along === "t" || coordinate === "x" ? null : flightCourse(stations, 1);
  if (course === null) return { window: choose(null), flight: null };
  if (coordinate === "auto") {
    const window = choose(null);
    const variation = speedVariation(stations.slice(window.first, window.last + 1));
    if (variation === null || !(variation.beyondErrors > steadySpeed)) return { window, flight: null };
  }
  // which window is chosen does not depend on the speed that s is counted in
  const window = choose(course);
  const used = points.slice(window.first, window.last + 1);
  const flight = flightCourse(stations, meanSpeed(used, course));
  return { window: { ...window, fitted: fitWindow(used, settings, flight) }, flight };
}

/** The mean U of the stations used; that of all where none of them carries one. */
function meanSpeed(used: readonly RawPoint[], { x, U }: Flight): number {
  const own = U.filter((_, i) => used.some((point) => point.x === x[i]));
  const speeds = own.length > 0 ? own : U;
  return speeds.reduce((sum, speed) => sum + speed, 0) / speeds.length;
}

/** The stations within the ends that were set. */
function givenWindow(
  points: readonly RawPoint[],
  settings: DecaySettings,
  flight: Flight | null,
): ChosenWindow {
  const [from, to] = settings.window === "auto" ? [0, 0] : settings.window;
  // an end set on a station includes it, whatever its last digit
  const slack = 1e-9 * Math.max(Math.abs(from), Math.abs(to));
  const inside = points.filter(({ x }) => x >= from - slack && x <= to + slack);
  const first = inside.length > 0 ? points.indexOf(inside[0]) : 0;
  return {
    first,
    last: first + inside.length - 1,
    fitted: fitWindow(inside, settings, flight),
    reason: "set by hand",
    withoutPlateau: false,
    leftOut: 0,
  };
}
