import { type KeyboardEvent, useRef } from "react";
import type { LaneActions } from "./laneActions.ts";
import { originAt, originKeys } from "./originKeys.ts";
import type { RulerCase } from "./rulerProps.ts";
import type { LaneMap } from "./rulerScale.ts";
import { originPlace } from "./spokenText.ts";
import { usePointerDrag } from "./usePointerDrag.ts";

interface OriginFlagProps {
  readonly one: RulerCase;
  readonly x0: number;
  readonly map: LaneMap;
  readonly width: number;
  readonly units: string;
  readonly actions: LaneActions;
}

/** The virtual origin as a slider: moving it holds it, Delete or a double click frees it. */
export function OriginFlag({ one, x0, map, width, units, actions }: OriginFlagProps) {
  const first = one.window?.[0] ?? one.stations[0]?.x ?? x0;
  const length = one.length ?? width / map.perX / 100;
  const place = { x0, length, limit: first };
  const before = useRef<{ readonly from: number; readonly held: number | null }>({ from: x0, held: null });
  const keyed = useRef<number | null>(null);
  const remember = () => {
    before.current = { from: x0, held: one.originHeld ? x0 : null };
  };
  const last = useRef(x0);
  const hold = (to: number) => {
    if (to === last.current) return;
    last.current = to;
    actions.holdOrigin(one.id, to, "drag");
  };
  const rest = () => {
    if (keyed.current === null) return;
    actions.holdOrigin(one.id, keyed.current, "rest");
    keyed.current = null;
  };
  const drag = usePointerDrag({
    start: () => {
      remember();
      last.current = x0;
    },
    move: (dx) => hold(originAt(place, before.current.from + dx / map.perX)),
    end: () => actions.holdOrigin(one.id, last.current, "rest"),
    cancel: () => actions.holdOrigin(one.id, before.current.held, "cancel"),
  });
  const { putBack, ...pointer } = drag;
  const onKeyDown = (event: KeyboardEvent<HTMLElement>) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const move = originKeys(place, event.key, event.shiftKey);
    if (move === null) return;
    event.preventDefault();
    if (putBack(event)) return;
    if (move.kind === "back") {
      keyed.current = null;
      actions.holdOrigin(one.id, before.current.held, "cancel");
    } else if (move.kind === "free") {
      keyed.current = null;
      actions.holdOrigin(one.id, null, "rest");
    } else {
      keyed.current = move.x0;
      actions.holdOrigin(one.id, move.x0, "drag");
    }
  };
  return (
    <div
      className="ruler-grip ruler-flag"
      style={{ left: Math.max(0, map.at + map.perX * x0) }}
      role="slider"
      tabIndex={0}
      aria-label={`Virtual origin, ${one.name}`}
      aria-orientation="horizontal"
      aria-valuemin={Math.min(x0, -map.at / map.perX)}
      aria-valuemax={first}
      aria-valuenow={x0}
      aria-valuetext={originPlace(one, x0, units)}
      onFocus={remember}
      onBlur={rest}
      onKeyDown={onKeyDown}
      onKeyUp={rest}
      onDoubleClick={() => actions.holdOrigin(one.id, null, "rest")}
      {...pointer}
    />
  );
}
