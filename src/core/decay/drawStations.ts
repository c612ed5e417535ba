import type { SeededRandom } from "../signal/seededRandom.ts";
import type { CommonBlocks } from "./commonBlocks.ts";
import { drawTogether } from "./drawTogether.ts";

/**
 * One draw of all stations of a fit: all at once by the blocks they have in common, else each by its own error.
 * @param error standard error of each station
 * @param out   receives by how much each moves: in ln q with blocks, else in the unit of the errors
 */
export function drawStations(
  blocks: CommonBlocks | null,
  error: ArrayLike<number>,
  random: SeededRandom,
  out: Float64Array,
): void {
  if (blocks !== null) drawTogether(blocks, random, out);
  else for (let i = 0; i < out.length; i++) out[i] = error[i] * random.gaussian();
}
