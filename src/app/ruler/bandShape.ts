import { lawDistance, lawPlace } from "../../core/decay/lawDistance.ts";
import type { PowerLaw } from "../../core/decayResult.ts";
import { tickScale } from "./laneHeight.ts";
import type { LaneMap } from "./rulerScale.ts";

/** Half width of the band along the lane, as points in px. */
export interface BandShape {
  readonly px: readonly number[];
  readonly half: readonly number[];
}

/**
 * The fitted law as a band: its full width at x is the length of a tick of Tu(x) = f √(A ((x - x0)/ell)^-n).
 * It begins where it would leave the lane and ends with the scale, a point every `every` px.
 */
export function bandShape(
  law: PowerLaw,
  lawTu: number,
  map: LaneMap,
  lane: { readonly width: number; readonly height: number },
  every = 6,
): BandShape {
  const widest = lane.height - 3;
  const scale = tickScale(lane.height) * lawTu * Math.sqrt(law.A);
  // w = scale ((x - x0)/ell)^(-n/2) solved for the x where w fills the lane.
  const reach = law.length * (widest / scale) ** (-2 / law.n);
  const begin = Math.max(0, map.at + map.perX * lawPlace(law, reach));
  if (!Number.isFinite(begin) || begin >= lane.width || law.n <= 0) return { px: [], half: [] };
  const points = Math.max(2, Math.ceil((lane.width - begin) / every) + 1);
  const px = Array.from({ length: points }, (_, i) => begin + ((lane.width - begin) * i) / (points - 1));
  const half = px.map((at) => {
    const distance = lawDistance(law, (at - map.at) / map.perX) / law.length;
    return Math.min(widest, scale * distance ** (-law.n / 2)) / 2;
  });
  return { px, half };
}

/** The part of a band between two px, its ends on the straight line between neighbouring points. */
export function cutBand({ px, half }: BandShape, from: number, to: number): BandShape {
  if (px.length === 0) return { px, half };
  const begin = Math.max(from, px[0]);
  const end = Math.min(to, px[px.length - 1]);
  if (begin >= end) return { px: [], half: [] };
  const inside = px.map((_, i) => i).filter((i) => px[i] > begin && px[i] < end);
  return {
    px: [begin, ...inside.map((i) => px[i]), end],
    half: [halfAt(px, half, begin), ...inside.map((i) => half[i]), halfAt(px, half, end)],
  };
}

function halfAt(px: readonly number[], half: readonly number[], at: number): number {
  const next = Math.max(
    1,
    px.findIndex((value) => value >= at),
  );
  const share = (at - px[next - 1]) / (px[next] - px[next - 1]);
  return half[next - 1] + (half[next] - half[next - 1]) * share;
}

/** One side of a band as an SVG path; `side` -1 above the middle, 1 below. */
export function sidePath({ px, half }: BandShape, middle: number, side: -1 | 1): string {
  return px
    .map((x, i) => `${i === 0 ? "M" : "L"}${x.toFixed(1)} ${(middle + side * half[i]).toFixed(2)}`)
    .join("");
}

/** The band as a closed path. */
export function bandPath(band: BandShape, middle: number): string {
  if (band.px.length === 0) return "";
  const back = band.px
    .map((x, i) => `L${x.toFixed(1)} ${(middle + band.half[i]).toFixed(2)}`)
    .reverse()
    .join("");
  return `${sidePath(band, middle, -1)}${back}Z`;
}
