import { type KeyboardEvent, useRef } from "react";
import { bodyKeys, tidy } from "./bodyKeys.ts";
import type { Phase } from "./rulerProps.ts";
import { usePointerDrag } from "./usePointerDrag.ts";

interface BodyGrip {
  readonly x: number;
  /** Ends of the scale, in the unit of x: it is not moved beyond them, though a typed number may lie there. */
  readonly ends: readonly [number, number];
  readonly perX: number;
  readonly onBody: (x: number, phase: Phase) => void;
  /** Enter: a number is to be typed. */
  readonly onType: () => void;
}

/** What moves the body: handlers of its slider. */
export function useBodyGrip({ x, ends, perX, onBody, onType }: BodyGrip) {
  const span = ends[1] - ends[0];
  const before = useRef(x);
  const latest = useRef(x);
  const keyed = useRef(false);
  const atFocus = useRef(x);
  const tell = (to: number, phase: Phase) => {
    latest.current = to;
    onBody(to, phase);
  };
  const remember = () => {
    before.current = x;
  };
  /** On the scale, in decimals that a hand can set. */
  const placed = (to: number) => tidy(Math.min(Math.max(to, ends[0]), ends[1]), span);
  const rest = () => {
    if (keyed.current) tell(latest.current, "rest");
    keyed.current = false;
  };
  const { putBack, ...pointer } = usePointerDrag({
    start: remember,
    move: (dx) => tell(placed(before.current + dx / perX), "drag"),
    end: () => tell(latest.current, "rest"),
    cancel: () => tell(before.current, "cancel"),
  });
  const onKeyDown = (event: KeyboardEvent<HTMLElement>) => {
    if (event.ctrlKey || event.metaKey || event.altKey || putBack(event)) return;
    const wanted = bodyKeys(x, span, event.key, event.shiftKey);
    const next = wanted === null ? null : placed(wanted);
    if (next === null && event.key !== "Escape" && event.key !== "Enter") return;
    event.preventDefault();
    keyed.current = next !== null;
    if (next !== null) tell(next, "drag");
    else if (event.key === "Enter") onType();
    else if (x !== atFocus.current) tell(atFocus.current, "rest");
  };
  const onFocus = () => {
    atFocus.current = x;
  };
  return { ...pointer, onKeyDown, onKeyUp: rest, onBlur: rest, onFocus };
}
