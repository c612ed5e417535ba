/** Height of a lane, px: 44 for one or two cases, 34 to four, 26 beyond and in a low window. */
export function laneHeight(cases: number, lowWindow: boolean): 44 | 34 | 26 {
  if (lowWindow || cases > 4) return 26;
  return cases > 2 ? 34 : 44;
}

/** Px per unit of Tu: 2.7 px per percent in a lane of 44. */
export function tickScale(height: number): number {
  return (270 * height) / 44;
}

/**
 * Length of a station's tick, px; the band is as wide where the law has that Tu.
 * Five px at least, so that it can be seen; clipped to the lane. Without Tu a mark of fixed length.
 */
export function tickLength(Tu: number | null, height: number): number {
  if (Tu === null) return height / 4;
  return Math.min(height - 4, Math.max(5, Tu * tickScale(height)));
}
