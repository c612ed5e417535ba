import { readFileSync } from "node:fs";
import { join } from "node:path";
import { beforeAll, describe, expect, it } from "vitest";
import { deriveStations } from "../../src/core/decay/deriveStations.ts";
import { fitDecay } from "../../src/core/decay/fitDecay.ts";
import type { DecayResult } from "../../src/core/decayResult.ts";
import type { Quantity } from "../../src/core/quantity.ts";
import type { StationResult } from "../../src/core/stationResult.ts";
import { decaySettings } from "../../src/sheet/decaySettings.ts";
import { reduceSheet, sampleFolder } from "./reduceSheet.ts";

/** What the records were made from: written beside them by sample-data/make.mjs, SI. */
interface Truth {
  readonly cases: readonly CaseTruth[];
}
interface CaseTruth {
  readonly case: string;
  readonly n: number;
  readonly x0: number;
  readonly windowStart: number;
  readonly stations: readonly Readonly<Record<Key | "x" | "samples", number>>[];
}
const everywhere = [
  "U",
  "uu",
  "vv",
  "ww",
  "k",
  "Tu",
  "isotropy_uv",
  "isotropy_uw",
  "L11",
  "S_dudx",
  "epsilon_gradient",
] as const;
/** In the simulation these follow from the law, which holds from the window's start on. */
const byLaw = ["lambda", "epsilon", "eta", "Re_lambda"] as const;
type Key = (typeof everywhere)[number] | (typeof byLaw)[number];

const truth: Truth = JSON.parse(readFileSync(join(sampleFolder, "truth.json"), "utf8"));

interface Held {
  readonly place: string;
  readonly key: Key;
  /** Whether the 95 % interval holds the truth. */
  readonly holds: boolean;
  /** Distance from the truth in standard errors. */
  readonly distance: number;
}

function against(value: Quantity, expected: number, place: string, key: Key): Held {
  if (value.value === null || value.low === null || value.high === null || !value.error)
    throw new Error(`${place}: ${key} has no interval`);
  const { scale, standard } = value.error;
  const departure = scale === "log" ? Math.log(value.value / expected) : value.value - expected;
  const holds = value.low <= expected && expected <= value.high;
  return { place, key, holds, distance: Math.abs(departure) / standard };
}

function expectHeld({ n, x0 }: DecayResult, expected: CaseTruth): void {
  for (const [quantity, value] of [
    [n, expected.n],
    [x0, expected.x0],
  ] as const) {
    if (quantity.value === null) throw new Error(`no law was fitted: ${quantity.why}`);
    expect(quantity.low ?? Number.NEGATIVE_INFINITY).toBeLessThan(value);
    expect(quantity.high ?? Number.POSITIVE_INFINITY).toBeGreaterThan(value);
  }
}

describe.each(["screen", "simulation"])("the sample case %s", (name) => {
  const expected = truth.cases.find((each) => each.case === name) as CaseTruth;
  let stations: StationResult[] = [];
  let decay: DecayResult;
  let held: Held[] = [];

  beforeAll(async () => {
    const reduced = await reduceSheet(`${name}.json`);
    const settings = decaySettings(reduced.sheet);
    decay = fitDecay(reduced.stations, settings);
    stations = deriveStations(reduced.stations, decay, settings);
    held = stations.flatMap((station, i) => {
      const there = expected.stations[i];
      const keys = there.x < expected.windowStart ? everywhere : [...everywhere, ...byLaw];
      return keys.map((key) => against(station[key], there[key], `${name} at ${station.x} m`, key));
    });
  }, 60_000);

  it("is read whole, each station in its place", () => {
    expect(stations.map(({ x }) => x)).toEqual(expected.stations.map(({ x }) => x));
    expect(stations.map(({ samples }) => samples)).toEqual(expected.stations.map(({ samples }) => samples));
  });

  it("has its truth inside at least nine of ten 95 % intervals", () => {
    const outside = held.filter(({ holds }) => !holds).map(({ place, key }) => `${key} of ${place}`);
    expect(outside.length / held.length, outside.join(", ")).toBeLessThanOrEqual(0.1);
  });

  it("has no quantity that is off by more than four standard errors", () => {
    const far = held.filter(({ distance }) => distance > 4);
    expect(far.map(({ place, key, distance }) => `${key} of ${place}: ${distance.toFixed(1)}`)).toEqual([]);
  });

  it("decays with its exponent from its virtual origin, within their intervals", () => {
    expectHeld(decay, expected);
  });

  it("is fitted from about where its near field ends", () => {
    const places = expected.stations.map(({ x }) => x);
    const earliest = places[Math.max(0, places.indexOf(expected.windowStart) - 1)];
    expect(decay.window[0]).toBeGreaterThanOrEqual(earliest);
    expect(decay.window[1]).toBe(places.at(-1));
  });
});

it("the profile of the second inflow decays with its exponent from its virtual origin", async () => {
  const expected = truth.cases.find((each) => each.case === "simulation-2") as CaseTruth;
  const { sheet, stations } = await reduceSheet("simulation-2.json");
  const decay = fitDecay(stations, decaySettings(sheet));
  expect(decay.window[0]).toBe(expected.windowStart);
  expectHeld(decay, expected);
});
