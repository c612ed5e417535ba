import { type KeyboardEvent, type PointerEvent, useRef } from "react";

export interface PointerDrag {
  readonly start: (shift: boolean) => void;
  /** Px from where the pointer went down. */
  readonly move: (dx: number) => void;
  readonly end: () => void;
  readonly cancel: () => void;
}

interface Grip {
  readonly pointer: number;
  readonly from: number;
  readonly shift: boolean;
  started: boolean;
}

/** Px a pointer may tremble before a press becomes a drag, so that taps and double clicks stay what they are. */
const still = 3;

/**
 * Pointer handlers of something that is dragged along the ruler. The pointer is captured; a vertical pan that
 * the browser takes over, and Escape, put everything back.
 */
export function usePointerDrag(drag: PointerDrag) {
  const grip = useRef<Grip | null>(null);
  const finish = (event: PointerEvent<HTMLElement>, kept: boolean) => {
    const held = grip.current;
    if (held === null || held.pointer !== event.pointerId) return;
    grip.current = null;
    if (held.started) kept ? drag.end() : drag.cancel();
  };
  return {
    onPointerDown: (event: PointerEvent<HTMLElement>) => {
      if (event.button !== 0) return;
      event.currentTarget.setPointerCapture?.(event.pointerId);
      grip.current = { pointer: event.pointerId, from: event.clientX, shift: event.shiftKey, started: false };
    },
    onPointerMove: (event: PointerEvent<HTMLElement>) => {
      const held = grip.current;
      if (held === null || held.pointer !== event.pointerId) return;
      const dx = event.clientX - held.from;
      if (!held.started && Math.abs(dx) < still) return;
      if (!held.started) drag.start(held.shift);
      held.started = true;
      drag.move(dx);
    },
    onPointerUp: (event: PointerEvent<HTMLElement>) => finish(event, true),
    onPointerCancel: (event: PointerEvent<HTMLElement>) => finish(event, false),
    /** True when the key was used: Escape while dragging. */
    putBack: (event: KeyboardEvent<HTMLElement>): boolean => {
      if (event.key !== "Escape" || grip.current === null) return false;
      const { started } = grip.current;
      grip.current = null;
      if (started) drag.cancel();
      return started;
    },
  };
}
