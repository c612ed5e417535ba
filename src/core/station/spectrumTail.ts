import { bandBorders } from "./bandBorders.ts";

/** An exponential that stands for a spectrum beyond bin `from`: E = level e^(-rate (f - from)). */
export interface SpectrumTail {
  /** First bin beyond the cut. */
  readonly from: number;
  readonly level: number;
  /** Per bin, > 0. */
  readonly rate: number;
}

/** Bands in an octave, at twenty a decade. */
const octave = 6;

/**
 * The tail beyond a cut: an exponential fitted to E - floor in the bands of the octave below it, each weighing as
 * its scatter allows, w = n ((E - floor)/E)² for n bins. In the far dissipation range a spectrum of turbulence
 * falls exponentially in k.
 * @param density  one-sided spectrum, bins 0 … size/2
 * @param floor    noise, subtracted
 * @param cut      bands left out, counted down from Nyquist; ≥ 1
 * @returns        null where the octave does not fall
 * @see   Pope (2000) §6.5.3 on the exponential form; Kraichnan (1959), J. Fluid Mech. 5, 497
 */
export function spectrumTail(
  density: Float64Array,
  floor: number,
  size: number,
  cut: number,
): SpectrumTail | null {
  const borders = bandBorders(size);
  const from = borders[cut - 1];
  let weight = 0;
  let sx = 0;
  let sy = 0;
  let sxx = 0;
  let sxy = 0;
  for (let band = cut; band < Math.min(cut + octave, borders.length); band++) {
    const n = borders[band - 1] - borders[band];
    if (n < 1) continue;
    let sum = 0;
    for (let f = borders[band]; f < borders[band - 1]; f++) sum += density[f];
    const level = sum / n - floor;
    if (!(level > 0)) continue;
    const w = n * (level / (sum / n)) ** 2;
    const x = (borders[band] + borders[band - 1] - 1) / 2 - from;
    const y = Math.log(level);
    weight += w;
    sx += w * x;
    sy += w * y;
    sxx += w * x * x;
    sxy += w * x * y;
  }
  const spread = weight * sxx - sx * sx;
  const rate = spread > 0 ? -(weight * sxy - sx * sy) / spread : 0;
  if (!(rate > 0)) return null;
  return { from, level: Math.exp((sy + rate * sx) / weight), rate };
}

/** Σ f² E beyond the cut: ∫ f² level e^(-rate (f - from)) df from half a bin below the first one to infinity. */
export function tailMoment({ from, level, rate }: SpectrumTail): number {
  const edge = from - 0.5;
  const height = level * Math.exp(rate / 2);
  return height * (edge ** 2 / rate + (2 * edge) / rate ** 2 + 2 / rate ** 3);
}
