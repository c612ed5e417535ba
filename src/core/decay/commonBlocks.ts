import type { DecaySettings } from "../decayResult.ts";
import { isEstimate } from "../quantity.ts";
import { groupBlocks } from "../station/groupBlocks.ts";
import { fewestInPeriod } from "../station/sampling.ts";
import type { BlockTable, StationResult } from "../stationResult.ts";
import type { DecayQuantity } from "./decayQuantity.ts";

/** What stations sampled at the same times have in common: ln q of each with one stretch of time left out of all. */
export interface CommonBlocks {
  readonly groups: number;
  /** Weight of each group. */
  readonly weights: Float64Array;
  /** For each group, by how much ln q of each station moves without it. */
  readonly moves: readonly Float64Array[];
  /** Mean correlation of these moves between neighbouring stations. */
  readonly correlation: number;
  /** How often the records repeat themselves, as where an inflow is replayed: so many groups tell what one does. */
  readonly repeats?: number;
}

/** Fewer integral times than this do not make groups to leave out. */
const leastIntegralTimes = 100;
/** Standard errors by which the mean correlation must exceed zero to show that records belong together. */
const significant = 2.33;

/**
 * Blocks that all stations of a window share, shifted along the stream by the time of flight in whole blocks, gathered
 * into 10 to 50 groups of 20 integral times or more. A block shifted past the end of the record comes in again at its
 * start: every block is left out once.
 * Records count as sampled together where step, start and length agree and, unless the settings say so, neighbours
 * prove correlated: a single probe that is moved along also starts each record at zero.
 * Where the inflow is replayed, groups are as many as in one period times the periods, and errors those of one.
 * @param stations of the window, in order of x
 * @returns        null where the records were not sampled together, or are too short to tell
 * @see            Künsch (1989), Ann. Statist. 17, 1217
 */
export function commonBlocks(
  stations: readonly StationResult[],
  what: DecayQuantity,
  { along, simultaneous = "auto" }: DecaySettings,
): CommonBlocks | null {
  if (simultaneous === false || along === "t" || what.quantity === "q" || stations.length < 3) return null;
  const tables = stations.flatMap(({ blocks }) => (blocks === null ? [] : [blocks]));
  const shifts = flightInBlocks(stations, tables);
  if (tables.length < stations.length || shifts === null || !alike(tables)) return null;
  const integralTimes = Math.min(...stations.map(({ facts }) => facts.integralTimes ?? 0));
  if (integralTimes < leastIntegralTimes) return null;
  const [first] = tables;
  // where one station shows that the inflow is replayed, it is for all of them
  const repeats = Math.max(1, ...stations.map(({ facts }) => facts.repeats ?? 1));
  const groups = groupBlocks(column(first, "weight"), integralTimes, repeats);
  if (groups.count < 2 || (repeats > 1 && groups.count < fewestInPeriod * repeats)) return null;
  const moves = Array.from({ length: groups.count }, () => new Float64Array(stations.length));
  for (let station = 0; station < tables.length; station++) {
    const left = energiesWithout(tables[station], what, groups.of, groups.count, shifts[station]);
    if (left === null) return null;
    left.forEach((move, group) => {
      moves[group][station] = move;
    });
  }
  const weights = new Float64Array(groups.count);
  column(first, "weight").forEach((weight, row) => {
    weights[groups.of[row]] += weight;
  });
  const correlation = neighbourCorrelation(moves, stations.length);
  const bound = significant / Math.sqrt((groups.count / repeats - 1) * (stations.length - 1));
  if (simultaneous === "auto" && !(correlation > bound)) return null;
  return { groups: groups.count, weights, moves, correlation, repeats };
}

/** Whether all tables are cut alike. */
function alike(tables: readonly BlockTable[]): boolean {
  const [first] = tables;
  return tables.every(
    ({ rows, blockSamples, step, start }) =>
      rows === first.rows &&
      blockSamples === first.blockSamples &&
      Math.abs(step - first.step) <= 1e-9 * first.step &&
      Math.abs(start - first.start) <= 1e-3 * first.step,
  );
}

/** Time of flight from the first station in whole blocks, by the trapezoid over 1/U; null without U. */
function flightInBlocks(
  stations: readonly StationResult[],
  [table]: readonly BlockTable[],
): readonly number[] | null {
  if (!table) return null;
  let time = 0;
  const shifts = [0];
  for (let i = 1; i < stations.length; i++) {
    const [before, here] = [stations[i - 1], stations[i]];
    if (!isEstimate(before.U) || !isEstimate(here.U) || !(before.U.value > 0 && here.U.value > 0))
      return null;
    time += ((here.x - before.x) / 2) * (1 / before.U.value + 1 / here.U.value);
    shifts.push(Math.round(time / (table.step * table.blockSamples)));
  }
  return shifts;
}

function column({ fields, rows, data }: BlockTable, name: string): Float64Array {
  const at = fields.indexOf(name);
  return Float64Array.from({ length: at < 0 ? 0 : rows }, (_, row) => data[row * fields.length + at]);
}

/** ln q without each group less ln q of all; null where a component or a positive energy is lacking. */
function energiesWithout(
  table: BlockTable,
  { quantity, assumption }: DecayQuantity,
  groupOf: Int32Array,
  groups: number,
  shift: number,
): Float64Array | null {
  const lateral = table.fields.includes("vv") ? "v" : "w";
  const parts: readonly (readonly [string, number])[] =
    quantity === "uu" || assumption === "isotropic"
      ? [["u", 1]]
      : assumption === "axisymmetric"
        ? [
            ["u", 0.5],
            [lateral, 1],
          ]
        : ["u", "v", "w"].map((name) => [name, 0.5]);
  const { rows } = table;
  const groupAt = (row: number) => groupOf[(((row - shift) % rows) + rows) % rows];
  const weight = leftOut(column(table, "weight"), groupAt, groups);
  const energy = new Float64Array(groups + 1);
  for (const [name, factor] of parts) {
    const squares = column(table, name + name);
    if (squares.length === 0) return null;
    const square = leftOut(squares, groupAt, groups);
    const sum = leftOut(column(table, name), groupAt, groups);
    for (let j = 0; j <= groups; j++)
      energy[j] += (factor * (square[j] - sum[j] ** 2 / weight[j])) / weight[j];
  }
  // two logarithms: the ratio of two energies below zero would pass for a sound one
  const moves = Float64Array.from(
    { length: groups },
    (_, j) => Math.log(energy[j]) - Math.log(energy[groups]),
  );
  return moves.every(Number.isFinite) ? moves : null;
}

/** Sum of all rows less those of each group; the whole sum at the end. */
function leftOut(values: Float64Array, groupAt: (row: number) => number, groups: number): Float64Array {
  const sums = new Float64Array(groups + 1);
  values.forEach((value, row) => {
    sums[groupAt(row)] += value;
    sums[groups] += value;
  });
  for (let j = 0; j < groups; j++) sums[j] = sums[groups] - sums[j];
  return sums;
}

function neighbourCorrelation(moves: readonly Float64Array[], stations: number): number {
  let total = 0;
  for (let i = 1; i < stations; i++) {
    const mean = [i - 1, i].map((at) => moves.reduce((sum, move) => sum + move[at], 0) / moves.length);
    let [ab, aa, bb] = [0, 0, 0];
    for (const move of moves) {
      const [a, b] = [move[i - 1] - mean[0], move[i] - mean[1]];
      ab += a * b;
      aa += a * a;
      bb += b * b;
    }
    total += aa > 0 && bb > 0 ? ab / Math.sqrt(aa * bb) : 0;
  }
  return total / (stations - 1);
}
