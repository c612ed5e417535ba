import type { PowerLaw } from "../../core/decayResult.ts";
import type { Quantity } from "../../core/quantity.ts";
import type { Axis } from "../../sheet/workspace.ts";

/**
 * All that the ruler shows and all that it asks for. It keeps no results: what it changes comes back as new
 * props. Lanes are memoised on their `RulerCase`, so a case that did not change must keep its identity.
 * An empty `cases` draws the blank ruler of the empty page.
 */
export interface RulerProps {
  readonly cases: readonly RulerCase[];
  readonly axis: Axis;
  /** Unit of x as printed, "m"; "" for a non-dimensional case. */
  readonly units: string;
  /** "t" for a box that decays in time: the symbols turn to t and t0. */
  readonly along?: "x" | "t";
  readonly body?: RulerBody | null;
  readonly picked: readonly RulerPick[];
  /** A station pointed at elsewhere (table row, figure): the same thin line as under the pointer. */
  readonly hovered?: { readonly caseId: string; readonly x: number } | null;

  /**
   * Called once for each case that moves, all with `allCases` true when one drag moves them together.
   * "drag": live, many a second · "rest": done, one step of undo · "cancel": what was live is dropped, and this
   * is what stood before it. Escape after a rest is a rest with the earlier window.
   */
  readonly onWindow: (caseId: string, window: RulerWindow, phase: Phase, allCases: boolean) => void;
  readonly onAxis: (axis: Axis) => void;
  readonly onPick: (caseId: string, x: number, picked: boolean) => void;
  /** x0 in the unit of x; null frees it. */
  readonly onHoldOrigin: (caseId: string, x0: number | null, phase: Phase) => void;
  readonly onHover?: (caseId: string, x: number | null) => void;
  readonly onBody?: (x: number, phase: Phase) => void;
  /** Enter on a station: show its row. */
  readonly onShowStation?: (caseId: string, x: number) => void;
  /** The page has a voice of its own for what a bracket changes: the ruler's live region is left out. */
  readonly quiet?: boolean;
  /** Absent: no Cancel beside what is being read. */
  readonly onCancelReading?: (caseId: string) => void;
}

export type RulerWindow = readonly [number, number] | "auto";
export type Phase = "drag" | "rest" | "cancel";

export interface RulerCase {
  readonly id: string;
  readonly name: string;
  /** Index of colour, marker and dash, from 0. */
  readonly mark: number;
  /** In the order of x. */
  readonly stations: readonly RulerStation[];
  readonly law: PowerLaw | null;
  /** The law's intensity is `lawTu` √q; see lawTuFactor. Null: no band. */
  readonly lawTu: number | null;
  /** First and last x of the fit; null while there is none: no brackets. */
  readonly window: readonly [number, number] | null;
  readonly windowChosen: "auto" | "given";
  readonly n: Quantity;
  /** In the unit of x. */
  readonly x0: Quantity;
  readonly originHeld: boolean;
  /** ell; null where the case has none. */
  readonly length: number | null;
  /** Symbol of ell, "M". */
  readonly symbol: string;
  readonly state: LaneState;
  /** Where one more measurement would narrow the intervals most, while that is asked for. */
  readonly plans?: readonly RulerPlan[];
}

/** A station to be added, or one whose record is to be doubled. */
export interface RulerPlan {
  readonly kind: "station" | "record";
  readonly x: number;
}

export interface RulerStation {
  readonly x: number;
  /** A fraction, 0.06 for 6 %; null where it is not known. */
  readonly Tu: number | null;
  /** well: 1000 integral times or more · fair: 200 to 1000 · none: no interval · waiting: not yet read · read: its file is in. */
  readonly quality: "well" | "fair" | "none" | "waiting" | "read";
  /** Why there is no interval, one clause without a stop: "record too short". */
  readonly why?: string;
}

export type LaneState =
  | { readonly kind: "ready" }
  /** Numbers older than 100 ms of work: grey on dots, aria-busy. */
  | { readonly kind: "stale" }
  /** `amount` as "2.1 of 3.8 GB". */
  | { readonly kind: "reading"; readonly done: number; readonly total: number; readonly amount: string }
  /** No law, and why in a few words: "no law yet", "3 stations: no law". */
  | { readonly kind: "open"; readonly note: string };

export interface RulerBody {
  readonly x: number;
  readonly name: string;
  /** Streamwise length: the dot is drawn to scale when that gives 7 px or more. */
  readonly chord?: number | null;
  /** Where it stands in each case, where that differs; null: nowhere. The dot is that of the first that has one. */
  readonly places?: readonly (number | null)[];
  /** What is met there, for the live region: "Tu 3.34 percent in screen". */
  readonly readings?: string;
}

export interface RulerPick {
  readonly caseId: string;
  readonly x: number;
  readonly letter: string;
}
