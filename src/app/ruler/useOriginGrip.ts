import { type KeyboardEvent, useRef } from "react";
import type { LaneActions } from "./laneActions.ts";
import { type OriginMove, type OriginPlace, originAt, originKeys } from "./originKeys.ts";
import type { RulerCase } from "./rulerProps.ts";
import { usePointerDrag } from "./usePointerDrag.ts";

/** What moves the flag: handlers of its slider. A key is live until it is let go of, then one change. */
export function useOriginGrip(one: RulerCase, place: OriginPlace, perX: number, actions: LaneActions) {
  const before = useRef<{ from: number; held: number | null }>({ from: place.x0, held: null });
  const keyed = useRef<number | null>(null);
  const last = useRef(place.x0);
  const remember = () => {
    before.current = { from: place.x0, held: one.originHeld ? place.x0 : null };
    last.current = place.x0;
  };
  const hold = (x0: number) => {
    if (x0 !== last.current) actions.holdOrigin(one.id, x0, "drag");
    last.current = x0;
  };
  const rest = () => {
    if (keyed.current !== null) actions.holdOrigin(one.id, keyed.current, "rest");
    keyed.current = null;
  };
  const { putBack, ...pointer } = usePointerDrag({
    start: remember,
    move: (dx) => hold(originAt(place, before.current.from + dx / perX)),
    end: () => actions.holdOrigin(one.id, last.current, "rest"),
    cancel: () => actions.holdOrigin(one.id, before.current.held, "cancel"),
  });
  const obey = (move: OriginMove) => {
    keyed.current = move.kind === "hold" ? move.x0 : null;
    if (move.kind === "hold") actions.holdOrigin(one.id, move.x0, "drag");
    else if (move.kind === "free") actions.holdOrigin(one.id, null, "rest");
    else actions.holdOrigin(one.id, before.current.held, "cancel");
  };
  const onKeyDown = (event: KeyboardEvent<HTMLElement>) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const move = originKeys(place, event.key, event.shiftKey);
    if (move === null) return;
    event.preventDefault();
    if (!putBack(event)) obey(move);
  };
  const onDoubleClick = () => actions.holdOrigin(one.id, null, "rest");
  return { ...pointer, onKeyDown, onKeyUp: rest, onBlur: rest, onFocus: remember, onDoubleClick };
}
