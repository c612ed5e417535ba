import { lawVariance } from "../core/decay/lawBand.ts";
import { lawDistance, lawPlace } from "../core/decay/lawDistance.ts";
import type { PowerLaw } from "../core/decayResult.ts";

/** The law at one x: A ((x − x0)/ℓ)^(−n), with the 95 % band that its covariance gives. */
export interface LawAt {
  readonly value: number;
  readonly low: number;
  readonly high: number;
}

/**
 * The law and its band at one x, along what the law runs along.
 * @returns null at and above the virtual origin, where there is no law
 */
export function lawAt(law: PowerLaw, x: number): LawAt | null {
  const distance = lawDistance(law, x) / law.length;
  if (!(distance > 0)) return null;
  const value = law.A * distance ** -law.n;
  const half = law.quantile * Math.sqrt(lawVariance(law, x, 0));
  return { value, low: value * Math.exp(-half), high: value * Math.exp(half) };
}

/** So many positions from one x to another, evenly spaced in the logarithm of the distance from the origin. */
export function lawPositions(law: PowerLaw, from: number, to: number, count: number): number[] {
  const [low, high] = [Math.log(lawDistance(law, from)), Math.log(lawDistance(law, to))];
  if (!Number.isFinite(low) || !Number.isFinite(high)) return [];
  return Array.from({ length: count }, (_, i) =>
    lawPlace(law, Math.exp(low + ((high - low) * i) / Math.max(count - 1, 1))),
  );
}
