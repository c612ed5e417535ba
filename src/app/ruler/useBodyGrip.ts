import { type KeyboardEvent, useRef } from "react";
import { bodyKeys, tidy } from "./bodyKeys.ts";
import type { Phase } from "./rulerProps.ts";
import { usePointerDrag } from "./usePointerDrag.ts";

interface BodyGrip {
  readonly x: number;
  /** Length of the scale, in the unit of x. */
  readonly span: number;
  readonly perX: number;
  readonly onBody: (x: number, phase: Phase) => void;
  /** Enter: a number is to be typed. */
  readonly onType: () => void;
}

/** What moves the body: handlers of its slider. */
export function useBodyGrip({ x, span, perX, onBody, onType }: BodyGrip) {
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
  const rest = () => {
    if (keyed.current) tell(latest.current, "rest");
    keyed.current = false;
  };
  const { putBack, ...pointer } = usePointerDrag({
    start: remember,
    move: (dx) => tell(tidy(before.current + dx / perX, span), "drag"),
    end: () => tell(latest.current, "rest"),
    cancel: () => tell(before.current, "cancel"),
  });
  const onKeyDown = (event: KeyboardEvent<HTMLElement>) => {
    if (event.ctrlKey || event.metaKey || event.altKey || putBack(event)) return;
    const next = bodyKeys(x, span, event.key, event.shiftKey);
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
