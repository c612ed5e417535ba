import type { BracketMove } from "./bracketKeys.ts";
import type { Phase, RulerWindow } from "./rulerProps.ts";
import type { Edge } from "./snapWindow.ts";

/** What a lane's controls can ask of the ruler. One object for the ruler's life, so that lanes stay memoised. */
export interface LaneActions {
  /** A bracket is taken hold of; `all`: every case's bracket goes along. */
  readonly windowStart: (caseId: string, edge: Edge, all: boolean) => void;
  readonly windowDrag: (dx: number) => void;
  readonly windowEnd: () => void;
  readonly windowKeysEnd: () => void;
  readonly windowCancel: () => void;
  readonly windowKey: (caseId: string, edge: Edge, move: BracketMove) => void;
  /** Back to the window from before the bracket was focused. */
  readonly windowBack: (caseId: string, window: RulerWindow) => void;
  readonly bracketFocus: (caseId: string, edge: Edge) => void;
  readonly bracketBlur: () => void;
  readonly holdOrigin: (caseId: string, x0: number | null, phase: Phase) => void;
  readonly pick: (caseId: string, x: number, picked: boolean) => void;
  readonly hover: (caseId: string, x: number | null) => void;
  readonly show: (caseId: string, x: number) => void;
  readonly cancelReading: (caseId: string) => void;
}
