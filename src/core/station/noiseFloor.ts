import { bandBorders } from "./bandBorders.ts";

/** How a spectrum ends: where the integral of k² E is cut, and what is subtracted below the cut. */
export interface NoiseRule {
  /** Level of the noise, in the unit of E; 0: none was seen. */
  readonly floor: number;
  /** Bands 0 … cut - 1, counted down from Nyquist, are left out. */
  readonly cut: number;
  /** First bin that is left out; size/2 + 1 where none is. */
  readonly cutBin: number;
  /** Estimated share of ∫k²E dk that lies beyond the cut; 0 without a cut. */
  readonly shareBeyond: number;
  /** Log-log slope over the top third of the spectrum. */
  readonly slope: number;
}

/**
 * Noise floor of a spectrum: where the log-log slope over the top third of the wavenumbers is above -1, the mean
 * there is the floor. The spectrum is cut at the first band below which k L11 > 3 and E < 2 floor.
 * @param density  one-sided spectrum, bins 0 … size/2
 * @param size     samples a segment
 * @param scaleBin bin at which k L11 = 3: a spectrum is not cut in its energetic range
 * @returns        the rule; without a floor nothing is cut
 */
export function noiseFloor(density: Float64Array, size: number, scaleBin: number): NoiseRule {
  const top = Math.max(1, Math.ceil(size / 3));
  const slope = logSlope(density, top, size / 2);
  const none = { floor: 0, cut: 0, cutBin: size / 2 + 1, shareBeyond: 0, slope };
  if (!(slope > -1)) return none;
  const floor = meanOf(density, top, size / 2 + 1);
  const borders = bandBorders(size);
  for (let band = borders.length - 1; band >= 0; band--) {
    const from = borders[band];
    const to = band === 0 ? size / 2 + 1 : borders[band - 1];
    if (to <= from || from < scaleBin || meanOf(density, from, to) >= 2 * floor) continue;
    return { floor, cut: band + 1, cutBin: from, shareBeyond: share(density, floor, from), slope };
  }
  return { ...none, floor };
}

/** Bin of a segment's spectrum at which k L11 = 3, since k L11 = 2πf T_int. */
export function scaleBin(segment: number, integralSteps: number): number {
  return (3 * segment) / (2 * Math.PI * Math.max(integralSteps, 1e-3));
}

function meanOf(density: Float64Array, from: number, to: number): number {
  let sum = 0;
  for (let f = from; f < to; f++) sum += density[f];
  return to > from ? sum / (to - from) : 0;
}

/** Slope of ln E against ln k by least squares, every bin weighing as its share of the logarithm. */
function logSlope(density: Float64Array, from: number, to: number): number {
  let weight = 0;
  let sx = 0;
  let sy = 0;
  let sxx = 0;
  let sxy = 0;
  for (let f = from; f <= to; f++) {
    if (!(density[f] > 0)) continue;
    const w = 1 / f;
    const x = Math.log(f);
    const y = Math.log(density[f]);
    weight += w;
    sx += w * x;
    sy += w * y;
    sxx += w * x * x;
    sxy += w * x * y;
  }
  const spread = weight * sxx - sx * sx;
  return spread > 0 ? (weight * sxy - sx * sy) / spread : -Infinity;
}

/** Share of ∫k²E dk beyond the cut: an exponential fitted to E - floor over the octave below it. */
function share(density: Float64Array, floor: number, cut: number): number {
  let below = 0;
  for (let f = 1; f < cut; f++) below += f * f * (density[f] - floor);
  let n = 0;
  let sx = 0;
  let sy = 0;
  let sxx = 0;
  let sxy = 0;
  for (let f = Math.max(1, Math.floor(cut / 2)); f < cut; f++) {
    const level = density[f] - floor;
    if (!(level > 0)) continue;
    n++;
    sx += f;
    sy += Math.log(level);
    sxx += f * f;
    sxy += f * Math.log(level);
  }
  const spread = n * sxx - sx * sx;
  if (!(spread > 0) || !(below > 0)) return 1;
  const rate = -(n * sxy - sx * sy) / spread;
  if (!(rate > 0)) return 1;
  const level = Math.exp((sy + rate * sx) / n - rate * cut);
  // ∫ f² e^(-rate (f - cut)) df from the cut to infinity
  const beyond = level * (cut ** 2 / rate + (2 * cut) / rate ** 2 + 2 / rate ** 3);
  return beyond / (below + beyond);
}
