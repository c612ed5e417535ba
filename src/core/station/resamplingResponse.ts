import { splineAt, splineSecond } from "../signal/cubicSpline.ts";

/** Frequencies looked at, evenly up to Nyquist. */
const frequencies = 16;
/** Windows all looked at, and then every so-manieth. */
const firstWindows = 16;
const every = 128;

/**
 * What a resampling does to the gradient of a sine, with the record's own times: at each frequency the sine is
 * sampled where the record was, put onto even steps as the record is, and compared.
 */
export class ResamplingResponse {
  private readonly step: number;
  private windows = 0;
  private points = 0;
  private readonly re = new Float64Array(frequencies);
  private readonly im = new Float64Array(frequencies);

  constructor(step: number) {
    this.step = step;
  }

  /** Looks at one window of a spline: samples `from` to `to`, grid points from `first` on. */
  look(times: Float64Array, held: number, from: number, to: number, first: number, count: number): void {
    const window = this.windows++;
    if (count === 0 || (window >= firstWindows && window % every !== 0)) return;
    const [y, second, work] = [new Float64Array(held), new Float64Array(held), new Float64Array(held)];
    for (let f = 0; f < frequencies; f++) {
      const omega = omegaOf(f) / this.step;
      for (const phase of [0, Math.PI / 2]) {
        for (let i = 0; i < held; i++) y[i] = Math.cos(omega * times[i] - phase);
        splineSecond(times, y, held, second, work);
        for (let j = 0, i = from; j < count; j++) {
          const place = (first + j) * this.step;
          while (i < to - 1 && times[i + 1] <= place) i++;
          const value = splineAt(times, y, second, i, place);
          this.re[f] += value * Math.cos(omega * place - phase);
          this.im[f] += value * Math.sin(omega * place - phase);
        }
      }
    }
    this.points += 2 * count;
  }

  /**
   * Share of the mean-square gradient that the resampling takes, 1 - ∫ω² E h² dω / ∫ω² E dω, with h the amplitude
   * that is left of a sine at ω. What it puts in at other frequencies makes up for some of that, so it is no less
   * than what is lost.
   * @param density  spectral density of the resampled record, bins 0 … size/2
   * @returns        a share; 0 where nothing was resampled
   */
  loss(density: Float64Array): number {
    if (this.points === 0) return 0;
    const half = density.length - 1;
    let [whole, kept] = [0, 0];
    for (let bin = 1; bin <= half; bin++) {
      const square = bin * bin * density[bin];
      whole += square;
      kept += square * this.gain(bin / half);
    }
    return whole > 0 ? 1 - kept / whole : 0;
  }

  /** Gain of the mean-square gradient at a share of the Nyquist frequency, on straight lines. */
  private gain(share: number): number {
    const at = share * frequencies - 1;
    const low = Math.max(0, Math.min(frequencies - 2, Math.floor(at)));
    // nothing is lost at frequency 0
    if (at < 0) return 1 + (this.gainAt(0) - 1) * (at + 1);
    return this.gainAt(low) + (this.gainAt(low + 1) - this.gainAt(low)) * (at - low);
  }

  private gainAt(f: number): number {
    return (this.re[f] ** 2 + this.im[f] ** 2) / (this.points / 2) ** 2;
  }
}

/** Angle per step at the f-th frequency. */
function omegaOf(f: number): number {
  return (Math.PI * (f + 1)) / frequencies;
}
