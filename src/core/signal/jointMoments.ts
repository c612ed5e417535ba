/**
 * Weight, means and centred sums of one to three sequences taken together, a row of numbers:
 *     weight · mean_a … · Σ(a-ā)(b-b̄) for a ≤ b · Σ(a-ā)³ … · Σ(a-ā)⁴ …
 * Sums of plain powers would cancel; these are centred, and moved exactly when two rows are merged.
 */
export interface JointLayout {
  readonly sequences: number;
  readonly length: number;
  readonly mean: number;
  readonly second: number;
  readonly third: number;
  readonly fourth: number;
}

/** Where the entries of a row stand. */
export function jointLayout(sequences: number): JointLayout {
  const pairs = (sequences * (sequences + 1)) / 2;
  const second = 1 + sequences;
  const third = second + pairs;
  return { sequences, length: third + 2 * sequences, mean: 1, second, third, fourth: third + sequences };
}

/** Place of Σ(a-ā)(b-b̄), a ≤ b, counted from `second`. */
export function pairIndex(sequences: number, a: number, b: number): number {
  return a * sequences - (a * (a - 1)) / 2 + (b - a);
}

/**
 * Fills a row from samples, in two passes: the means, then the powers about them.
 * @param row      out; `layout.length` numbers
 * @param columns  a column a sequence, read from index `from` to `to` - 1
 * @param weights  of the same indices; null: all weigh 1
 */
export function fillJoint(
  row: Float64Array,
  layout: JointLayout,
  columns: readonly Float64Array[],
  from: number,
  to: number,
  weights: Float64Array | null,
): void {
  row.fill(0);
  let weight = 0;
  if (weights === null) weight = to - from;
  else for (let i = from; i < to; i++) weight += weights[i];
  row[0] = weight;
  if (!(weight > 0)) return;
  for (let a = 0; a < layout.sequences; a++) {
    const mean = meanOf(columns[a], from, to, weights, weight);
    row[layout.mean + a] = mean;
    fillPowers(row, layout, a, columns[a], mean, from, to, weights);
  }
  for (let a = 0; a < layout.sequences; a++) {
    for (let b = a + 1; b < layout.sequences; b++) {
      const at = layout.second + pairIndex(layout.sequences, a, b);
      row[at] = coSum(columns[a], row[1 + a], columns[b], row[1 + b], from, to, weights);
    }
  }
}

function meanOf(
  x: Float64Array,
  from: number,
  to: number,
  weights: Float64Array | null,
  weight: number,
): number {
  let sum = 0;
  if (weights === null) for (let i = from; i < to; i++) sum += x[i];
  else for (let i = from; i < to; i++) sum += weights[i] * x[i];
  return sum / weight;
}

function fillPowers(
  row: Float64Array,
  layout: JointLayout,
  a: number,
  x: Float64Array,
  mean: number,
  from: number,
  to: number,
  weights: Float64Array | null,
): void {
  let second = 0;
  let third = 0;
  let fourth = 0;
  for (let i = from; i < to; i++) {
    const d = x[i] - mean;
    const square = d * d;
    const weighted = weights === null ? square : weights[i] * square;
    second += weighted;
    third += weighted * d;
    fourth += weighted * square;
  }
  row[layout.second + pairIndex(layout.sequences, a, a)] = second;
  row[layout.third + a] = third;
  row[layout.fourth + a] = fourth;
}

function coSum(
  x: Float64Array,
  meanX: number,
  y: Float64Array,
  meanY: number,
  from: number,
  to: number,
  weights: Float64Array | null,
): number {
  let sum = 0;
  if (weights === null) for (let i = from; i < to; i++) sum += (x[i] - meanX) * (y[i] - meanY);
  else for (let i = from; i < to; i++) sum += weights[i] * (x[i] - meanX) * (y[i] - meanY);
  return sum;
}
