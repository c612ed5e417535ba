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
  /** Whether anything has come to rest since the flag was focused, which Escape has to change back. */
  const changed = useRef(false);
  const remember = () => {
    before.current = { from: place.x0, held: one.originHeld ? place.x0 : null };
    last.current = place.x0;
  };
  const hold = (x0: number) => {
    if (x0 !== last.current) actions.holdOrigin(one.id, x0, "drag");
    last.current = x0;
  };
  const settle = (x0: number | null) => {
    changed.current = true;
    actions.holdOrigin(one.id, x0, "rest");
  };
  const rest = () => {
    if (keyed.current !== null) settle(keyed.current);
    keyed.current = null;
  };
  const back = () => {
    if (keyed.current !== null) actions.holdOrigin(one.id, before.current.held, "cancel");
    if (changed.current) actions.holdOrigin(one.id, before.current.held, "rest");
    keyed.current = null;
    changed.current = false;
  };
  const { putBack, ...pointer } = usePointerDrag({
    start: remember,
    move: (dx) => hold(originAt(place, before.current.from + dx / perX)),
    end: () => settle(last.current),
    cancel: () => actions.holdOrigin(one.id, before.current.held, "cancel"),
  });
  const obey = (move: OriginMove) => {
    if (move.kind === "back") return back();
    keyed.current = move.kind === "hold" ? move.x0 : null;
    if (move.kind === "hold") actions.holdOrigin(one.id, move.x0, "drag");
    else settle(null);
  };
  const onKeyDown = (event: KeyboardEvent<HTMLElement>) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const move = originKeys(place, event.key, event.shiftKey);
    if (move === null) return;
    event.preventDefault();
    if (!putBack(event)) obey(move);
  };
  const onFocus = () => {
    remember();
    changed.current = false;
  };
  return { ...pointer, onKeyDown, onKeyUp: rest, onBlur: rest, onFocus, onDoubleClick: () => settle(null) };
}
