import { formatNumber } from "../../figures/formatNumber.ts";
import type { Axis } from "../../sheet/workspace.ts";
import { edgeStation } from "./snapWindow.ts";
import type { WindowGesture } from "./useWindowGesture.ts";

/** Place of the station that a moving bracket has caught, px on the ruler; null while nothing is dragged. */
export function caughtPx(gesture: WindowGesture | null): number | null {
  const lane = gesture?.lanes.find(({ id }) => id === gesture.caseId);
  if (gesture === null || !gesture.byPointer || lane === undefined) return null;
  const window = gesture.windows.get(lane.id) ?? lane.window;
  return lane.map.at + lane.map.perX * lane.stations[edgeStation(lane.stations, window, gesture.edge)];
}

interface DragTagProps {
  readonly gesture: WindowGesture | null;
  readonly axis: Axis;
  /** Decimals of the stations' x. */
  readonly decimals: number;
}

/** The black tag on the edge, with the position in the numbers of the scale. */
export function DragTag({ gesture, axis, decimals }: DragTagProps) {
  const px = caughtPx(gesture);
  if (px === null || gesture === null) return null;
  const { from, to, width, ticks } = gesture.scale;
  const shown = from + ((to - from) * px) / width;
  return (
    <span className="ruler-tag" style={{ left: px }} aria-hidden="true">
      {formatNumber(shown, axis === "x" ? decimals : ticks.decimals + 1)}
    </span>
  );
}
