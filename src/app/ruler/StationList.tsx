import type { LaneActions } from "./laneActions.ts";
import type { RulerCase, RulerPick } from "./rulerProps.ts";
import type { LaneMap } from "./rulerScale.ts";
import { type SpokenScale, stationName } from "./spokenText.ts";
import { useStationList } from "./useStationList.ts";

interface StationListProps {
  readonly one: RulerCase;
  readonly map: LaneMap;
  readonly picks: readonly RulerPick[];
  readonly scale: SpokenScale;
  readonly actions: LaneActions;
}

/** The stations of a lane: one tab stop, arrows move, Space picks, Enter shows the row. */
export function StationList({ one, map, picks, scale, actions }: StationListProps) {
  const { list, current, letterOf, focused, handlers } = useStationList(one, map, picks, actions);
  return (
    <div
      ref={list}
      className="ruler-stations"
      role="listbox"
      aria-label={`Stations, ${one.name}`}
      aria-multiselectable="true"
      aria-orientation="horizontal"
      {...handlers}
    >
      {one.stations.map((station, i) => (
        <div
          key={station.x}
          data-station={i}
          className="ruler-station"
          style={{ left: map.at + map.perX * station.x }}
          role="option"
          tabIndex={i === current ? 0 : -1}
          aria-selected={letterOf(station.x) !== null}
          aria-disabled={station.quality === "waiting"}
          aria-label={stationName(station, letterOf(station.x), scale)}
          onFocus={() => focused(i)}
        />
      ))}
    </div>
  );
}
