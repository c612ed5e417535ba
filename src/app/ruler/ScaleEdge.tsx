import { formatNumber } from "../../figures/formatNumber.ts";
import type { RulerScale } from "./rulerScale.ts";

/** Height of the scale's row: 34 px with the head's edge. */
const height = 34;

/** The head's lower edge as a graduated scale: numerals, and ticks that stand on the edge. */
export function ScaleEdge({ scale, blank = false }: { scale: RulerScale; blank?: boolean }) {
  const { from, to, width, ticks } = scale;
  const px = (value: number) => ((value - from) / (to - from)) * width;
  const path = (marks: readonly number[], length: number) =>
    marks.map((mark) => `M${px(mark).toFixed(1)} ${height}v${-length}`).join("");
  return (
    <svg className="ruler-scale" width={width} height={height} aria-hidden="true" focusable="false">
      <path className="major" d={path(ticks.majors, 11)} />
      <path className="minor" d={path(ticks.minors, 6)} />
      {!blank &&
        ticks.majors.map((mark) => (
          <text key={mark} x={px(mark)} y={17}>
            {formatNumber(mark, mark === 0 ? 0 : ticks.decimals)}
          </text>
        ))}
    </svg>
  );
}
