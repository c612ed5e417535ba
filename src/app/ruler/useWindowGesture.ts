import { useRef, useState } from "react";
import type { BracketMove } from "./bracketKeys.ts";
import { gestureWindows, type MovableLane } from "./gestureWindows.ts";
import type { RulerCase, RulerProps, RulerWindow } from "./rulerProps.ts";
import type { RulerScale } from "./rulerScale.ts";
import { type Edge, type StationWindow, sameWindow } from "./snapWindow.ts";

/** A bracket on its way, with everything that is needed to put it back. */
export interface WindowGesture {
  readonly caseId: string;
  readonly edge: Edge;
  readonly byPointer: boolean;
  readonly lanes: readonly MovableLane[];
  /** The scale keeps still while a bracket moves. */
  readonly scale: RulerScale;
  readonly restore: ReadonlyMap<string, RulerWindow>;
  readonly windows: ReadonlyMap<string, StationWindow>;
  /** Lanes that were told of a change, so that they hear of its end. */
  readonly told: ReadonlySet<string>;
}

interface Host {
  readonly cases: readonly RulerCase[];
  readonly scale: RulerScale;
  readonly onWindow: RulerProps["onWindow"];
  /** After a bracket has come to rest. */
  readonly rested: (caseId: string) => void;
}

export function windowAsChosen(one: RulerCase): RulerWindow {
  return one.windowChosen === "auto" || one.window === null ? "auto" : one.window;
}

function sameChoice(one: RulerWindow, other: RulerWindow): boolean {
  return one === "auto" || other === "auto" ? one === other : sameWindow(one, other);
}

/** Moves brackets by pointer or key: live while it moves, one change when it rests, all back when cancelled. */
export function useWindowGesture({ cases, scale, onWindow, rested }: Host) {
  const [gesture, setGesture] = useState<WindowGesture | null>(null);
  const live = useRef<WindowGesture | null>(null);
  const keep = (next: WindowGesture | null) => {
    live.current = next;
    setGesture(next);
  };
  const begin = (caseId: string, edge: Edge, all: boolean, byPointer: boolean) => {
    const lanes = movableLanes(cases, scale).filter(({ id }) => all || id === caseId);
    const windows = new Map(lanes.map(({ id, window }) => [id, window]));
    const restore = new Map(cases.map((one) => [one.id, windowAsChosen(one)]));
    keep({ caseId, edge, byPointer, lanes, scale, restore, windows, told: new Set() });
  };
  const move = (windows: ReadonlyMap<string, StationWindow>) => {
    const held = live.current;
    if (held === null) return;
    const changed = [...windows].filter(
      ([id, window]) => !sameWindow(window, held.windows.get(id) ?? window),
    );
    if (changed.length === 0) return;
    keep({ ...held, windows, told: new Set([...held.told, ...changed.map(([id]) => id)]) });
    for (const [id, window] of changed) onWindow(id, window, "drag", held.lanes.length > 1);
  };
  const finish = (kept: boolean) => {
    const held = live.current;
    if (held === null) return;
    keep(null);
    for (const { id, window } of held.lanes.filter((lane) => held.told.has(lane.id))) {
      const now = held.windows.get(id) ?? window;
      const rests = kept && !sameWindow(now, window);
      const back = held.restore.get(id) ?? "auto";
      onWindow(id, rests ? now : back, rests ? "rest" : "cancel", held.lanes.length > 1);
    }
    rested(held.caseId);
  };
  return {
    gesture,
    windowStart: (caseId: string, edge: Edge, all: boolean) => begin(caseId, edge, all, true),
    windowDrag: (dx: number) => {
      if (live.current !== null) move(gestureWindows(live.current.lanes, live.current.edge, dx));
    },
    windowEnd: () => finish(true),
    /** A key has been let go of; letting go of Shift does not end a drag. */
    windowKeysEnd: () => {
      if (live.current?.byPointer === false) finish(true);
    },
    windowCancel: () => finish(false),
    windowKey: (caseId: string, edge: Edge, key: BracketMove) => {
      if (key.kind === "move") {
        if (live.current === null) begin(caseId, edge, false, false);
        move(new Map([[caseId, key.window]]));
      } else if (key.kind === "automatic") {
        finish(true);
        onWindow(caseId, "auto", "rest", false);
        rested(caseId);
      }
    },
    windowBack: (caseId: string, window: RulerWindow) => {
      const one = cases.find(({ id }) => id === caseId);
      const stood = live.current?.restore.get(caseId) ?? (one ? windowAsChosen(one) : window);
      // What is on its way is dropped; what has come to rest since is changed back, as a change of its own.
      finish(false);
      if (!sameChoice(stood, window)) onWindow(caseId, window, "rest", false);
      rested(caseId);
    },
  };
}

function movableLanes(cases: readonly RulerCase[], scale: RulerScale): MovableLane[] {
  return cases.flatMap(({ id, stations, window }, i) => {
    const map = scale.maps[i] ?? null;
    return map === null || window === null ? [] : [{ id, stations: stations.map(({ x }) => x), map, window }];
  });
}
