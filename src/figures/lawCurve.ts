import type { PowerLaw } from "../core/decayResult.ts";

/** The law at one x: A ((x − x0)/ℓ)^(−n), with the 95 % band that its covariance gives. */
export interface LawAt {
  readonly value: number;
  readonly low: number;
  readonly high: number;
}

/**
 * The law and its band at one x:
 *     var(ln q) = gᵀ C g,   g = (1, n/(x − x0), −ln((x − x0)/ℓ)) for (ln A, x0, n)
 * @returns null at and above the virtual origin, where there is no law
 */
export function lawAt(law: PowerLaw, x: number): LawAt | null {
  const distance = (x - law.x0) / law.length;
  if (!(distance > 0)) return null;
  const value = law.A * distance ** -law.n;
  const gradient = [1, law.n / (x - law.x0), -Math.log(distance)];
  let variance = 0;
  for (let row = 0; row < 3; row++)
    for (let column = 0; column < 3; column++)
      variance += gradient[row] * law.covariance[3 * row + column] * gradient[column];
  const half = law.quantile * Math.sqrt(Math.max(variance, 0));
  return { value, low: value * Math.exp(-half), high: value * Math.exp(half) };
}

/** So many positions from one x to another, evenly spaced in the logarithm of the distance from the origin. */
export function lawPositions(law: PowerLaw, from: number, to: number, count: number): number[] {
  const [low, high] = [Math.log(from - law.x0), Math.log(to - law.x0)];
  if (!Number.isFinite(low) || !Number.isFinite(high)) return [];
  return Array.from(
    { length: count },
    (_, i) => law.x0 + Math.exp(low + ((high - low) * i) / Math.max(count - 1, 1)),
  );
}
