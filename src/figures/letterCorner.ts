import type { Panel } from "./panel.ts";
import { pointsOf } from "./pointsOf.ts";

const widthMm = 6;
const heightMm = 5;

export interface Corner {
  /** Left edge and middle of the letter, mm. */
  readonly x: number;
  readonly y: number;
  readonly side: "left" | "right";
  readonly end: "upper" | "lower";
}

/** Where a panel's letter stands: upper left, or the first other corner that is free of data. */
export function letterCorner(panel: Panel): Corner {
  const { box } = panel;
  const places = pointsOf(panel);
  const corners = (["left", "right"] as const).flatMap((side) =>
    (["upper", "lower"] as const).map((end): Corner => {
      const x = side === "left" ? box.left + 1.6 : box.right - 5.4;
      return { x, y: end === "upper" ? box.top - 2.8 : box.bottom + 2.8, side, end };
    }),
  );
  const covered = corners.map(
    ({ x, y }) =>
      places.filter(
        ([across, up]) => across > x - 1.6 && across < x - 1.6 + widthMm && Math.abs(up - y) < heightMm / 2,
      ).length,
  );
  return corners[covered.indexOf(Math.min(...covered))];
}
