import { useMemo, useState } from "react";
import "./ruler.css";
import { Across } from "./Across.tsx";
import { AxisSwitch } from "./AxisSwitch.tsx";
import { axisChoices } from "./axisChoices.ts";
import { BlankRuler } from "./BlankRuler.tsx";
import { DragTag } from "./DragTag.tsx";
import { Lane } from "./Lane.tsx";
import { laneHeight } from "./laneHeight.ts";
import type { RulerPick, RulerProps } from "./rulerProps.ts";
import { type RulerScale, rulerScale } from "./rulerScale.ts";
import { ScaleEdge } from "./ScaleEdge.tsx";
import { Stepper } from "./Stepper.tsx";
import type { Edge } from "./snapWindow.ts";
import { lawSpoken, placeDecimals } from "./spokenText.ts";
import { useLaneActions } from "./useLaneActions.ts";
import { useMedia } from "./useMedia.ts";
import { useSlide } from "./useSlide.ts";
import { useSpoken } from "./useSpoken.ts";
import { useStable } from "./useStable.ts";
import { useWidth } from "./useWidth.ts";
import { useWindowGesture } from "./useWindowGesture.ts";
import { withVariables } from "./withVariables.ts";

const noPicks: readonly RulerPick[] = [];

/**
 * The streamwise ruler: a lane for each case with its stations, the band of its law, the brackets of its fit
 * window and the flag of its virtual origin, over the scale that is the head's lower edge.
 */
export function Ruler(props: RulerProps) {
  const [column, width] = useWidth(890);
  return (
    // biome-ignore lint/a11y/useSemanticElements: a fieldset is for forms
    <div className="ruler" role="group" aria-label="Streamwise ruler">
      {props.cases.length === 0 ? (
        <div className="ruler-foot blank">
          <div className="ruler-switch" />
          <div ref={column} className="ruler-column">
            <BlankRuler width={width} />
          </div>
        </div>
      ) : (
        <FilledRuler {...props} column={column} width={width} />
      )}
    </div>
  );
}

type FilledProps = RulerProps & {
  readonly column: ReturnType<typeof useWidth>[0];
  readonly width: number;
};

function FilledRuler({ column, width, ...props }: FilledProps) {
  const { cases, units, along = "x" } = props;
  const choices = useMemo(() => axisChoices(cases, units, along), [cases, units, along]);
  const axis = choices.some((choice) => choice.axis === props.axis) ? props.axis : "x";
  const computed = useMemo(() => rulerScale(cases, axis, width), [cases, axis, width]);
  const toSay = useStable((caseId: string) => {
    const one = cases.find(({ id }) => id === caseId);
    if (one === undefined) return "";
    return one.state.kind === "stale" ? null : lawSpoken(one, units);
  });
  const { spoken, say } = useSpoken(toSay);
  const gestures = useWindowGesture({ cases, scale: computed, onWindow: props.onWindow, rested: say });
  const { gesture } = gestures;
  const [active, setActive] = useState<{ caseId: string; edge: Edge } | null>(null);
  const [hover, setHover] = useState<{ caseId: string; x: number } | null>(null);
  const [frozen, setFrozen] = useState<RulerScale | null>(null);
  const actions = useLaneActions({ props, gestures, computed, setActive, setHover, setFrozen, say });
  const scale = gesture?.scale ?? frozen ?? computed;
  const still = useMedia("(prefers-reduced-motion: reduce)");
  const maps = useSlide(scale.maps, axis, still);
  const height = laneHeight(cases.length, useMedia("(max-height: 699px)"));
  const stepped = useMedia("(max-width: 959px), (pointer: coarse)");
  const decimals = useMemo(
    () => placeDecimals(cases.flatMap((one) => one.stations.map(({ x }) => x))),
    [cases],
  );
  const picks = useMemo(() => picksByCase(props.picked), [props.picked]);
  const ghosts = useMemo(
    () => new Map(gesture?.lanes.map(({ id, window }) => [id, { edge: gesture.edge, window }])),
    [gesture?.lanes, gesture?.edge],
  );
  const windowOf = (id: string) =>
    gesture?.windows.get(id) ?? cases.find((one) => one.id === id)?.window ?? null;
  const spokenScale = { units, decimals };
  const stepping = stepped && active !== null ? cases.find(({ id }) => id === active.caseId) : undefined;
  const steppingWindow = stepping === undefined ? null : windowOf(stepping.id);
  return (
    <>
      <div className="ruler-foot">
        <AxisSwitch choices={choices} axis={axis} along={along} onAxis={props.onAxis} />
        <div ref={column} className="ruler-column">
          <ScaleEdge scale={scale} />
          <DragTag gesture={gesture} axis={axis} decimals={decimals} />
        </div>
      </div>
      <div
        className={`ruler-lanes${cases.length > 6 ? " scrolls" : ""}`}
        style={withVariables({ "--n": cases.length, "--lane-height": `${height}px` })}
        data-lane={height}
      >
        {cases.map((one, i) => (
          <Lane
            key={one.id}
            one={one}
            order={i}
            at={maps[i]?.at ?? null}
            perX={maps[i]?.perX ?? null}
            width={width}
            height={height}
            units={units}
            decimals={decimals}
            along={along}
            window={windowOf(one.id)}
            ghost={gesture?.byPointer ? (ghosts.get(one.id) ?? null) : null}
            picks={picks.get(one.id) ?? noPicks}
            activeEdge={stepped && active?.caseId === one.id ? active.edge : null}
            cancels={props.onCancelReading !== undefined}
            actions={actions}
          />
        ))}
        <Across
          cases={cases}
          maps={maps}
          width={width}
          height={height}
          body={props.body ?? null}
          onBody={props.onBody ?? null}
          hover={hover ?? props.hovered ?? null}
          gesture={gesture}
          scale={spokenScale}
        />
      </div>
      {stepping && active && steppingWindow && (
        <Stepper
          one={stepping}
          edge={active.edge}
          window={steppingWindow}
          scale={spokenScale}
          onStep={(window) => {
            props.onWindow(stepping.id, window, "rest", false);
            say(stepping.id);
          }}
        />
      )}
      <p className="spoken" aria-live="polite">
        {spoken}
      </p>
    </>
  );
}

function picksByCase(picked: readonly RulerPick[]): ReadonlyMap<string, readonly RulerPick[]> {
  const ids = new Set(picked.map(({ caseId }) => caseId));
  return new Map([...ids].map((id) => [id, picked.filter(({ caseId }) => caseId === id)]));
}
