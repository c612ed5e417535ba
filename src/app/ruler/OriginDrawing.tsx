import type { LaneDrawingProps } from "./LaneDrawing.tsx";
import { whiskerEnds } from "./whiskerEnds.ts";

/** The flag at the virtual origin, with its 95 % whisker at the foot of the pole. */
export function OriginDrawing({ one, map, width, height, along }: LaneDrawingProps) {
  if (one.x0.value === null) return null;
  const px = map.at + map.perX * one.x0.value;
  const top = height < 30 ? 3 : 7;
  const foot = height - (height < 30 ? 4 : 7);
  const off = px < 0;
  const whisker = whiskerEnds(one.x0, map, width);
  return (
    <g className="ruler-origin">
      {off ? (
        <path className="pennant" d={`M1 ${height / 2}l8 -5v10z`} />
      ) : (
        <>
          <path className="pennant" d={`M${px} ${top}l11.5 4.6l-11.5 4.6z`} />
          <path className="pole" d={`M${px} ${top}V${foot + 2}`} />
          {one.originHeld && <path className="pole" d={`M${px - 3} ${top}V${foot + 2}`} />}
        </>
      )}
      {whisker && (
        <path
          className="whisker"
          d={`M${whisker.low} ${foot}H${whisker.high}${end(whisker.low, foot, whisker.lowLeaves, 1)}${end(
            whisker.high,
            foot,
            whisker.highLeaves,
            -1,
          )}`}
        />
      )}
      <text
        className="ruler-origin-name"
        x={off ? 13 : px - (one.originHeld ? 7 : 5)}
        y={top + 11}
        data-off={off}
      >
        {along}
        <tspan className="index" dy="3.5">
          0
        </tspan>
      </text>
    </g>
  );
}

/** A cap where the interval ends, an arrow where it goes on beyond the scale. */
function end(px: number, foot: number, leaves: boolean, inward: 1 | -1): string {
  return leaves
    ? `M${px + 5 * inward} ${foot - 3.5}L${px} ${foot}L${px + 5 * inward} ${foot + 3.5}`
    : `M${px} ${foot - 3.5}v7`;
}
