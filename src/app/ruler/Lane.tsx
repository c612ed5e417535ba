import { memo, useMemo } from "react";
import { Bracket } from "./Bracket.tsx";
import { LaneDrawing } from "./LaneDrawing.tsx";
import { LaneName } from "./LaneName.tsx";
import { LaneReadings } from "./LaneReadings.tsx";
import type { LaneActions } from "./laneActions.ts";
import { OriginFlag } from "./OriginFlag.tsx";
import type { RulerCase, RulerPick } from "./rulerProps.ts";
import type { LaneMap } from "./rulerScale.ts";
import { StationList } from "./StationList.tsx";
import { type Edge, onStations, type StationWindow } from "./snapWindow.ts";
import { withVariables } from "./withVariables.ts";

export interface LaneProps {
  readonly one: RulerCase;
  /** Place from the top, from 0. */
  readonly order: number;
  /** The lane's map as two numbers, so that equal maps are equal props; null: no place on this axis. */
  readonly at: number | null;
  readonly perX: number | null;
  readonly width: number;
  readonly height: number;
  readonly units: string;
  readonly decimals: number;
  readonly along: "x" | "t";
  readonly window: StationWindow | null;
  readonly ghost: { readonly edge: Edge; readonly window: StationWindow } | null;
  readonly picks: readonly RulerPick[];
  readonly activeEdge: Edge | null;
  readonly cancels: boolean;
  readonly actions: LaneActions;
}

/** One case on the ruler: name, lane, readings. Drawn anew only when something of its own has changed. */
export const Lane = memo(function Lane(props: LaneProps) {
  const { one, order, at, perX, height, units, decimals, along, actions } = props;
  const window = useMemo(() => snapped(one, props.window), [one, props.window]);
  const map = useMemo(() => (at === null || perX === null ? null : { at, perX }), [at, perX]);
  const scale = useMemo(() => ({ units, decimals }), [units, decimals]);
  const count = one.stations.length;
  const place = { "--i": order, "--case": `var(--case-${(one.mark % 6) + 1})` };
  return (
    <>
      <div className="ruler-cell left" style={withVariables(place)}>
        <LaneName one={one} window={window} scale={scale} />
      </div>
      {/* biome-ignore lint/a11y/useSemanticElements: a fieldset is for forms */}
      <div
        className="ruler-lane"
        style={withVariables(place, { height })}
        role="group"
        aria-label={`${one.name}, ${count} ${count === 1 ? "station" : "stations"}`}
      >
        {map === null ? (
          <p className="ruler-nowhere">no virtual origin, so no place on this scale</p>
        ) : (
          <LaneControls {...props} map={map} window={window} />
        )}
      </div>
      <div className="ruler-cell right" style={withVariables(place)}>
        <LaneReadings
          one={one}
          along={along}
          units={units}
          onCancel={props.cancels ? actions.cancelReading : null}
        />
      </div>
    </>
  );
});

function snapped(one: RulerCase, window: StationWindow | null): StationWindow | null {
  if (window === null || one.stations.length === 0) return null;
  return onStations(
    one.stations.map(({ x }) => x),
    window,
  );
}

function LaneControls({ map, ...props }: LaneProps & { map: LaneMap }) {
  const { one, width, height, along, window, ghost, picks, units, decimals, activeEdge, actions } = props;
  const scale = { units, decimals };
  const px = (x: number) => map.at + map.perX * x;
  const x0 = one.law === null ? null : one.x0.value;
  const bracket = (edge: Edge) =>
    window && (
      <Bracket
        one={one}
        edge={edge}
        window={window}
        px={px(edge === "start" ? window[0] : window[1])}
        scale={scale}
        active={activeEdge === edge}
        actions={actions}
      />
    );
  return (
    <>
      <LaneDrawing
        one={one}
        map={map}
        width={width}
        height={height}
        along={along}
        window={window}
        ghost={ghost}
        picks={picks}
      />
      {bracket("start")}
      {bracket("end")}
      {x0 !== null && (
        <OriginFlag one={one} x0={x0} map={map} width={width} units={units} actions={actions} />
      )}
      {one.stations.length > 0 && (
        <StationList one={one} map={map} picks={picks} scale={scale} actions={actions} />
      )}
    </>
  );
}
