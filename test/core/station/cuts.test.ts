import { describe, expect, it } from "vitest";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import { startRecord } from "../../../src/core/station/startRecord.ts";
import type { StationPart } from "../../../src/core/station/stationPart.ts";
import { blockOf, exponential, origin, partOf, type Signal, settings } from "./records.ts";

const step = 1e-3;
const u = exponential(12_000, 20, 3).map((value) => 5 + value);

/** Samples of a stream of equal steps, in the order of their indices; what lies in `gaps` is late by 50 steps each. */
function written(indices: readonly number[], gaps: readonly number[] = []): Signal {
  const late = (i: number) => 50 * gaps.filter((gap) => i >= gap).length;
  return {
    t: Float64Array.from(indices, (i) => (i + late(i)) * step),
    u: Float64Array.from(indices, (i) => u[i]),
  };
}
const range = (from: number, to: number) => Array.from({ length: to - from }, (_, i) => from + i);

function readAll(signal: Signal, pilot: number, cuts: readonly number[]): StationPart {
  let plan = null;
  for (let reading = 1; reading <= 3; reading++) {
    const reducer = startRecord(origin, settings, { pilot, plan });
    const borders = [0, ...cuts, signal.u.length];
    for (let i = 0; i + 1 < borders.length; i++) reducer.add(blockOf(signal, borders[i], borders[i + 1]));
    const end = reducer.finish();
    if ("part" in end) return end.part;
    plan = end.again;
  }
  throw new Error("a fourth reading was asked for");
}

// 1500 samples, back by 200, on to 6000, back by 100; a gap before 3000 and one before 9000; 4000 and 10 000 twice
const order = [
  ...range(0, 1500),
  ...range(1300, 4000),
  ...[4000, 4000],
  ...range(4001, 6000),
  ...range(5900, 10_000),
  ...[10_000, 10_000],
  ...range(10_001, 12_000),
];
const signal = written(order, [3000, 9000]);
const placeOf = (index: number) => order.lastIndexOf(index) + 1;
const time = (index: number) => signal.t?.[order.indexOf(index)];
const expected = [
  { at: 1501, kind: "backward", from: time(1499), to: time(1300), samples: 200 },
  { at: placeOf(3000), kind: "gap", from: time(2999), to: time(3000), samples: 50 },
  { at: placeOf(4000), kind: "repeated", from: time(4000), to: time(4000), samples: 1 },
  { at: placeOf(5900), kind: "backward", from: time(5999), to: time(5900), samples: 100 },
  { at: placeOf(9000), kind: "gap", from: time(8999), to: time(9000), samples: 50 },
  { at: placeOf(10_000), kind: "repeated", from: time(10_000), to: time(10_000), samples: 1 },
];

describe("the cuts of a record", () => {
  it.each([
    ["all in the pilot", 20_000, []],
    ["all in the pilot, in pieces", 20_000, [1, 1400, 1501, 7000]],
    ["past the pilot, by a second reading", 1000, []],
    ["partly past the pilot, in pieces", 5000, [4999, 5000, 9000]],
    ["a pilot that ends on a sample sent twice", 4200, [4202]],
  ])("are listed with the sample they stand at in the file: %s", (_, pilot, cuts) => {
    const { first, more } = readAll(signal, pilot, cuts).cuts ?? { first: [], more: -1 };
    expect(first).toEqual(expected);
    expect(more).toBe(0);
  });
  it("are counted from the file's first sample though some are left out as start-up", () => {
    const part = partOf(written(range(0, 12_000), [3000]), { record: { startup: 1 } });
    expect(part.samples).toBe(11_000);
    expect(part.cuts?.first.map(({ at }) => at)).toEqual([3001]);
  });
  it("are none in a record without blemish, and the result carries no such key", () => {
    const part = partOf(written(range(0, 5000)));
    expect(part.cuts).toBeUndefined();
    expect(reduceStation([part], settings)).not.toHaveProperty("cuts");
  });
  it("are listed for a hundred, and beyond that counted", () => {
    const gaps = range(1, 131).map((i) => 80 * i);
    const station = reduceStation([partOf(written(range(0, 12_000), gaps))], settings);
    expect(station.cuts).toHaveLength(100);
    expect(station.cuts?.[99].at).toBe(8001);
    expect(station.cuts_more).toBe(30);
    expect(station.flags.find(({ code }) => code === "gap")?.value).toBe(130);
  });
  it("tell their record where several stand at one x", () => {
    const of = (y: number, gap: number) =>
      partOf(written(range(0, 12_000), [gap]), { origin: { file: "rake.csv", y } });
    const { cuts } = reduceStation([of(0.2, 700), of(0.1, 900)], settings);
    expect(cuts?.map(({ file, y, at }) => [file, y, at])).toEqual([
      ["rake.csv", 0.1, 901],
      ["rake.csv", 0.2, 701],
    ]);
  });
});
