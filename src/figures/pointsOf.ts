import { type Panel, placeX, placeY } from "./panel.ts";

interface DrawnTrace {
  readonly x?: readonly (number | null)[];
  readonly y?: readonly (number | null)[];
  readonly error_y?: {
    readonly array: readonly (number | null)[];
    readonly arrayminus: readonly (number | null)[];
  };
}

type Place = readonly [number, number];

/** Letter and legend of a panel ask for the same places. */
const known = new WeakMap<Panel, readonly Place[]>();

/** Every place of a panel's traces on the page, mm: what a legend or a letter should not cover. */
export function pointsOf(panel: Panel): readonly Place[] {
  const before = known.get(panel);
  if (before !== undefined) return before;
  const places = placesOf(panel);
  known.set(panel, places);
  return places;
}

function placesOf(panel: Panel): Place[] {
  return panel.traces.flatMap((trace) => {
    const { x = [], y = [], error_y } = trace as DrawnTrace;
    return x.flatMap((value, i): Place[] => {
      const up = y[i];
      if (value === null || up === null || up === undefined) return [];
      const heights = [up, up + (error_y?.array[i] ?? 0), up - (error_y?.arrayminus[i] ?? 0)];
      return [...new Set(heights)]
        .map((height): Place => [placeX(panel, value), placeY(panel, height)])
        .filter((place) => place.every(Number.isFinite));
    });
  });
}
