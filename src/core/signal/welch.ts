import { hannWindow } from "./hannWindow.ts";
import { realFourier } from "./realFourier.ts";

/** Welch sums of one sequence that arrives in pieces of any length. */
export interface WelchSums {
  /** Σ |X_f|² over the segments, f = 0 … size/2. */
  readonly power: Float64Array;
  /** Σ Re X_0 and Σ Re X_1. */
  readonly edges: Float64Array;
  readonly segments: number;
  /** Takes samples from index `from` to `to` - 1. */
  add(x: Float64Array, from: number, to: number): void;
  /** What follows shares no segment with what came before. */
  restart(): void;
}

/**
 * Power of overlapping segments: Hann window, 50 % overlap, nothing removed from a segment.
 * @param size       samples a segment, a power of two, ≥ 4
 * @param onSegment  told of every segment: the index of its middle sample and its transform (re, im), bins 0 … size/2
 * @see   Welch (1967), IEEE Trans. Audio Electroacoust. 15, 70
 */
export function startWelch(
  size: number,
  onSegment: (middle: number, transform: Float64Array) => void = () => {},
): WelchSums {
  const window = hannWindow(size);
  const fourier = realFourier(size);
  const [held, windowed] = [new Float64Array(size), new Float64Array(size)];
  const power = new Float64Array(size / 2 + 1);
  const edges = new Float64Array(2);
  let [filled, segments, seen] = [0, 0, 0];

  function take(): void {
    for (let n = 0; n < size; n++) windowed[n] = held[n] * window[n];
    const transform = fourier.forward(windowed);
    addPower(power, transform);
    edges[0] += transform[0];
    edges[1] += transform[2];
    onSegment(seen - size / 2, transform);
    segments++;
    held.copyWithin(0, size / 2);
    filled = size / 2;
  }

  return {
    power,
    edges,
    get segments() {
      return segments;
    },
    add(x, from, to) {
      for (let start = from; start < to; ) {
        const count = Math.min(size - filled, to - start);
        held.set(x.subarray(start, start + count), filled);
        filled += count;
        start += count;
        seen += count;
        if (filled === size) take();
      }
    },
    restart() {
      filled = 0;
    },
  };
}

/** sum += |X|², bin by bin. */
function addPower(sum: Float64Array, transform: Float64Array): void {
  for (let f = 0, i = 0; f < sum.length; f++, i += 2) {
    sum[f] += transform[i] * transform[i] + transform[i + 1] * transform[i + 1];
  }
}
