import { type Dispatch, type SetStateAction, useMemo } from "react";
import type { LaneActions } from "./laneActions.ts";
import type { Phase, RulerProps } from "./rulerProps.ts";
import type { RulerScale } from "./rulerScale.ts";
import type { Edge } from "./snapWindow.ts";
import { useStable } from "./useStable.ts";
import type { useWindowGesture } from "./useWindowGesture.ts";

interface Host {
  readonly props: RulerProps;
  readonly gestures: ReturnType<typeof useWindowGesture>;
  readonly computed: RulerScale;
  readonly setActive: Dispatch<SetStateAction<{ caseId: string; edge: Edge } | null>>;
  readonly setHover: Dispatch<SetStateAction<{ caseId: string; x: number } | null>>;
  /** The scale keeps still while a flag is moved. */
  readonly setFrozen: Dispatch<SetStateAction<RulerScale | null>>;
  readonly say: (caseId: string) => void;
}

/** The ruler's actions as one object that stays the same while what stands behind it changes. */
export function useLaneActions({ props, gestures, computed, setActive, setHover, setFrozen, say }: Host) {
  const windowStart = useStable(gestures.windowStart);
  const windowDrag = useStable(gestures.windowDrag);
  const windowEnd = useStable(gestures.windowEnd);
  const windowKeysEnd = useStable(gestures.windowKeysEnd);
  const windowCancel = useStable(gestures.windowCancel);
  const windowKey = useStable(gestures.windowKey);
  const windowBack = useStable(gestures.windowBack);
  const bracketFocus = useStable((caseId: string, edge: Edge) => setActive({ caseId, edge }));
  const bracketBlur = useStable(() => setActive(null));
  const holdOrigin = useStable((caseId: string, x0: number | null, phase: Phase) => {
    setFrozen((before) => (phase === "drag" ? (before ?? computed) : null));
    props.onHoldOrigin(caseId, x0, phase);
    if (phase !== "drag") say(caseId);
  });
  const pick = useStable(props.onPick);
  const hover = useStable((caseId: string, x: number | null) => {
    setHover((before) =>
      before?.caseId === caseId && before.x === x ? before : x === null ? null : { caseId, x },
    );
    props.onHover?.(caseId, x);
  });
  const show = useStable((caseId: string, x: number) => props.onShowStation?.(caseId, x));
  const cancelReading = useStable((caseId: string) => props.onCancelReading?.(caseId));
  return useMemo<LaneActions>(
    () => ({
      windowStart,
      windowDrag,
      windowEnd,
      windowKeysEnd,
      windowCancel,
      windowKey,
      windowBack,
      bracketFocus,
      bracketBlur,
      holdOrigin,
      pick,
      hover,
      show,
      cancelReading,
    }),
    [
      windowStart,
      windowDrag,
      windowEnd,
      windowKeysEnd,
      windowCancel,
      windowKey,
      windowBack,
      bracketFocus,
      bracketBlur,
      holdOrigin,
      pick,
      hover,
      show,
      cancelReading,
    ],
  );
}
