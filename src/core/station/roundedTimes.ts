/**
 * The constant step behind time stamps that were printed with too few digits,
 *     |t_i - t_0 - i step| ≤ half a digit,
 * by least squares, if all of them agree with it.
 * @param t        time stamps, s; may repeat
 * @param from     first index
 * @param to       index after the last
 * @param quantum  last digit they are printed with; > 0
 * @returns        the step, s; null where no constant step is behind them
 */
export function roundedStep(t: Float64Array, from: number, to: number, quantum: number): number | null {
  const count = to - from;
  if (count < fewest || !(quantum > 0)) return null;
  const middle = (count - 1) / 2;
  let product = 0;
  for (let i = 0; i < count; i++) product += (i - middle) * (t[from + i] - t[from]);
  const step = (12 * product) / (count * (count * count - 1));
  if (!(step > 0)) return null;
  // the step itself is found no better than a digit over the square root of their number
  const allowed = quantum * (1.01 + 4 / Math.sqrt(count));
  let [low, high] = [0, 0];
  for (let i = 0; i < count; i++) {
    const rest = t[from + i] - t[from] - i * step;
    low = Math.min(low, rest);
    high = Math.max(high, rest);
    if (high - low > allowed) return null;
  }
  return quantum <= step / 2 || alternates(t, from, to, quantum) ? step : null;
}

const fewest = 32;

/**
 * Stamps a digit apart, and one of them two digits: that is a sample missing, not a rounded step. A rounded one
 * shows all along the record.
 */
function alternates(t: Float64Array, from: number, to: number, quantum: number): boolean {
  const counts = new Map<number, number>();
  for (let i = from + 1; i < to; i++) {
    const digits = Math.round((t[i] - t[i - 1]) / quantum);
    counts.set(digits, (counts.get(digits) ?? 0) + 1);
  }
  const most = Math.max(...counts.values());
  return to - from - 1 - most >= Math.max(5, 0.01 * (to - from));
}
