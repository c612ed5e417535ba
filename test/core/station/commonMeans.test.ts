import { describe, expect, it } from "vitest";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import type { StationPart } from "../../../src/core/station/stationPart.ts";
import { expectClose } from "../../support/expectClose.ts";
import { exponential, partOf, settings } from "./records.ts";

const whole = exponential(40_000, 40, 12).map((value) => 6 + value);
const pieces = 8;
const length = whole.length / pieces;

/** The record in files of its own, each with its place and the time at which it begins. */
function filesOf(place: { y: number | null }, startOf: (piece: number) => number): StationPart[] {
  return Array.from({ length: pieces }, (_, piece) => {
    const u = whole.slice(piece * length, (piece + 1) * length);
    const t = u.map((_value, i) => (startOf(piece) + i) * 1e-3);
    return partOf({ u, t }, { origin: { file: `run${piece}.csv`, ...place } });
  });
}

describe("one probe's record in eight files", () => {
  const alone = reduceStation([partOf({ u: whole })], settings);
  it.each([
    ["whose times follow each other", { y: null }, (piece: number) => piece * length],
    ["that stand at one place and each begin at zero", { y: 0.1 }, () => 0],
  ] as const)("%s has the moments and the scale of the whole", (_, place, startOf) => {
    const joined = reduceStation(filesOf(place, startOf), settings);
    const rounding = { relative: 1e-9, because: "the same sums" };
    expectClose(joined.U.value, alone.U.value ?? 0, rounding);
    expectClose(joined.uu.value, alone.uu.value ?? 0, rounding);
    expectClose(joined.facts.integralTimes, (joined.duration ?? 0) / (joined.T_int.value ?? 1), rounding);
    expectClose(joined.T_int.value, alone.T_int.value ?? 0, {
      relative: 0.05,
      because: "pairs across the seams are lost: three zero crossings of some hundred",
    });
  });
  it("that may be eight probes is about eight means: what is slower than a file is lost", () => {
    const apart = reduceStation(
      filesOf({ y: null }, () => 0),
      settings,
    );
    const means = apart.probes?.map(({ U }) => U.value ?? 0) ?? [];
    const lost = means.reduce((sum, mean) => sum + (mean - (alone.U.value ?? 0)) ** 2, 0) / pieces;
    expect(lost).toBeGreaterThan(0.005);
    expectClose((apart.uu.value ?? 0) + lost, alone.uu.value ?? 0, {
      relative: 1e-9,
      because: "a variance is that within the files and that of their means",
    });
  });
});
