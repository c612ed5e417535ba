import { type FocusEvent, type KeyboardEvent, useRef } from "react";
import { bracketKeys } from "./bracketKeys.ts";
import type { LaneActions } from "./laneActions.ts";
import type { RulerCase, RulerWindow } from "./rulerProps.ts";
import type { Edge, StationWindow } from "./snapWindow.ts";
import { usePointerDrag } from "./usePointerDrag.ts";
import { windowAsChosen } from "./useWindowGesture.ts";

/** What moves a bracket: handlers of its slider. Escape goes back to the window from before it was focused. */
export function useBracketGrip(
  one: RulerCase,
  edge: Edge,
  window: StationWindow,
  stations: readonly number[],
  actions: LaneActions,
) {
  const atFocus = useRef<RulerWindow>("auto");
  const { putBack, ...pointer } = usePointerDrag({
    start: (shift) => actions.windowStart(one.id, edge, shift),
    move: actions.windowDrag,
    end: actions.windowEnd,
    cancel: actions.windowCancel,
  });
  const onFocus = () => {
    atFocus.current = windowAsChosen(one);
    actions.bracketFocus(one.id, edge);
  };
  const onKeyDown = (event: KeyboardEvent<HTMLElement>) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const move = bracketKeys(stations, window, edge, event.key, event.shiftKey);
    if (move === null) return;
    event.preventDefault();
    if (putBack(event)) return;
    if (move.kind === "back") actions.windowBack(one.id, atFocus.current);
    else actions.windowKey(one.id, edge, move);
  };
  const onBlur = (event: FocusEvent<HTMLElement>) => {
    actions.windowKeysEnd();
    const to = event.relatedTarget;
    if (!(to instanceof Element && to.closest(".ruler-stepper"))) actions.bracketBlur();
  };
  return { ...pointer, onFocus, onKeyDown, onBlur, onKeyUp: actions.windowKeysEnd };
}
