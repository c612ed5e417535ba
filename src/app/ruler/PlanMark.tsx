import type { RulerPlan } from "./rulerProps.ts";

/** From the edge that a place off the scale is marked at, px. */
const edge = 8;

/** Where one more measurement would narrow the intervals: a plus for a new station, an open wedge over one to be longer. */
export function PlanMark({
  kind,
  px,
  width,
  height,
}: {
  kind: RulerPlan["kind"];
  px: number;
  width: number;
  height: number;
}) {
  const at = Math.min(Math.max(px, edge), width - edge);
  if (kind === "record") return <path className="ruler-plan" d={`M${at} 8l-4.2 -5.5h8.4z`} />;
  const foot = height - 7;
  const off = px > width ? `M${at + 5} ${foot - 3}l3 3l-3 3` : "";
  return <path className="ruler-plan" fill="none" d={`M${at - 4} ${foot}h8M${at} ${foot - 4}v8${off}`} />;
}
