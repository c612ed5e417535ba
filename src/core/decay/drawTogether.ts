import type { SeededRandom } from "../signal/seededRandom.ts";
import type { CommonBlocks } from "./commonBlocks.ts";

/**
 * A draw whose covariance over the stations is that of the jackknife: sum over groups j of g_j (m_j - mean m), times
 * ((B - 1)/B)^(1/2), with g_j normal and m_j the move of ln q without group j; of records that repeat themselves r
 * times, times (r/(1 - r/B))^(1/2) more.
 * @param out receives the move of ln q of each station
 */
export function drawTogether(
  { moves, groups, repeats = 1 }: CommonBlocks,
  random: SeededRandom,
  out: Float64Array,
): void {
  const periods = repeats > 1 ? repeats / (1 - repeats / groups) : 1;
  const factor = Math.sqrt(((groups - 1) / groups) * periods);
  const draws = Float64Array.from(moves, () => factor * random.gaussian());
  const total = draws.reduce((sum, draw) => sum + draw, 0);
  out.fill(0);
  moves.forEach((move, j) => {
    // sum of g_j (m_j - mean m) = sum of (g_j - mean g) m_j
    const share = draws[j] - total / groups;
    for (let i = 0; i < out.length; i++) out[i] += share * move[i];
  });
}
