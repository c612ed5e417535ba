import type { SeededRandom } from "../../src/core/signal/seededRandom.ts";
import type { StationResult } from "../../src/core/stationResult.ts";
import { known, stationAt } from "./lawStations.ts";

const rows = 200;
/** Blocks of 4 time units: the stations lie 0 to 15 blocks apart in time of flight. */
const blockTime = 4;
/** Relative scatter of one block's variance. */
const scatter = 0.3;

/** uu = A (x - x0)^(-n) in a stream of speed U. */
export interface SharedLaw {
  readonly A: number;
  readonly x0: number;
  readonly n: number;
  readonly U: number;
}

/**
 * Stations with the blocks of their records: each block carries variance uu (1 + scatter e) of eddies that pass the
 * stations in turn, and change on their way.
 * @param rho correlation of e between neighbours
 */
export function sharedRecords(
  law: SharedLaw,
  xs: readonly number[],
  rho: number,
  random: SeededRandom,
): StationResult[] {
  const shared = Float64Array.from({ length: rows }, () => random.gaussian());
  let eddies = shared;
  return xs.map((x, i) => {
    // from station to station the eddies change: neighbours are correlated by rho
    if (i > 0) eddies = eddies.map((e) => rho * e + Math.sqrt(1 - rho * rho) * random.gaussian());
    const shift = Math.round((x - xs[0]) / law.U / blockTime);
    const variance = law.A * (x - law.x0) ** -law.n;
    const data = new Float64Array(3 * rows);
    let sum = 0;
    for (let row = 0; row < rows; row++) {
      const square = 100 * variance * (1 + scatter * eddies[(row - shift + rows) % rows]);
      data.set([100, 0, square], 3 * row);
      sum += square;
    }
    const facts = { ...stationAt(x, {}).facts, integralTimes: 1000 };
    return stationAt(x, {
      duration: rows * blockTime,
      U: known(law.U, 0),
      uu: known(sum / (100 * rows), scatter / Math.sqrt(rows)),
      blocks: { fields: ["weight", "u", "uu"], rows, data, blockSamples: 40, step: 0.1, start: 0 },
      facts,
    });
  });
}
