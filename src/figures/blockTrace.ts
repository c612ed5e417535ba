import type { StationResult } from "../core/stationResult.ts";

/** One block of a record: the middle of its time, its mean of u over the record's, its variance over the record's. */
export interface BlockPoint {
  readonly time: number;
  readonly mean: number;
  readonly variance: number;
}

/**
 * Block means and variances of a station against the time since each record began, a list a record; all components
 * together make the variance.
 * @param startup time that was left out before the first block
 * @returns       no list where there are no blocks, or records of unequal length that were not taken at once
 */
export function blockTraces(station: StationResult, startup: number): readonly (readonly BlockPoint[])[] {
  const { blocks, U, facts, probes } = station;
  if (blocks === null || U.value === null) return [];
  const { fields, rows, data, blockSamples, step } = blocks;
  const at = (name: string) => fields.indexOf(name);
  const components = facts.components.map((name) => [at(name), at(name + name)] as const);
  if (at("weight") < 0 || at("u") < 0 || components.flat().some((place) => place < 0)) return [];
  const sums = Array.from({ length: rows }, (_, row) => {
    const of = (field: number) => data[row * fields.length + field];
    const weight = of(at("weight"));
    const variance = components.reduce(
      (sum, [mean, square]) => sum + of(square) / weight - (of(mean) / weight) ** 2,
      0,
    );
    return { weight, departure: of(at("u")) / weight, variance };
  });
  const total = sums.reduce((sum, { weight }) => sum + weight, 0);
  const whole = sums.reduce((sum, { weight, variance }) => sum + weight * variance, 0) / total;
  const records = recordsBehind(station, probes?.length ?? 1);
  if (!(whole > 0) || rows % records !== 0) return [];
  const each = rows / records;
  const mean = U.value;
  return Array.from({ length: records }, (_, r) =>
    sums.slice(r * each, (r + 1) * each).flatMap(({ weight, departure, variance }, i, own) =>
      // a last block that is hardly begun scatters more than the others
      weight < own[0].weight / 2
        ? []
        : {
            time: startup + (i + 0.5) * blockSamples * step,
            mean: (mean + departure) / mean,
            variance: variance / whole,
          },
    ),
  );
}

/** Records whose blocks stand one after the other: one where all were taken at once. */
function recordsBehind({ blocks, duration, samples }: StationResult, probes: number): number {
  if (blocks === null || duration === null || probes === 1) return 1;
  return blocks.rows * blocks.blockSamples < samples / 1.5 ? 1 : probes;
}
