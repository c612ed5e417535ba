import { useMemo, useState } from "react";
import { positionDecimals } from "../../figures/positionDecimals.ts";
import type { Axis } from "../../sheet/workspace.ts";
import { axisChoices } from "./axisChoices.ts";
import { laneHeight } from "./laneHeight.ts";
import type { Phase, RulerCase, RulerProps } from "./rulerProps.ts";
import { type RulerScale, rulerScale } from "./rulerScale.ts";
import type { Edge, StationWindow } from "./snapWindow.ts";
import { bodySpoken, lawSpoken } from "./spokenText.ts";
import { useLaneActions } from "./useLaneActions.ts";
import { useMedia } from "./useMedia.ts";
import { useSlide } from "./useSlide.ts";
import { useSpoken } from "./useSpoken.ts";
import { useStable } from "./useStable.ts";
import { useWindowGesture } from "./useWindowGesture.ts";

export type RulerView = ReturnType<typeof useRulerView>;

/** All that the ruler works out from its props, and the little it keeps: what is moved, pointed at, stepped. */
export function useRulerView(props: RulerProps, width: number) {
  const { cases, onWindow } = props;
  const { choices, axis, decimals } = useAxis(props);
  const computed = useMemo(() => rulerScale(cases, axis, width), [cases, axis, width]);
  const { spoken, say } = useRulerVoice(props, decimals);
  const { gesture, ...moves } = useWindowGesture({ cases, scale: computed, onWindow, rested: say });
  const [active, setActive] = useState<{ caseId: string; edge: Edge } | null>(null);
  const [hover, setHover] = useState<{ caseId: string; x: number } | null>(null);
  const [frozen, setFrozen] = useState<RulerScale | null>(null);
  const actions = useLaneActions({ props, moves, computed, setActive, setHover, setFrozen, say });
  const scale = gesture?.scale ?? frozen ?? computed;
  const maps = useSlide(scale.maps, axis, useMedia("(prefers-reduced-motion: reduce)"));
  const height = laneHeight(cases.length, useMedia("(max-height: 699px)"));
  const windowOf = (one: RulerCase) => gesture?.windows.get(one.id) ?? one.window;
  const ghosts = useMemo(() => {
    const moved = gesture?.byPointer ? gesture.lanes : [];
    return new Map(moved.map(({ id, window }) => [id, { edge: gesture?.edge ?? "start", window }]));
  }, [gesture?.lanes, gesture?.edge, gesture?.byPointer]);
  const fingers = useMedia("(max-width: 959px), (pointer: coarse)");
  const stepping = fingers && active !== null ? steppingOf(cases, active, windowOf) : null;
  const step = (window: StationWindow | "auto") => {
    if (active === null) return;
    onWindow(active.caseId, window, "rest", false);
    say(active.caseId);
  };
  const moveBody = (x: number, phase: Phase) => {
    props.onBody?.(x, phase);
    if (phase !== "drag") say(bodyVoice);
  };
  return {
    ...{ choices, axis, decimals, scale, maps, height, gesture, ghosts, hover, spoken, actions },
    ...{ windowOf, stepping, step, moveBody },
  };
}

/** The axes there are, and the one that is drawn: x where the wanted one has no meaning. */
function useAxis({ cases, units, along = "x", axis: wanted }: RulerProps) {
  const choices = useMemo(() => axisChoices(cases, units, along), [cases, units, along]);
  const axis: Axis = choices.some((choice) => choice.axis === wanted) ? wanted : "x";
  const decimals = useMemo(
    () => positionDecimals(cases.flatMap(({ stations }) => stations.map(({ x }) => x))),
    [cases],
  );
  return { choices, axis, decimals };
}

/** In place of a case's id: it is the body that is spoken of. */
const bodyVoice = "body of all cases";

function useRulerVoice({ cases, units, body }: RulerProps, decimals: number) {
  const text = useStable((caseId: string) => {
    if (caseId === bodyVoice) return body ? bodySpoken(body, { units, decimals }) : "";
    const one = cases.find(({ id }) => id === caseId);
    if (one === undefined) return "";
    return one.state.kind === "stale" ? null : lawSpoken(one, units);
  });
  return useSpoken(text);
}

function steppingOf(
  cases: readonly RulerCase[],
  { caseId, edge }: { readonly caseId: string; readonly edge: Edge },
  windowOf: (one: RulerCase) => StationWindow | null,
) {
  const one = cases.find(({ id }) => id === caseId);
  const window = one === undefined ? null : windowOf(one);
  return one === undefined || window === null ? null : { one, edge, window };
}
