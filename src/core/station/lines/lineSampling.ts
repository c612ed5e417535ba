import type { StandardError } from "../../quantity.ts";
import { type BlockGroups, groupBlocks } from "../groupBlocks.ts";
import type { JoinedLines } from "./joinLines.ts";
import { type SnapshotTime, snapshotTime } from "./snapshotTime.ts";

/** How well the lines of a station are sampled: what its intervals rest on. */
export interface LineSampling extends SnapshotTime {
  /** Independent samples: snapshots, times lengths of 2 L in a line, times lines that are far enough apart. */
  readonly samples: number;
  readonly groups: BlockGroups | null;
  /** Error of L11; null where there is none. */
  readonly scaleError: StandardError | null;
  /** Why there are no intervals. */
  readonly why: string;
}

/** Fewest independent snapshots that are given intervals. */
export const fewestSnapshots = 10;

/** Groups are of as many blocks as a record of so many integral times would have. */
const perSnapshot = 20;

/**
 * @param length  of the line; null: of lines along x, where a point stands for itself
 * @param L11     the integral scale, or null where it is not known
 * @param reach   separation up to which the correlation was integrated; null like L11
 * @param periodic of a line that does not close, pairs are fewer the farther apart they are
 */
export function lineSampling(
  lines: JoinedLines,
  length: number | null,
  L11: number | null,
  reach: number | null,
  periodic: boolean,
): LineSampling {
  const time = snapshotTime(lines);
  const across = independentLines(lines, L11);
  const along = length === null || L11 === null ? 1 : Math.max(1, length / (2 * L11));
  const samples = time.independent * across * along;
  if (time.independent < fewestSnapshots) {
    const why = `there are ${time.independent.toPrecision(2)} independent snapshots; ${fewestSnapshots} are needed`;
    return { ...time, samples, groups: null, scaleError: null, why };
  }
  const weights = Float64Array.from(lines.rows, (row) => row[0]);
  const groups = groupBlocks(weights, perSnapshot * time.independent);
  return {
    ...time,
    samples,
    groups,
    scaleError: scaleError(time.independent * across, length, reach, periodic),
    why: "",
  };
}

/**
 * se(ln L11) = √(4 r* / total length), as for a record in time: a jackknife fails at a zero crossing. The length of a
 * line that does not close is that which pairs up to r* have on average, half of r* less.
 */
function scaleError(
  lines: number,
  length: number | null,
  reach: number | null,
  periodic: boolean,
): StandardError | null {
  if (reach === null) return null;
  // of lines along x each snapshot gives the correlation around the station once
  const total = lines * Math.max((length ?? 0) - (periodic ? 0 : reach / 2), reach);
  return { standard: Math.sqrt((4 * reach) / total), freedom: null, scale: "log" };
}

/** Parallel lines nearer than L11 share their eddies: one, and one more for every L11 of their extent. */
function independentLines({ across }: JoinedLines, L11: number | null): number {
  if (across.length === 1 || L11 === null) return 1;
  const extent = (pick: (place: (typeof across)[number]) => number | null) => {
    const places = across.map((place) => pick(place) ?? 0);
    return 1 + (Math.max(...places) - Math.min(...places)) / L11;
  };
  return Math.min(across.length, extent(({ y }) => y) * extent(({ z }) => z));
}
