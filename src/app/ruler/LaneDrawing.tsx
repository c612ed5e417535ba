import { useMemo } from "react";
import { bandPath, bandShape, cutBand, sidePath } from "./bandShape.ts";
import { OriginDrawing } from "./OriginDrawing.tsx";
import { PlanMark } from "./PlanMark.tsx";
import type { RulerCase, RulerPick } from "./rulerProps.ts";
import type { LaneMap } from "./rulerScale.ts";
import { StationTick } from "./StationTick.tsx";
import type { Edge, StationWindow } from "./snapWindow.ts";

export interface LaneDrawingProps {
  readonly one: RulerCase;
  readonly map: LaneMap;
  readonly width: number;
  readonly height: number;
  readonly along: "x" | "t";
  /** As it is shown: while a bracket moves, ahead of the case. */
  readonly window: StationWindow | null;
  /** Where the moving bracket stood before. */
  readonly ghost: { readonly edge: Edge; readonly window: StationWindow } | null;
  readonly picks: readonly RulerPick[];
}

/** Px between a bracket and the station it encloses. */
const bracketGap = 9;

/** One lane as a drawing: window ground, band, ticks, brackets, origin, letters. Nothing in it is pressed. */
export function LaneDrawing(props: LaneDrawingProps) {
  const { one, map, width, height, window, ghost, picks } = props;
  const at = (x: number) => map.at + map.perX * x;
  const ends = window === null ? null : ([at(window[0]) - bracketGap, at(window[1]) + bracketGap] as const);
  // a case that is read anew keeps what it had until there is more
  const waits = one.law === null;
  return (
    <svg className="ruler-drawing" width={width} height={height} aria-hidden="true" focusable="false">
      {ends && (
        <rect className="ruler-window" x={ends[0]} y={1} width={ends[1] - ends[0]} height={height - 2} />
      )}
      {waits && <line className="ruler-midline" x1={0} x2={width} y1={height / 2} y2={height / 2} />}
      {!waits && <Band {...props} ends={ends} part="fill" />}
      {one.stations.map((station) => (
        <StationTick key={station.x} station={station} px={at(station.x)} height={height} />
      ))}
      {/* over the ticks, whose paper edge would break the lines */}
      {!waits && <Band {...props} ends={ends} part="sides" />}
      {one.law && one.x0.value !== null && <OriginDrawing {...props} />}
      {picks.map(({ x, letter }) => (
        <Pick key={x} px={at(x)} letter={letter} height={height} />
      ))}
      {one.plans?.map(({ kind, x }) => (
        <PlanMark key={`${kind} ${x}`} kind={kind} px={at(x)} width={width} height={height} />
      ))}
      {ghost && <BracketLine edge={ghost.edge} px={edgePx(ghost, at)} height={height} look="before" />}
      {window && (
        <>
          <BracketLine
            edge="start"
            px={at(window[0])}
            height={height}
            look={ghost?.edge === "start" ? "held" : ""}
          />
          <BracketLine
            edge="end"
            px={at(window[1])}
            height={height}
            look={ghost?.edge === "end" ? "held" : ""}
          />
        </>
      )}
    </svg>
  );
}

function edgePx({ edge, window }: { edge: Edge; window: StationWindow }, at: (x: number) => number): number {
  return at(edge === "start" ? window[0] : window[1]);
}

interface BandProps extends LaneDrawingProps {
  readonly ends: readonly [number, number] | null;
  readonly part: "fill" | "sides";
}

function Band({ one, map, width, height, ends, part }: BandProps) {
  const { law, lawTu } = one;
  const band = useMemo(
    () => (law === null || lawTu === null ? null : bandShape(law, lawTu, map, { width, height })),
    [law, lawTu, map, width, height],
  );
  if (band === null) return null;
  if (part === "sides") {
    const sides = sidePath(band, height / 2, -1) + sidePath(band, height / 2, 1);
    return <path className="ruler-band-sides" d={sides} />;
  }
  return ends && <path className="ruler-band" d={bandPath(cutBand(band, ends[0], ends[1]), height / 2)} />;
}

interface BracketLineProps {
  readonly edge: Edge;
  readonly px: number;
  readonly height: number;
  readonly look: "" | "held" | "before";
}

function BracketLine({ edge, px, height, look }: BracketLineProps) {
  const out = edge === "start" ? -1 : 1;
  const spine = px + out * bracketGap;
  const arm = spine - out * 6.5;
  return <path className={`ruler-bracket-line ${look}`} d={`M${arm} 2H${spine}V${height - 2}H${arm}`} />;
}

function Pick({ px, letter, height }: { px: number; letter: string; height: number }) {
  const foot = height - (height < 30 ? 1 : 6);
  return (
    <>
      <text className="ruler-letter" x={px} y={height < 30 ? 7 : 10}>
        {letter}
      </text>
      <path className="ruler-wedge" d={`M${px} ${foot - 5}l4.2 5h-8.4z`} />
    </>
  );
}
