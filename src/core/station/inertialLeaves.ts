import { seededRandom } from "../signal/seededRandom.ts";
import { bandBorders } from "./bandBorders.ts";
import type { BlockGroups } from "./groupBlocks.ts";
import { type InertialRange, nearestRange } from "./inertialRange.ts";

/** What one block says of a spectrum: how many segments, and their power by band (see bandBorders). */
export interface SpectrumBlock {
  readonly segments: number;
  readonly powers: ArrayLike<number>;
}

/** How an inertial-range dissipation varies with what is left out of the record. */
export interface InertialLeaves {
  /** Without each group of blocks, the range held; m²/s³. */
  readonly without: readonly number[];
  /** Standard error of ln epsilon by the choice of the range, beyond what the groups tell with it held. */
  readonly choice: number;
}

/** Resampled spectra in which the range is looked for anew, and their seed: the same for all, so that runs agree. */
const draws = 200;
const seed = 1;

/**
 * The dissipation of an inertial range without each group of blocks, the range held,
 *     epsilon_g = epsilon (mean over its bands of (P - P_g)/P · n/(n - n_g))^(3/2),
 * and how much more it varies since the range is chosen by the spectrum itself, which no leaving-out of single
 * groups tells: from spectra of groups drawn with replacement, the range found anew in each.
 * @param range   found in the spectrum of all blocks
 * @param bands   for each band of that spectrum the band of the blocks' powers that it lies in
 * @param blocks  in the order of the groups' list
 * @see   Efron & Tibshirani (1993), An Introduction to the Bootstrap, ch. 6 and 11
 */
export function inertialLeaves(
  range: InertialRange,
  bands: readonly number[],
  blocks: readonly SpectrumBlock[],
  { count, of }: BlockGroups,
): InertialLeaves {
  const width = blocks[0]?.powers.length ?? 0;
  const sums = Array.from({ length: count }, () => new Float64Array(width + 1));
  const whole = new Float64Array(width + 1);
  blocks.forEach(({ segments, powers }, block) => {
    for (const sum of [sums[of[block]], whole]) {
      for (let band = 0; band < width; band++) sum[band] += powers[band];
      sum[width] += segments;
    }
  });
  /** ln of the power of some groups a segment over that of all, at each band of the spectrum. */
  const moves = (some: Float64Array) =>
    bands.map((band) => Math.log((some[band] / whole[band]) * (whole[width] / some[width])));
  const without = sums.map((group) => {
    const [first, end] = [range.first, range.end];
    const left = moves(whole.map((value, i) => value - group[i])).slice(first, end);
    return range.epsilon * Math.exp(1.5 * (left.reduce((sum, move) => sum + move, 0) / (end - first)));
  });
  return { without, choice: choiceError(range, sums, moves, without) };
}

/** What the spread over resampled spectra has beyond the range held. */
function choiceError(
  { spectrum, first, end }: InertialRange,
  sums: readonly Float64Array[],
  moves: (some: Float64Array) => number[],
  without: readonly number[],
): number {
  if (without.some((value) => !Number.isFinite(value))) return 0;
  const random = seededRandom(seed);
  const departures: number[] = [];
  for (let draw = 0; draw < draws; draw++) {
    const drawn = new Float64Array(sums[0].length);
    for (let group = 0; group < sums.length; group++) {
      const one = sums[Math.floor(random.uniform() * sums.length)];
      for (let i = 0; i < drawn.length; i++) drawn[i] += one[i];
    }
    const move = moves(drawn);
    const anew = nearestRange({ x: spectrum.x, y: spectrum.y.map((value, i) => value + move[i]) });
    if (anew === null) continue;
    const held = move.slice(first, end).reduce((sum, value) => sum + value, 0) / (end - first);
    departures.push(Math.log(anew.epsilon) - 1.5 * held);
  }
  if (departures.length < 2) return 0;
  const mean = departures.reduce((sum, value) => sum + value, 0) / departures.length;
  const square = departures.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  return Math.sqrt(square / (departures.length - 1));
}

/** Band of a spectrum of so many samples a segment that a frequency lies in, counted in its bins. */
export function bandAt(size: number, bin: number): number {
  const borders = bandBorders(size);
  const found = borders.findIndex((first) => first <= bin);
  return found < 0 ? borders.length - 1 : found;
}
