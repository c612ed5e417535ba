import { execFileSync } from "node:child_process";
import { mkdtempSync, readdirSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { beforeAll, describe, expect, it } from "vitest";
import { deriveStations } from "../../src/core/decay/deriveStations.ts";
import { fitDecay } from "../../src/core/decay/fitDecay.ts";
import type { StationResult } from "../../src/core/stationResult.ts";
import { decaySettings } from "../../src/sheet/decaySettings.ts";
import { expectClose } from "../support/expectClose.ts";
import { reduceSheet, sampleFolder } from "./reduceSheet.ts";

/** What the lines were made from: written beside them by sample-data/make-lines.mjs, SI. */
const truth = JSON.parse(readFileSync(join(sampleFolder, "truth-lines.json"), "utf8"));
const [expected] = truth.cases;
const keys = [
  ...(["U", "uu", "vv", "ww", "k", "Tu", "isotropy_uv", "isotropy_uw", "L11", "gradient"] as const),
  ...(["lambda", "epsilon", "eta", "Re_lambda", "epsilon_gradient"] as const),
];

describe("the simulation of the sample data, given as lines", () => {
  let stations: StationResult[] = [];
  let decay: ReturnType<typeof fitDecay>;
  beforeAll(async () => {
    const reduced = await reduceSheet("simulation-lines.json");
    const settings = decaySettings(reduced.sheet);
    decay = fitDecay(reduced.stations, settings);
    stations = deriveStations(reduced.stations, decay, settings);
  }, 60_000);

  it("is read whole, each station in its place, and found to be periodic", () => {
    const { points, spacing, snapshots } = expected;
    expect(stations.map(({ x }) => x)).toEqual(expected.stations.map(({ x }: { x: number }) => x));
    for (const { samples, facts } of stations) {
      expect(samples).toBe(points * snapshots);
      expect(facts.lines).toMatchObject({ along: "y", points, snapshots, periodic: true });
      expectClose(facts.lines?.length, points * spacing, {
        relative: 1e-9,
        because: "the line closes after one more step; coordinates have a few digits",
      });
    }
  });

  it("has its truth inside at least nine of ten 95 % intervals, and nothing four standard errors off", () => {
    const outside: string[] = [];
    for (const [i, station] of stations.entries()) {
      for (const key of keys) {
        const { value, low, high, error } = station[key] as never as Record<string, number> & {
          error?: { standard: number; scale: string };
        };
        const wanted = expected.stations[i][key];
        const place = `${key} at ${station.x}: ${low} … ${high}, not ${wanted}`;
        if (!error || low === null || high === null) throw new Error(`${place} has no interval`);
        if (!(low <= wanted && wanted <= high)) outside.push(place);
        const departure = error.scale === "log" ? Math.log(value / wanted) : value - wanted;
        expect(Math.abs(departure) / error.standard, place).toBeLessThan(4);
      }
    }
    expect(outside.length, outside.join("\n")).toBeLessThanOrEqual(0.1 * keys.length * stations.length);
  });

  it("decays with its exponent from its virtual origin, within their intervals", () => {
    for (const [quantity, wanted] of [
      [decay.n, expected.n],
      [decay.x0, expected.x0],
    ] as const) {
      if (quantity.value === null) throw new Error(`no law was fitted: ${quantity.why}`);
      expect(quantity.low ?? Number.NEGATIVE_INFINITY).toBeLessThan(wanted);
      expect(quantity.high ?? Number.POSITIVE_INFINITY).toBeGreaterThan(wanted);
    }
  });
});

it("the lines of the sample data are made again from their seed, byte for byte", () => {
  const out = mkdtempSync(join(tmpdir(), "waneline-lines-"));
  execFileSync("node", [join(sampleFolder, "make-lines.mjs"), "--out", out]);
  const made = readdirSync(join(out, "simulation-lines")).map((name) => `simulation-lines/${name}`);
  for (const name of [...made, "truth-lines.json", "simulation-lines.json"]) {
    const [again, kept] = [out, sampleFolder].map((folder) => readFileSync(join(folder, name), "utf8"));
    expect(again === kept, name).toBe(true);
  }
  rmSync(out, { recursive: true });
}, 60_000);
