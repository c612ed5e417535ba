import type { PickedCurve } from "./figureSpec.ts";

/** 1 pt, and half of it for every further station of the same case downstream. */
export function lineWeight(one: PickedCurve, all: readonly PickedCurve[]): number {
  const upstream = all.filter(({ of, station }) => of.mark === one.of.mark && station.x < one.station.x);
  return upstream.length === 0 ? 1 : 0.5;
}
