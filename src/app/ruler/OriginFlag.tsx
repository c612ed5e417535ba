import type { LaneActions } from "./laneActions.ts";
import type { RulerCase } from "./rulerProps.ts";
import type { LaneMap } from "./rulerScale.ts";
import { originPlace } from "./spokenText.ts";
import { useOriginGrip } from "./useOriginGrip.ts";

interface OriginFlagProps {
  readonly one: RulerCase;
  readonly x0: number;
  readonly map: LaneMap;
  readonly width: number;
  readonly units: string;
  readonly actions: LaneActions;
}

/** The virtual origin as a slider: moving it holds it, Delete or a double click frees it. */
export function OriginFlag({ one, x0, map, width, units, actions }: OriginFlagProps) {
  const limit = one.window?.[0] ?? one.stations[0]?.x ?? x0;
  const length = one.length ?? width / map.perX / 100;
  const grip = useOriginGrip(one, { x0, length, limit }, map.perX, actions);
  return (
    <div
      className="ruler-grip ruler-flag"
      style={{ left: Math.min(width, Math.max(0, map.at + map.perX * x0)) }}
      role="slider"
      tabIndex={0}
      aria-label={`Virtual origin, ${one.name}`}
      aria-orientation="horizontal"
      aria-valuemin={Math.min(x0, -map.at / map.perX)}
      aria-valuemax={Math.max(x0, limit)}
      aria-valuenow={x0}
      aria-valuetext={originPlace(one, x0, units)}
      {...grip}
    />
  );
}
