import { type Panel, placeX, placeY } from "./panel.ts";

interface DrawnTrace {
  readonly x?: readonly (number | null)[];
  readonly y?: readonly (number | null)[];
  readonly error_y?: {
    readonly array: readonly (number | null)[];
    readonly arrayminus: readonly (number | null)[];
  };
}

/** Every place of a panel's traces on the page, mm: what a legend or a letter should not cover. */
export function pointsOf(panel: Panel): [number, number][] {
  return panel.traces.flatMap((trace) => {
    const { x = [], y = [], error_y } = trace as DrawnTrace;
    return x.flatMap((value, i): [number, number][] => {
      const up = y[i];
      if (value === null || up === null || up === undefined) return [];
      const heights = [up, up + (error_y?.array[i] ?? 0), up - (error_y?.arrayminus[i] ?? 0)];
      return [...new Set(heights)]
        .map((height): [number, number] => [placeX(panel, value), placeY(panel, height)])
        .filter((place) => place.every(Number.isFinite));
    });
  });
}
