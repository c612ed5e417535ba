/** A distribution on the positive axis: its tail above x, and its density. */
export interface PositiveDistribution {
  readonly tail: (x: number) => number;
  readonly density: (x: number) => number;
}

/**
 * The x > 0 whose tail is q: Newton's steps, and a halving of the bracket wherever one would leave it.
 * @param distribution  tail falls from 1 at 0 to 0
 * @param q             from 0 to 1
 * @param start         a first guess, > 0
 * @returns             x; 0 for q ≥ 1, Infinity for q ≤ 0
 */
export function invertTail({ tail, density }: PositiveDistribution, q: number, start: number): number {
  if (q >= 1) return 0;
  if (q <= 0) return Infinity;
  let low = 0;
  let high = start;
  while (tail(high) > q) high *= 2;
  let x = start;
  for (let i = 0; i < 200; i++) {
    const excess = tail(x) - q;
    if (excess === 0) return x;
    if (excess > 0) low = x;
    else high = x;
    const newton = x + excess / density(x);
    const next = newton > low && newton < high ? newton : (low + high) / 2;
    if (Math.abs(next - x) <= 2e-16 * Math.abs(next)) return next;
    x = next;
  }
  return x;
}
