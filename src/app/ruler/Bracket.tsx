import { type FocusEvent, type KeyboardEvent, useRef } from "react";
import { bracketKeys } from "./bracketKeys.ts";
import type { LaneActions } from "./laneActions.ts";
import type { RulerCase, RulerWindow } from "./rulerProps.ts";
import { type Edge, edgeRange, edgeStation, type StationWindow } from "./snapWindow.ts";
import { bracketName, bracketPlace, type SpokenScale } from "./spokenText.ts";
import { usePointerDrag } from "./usePointerDrag.ts";
import { windowAsChosen } from "./useWindowGesture.ts";

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
  const range = edgeRange(stations, window, edge).map((i) => stations[i]);
  const atFocus = useRef<RulerWindow>("auto");
  const drag = usePointerDrag({
    start: (shift) => actions.windowStart(one.id, edge, shift),
    move: actions.windowDrag,
    end: actions.windowEnd,
    cancel: actions.windowCancel,
  });
  const { putBack, ...pointer } = drag;
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
    if (!(event.relatedTarget instanceof Element && event.relatedTarget.closest(".ruler-stepper")))
      actions.bracketBlur();
  };
  return (
    <div
      className={`ruler-grip ruler-bracket ${edge}${active ? " active" : ""}`}
      style={{ left: px }}
      role="slider"
      tabIndex={0}
      aria-label={bracketName(edge, one.name)}
      aria-orientation="horizontal"
      aria-valuemin={range[0]}
      aria-valuemax={range[1]}
      aria-valuenow={stations[edgeStation(stations, window, edge)]}
      aria-valuetext={bracketPlace(stations, window, edge, scale)}
      onFocus={() => {
        atFocus.current = windowAsChosen(one);
        actions.bracketFocus(one.id, edge);
      }}
      onBlur={onBlur}
      onKeyDown={onKeyDown}
      onKeyUp={actions.windowKeysEnd}
      {...pointer}
    />
  );
}
