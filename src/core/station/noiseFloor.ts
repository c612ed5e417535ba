import { logSlope } from "../signal/logSlope.ts";
import { bandBorders } from "./bandBorders.ts";
import { type SpectrumTail, spectrumTail, tailMoment } from "./spectrumTail.ts";

/** How a spectrum ends: what is subtracted, where the integral of k² E is cut, and what goes on beyond. */
export interface NoiseRule {
  /** Level of the noise, in the unit of E; 0: none was seen. */
  readonly floor: number;
  /** Bands 0 … cut - 1, counted down from Nyquist, are left out. */
  readonly cut: number;
  /** First bin that is left out; size/2 + 1 where none is. */
  readonly cutBin: number;
  /** What stands for the spectrum beyond the cut; null without a cut, or where none could be fitted. */
  readonly tail: SpectrumTail | null;
  /** Share of ∫k²E dk that lies beyond the cut, by the tail; 0 without a cut, 1 where no tail could be fitted. */
  readonly shareBeyond: number;
  /** Log-log slope over the top third of the spectrum. */
  readonly slope: number;
}

/** A floor is looked for over these shares of the spectrum at its top, the widest that is flat decides. */
const tops = [1 / 3, 1 / 6, 1 / 12];
/** A log-log slope above this is a floor: turbulence falls faster at any wavenumber that matters to the gradient. */
const flat = -1;
/** The cut: the first band below so many floors. */
const multiple = 2;

/**
 * Noise floor of a spectrum. Where the log-log slope over the top third of the wavenumbers is above -1, the mean
 * there is the floor; a floor that shows at the very end only is found over the top sixth or twelfth. The spectrum
 * is cut at the first band below which k L11 > 3 and E < 2 floor: beyond it the floor's own scatter, weighed with
 * k², would outweigh the signal. What was cut off is added back as an exponential fitted to the octave below the
 * cut (see spectrumTail), for at strong noise it is a tenth of the gradient.
 * @param density  one-sided spectrum, bins 0 … size/2
 * @param size     samples a segment
 * @param scaleBin bin at which k L11 = 3: a spectrum is not cut in its energetic range
 * @param shift    bands by which the cut is moved, upward in wavenumber if positive: for its sensitivity
 * @returns        the rule; without a floor nothing is cut
 */
export function noiseFloor(density: Float64Array, size: number, scaleBin: number, shift = 0): NoiseRule {
  const half = size / 2;
  const from = (share: number) => Math.max(1, Math.ceil(half * (1 - share)));
  const slope = logSlope(density, from(tops[0]), half);
  const none = { floor: 0, cut: 0, cutBin: half + 1, tail: null, shareBeyond: 0, slope };
  const top = tops.find((share) => logSlope(density, from(share), half) > flat);
  if (top === undefined) return none;
  const floor = meanOf(density, from(top), half + 1);
  const borders = bandBorders(size);
  for (let band = borders.length - 1; band >= 0; band--) {
    const to = band === 0 ? half + 1 : borders[band - 1];
    if (to <= borders[band] || borders[band] < scaleBin) continue;
    if (meanOf(density, borders[band], to) >= multiple * floor) continue;
    const cut = Math.min(Math.max(band + 1 - shift, 1), borders.length - 1);
    return { floor, slope, ...ended(density, floor, size, cut) };
  }
  return { ...none, floor };
}

/** Bin of a segment's spectrum at which k L11 = 3, since k L11 = 2πf T_int. */
export function scaleBin(segment: number, integralSteps: number): number {
  return (3 * segment) / (2 * Math.PI * Math.max(integralSteps, 1e-3));
}

function ended(density: Float64Array, floor: number, size: number, cut: number) {
  const cutBin = bandBorders(size)[cut - 1];
  const tail = spectrumTail(density, floor, size, cut);
  let below = 0;
  for (let f = 1; f < cutBin; f++) below += f * f * (density[f] - floor);
  const beyond = tail === null ? 0 : tailMoment(tail);
  const shareBeyond = tail === null || !(below > 0) ? 1 : beyond / (below + beyond);
  return { cut, cutBin, tail, shareBeyond };
}

function meanOf(density: Float64Array, from: number, to: number): number {
  let sum = 0;
  for (let f = from; f < to; f++) sum += density[f];
  return to > from ? sum / (to - from) : 0;
}
