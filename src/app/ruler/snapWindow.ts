export type Edge = "start" | "end";
export type StationWindow = readonly [number, number];

/** Index of the station nearest to x; the upstream one of two that are equally near. */
export function nearestStation(stations: readonly number[], x: number): number {
  let nearest = 0;
  stations.forEach((station, i) => {
    if (Math.abs(station - x) < Math.abs(stations[nearest] - x)) nearest = i;
  });
  return nearest;
}

/** Index of the station a bracket stands at; a window given between stations holds those inside it. */
export function edgeStation(stations: readonly number[], window: StationWindow, edge: Edge): number {
  // A window read back from a sheet may differ from the station in the last bit.
  const slack = 1e-9 * Math.max(Math.abs(window[0]), Math.abs(window[1]));
  if (edge === "start") {
    const first = stations.findIndex((x) => x >= window[0] - slack);
    return first < 0 ? stations.length - 1 : first;
  }
  return Math.max(
    0,
    stations.findLastIndex((x) => x <= window[1] + slack),
  );
}

/** The window with one bracket moved to a station; the brackets never meet: two stations stay inside. */
export function moveEdge(
  stations: readonly number[],
  window: StationWindow,
  edge: Edge,
  station: number,
): StationWindow {
  const [least, most] = edgeRange(stations, window, edge);
  const x = stations[Math.min(most, Math.max(least, station))];
  return edge === "start" ? [x, window[1]] : [window[0], x];
}

/** First and last station that a bracket may stand at. */
export function edgeRange(
  stations: readonly number[],
  window: StationWindow,
  edge: Edge,
): readonly [number, number] {
  if (edge === "start") return [0, Math.max(0, edgeStation(stations, window, "end") - 1)];
  const last = stations.length - 1;
  return [Math.min(last, edgeStation(stations, window, "start") + 1), last];
}

/** The window as its stations bound it: first and last station inside. */
export function onStations(stations: readonly number[], window: StationWindow): StationWindow {
  return [stations[edgeStation(stations, window, "start")], stations[edgeStation(stations, window, "end")]];
}

export function sameWindow(one: StationWindow, other: StationWindow): boolean {
  return one[0] === other[0] && one[1] === other[1];
}
