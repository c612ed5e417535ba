import type { LaneMap } from "./rulerScale.ts";
import { type Edge, edgeStation, moveEdge, nearestStation, type StationWindow } from "./snapWindow.ts";

/** A lane whose bracket can be moved: its stations, where they are drawn, its window before the drag. */
export interface MovableLane {
  readonly id: string;
  readonly stations: readonly number[];
  readonly map: LaneMap;
  readonly window: StationWindow;
}

/**
 * Windows after one bracket has been dragged by `dx` px: in each lane the bracket's own station is shifted by
 * as many px and the bracket snaps to the station that is then the nearest.
 */
export function gestureWindows(
  lanes: readonly MovableLane[],
  edge: Edge,
  dx: number,
): ReadonlyMap<string, StationWindow> {
  return new Map(
    lanes.map(({ id, stations, map, window }) => {
      const from = stations[edgeStation(stations, window, edge)];
      const station = nearestStation(stations, from + dx / map.perX);
      return [id, moveEdge(stations, window, edge, station)];
    }),
  );
}
