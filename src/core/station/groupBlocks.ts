/** Blocks gathered into groups of nearly equal weight: what the jackknife leaves out one at a time. */
export interface BlockGroups {
  readonly count: number;
  /** Group of each block. */
  readonly of: Int32Array;
  /** How often the same is in the record: so many groups tell what one of them does. */
  readonly repeats: number;
}

const fewest = 10;
const most = 50;
/** Integral times a group should hold. */
const perGroup = 20;

/** Groups that a record of so many integral times is cut into. */
export function groupsFor(integralTimes: number): number {
  return Math.min(Math.max(Math.round(integralTimes / perGroup), fewest), most);
}

/**
 * B = T/(20 T_int) groups, from 10 to 50, of whole neighbouring blocks, two or more where there are enough.
 * @param weights  weight of each block, in order
 * @param integralTimes  length of the record in integral times, without repetition
 * @param repeats  how often it repeats itself: groups are then as many as there are blocks, for each must be short
 *   against the period
 * @see   Lenschow, Mann & Kristensen (1994), J. Atmos. Ocean. Technol. 11, 661, on independent stretches
 */
export function groupBlocks(weights: Float64Array, integralTimes: number, repeats = 1): BlockGroups {
  const wanted =
    repeats > 1
      ? Math.min(weights.length, Math.round((integralTimes * repeats) / perGroup))
      : groupsFor(integralTimes);
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  // no more groups than whole blocks, or one of them would be empty
  const whole = Math.floor(total / weights.reduce((most, weight) => Math.max(most, weight), 0));
  const all = repeats > 1 ? whole : Math.floor(weights.length / 2);
  const count = Math.min(wanted, Math.max(fewest, all), weights.length);
  const of = new Int32Array(weights.length);
  let before = 0;
  for (let block = 0; block < weights.length; block++) {
    of[block] = Math.min(count - 1, Math.floor((count * (before + weights[block] / 2)) / total));
    before += weights[block];
  }
  return { count, of, repeats };
}
