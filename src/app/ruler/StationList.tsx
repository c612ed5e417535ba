import { type KeyboardEvent, type MouseEvent, type PointerEvent, useRef, useState } from "react";
import type { LaneActions } from "./laneActions.ts";
import type { RulerCase, RulerPick } from "./rulerProps.ts";
import type { LaneMap } from "./rulerScale.ts";
import { nearestStation } from "./snapWindow.ts";
import { type SpokenScale, stationName } from "./spokenText.ts";

interface StationListProps {
  readonly one: RulerCase;
  readonly map: LaneMap;
  readonly picks: readonly RulerPick[];
  readonly scale: SpokenScale;
  readonly actions: LaneActions;
}

/** Px from a station within which the pointer means it: half of a hit area, for a mouse and for a finger. */
const reach = { mouse: 12, pen: 16, touch: 22 };

/** The stations of a lane: one tab stop, arrows move, Space picks, Enter shows the row. */
export function StationList({ one, map, picks, scale, actions }: StationListProps) {
  const { id, stations } = one;
  const list = useRef<HTMLDivElement>(null);
  const [roving, setRoving] = useState(0);
  const current = Math.min(roving, stations.length - 1);
  const letterOf = (x: number) => picks.find((pick) => pick.x === x)?.letter ?? null;
  const toggle = (index: number) => {
    const { x, quality } = stations[index];
    if (quality !== "waiting") actions.pick(id, x, letterOf(x) === null);
  };
  const under = (clientX: number, within: number): number | null => {
    const left = list.current?.getBoundingClientRect().left ?? 0;
    const xs = stations.map(({ x }) => x);
    const index = nearestStation(xs, (clientX - left - map.at) / map.perX);
    return Math.abs(map.at + map.perX * xs[index] - (clientX - left)) <= within ? index : null;
  };
  const onClick = (event: MouseEvent<HTMLElement>) => {
    const touched =
      event.nativeEvent instanceof window.PointerEvent ? event.nativeEvent.pointerType : "mouse";
    const index =
      optionIndex(event.target) ?? under(event.clientX, touched === "touch" ? reach.touch : reach.mouse);
    if (index !== null) toggle(index);
  };
  const onPointerMove = (event: PointerEvent<HTMLElement>) => {
    if (event.pointerType === "touch") return;
    const index = under(event.clientX, reach.mouse);
    actions.hover(id, index === null ? null : stations[index].x);
  };
  const onKeyDown = (event: KeyboardEvent<HTMLElement>) => {
    const next = rove(event.key, current, stations.length);
    if (next !== null) {
      setRoving(next);
      list.current?.querySelector<HTMLElement>(`[data-station="${next}"]`)?.focus();
    } else if (event.key === " ") toggle(current);
    else if (event.key === "Enter") actions.show(id, stations[current].x);
    else return;
    event.preventDefault();
  };
  return (
    <div
      ref={list}
      className="ruler-stations"
      role="listbox"
      aria-label={`Stations, ${one.name}`}
      aria-multiselectable="true"
      aria-orientation="horizontal"
      onClick={onClick}
      onKeyDown={onKeyDown}
      onPointerMove={onPointerMove}
      onPointerLeave={() => actions.hover(id, null)}
      onBlur={() => actions.hover(id, null)}
    >
      {stations.map((station, i) => (
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
          onFocus={() => {
            setRoving(i);
            actions.hover(id, station.x);
          }}
        />
      ))}
    </div>
  );
}

function rove(key: string, current: number, count: number): number | null {
  if (key === "ArrowLeft" || key === "ArrowUp") return Math.max(0, current - 1);
  if (key === "ArrowRight" || key === "ArrowDown") return Math.min(count - 1, current + 1);
  if (key === "Home") return 0;
  return key === "End" ? count - 1 : null;
}

function optionIndex(target: EventTarget): number | null {
  const option = target instanceof Element ? target.closest("[data-station]") : null;
  return option === null ? null : Number(option.getAttribute("data-station"));
}
