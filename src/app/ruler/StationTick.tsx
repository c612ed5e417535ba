import { tickLength } from "./laneHeight.ts";
import type { RulerStation } from "./rulerProps.ts";

/** A station's tick: as long as its Tu; thin where fairly sampled, hollow without an interval, small while unread. */
export function StationTick({ station, px, height }: { station: RulerStation; px: number; height: number }) {
  const { quality } = station;

  if (quality === "waiting" || quality === "read") {
    return <rect className={`ruler-tick ${quality}`} x={px - 1.5} y={height / 2 - 4} width={3} height={8} />;
  }
  const length = tickLength(station.Tu, height);
  if (quality === "none") {
    const tall = Math.max(8, length);
    return (
      <rect className="ruler-tick none" x={px - 2.2} y={(height - tall) / 2} width={4.4} height={tall} />
    );
  }
  const wide = quality === "well" ? 3.5 : 1.5;
  return (
    <rect className="ruler-tick" x={px - wide / 2} y={(height - length) / 2} width={wide} height={length} />
  );
}
