import { useMemo } from "react";
import "./ruler.css";
import { Across } from "./Across.tsx";
import { AxisSwitch } from "./AxisSwitch.tsx";
import { BlankRuler } from "./BlankRuler.tsx";
import { DragTag } from "./DragTag.tsx";
import { Lane } from "./Lane.tsx";
import type { RulerPick, RulerProps } from "./rulerProps.ts";
import { ScaleEdge } from "./ScaleEdge.tsx";
import { Stepper } from "./Stepper.tsx";
import { type RulerView, useRulerView } from "./useRulerView.ts";
import { useWidth } from "./useWidth.ts";
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
  const view = useRulerView(props, width);
  const { axis, scale, gesture, stepping } = view;
  const spokenScale = { units, decimals: view.decimals };
  return (
    <>
      <div className="ruler-foot">
        <AxisSwitch choices={view.choices} axis={axis} along={along} onAxis={props.onAxis} />
        <div ref={column} className="ruler-column">
          <ScaleEdge scale={scale} />
          <DragTag gesture={gesture} axis={axis} decimals={view.decimals} />
        </div>
      </div>
      <div
        className={`ruler-lanes${cases.length > 6 ? " scrolls" : ""}`}
        style={withVariables({ "--n": cases.length, "--lane-height": `${view.height}px` })}
        data-lane={view.height}
      >
        <Lanes props={props} view={view} width={width} />
        <Across
          cases={cases}
          maps={view.maps}
          width={width}
          height={view.height}
          body={props.body ?? null}
          onBody={props.onBody ? view.moveBody : null}
          hover={view.hover ?? props.hovered ?? null}
          gesture={gesture}
          scale={spokenScale}
        />
      </div>
      {stepping && <Stepper {...stepping} scale={spokenScale} onStep={view.step} />}
      {!props.quiet && (
        <p className="spoken" aria-live="polite">
          {view.spoken}
        </p>
      )}
    </>
  );
}

function Lanes({ props, view, width }: { props: RulerProps; view: RulerView; width: number }) {
  const picks = useMemo(() => picksByCase(props.picked), [props.picked]);
  return props.cases.map((one, i) => (
    <Lane
      key={one.id}
      one={one}
      order={i}
      at={view.maps[i]?.at ?? null}
      perX={view.maps[i]?.perX ?? null}
      width={width}
      height={view.height}
      units={props.units}
      decimals={view.decimals}
      along={props.along ?? "x"}
      window={view.windowOf(one)}
      ghost={view.ghosts.get(one.id) ?? null}
      picks={picks.get(one.id) ?? noPicks}
      activeEdge={view.stepping?.one.id === one.id ? view.stepping.edge : null}
      cancels={props.onCancelReading !== undefined}
      actions={view.actions}
    />
  ));
}

function picksByCase(picked: readonly RulerPick[]): ReadonlyMap<string, readonly RulerPick[]> {
  const ids = new Set(picked.map(({ caseId }) => caseId));
  return new Map([...ids].map((id) => [id, picked.filter(({ caseId }) => caseId === id)]));
}
