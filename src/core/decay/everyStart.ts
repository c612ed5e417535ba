import type { EveryStart } from "../decayArgument.ts";
import type { DecaySettings, Flight } from "../decayResult.ts";
import { leastStations } from "./chooseWindow.ts";
import type { CommonBlocks } from "./commonBlocks.ts";
import { type FitPoint, fitWindow } from "./fitWindow.ts";
import { unionOfWindows } from "./unionOfWindows.ts";
import { withCommonBlocks } from "./withCommonBlocks.ts";

/**
 * The union of the intervals of n and x0 over every start of a window that leaves five stations: wide, and what is left to
 * hold on to where a near field hides below the scatter. Shown, not adopted.
 * @param points of the window, in order of x
 * @param flight the course of the law; null: x
 * @param blocks of these stations; null: each for itself
 * @returns      null with fewer than six stations, and where n or x0 is held
 */
export function everyStart(
  points: readonly FitPoint[],
  settings: DecaySettings,
  flight: Flight | null = null,
  blocks: CommonBlocks | null = null,
): EveryStart | null {
  const starts = points.length - leastStations + 1;
  if (starts < 2 || settings.x0 !== null || settings.n !== null) return null;
  const windows = Array.from({ length: starts }, (_, from) =>
    withCommonBlocks(fitWindow(points.slice(from), settings, flight), blocks, from),
  );
  return "refused" in windows[0]
    ? null
    : { starts, n: unionOfWindows(windows, "n"), x0: unionOfWindows(windows, "x0") };
}
