import { type Dispatch, type SetStateAction, useMemo } from "react";
import type { LaneActions } from "./laneActions.ts";
import type { Phase, RulerProps } from "./rulerProps.ts";
import type { RulerScale } from "./rulerScale.ts";
import type { Edge } from "./snapWindow.ts";
import { useStable } from "./useStable.ts";
import type { useWindowGesture } from "./useWindowGesture.ts";

interface Host {
  readonly props: RulerProps;
  readonly moves: Omit<ReturnType<typeof useWindowGesture>, "gesture">;
  readonly computed: RulerScale;
  readonly setActive: Dispatch<SetStateAction<{ caseId: string; edge: Edge } | null>>;
  readonly setHover: Dispatch<SetStateAction<{ caseId: string; x: number } | null>>;
  /** The scale keeps still while a flag is moved. */
  readonly setFrozen: Dispatch<SetStateAction<RulerScale | null>>;
  readonly say: (caseId: string) => void;
}

/** The ruler's actions as one object that stays the same while what stands behind it changes. */
export function useLaneActions(host: Host): LaneActions {
  const latest = useStable(() => host);
  return useMemo(
    () => ({
      windowStart: (...args) => latest().moves.windowStart(...args),
      windowDrag: (dx) => latest().moves.windowDrag(dx),
      windowEnd: () => latest().moves.windowEnd(),
      windowKeysEnd: () => latest().moves.windowKeysEnd(),
      windowCancel: () => latest().moves.windowCancel(),
      windowKey: (...args) => latest().moves.windowKey(...args),
      windowBack: (...args) => latest().moves.windowBack(...args),
      bracketFocus: (caseId, edge) => latest().setActive({ caseId, edge }),
      bracketBlur: () => latest().setActive(null),
      holdOrigin: (...args) => holdOrigin(latest(), ...args),
      pick: (...args) => latest().props.onPick(...args),
      hover: (caseId, x) => hover(latest(), caseId, x),
      show: (caseId, x) => latest().props.onShowStation?.(caseId, x),
      cancelReading: (caseId) => latest().props.onCancelReading?.(caseId),
    }),
    [latest],
  );
}

function holdOrigin(host: Host, caseId: string, x0: number | null, phase: Phase): void {
  host.setFrozen((before) => (phase === "drag" ? (before ?? host.computed) : null));
  host.props.onHoldOrigin(caseId, x0, phase);
  if (phase !== "drag") host.say(caseId);
}

function hover({ props, setHover }: Host, caseId: string, x: number | null): void {
  setHover((before) => {
    if (x === null) return null;
    return before?.caseId === caseId && before.x === x ? before : { caseId, x };
  });
  props.onHover?.(caseId, x);
}
