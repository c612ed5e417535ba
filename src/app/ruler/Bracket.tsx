import type { LaneActions } from "./laneActions.ts";
import type { RulerCase } from "./rulerProps.ts";
import { type Edge, edgeRange, edgeStation, type StationWindow } from "./snapWindow.ts";
import { bracketName, bracketPlace, type SpokenScale } from "./spokenText.ts";
import { useBracketGrip } from "./useBracketGrip.ts";

interface BracketProps {
  readonly one: RulerCase;
  readonly edge: Edge;
  readonly window: StationWindow;
  /** Px of the station it stands at. */
  readonly px: number;
  readonly scale: SpokenScale;
  /** The stepper row speaks of this bracket. */
  readonly active: boolean;
  readonly actions: LaneActions;
}

/** One end of the fit window, as a slider; it is drawn by the lane, this is what is taken hold of. */
export function Bracket({ one, edge, window, px, scale, active, actions }: BracketProps) {
  const stations = one.stations.map(({ x }) => x);
  const [least, most] = edgeRange(stations, window, edge).map((i) => stations[i]);
  const grip = useBracketGrip(one, edge, window, stations, actions);
  return (
    <div
      className={`ruler-grip ruler-bracket ${edge}${active ? " active" : ""}`}
      style={{ left: px }}
      role="slider"
      tabIndex={0}
      aria-label={bracketName(edge, one.name)}
      aria-orientation="horizontal"
      aria-valuemin={least}
      aria-valuemax={most}
      aria-valuenow={stations[edgeStation(stations, window, edge)]}
      aria-valuetext={bracketPlace(stations, window, edge, scale)}
      {...grip}
    />
  );
}
