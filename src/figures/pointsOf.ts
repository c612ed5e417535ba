import { type Panel, placeX, placeY } from "./panel.ts";

/** Every place of a panel's traces on the page, mm: what a legend or a letter should not cover. */
export function pointsOf(panel: Panel): [number, number][] {
  return panel.traces.flatMap((trace) => {
    const { x = [], y = [] } = trace as { x?: (number | null)[]; y?: (number | null)[] };
    return x.flatMap((value, i): [number, number][] => {
      const up = y[i];
      if (value === null || up === null || up === undefined) return [];
      const place: [number, number] = [placeX(panel, value), placeY(panel, up)];
      return place.every(Number.isFinite) ? [place] : [];
    });
  });
}
