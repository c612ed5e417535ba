import { type KeyboardEvent, type MouseEvent, type PointerEvent, useRef, useState } from "react";
import type { LaneActions } from "./laneActions.ts";
import type { RulerCase, RulerPick } from "./rulerProps.ts";
import type { LaneMap } from "./rulerScale.ts";
import { nearestStation } from "./snapWindow.ts";

/** Px from a station within which a press means it: half of a hit area, for a mouse and for a finger. */
const reach = { mouse: 12, touch: 22 };

/** What the list of a lane's stations does: roving focus, picking, pointing out the station under the pointer. */
export function useStationList(
  { id, stations }: RulerCase,
  map: LaneMap,
  picks: readonly RulerPick[],
  actions: LaneActions,
) {
  const list = useRef<HTMLDivElement>(null);
  const [roving, setRoving] = useState(0);
  const current = Math.min(roving, stations.length - 1);
  const letterOf = (x: number) => picks.find((pick) => pick.x === x)?.letter ?? null;
  const toggle = (index: number) => {
    const { x, quality } = stations[index];
    if (quality !== "waiting") actions.pick(id, x, letterOf(x) === null);
  };
  const under = (clientX: number, within: number): number | null => {
    const at = clientX - (list.current?.getBoundingClientRect().left ?? 0);
    const places = stations.map(({ x }) => map.at + map.perX * x);
    const index = nearestStation(places, at);
    return Math.abs(places[index] - at) <= within ? index : null;
  };
  const focused = (index: number) => {
    setRoving(index);
    actions.hover(id, stations[index].x);
  };
  const onKeyDown = (event: KeyboardEvent<HTMLElement>) => {
    const next = rove(event.key, current, stations.length);
    if (next !== null) list.current?.querySelector<HTMLElement>(`[data-station="${next}"]`)?.focus();
    else if (event.key === " ") toggle(current);
    else if (event.key === "Enter") actions.show(id, stations[current].x);
    else return;
    event.preventDefault();
  };
  const handlers = {
    onKeyDown,
    onClick: (event: MouseEvent<HTMLElement>) => {
      const index = optionIndex(event.target) ?? under(event.clientX, reach[pressedBy(event)]);
      if (index !== null) toggle(index);
    },
    onPointerMove: (event: PointerEvent<HTMLElement>) => {
      if (event.pointerType === "touch") return;
      const index = under(event.clientX, reach.mouse);
      actions.hover(id, index === null ? null : stations[index].x);
    },
    onPointerLeave: () => actions.hover(id, null),
    onBlur: () => actions.hover(id, null),
  };
  return { list, current, letterOf, focused, handlers };
}

function pressedBy({ nativeEvent }: MouseEvent<HTMLElement>): "mouse" | "touch" {
  return "pointerType" in nativeEvent && nativeEvent.pointerType === "touch" ? "touch" : "mouse";
}

function rove(key: string, current: number, count: number): number | null {
  if (key === "ArrowLeft" || key === "ArrowUp") return Math.max(0, current - 1);
  if (key === "ArrowRight" || key === "ArrowDown") return Math.min(count - 1, current + 1);
  if (key === "Home") return 0;
  return key === "End" ? count - 1 : null;
}

/** A click sent to an option itself, as a screen reader does, needs no place. */
function optionIndex(target: EventTarget): number | null {
  const option = target instanceof Element ? target.closest("[data-station]") : null;
  return option === null ? null : Number(option.getAttribute("data-station"));
}
