/** ln Tu = level - slope ln(x - x0): the intensity of one case along its window. */
export interface IntensityLine {
  readonly level: number;
  readonly slope: number;
  readonly x0: number;
}

/**
 * Straight line of ln Tu on ln(x - x0), all stations alike.
 * @param x  stations above x0
 * @param y  ln Tu there
 * @returns  null where Tu does not fall, or a station stands at the origin
 */
export function intensityLine(x: ArrayLike<number>, y: ArrayLike<number>, x0: number): IntensityLine | null {
  const count = x.length;
  let meanS = 0;
  let meanY = 0;
  for (let i = 0; i < count; i++) {
    meanS += Math.log(x[i] - x0) / count;
    meanY += y[i] / count;
  }
  let top = 0;
  let bottom = 0;
  for (let i = 0; i < count; i++) {
    const s = Math.log(x[i] - x0) - meanS;
    top -= s * (y[i] - meanY);
    bottom += s * s;
  }
  const slope = top / bottom;
  return slope > 0 && Number.isFinite(slope) ? { level: meanY + slope * meanS, slope, x0 } : null;
}

/** Where the line has a given ln Tu. */
export function placeOfIntensity({ level, slope, x0 }: IntensityLine, logarithm: number): number {
  return x0 + Math.exp((level - logarithm) / slope);
}

/** ln Tu of the line at x above its origin. */
export function intensityAt({ level, slope, x0 }: IntensityLine, x: number): number {
  return level - slope * Math.log(x - x0);
}
