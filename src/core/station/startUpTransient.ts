/** What the blocks of a record say about its beginning. */
export interface Unsteadiness {
  /** A beginning unlike the rest, or a change all along. */
  readonly kind: "start-up" | "trend";
  readonly what: "mean" | "variance";
  /** Blocks after which the rest is steady; of a trend half of them. */
  readonly blocks: number;
  /** How far the first blocks are from the rest, in standard errors. */
  readonly departure: number;
}

/** Fewest blocks from which anything is told. */
const fewest = 16;
/** Departure that a steady record reaches once in some hundred: it is the largest over all places to cut. */
const significant = 4.5;
/** A cut beyond this share of the record leaves no rest to be held against: it is a trend. */
const latest = 0.4;

/**
 * Whether a record begins otherwise than it goes on. The mean of the first d blocks is held against that of the
 * rest, in standard errors of the rest with its correlation from block to block, for every d up to half of them.
 * Where any of them stands out, the cut is where the mean of what is left is known best,
 *     min over d of Σ_(j>d) (x_j - mean)²/(n - d)²
 * @param means      mean of u in each block, in order of time
 * @param variances  variance about its own mean in each block, all components together
 * @returns          null for a steady record, or one of too few blocks
 * @see   White (1997), Simulation 69, 323, for the cut
 */
export function startUpTransient(
  means: readonly number[],
  variances: readonly number[],
): Unsteadiness | null {
  if (means.length < fewest || variances.some((value) => !(value > 0))) return null;
  const series = [
    { what: "mean" as const, x: means },
    { what: "variance" as const, x: variances.map(Math.log) },
  ];
  const found = series
    .map(({ what, x }) => ({ what, departure: largestDeparture(x), blocks: steadyFrom(x), count: x.length }))
    .filter(({ departure }) => departure > significant);
  if (found.length === 0) return null;
  const { what, departure, blocks, count } = found.reduce((a, b) => (b.blocks > a.blocks ? b : a));
  const kind = blocks > latest * count ? "trend" : "start-up";
  return { kind, what, departure, blocks: kind === "trend" ? Math.floor(count / 2) : blocks };
}

function largestDeparture(x: readonly number[]): number {
  let largest = 0;
  for (let d = 1; d <= x.length / 2; d++) {
    const rest = x.slice(d);
    const { mean, variance, correlation } = describe(rest);
    const first = x.slice(0, d).reduce((sum, value) => sum + value, 0) / d;
    const memory = (1 + correlation) / (1 - correlation);
    const error = Math.sqrt(variance * memory * (1 / d + 1 / rest.length));
    if (error > 0) largest = Math.max(largest, Math.abs(first - mean) / error);
  }
  return largest;
}

function describe(x: readonly number[]) {
  const mean = x.reduce((sum, value) => sum + value, 0) / x.length;
  let [squares, products] = [0, 0];
  for (let i = 0; i < x.length; i++) {
    squares += (x[i] - mean) ** 2;
    if (i > 0) products += (x[i] - mean) * (x[i - 1] - mean);
  }
  // a beginning cannot be told from a memory that is nearly as long as the record
  const correlation = Math.min(0.8, Math.max(0, products / squares));
  return { mean, variance: squares / (x.length - 1), correlation };
}

/** Blocks to leave out so that the mean of the rest is known best. */
function steadyFrom(x: readonly number[]): number {
  let best = { d: 0, score: Infinity };
  for (let d = 0; d <= x.length / 2; d++) {
    const rest = x.slice(d);
    const { variance } = describe(rest);
    const score = (variance * (rest.length - 1)) / rest.length ** 2;
    if (score < best.score) best = { d, score };
  }
  return best.d;
}
