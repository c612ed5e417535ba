import { describe, expect, it } from "vitest";
import { type Estimate, isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import scipy from "../../reference/scipy/station.json" with { type: "json" };
import { expectClose } from "../../support/expectClose.ts";
import { type Signal, stationOf } from "./records.ts";

const { samples, step, viscosity, segments, noise } = scipy.settings;

/** The generator of make_station.py. */
function uniform(seed: number): Float64Array {
  let state = seed;
  return Float64Array.from({ length: samples }, () => {
    // 1664525 x exceeds 2^53: the product is taken in two halves
    const low = (state & 0xffff) * 1664525;
    const high = ((state >>> 16) * 1664525) % 65536;
    state = (low + high * 65536 + 1013904223) % 4294967296;
    return state / 4294967296 - 0.5;
  });
}

function smooth(seed: number): Float64Array {
  let last = 0;
  let y = uniform(seed).map((x) => {
    last = 0.95 * last + (x + 2 * x ** 2 - 1 / 6);
    return last;
  });
  for (let pass = 0; pass < 4; pass++) {
    const before = y;
    y = before.map((value, i) => (i === 0 ? value : (value + before[i - 1]) / 2));
  }
  return y;
}

function record(level: number): Required<Omit<Signal, "t">> {
  const [a, b, c] = [11, 22, 33].map(smooth);
  const [n, m, l] = [44, 55, 66].map((seed) => uniform(seed).map((x) => level * x));
  return {
    u: a.map((x, i) => 10 + x + 0.1 * x ** 2 + n[i]),
    v: b.map((x, i) => 0.8 * x - 0.3 * a[i] + m[i]),
    w: c.map((x, i) => 0.7 * x + 0.1 * b[i] + l[i]),
  };
}

function quantityAt(station: StationResult, name: string): Estimate {
  const found = (station as unknown as Record<string, Quantity>)[name] ?? station.routes[name];
  if (!isEstimate(found)) throw new Error(`${name} is missing`);
  return found;
}

/** The station's value of a key of the fixture: of the result itself, its routes or its facts. */
function numberAt(station: StationResult, name: string): number | null | undefined {
  const own = (station as unknown as Record<string, unknown>)[name] ?? station.routes[name];
  if (typeof own === "object" && own !== null && "value" in own) return own.value as number | null;
  return (station.facts as unknown as Record<string, number | null>)[name];
}

/** What is not a sum or a root of sums, with the tolerance that its search allows. */
const searched: Record<string, { relative: number; because: string }> = {
  T_int_model: { relative: 1e-6, because: "a minimum is found to the root of the rounding" },
};
const sums = { relative: 1e-9, absolute: 1e-14, because: "two correct double computations" };
const elsewhere = ["cospectrum_first", "derivativeStep", "errors"];

describe.each([
  ["clean", 0, segments[0]],
  ["noisy", noise, segments[1]],
] as const)(`a %s record of three components against ${scipy.made_with}`, (kind, level, segment) => {
  const signal = record(level);
  const wanted: Record<string, unknown> = scipy[kind];
  const station = stationOf(
    signal,
    { kinematicViscosity: viscosity, segment, taylorCorrection: true },
    { step },
  );
  it("is the same record", () => {
    if (level === 0) {
      [signal.u, signal.v, signal.w].forEach((x, i) => {
        expectClose(x[samples - 1], scipy.check[i], { relative: 1e-14, because: "the order of adding" });
      });
    }
    expect(station.facts.segment).toBe(segment);
  });
  it.each(Object.entries(wanted).filter(([name]) => !elsewhere.includes(name)))(
    "has its %s",
    (name, value) => {
      const found = numberAt(station, name);
      if (value === null) expect(found).toBeNull();
      else expectClose(found, Number(value), searched[name] ?? sums);
    },
  );
  it.each(Object.entries(scipy[kind].errors))("has the error and the ends of its %s", (name, wanted) => {
    const found = quantityAt(station, name);
    [found.error?.standard, found.low, found.high].forEach((value, i) => {
      expectClose(value, wanted[i], sums);
    });
  });
  it("has its co-spectrum of u and v", () => {
    const expected = scipy[kind].cospectrum_first;
    const scale = Math.max(...expected.map(Math.abs));
    expected.forEach((value, i) => {
      expectClose(station.curves?.E12?.[i], value, { absolute: 1e-10 * scale, because: "rounding" });
    });
  });
  it("is cut only where there is noise", () => {
    expect(station.facts.cutoff !== null).toBe(level > 0);
  });
});
