import type { RecordPlan } from "../../../src/core/station/recordPlan.ts";
import type { StationPart } from "../../../src/core/station/stationPart.ts";
import { partOf, smooth } from "./records.ts";

export const close = { relative: 1e-9, absolute: 1e-10, because: "the definition, summed in another order" };
export const step = 1e-3;

/** A plan by hand: every length small, so that all of them are met within a few hundred samples. */
export const plan: RecordPlan = {
  ...{ step, weighted: false, quantum: 0, reference: [10, 0.5], slope: [0, 0], centre: 0 },
  ...{ integralTime: 8e-3, lagLimit: 16, lagStride: 1, segment: 32, bandSegment: 16, blockSamples: 64 },
  derivativeStep: 3,
  last: true,
};
export const count = 300;
export const u = smooth(count, 4).map((value) => 10 + value);
export const v = smooth(count, 5);
export const part = partOf({ u, v }, { record: { plan } });
export const about = [u.map((value) => value - 10), v.map((value) => value - 0.5)];

export function rowsOf(of: StationPart, name: string): number[] {
  const { fields, rows, data } = of.blocks;
  return Array.from({ length: rows }, (_, row) => data[row * fields.length + fields.indexOf(name)]);
}
export const total = (values: ArrayLike<number>) => Array.from(values).reduce((sum, value) => sum + value, 0);
