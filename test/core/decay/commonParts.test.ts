import { describe, expect, it } from "vitest";
import { bootstrapLaw } from "../../../src/core/decay/bootstrapLaw.ts";
import { type CommonBlocks, commonBlocks } from "../../../src/core/decay/commonBlocks.ts";
import type { DecayQuantity } from "../../../src/core/decay/decayQuantity.ts";
import { drawTogether } from "../../../src/core/decay/drawTogether.ts";
import { fitWindow } from "../../../src/core/decay/fitWindow.ts";
import { jackknifeLaw } from "../../../src/core/decay/jackknifeLaw.ts";
import { isEstimate } from "../../../src/core/quantity.ts";
import { jackknife } from "../../../src/core/signal/jackknife.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";

const rows = 40;
const weight = 25;
const rounding = { relative: 1e-9, absolute: 1e-12, because: "the same sums" };

/** Records of four stations at one place of the stream each, mean and square of every component known block by block. */
function recordsOf(components: readonly string[], seed: number, U = 2): StationResult[] {
  const random = seededRandom(seed);
  const shared = Float64Array.from({ length: rows }, () => random.gaussian());
  return [1, 5, 9, 13].map((x) => {
    const fields = ["weight", ...components.flatMap((name) => [name, name + name])];
    const data = Array.from({ length: rows }, (_, row) => [
      weight,
      ...components.flatMap((_, c) => {
        const mean = 0.1 * random.gaussian();
        // one step of the stream is one block of time
        const eddy = shared[(row - Math.round((x - 1) / 4) + rows) % rows] * (c === 1 ? -0.5 : 1);
        return [weight * mean, weight * (1 + c + 0.2 * eddy + mean * mean)];
      }),
    ]);
    const blocks = {
      fields,
      rows,
      data: Float64Array.from(data.flat()),
      blockSamples: 20,
      step: 0.1,
      start: 0,
    };
    const facts = { ...stationAt(x, {}).facts, integralTimes: 400 };
    return stationAt(x, { duration: 80, U: known(U, 0), uu: known(1, 0.01), blocks, facts });
  });
}
const settings = { ...plainSettings, simultaneous: true };
const of = (stations: StationResult[], assumption: DecayQuantity["assumption"], quantity: "k" | "uu" = "k") =>
  commonBlocks(stations, { quantity, assumption }, settings);

/** ln of the energy of a station without some blocks, component by component. */
function energyWithout(
  station: StationResult,
  factors: Record<string, number>,
  out: (row: number) => boolean,
): number {
  const table = station.blocks;
  if (!table) throw new Error("no blocks");
  const sumOf = (name: string) => {
    let sum = 0;
    for (let row = 0; row < rows; row++)
      if (!out(row)) sum += table.data[row * table.fields.length + table.fields.indexOf(name)];
    return sum;
  };
  const total = (name: string) => sumOf(name) / sumOf("weight");
  return Math.log(
    Object.entries(factors).reduce(
      (sum, [name, factor]) => sum + factor * (total(name + name) - total(name) ** 2),
      0,
    ),
  );
}

describe("energies with one stretch of time left out of all stations", () => {
  it.each([
    ["u alone", ["u"], "isotropic", "k", { u: 1 }],
    ["three components", ["u", "v", "w"], "none", "k", { u: 0.5, v: 0.5, w: 0.5 }],
    ["one lateral, v", ["u", "v"], "axisymmetric", "k", { u: 0.5, v: 1 }],
    ["one lateral, w", ["u", "w"], "axisymmetric", "k", { u: 0.5, w: 1 }],
    ["uu of three", ["u", "v", "w"], "none", "uu", { u: 1 }],
  ] as const)("are those of %s", (_, components, assumption, quantity, factors) => {
    const stations = recordsOf(components, 5);
    const blocks = of(stations, assumption, quantity);
    if (blocks === null) throw new Error("no groups");
    // 400 integral times: 20 groups, of two blocks each
    expect(blocks.groups).toBe(20);
    expect(Array.from(blocks.weights)).toEqual(new Array(20).fill(2 * weight));
    stations.forEach((station, at) => {
      const whole = energyWithout(station, factors, () => false);
      for (const group of [0, 7, 19]) {
        // U = 2: from station to station 2 time units, one block of 20 samples at 0.1
        const left = (row: number) => Math.floor(((row - at + rows) % rows) / 2) === group;
        expectClose(blocks.moves[group][at], energyWithout(station, factors, left) - whole, rounding);
      }
    });
  });
  it("correlate as the eddies do that pass one station after another", () => {
    expect(of(recordsOf(["u"], 5), "isotropic")?.correlation).toBeGreaterThan(0.8);
    // a stream of another speed brings others
    expect(Math.abs(of(recordsOf(["u"], 5, 0.7), "isotropic")?.correlation ?? 1)).toBeLessThan(0.6);
  });
  it("are not to be had without a component, an energy above zero, U, blocks, or three stations", () => {
    expect(of(recordsOf(["u"], 5), "none")).toBeNull();
    expect(of(recordsOf(["u"], 5), "axisymmetric")).toBeNull();
    const stations = recordsOf(["u"], 5);
    const changed = (change: Partial<StationResult>) =>
      stations.map((one, i) => (i === 2 ? { ...one, ...change } : one));
    expect(of(changed({ blocks: null }), "isotropic")).toBeNull();
    expect(of(changed({ U: known(0, 0) }), "isotropic")).toBeNull();
    expect(of(changed({ U: stationAt(0, {}).U }), "isotropic")).toBeNull();
    expect(of(stations.slice(0, 2), "isotropic")).toBeNull();
    expect(of([], "isotropic")).toBeNull();
    const table = stations[2].blocks;
    if (!table) throw new Error("no blocks");
    const flat = table.data.map((value, at) => (at % 3 === 2 ? 0 : value));
    expect(of(changed({ blocks: { ...table, data: flat } }), "isotropic")).toBeNull();
  });
  it("need tables cut alike: rows, block length, step and start", () => {
    const stations = recordsOf(["u"], 5);
    const table = stations[2].blocks;
    if (!table) throw new Error("no blocks");
    const changed = (change: Partial<typeof table>) =>
      of(
        stations.map((one, i) => (i === 2 ? { ...one, blocks: { ...table, ...change } } : one)),
        "isotropic",
      );
    expect(changed({})).not.toBeNull();
    expect(changed({ step: 0.1 * (1 + 1e-10), start: 0.9e-4 })).not.toBeNull();
    expect(changed({ step: 0.1001 })).toBeNull();
    expect(changed({ start: 0.001 })).toBeNull();
    expect(changed({ start: -0.001 })).toBeNull();
    expect(changed({ blockSamples: 21 })).toBeNull();
    expect(changed({ rows: rows - 1 })).toBeNull();
  });
  it("are not asked for in a profile of q, along time, or where the records are told to be apart", () => {
    const stations = recordsOf(["u"], 5);
    const what = { quantity: "uu", assumption: "none" } as const;
    expect(commonBlocks(stations, { ...what, quantity: "q" }, settings)).toBeNull();
    expect(commonBlocks(stations, what, { ...settings, along: "t" })).toBeNull();
    expect(commonBlocks(stations, what, { ...settings, simultaneous: false })).toBeNull();
    expect(commonBlocks(stations, what, { ...settings, simultaneous: "auto" })).not.toBeNull();
    const short = stations.map((one) => ({ ...one, facts: { ...one.facts, integralTimes: 99 } }));
    expect(commonBlocks(short, what, settings)).toBeNull();
    const enough = stations.map((one) => ({ ...one, facts: { ...one.facts, integralTimes: 100 } }));
    expect(commonBlocks(enough, what, settings)?.groups).toBe(10);
  });
});

describe("draws of stations sampled together", () => {
  const random = seededRandom(8);
  const groups = 12;
  const moves = Array.from({ length: groups }, () =>
    Float64Array.from({ length: 3 }, () => random.gaussian()),
  );
  const blocks: CommonBlocks = { groups, weights: new Float64Array(groups).fill(1), moves, correlation: 0 };

  it("have the jackknife's covariance: (B - 1)/B times the sum over groups", () => {
    const mean = [0, 1, 2].map((i) => moves.reduce((sum, move) => sum + move[i] / groups, 0));
    const expected = (i: number, j: number) =>
      (moves.reduce((sum, move) => sum + (move[i] - mean[i]) * (move[j] - mean[j]), 0) * (groups - 1)) /
      groups;
    const draws = 4000;
    const out = new Float64Array(3);
    const sums = new Float64Array(9);
    for (let draw = 0; draw < draws; draw++) {
      drawTogether(blocks, random, out);
      for (let i = 0; i < 3; i++) for (let j = 0; j < 3; j++) sums[3 * i + j] += (out[i] * out[j]) / draws;
    }
    for (let i = 0; i < 3; i++)
      for (let j = 0; j < 3; j++)
        expectClose(sums[3 * i + j], expected(i, j), {
          absolute: 0.08 * Math.sqrt(expected(i, i) * expected(j, j)),
          because: "4000 draws know a variance to 2.2 %: three errors",
        });
  });

  const xs = spacedFrom(1, 3, 30, 8);
  const small = Array.from({ length: groups }, () => Float64Array.from(xs, () => 0.002 * random.gaussian()));
  const common = { ...blocks, moves: small };
  const points = xs.map((x) => ({ x, q: (x - 1) ** -1.3, smoothedError: 0.01 }));
  it.each(["log", "linear"] as const)(
    "move a law's numbers as refits without each group do, %s residuals",
    (residuals) => {
      const window = fitWindow(points, { ...plainSettings, residuals, x0: 1 });
      if ("refused" in window) throw new Error(window.refused);
      const before = window.fit.problem.y.slice();
      const found = jackknifeLaw(window, common, 0);
      expect(window.fit.problem.y).toEqual(before);
      expect(found?.freedom).toBe(groups - 1);
      const replicates = small.map((move) => {
        const q = points.map((point, i) => ({ ...point, q: point.q * Math.exp(move[i]) }));
        // the weights stay those of the whole
        const again = fitWindow(
          q.map((point, i) => ({
            ...point,
            smoothedError: residuals === "log" ? 0.01 : (0.01 * points[i].q) / point.q,
          })),
          { ...plainSettings, residuals, x0: 1 },
        );
        return "refused" in again ? Number.NaN : again.fit.n;
      });
      const error = jackknife(window.fit.n, replicates, common.weights);
      expectClose(Math.sqrt(found?.covariance[8] ?? 0), error?.standard ?? 0, {
        relative: 1e-4,
        because: "refits end at 1e-4 of an error",
      });
      // a held origin does not move
      expect(found?.covariance[4]).toBeLessThan(1e-20);
    },
  );

  it("give a bootstrap as wide as they are, and leave the fit as they found it", () => {
    const window = fitWindow(points, { ...plainSettings, x0: 1 });
    if ("refused" in window) throw new Error(window.refused);
    const width = (boot: ReturnType<typeof bootstrapLaw>) => {
      if (!isEstimate(boot.n) || boot.n.low === null || boot.n.high === null) throw new Error("open");
      return boot.n.high - boot.n.low;
    };
    const before = window.fit.problem.y.slice();
    const [alone, together] = [
      bootstrapLaw(window, null, { refits: 600 }),
      bootstrapLaw(window, common, { refits: 600 }),
    ];
    expect(window.fit.problem.y).toEqual(before);
    const own = 2 * 1.96 * Math.sqrt(window.fit.unitCovariance?.[8] ?? 0);
    const close = { relative: 0.12, because: "600 draws know their 2.5 % points to some 4 %" };
    expectClose(width(alone), own, close);
    const shared = 2 * 1.96 * Math.sqrt(jackknifeLaw(window, common, 0)?.covariance[8] ?? 0);
    expectClose(width(together), shared, close);
    expect(alone.withoutLaw).toBe(0);
    expect(alone.cloud.n).toHaveLength(400);
    expect(alone.cloud.x0.every((x0) => x0 === 1)).toBe(true);
    expect(bootstrapLaw(window, null, { refits: 600 })).toEqual(alone);
  });
  it("count draws that fall like an exponential as an n without end and an origin far upstream", () => {
    const short = spacedFrom(4, 30, 60, 6).map((x) => ({ x, q: (x - 4) ** -1.25, smoothedError: 0.1 }));
    const window = fitWindow(short, plainSettings);
    if ("refused" in window) throw new Error(window.refused);
    const { n, x0, withoutLaw, refits, cloud } = bootstrapLaw(window, null, { refits: 300 });
    expect(withoutLaw).toBeGreaterThan(30);
    expect(withoutLaw).toBeLessThan(refits - 30);
    expect(n).toMatchObject({ high: null });
    expect(x0).toMatchObject({ low: null });
    expect(isEstimate(n) && n.low !== null && n.low < n.value).toBe(true);
    expect(cloud.n.length).toBe(300 - withoutLaw);
  });
});
