import { describe, expect, it } from "vitest";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
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

const timesFrom = (first: number) => Float64Array.from({ length: samples }, (_, i) => (first + i) * 1e-3);

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

describe("a station whose probes do not all agree", () => {
  const numberOf = (quantity: Quantity) => (isEstimate(quantity) ? quantity.value : quantity.why);
  const textOf = (station: ReturnType<typeof stationOf>) =>
    station.flags.find(({ code }) => code === "inhomogeneous")?.text;
  const rake = [{ mean: 10 }, { mean: 10 }, { mean: 11 }, { mean: 10 }, { mean: 10 }];

  it.each([{}, { simultaneous: false }])(
    "is that of the larger part which agrees, to the last digit: %o",
    (how) => {
      const parts = partsOf(rake, 6, how);
      const chosen = { ...settings, simultaneous: how.simultaneous ?? ("auto" as const) };
      const station = reduceStation(parts, chosen);
      const four = reduceStation(
        parts.filter((_, i) => i !== 2),
        chosen,
      );
      for (const key of ["U", "uu", "k", "Tu", "L11", "lambda", "samples", "duration"] as const)
        expect(station[key]).toEqual(four[key]);
      expect(four.flags.map(({ code }) => code)).not.toContain("inhomogeneous");
      expect(station.probes?.map(({ agrees }) => agrees)).toEqual([true, true, false, true, true]);
      expect(station.probes?.[2].departs).toEqual(["U"]);
      expect(station.probes?.map(({ setAside }) => setAside === true)).toEqual([
        false,
        false,
        true,
        false,
        false,
      ]);
      expect(textOf(station)).toMatch(/4 of 5 which agree\. Set aside: at y = 0\.2 U 1[01]\.\d/);
    },
  );
  it("has no U where half of its probes differ from the others, but their fluctuations", () => {
    const station = stationOf([{ mean: 10 }, { mean: 11 }], 3);
    expect(numberOf(station.U)).toMatch(/^no larger part of the 2 probes at this x agrees in U: at y = 0 U/);
    for (const key of ["Tu", "L11", "lambda", "epsilon", "gradient", "C_epsilon"] as const)
      expect(numberOf(station[key])).toBe(numberOf(station.U));
    expectClose(numberOf(station.uu) as number, 1, { relative: 0.25, because: "three standard errors" });
    expect(isEstimate(station.T_int) && isEstimate(station.k)).toBe(true);
    expect(station.curves).toBeNull();
    expect(station.probes?.map(({ agrees, departs }) => [agrees, departs])).toEqual([
      [false, ["U"]],
      [false, ["U"]],
    ]);
  });
  it("keeps its U where they differ in u' alone, and nothing of the fluctuations", () => {
    const station = stationOf([{ mean: 10 }, { mean: 10, factor: 1.5 }], 8);
    expectClose(numberOf(station.U) as number, 10, { relative: 0.02, because: "three standard errors" });
    for (const key of ["uu", "k", "Tu", "T_int", "L11", "isotropy_uv"] as const)
      expect(isEstimate(station[key])).toBe(false);
    expect(numberOf(station.k)).toContain("agrees in u'");
    // v was not measured, which is the reason that stands
    expect(numberOf(station.vv)).toBe("v was not measured");
    expect(station.blocks).toBeNull();
  });
  it("has a Tu over the reference speed though they differ in U", () => {
    const parts = partsOf([{ mean: 10 }, { mean: 11 }], 3);
    const { Tu, L11 } = reduceStation(parts, { ...settings, referenceSpeed: 20 });
    expectClose(numberOf(Tu) as number, 1 / 20, { relative: 0.15, because: "three standard errors" });
    expect(isEstimate(L11)).toBe(false);
  });
  it("has no larger part along a profile", () => {
    const shear = [9, 9.7, 10.4, 11.1].map((mean) => ({ mean }));
    expect(isEstimate(stationOf(shear, 5).U)).toBe(false);
  });
  it("is the average of all where that is chosen, and says so", () => {
    const parts = partsOf(rake, 3);
    const station = reduceStation(parts, { ...settings, probes: "all" });
    expectClose(numberOf(station.U) as number, 10.2, { relative: 0.01, because: "three standard errors" });
    expect(station.samples).toBe(5 * samples);
    expect(station.probes?.[2].agrees).toBe(false);
    expect(station.probes?.[2]).not.toHaveProperty("setAside");
    expect(textOf(station)).toContain("All of them are averaged, as chosen");
  });
  it("is the average of the records of one probe, though it drifts from one to the next", () => {
    const parts = [10, 11].map((mean, i) =>
      partOf(
        { u: exponential(samples, 10, 70 + i).map((u) => u + mean), t: timesFrom(i * samples) },
        { origin: { file: `run${i}.csv`, y: 0.1 } },
      ),
    );
    const station = reduceStation(parts, settings);
    expectClose(numberOf(station.U) as number, 10.5, { relative: 0.01, because: "three standard errors" });
    expect(textOf(station)).toContain("The records of this probe differ");
  });
  it("keeps the larger part's own mean where one probe has several records", () => {
    const origin = (y: number) => ({ origin: { file: `y${y}.csv`, y } });
    const first = exponential(samples, 10, 80).map((u) => u + 10);
    const records = [
      partOf({ u: first, t: timesFrom(0) }, origin(0)),
      partOf({ u: exponential(samples, 10, 81).map((u) => u + 12), t: timesFrom(samples) }, origin(0)),
      partOf({ u: exponential(samples, 10, 82).map((u) => u + 10), t: timesFrom(2) }, origin(1)),
      partOf({ u: exponential(samples, 10, 83).map((u) => u + 10), t: timesFrom(3) }, origin(2)),
    ];
    const station = reduceStation(records, settings);
    const without = reduceStation([records[0], records[2], records[3]], settings);
    expect(station.uu).toEqual(without.uu);
    expectClose(numberOf(station.uu) as number, 1, { relative: 0.2, because: "the mean of 12 is not in it" });
  });
  it("sets aside none of ten alike but once in a hundred", () => {
    const alike = Array.from({ length: 10 }, () => ({ mean: 10 }));
    const lost = Array.from({ length: 25 }, (_, i) => {
      const record = joinParts(partsOf(alike, 400 + i, { shared: 0.5 }), settings);
      return compareProbes(record, 0.01).probes.some(({ agrees }) => agrees === false);
    });
    // binomial: at a rate of 1 %, three or more of 25 have a probability of 0.2 %
    expect(lost.filter(Boolean).length).toBeLessThanOrEqual(2);
  }, 60_000);
});
