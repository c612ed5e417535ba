import { describe, expect, it } from "vitest";
import { isEstimate } from "../../../src/core/quantity.ts";
import { compareProbes } from "../../../src/core/station/compareProbes.ts";
import { joinParts } from "../../../src/core/station/joinParts.ts";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import { expectClose } from "../../support/expectClose.ts";
import { exponential, partOf, settings, smooth } from "./records.ts";

const samples = 6000;

/** Probes at one x; each a mean and a factor on a signal of its own, or partly shared. */
function partsOf(
  probes: readonly { mean: number; factor?: number }[],
  seed: number,
  more: { shared?: number; simultaneous?: boolean } = {},
) {
  const shared = more.shared ?? 0;
  const common = exponential(samples, 10, 1000 + seed);
  return probes.map(({ mean, factor = 1 }, i) => {
    const own = exponential(samples, 10, seed + 50_000 * (i + 1));
    const u = own.map(
      (value, k) => mean + factor * (Math.sqrt(1 - shared) * value + Math.sqrt(shared) * common[k]),
    );
    return partOf({ u }, { origin: { file: "rake.csv", y: 0.1 * i } });
  });
}

function stationOf(...[probes, seed, more]: Parameters<typeof partsOf>) {
  return reduceStation(partsOf(probes, seed, more), {
    ...settings,
    simultaneous: more?.simultaneous ?? "auto",
  });
}

const differ = (station: ReturnType<typeof stationOf>) =>
  station.flags.some(({ code }) => code === "inhomogeneous");

describe("several probes at one x", () => {
  const alike = [{ mean: 10 }, { mean: 10 }, { mean: 10 }];
  const chanceOf = (seed: number, how: Parameters<typeof partsOf>[2]) => {
    const record = joinParts(partsOf(alike, seed, how), {
      ...settings,
      simultaneous: how?.simultaneous ?? "auto",
    });
    return compareProbes(record, 0.01).p ?? 0;
  };

  it.each([
    ["sampled at once, each its own eddies", { shared: 0 }],
    ["sampled at once, most of their eddies shared", { shared: 0.9 }],
    ["sampled one after another", { simultaneous: false }],
  ] as const)(
    "that agree are said to differ once in a hundred or less: %s",
    (_, how) => {
      const chances = Array.from({ length: 80 }, (_unused, i) => chanceOf(i + 1, how));
      // binomial: at a rate of 1 %, four or more of 80 have a probability of 0.9 %, at 10 % seventeen or more one of 1 %
      expect(chances.filter((p) => p < 0.01).length).toBeLessThanOrEqual(3);
      expect(chances.filter((p) => p < 0.1).length).toBeLessThanOrEqual(16);
    },
    60_000,
  );
  it("that differ in U by six standard errors are told apart, and their figure", () => {
    // se(U) = sqrt(2 T_int/T) = sqrt(20/6000) = 0.058
    for (const how of [{}, { simultaneous: false }]) {
      const station = stationOf([{ mean: 10 }, { mean: 10.5 }, { mean: 10 }], 3, how);
      expect(differ(station)).toBe(true);
      expect(station.flags.find(({ code }) => code === "inhomogeneous")?.value).toBeLessThan(0.01);
    }
  });
  it("that differ in u' alone are told apart too", () => {
    expect(differ(stationOf([{ mean: 10 }, { mean: 10, factor: 1.5 }], 8))).toBe(true);
    expect(differ(stationOf([{ mean: 10 }, { mean: 10, factor: 1.5 }], 8, { simultaneous: false }))).toBe(
      true,
    );
  });
  it("that share their eddies are told apart by far less than the error of each", () => {
    const close = [{ mean: 10 }, { mean: 10.06 }];
    expect(differ(stationOf(close, 5, { shared: 0.99 }))).toBe(true);
    expect(differ(stationOf(close, 5, { shared: 0 }))).toBe(false);
  });
  it("stand apart with U and u', each with its interval", () => {
    const { probes } = stationOf([{ mean: 10 }, { mean: 12, factor: 2 }], 4);
    expect(probes?.map(({ y }) => y)).toEqual([0, 0.1]);
    expectClose(probes?.[1].U.value, 12, { absolute: 0.4, because: "three standard errors" });
    expectClose(probes?.[1].u_rms.value, 2, { relative: 0.15, because: "three standard errors" });
    for (const { U, u_rms } of probes ?? []) {
      expect(isEstimate(U) && U.low !== null && isEstimate(u_rms) && u_rms.low !== null).toBe(true);
    }
  });
  it("that are too short are not tested, and have no intervals", () => {
    const parts = [1, 2].map((i) =>
      partOf({ u: smooth(3000, i).map((u) => u + 10 * i) }, { origin: { file: "short.csv", y: i } }),
    );
    const station = reduceStation(parts, settings);
    expect(station.flags.map(({ code }) => code)).not.toContain("inhomogeneous");
    expect(station.probes?.every(({ U }) => isEstimate(U) && U.low === null)).toBe(true);
  });
});
