import type { Panel } from "./panel.ts";
import { pointsOf } from "./pointsOf.ts";

const widthMm = 5.5;
const heightMm = 4.5;

/** Where a panel's letter stands, left edge and middle in mm: upper left, or lower left where data are in its way. */
export function letterCorner(panel: Panel): { x: number; y: number; corner: "upper" | "lower" } {
  const { box } = panel;
  const covered = pointsOf(panel).some(
    ([x, y]) => x >= box.left && x < box.left + widthMm + 1 && y <= box.top && y > box.top - heightMm - 1,
  );
  const x = box.left + 1.6;
  return covered ? { x, y: box.bottom + 2.8, corner: "lower" } : { x, y: box.top - 2.8, corner: "upper" };
}
