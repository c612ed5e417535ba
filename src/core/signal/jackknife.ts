/** Standard error by leaving out one group at a time. */
export interface JackknifeError {
  readonly standard: number;
  /** Groups less one. */
  readonly freedom: number;
}

/**
 * Delete-one-group jackknife for groups of unequal weight. With h_j = n/m_j and θ_j the value without group j,
 *     var = (1/B) Σ (h_j θ - (h_j - 1) θ_j - θ_J)²/(h_j - 1),   θ_J = B θ - Σ (1 - m_j/n) θ_j
 * With equal groups it is the usual (B - 1)/B Σ (θ_j - mean θ_j)².
 * @param whole      the value of all groups together
 * @param replicates the value without group j
 * @param weights    weight m_j of group j, > 0
 * @returns          standard error of the value; null with fewer than two groups or where a value is not finite
 * @see   Busing, Meijer & van der Leeden (1999), Stat. Comput. 9, 3
 */
export function jackknife(
  whole: number,
  replicates: ArrayLike<number>,
  weights: ArrayLike<number>,
): JackknifeError | null {
  const groups = replicates.length;
  if (groups < 2 || !Number.isFinite(whole)) return null;
  let total = 0;
  for (let j = 0; j < groups; j++) total += weights[j];
  let centre = groups * whole;
  for (let j = 0; j < groups; j++) centre -= (1 - weights[j] / total) * replicates[j];
  let variance = 0;
  for (let j = 0; j < groups; j++) {
    const h = total / weights[j];
    const pseudo = h * whole - (h - 1) * replicates[j];
    variance += (pseudo - centre) ** 2 / (h - 1);
  }
  const standard = Math.sqrt(variance / groups);
  return Number.isFinite(standard) ? { standard, freedom: groups - 1 } : null;
}
