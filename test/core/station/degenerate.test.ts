import { describe, expect, it } from "vitest";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { exponential, smooth, stationOf, whiteNoise } from "./records.ts";

// the step of records.ts is 1 ms
const count = 12_000;
const signal = (of: (i: number) => number) => Float64Array.from({ length: count }, (_, i) => 10 + of(i));
const codes = (station: StationResult) => station.flags.map(({ code }) => code);
const numbers = (station: StationResult): [string, Quantity][] => [
  ...Object.entries(station.routes),
  ...Object.entries(station).filter(
    (entry): entry is [string, Quantity] =>
      typeof entry[1] === "object" && entry[1] !== null && "value" in entry[1],
  ),
];

const signals = {
  "white noise": whiteNoise(count, 5).map((u) => u + 10),
  "a sine": signal((i) => Math.sin((2 * Math.PI * i) / 200)),
  "a sine that no segment holds a whole number of": signal((i) => Math.sin((2 * Math.PI * i) / 37.3)),
  "a step": signal((i) => (i < count / 2 ? -1 : 1)),
  "a spike": signal((i) => (i === 3000 ? 10 : 0)),
  "a ramp": signal((i) => i / count),
  "samples that alternate": signal((i) => (i % 2 === 0 ? 1 : -1)),
  "one last sample that differs": signal((i) => (i === count - 1 ? 1e-9 : 0)),
  "a stream at rest": smooth(count, 3),
  "an exponential correlation": exponential(count, 20, 9).map((u) => u + 10),
};

describe.each(Object.entries(signals))("%s", (_, u) => {
  it("gives finite numbers or reasons, whatever components stand beside it", () => {
    for (const more of [{}, { v: new Float64Array(count) }, { v: u, w: whiteNoise(count, 6) }]) {
      for (const [name, q] of numbers(stationOf({ u, ...more }))) {
        if (!isEstimate(q)) expect(q.why.length, name).toBeGreaterThan(10);
        else expect([q.value, q.low ?? 0, q.high ?? 0].every(Number.isFinite), name).toBe(true);
        if (isEstimate(q) && q.low === null) expect(q.why_low?.length, name).toBeGreaterThan(10);
        if (isEstimate(q) && q.high === null) expect(q.why_high?.length, name).toBeGreaterThan(10);
      }
    }
  });
});

describe("white noise", () => {
  const station = stationOf({ u: signals["white noise"] });
  it("has the integral time of half a step, which is no scale, and is flagged", () => {
    expectClose(station.T_int.value, 5e-4, {
      relative: 0.05,
      because: "the correlation at one lag is 0 ± 0.007",
    });
    expect(codes(station)).toContain("resolution");
    expect(isEstimate(station.routes.T_int_model)).toBe(false);
  });
  it("has no gradient, and nothing that follows from one", () => {
    for (const q of [station.gradient, station.lambda, station.epsilon, station.eta, station.Re_lambda])
      expect(isEstimate(q)).toBe(false);
  });
  it("has the flatness of a Gaussian, within its interval", () => {
    const { flatness_u } = station.routes;
    expect(isEstimate(flatness_u) && (flatness_u.low ?? 9) < 3 && (flatness_u.high ?? 0) > 3).toBe(true);
  });
});

describe("a sine", () => {
  const station = stationOf({ u: signals["a sine"] });
  const omega = 2 * Math.PI * 5;
  it("has the variance, the flatness and the gradient of its formula", () => {
    expectClose(station.uu.value, 0.5, { relative: 1e-9, because: "whole periods" });
    expectClose(station.routes.flatness_u.value, 1.5, { relative: 1e-9, because: "whole periods" });
    expectClose(station.gradient.value, (0.5 * omega ** 2) / 100, {
      relative: 0.01,
      because: "the window widens it",
    });
  });
  it("loses to second-order differences what a sine loses: sin²(ω dt)/(ω dt)²", () => {
    const exact = (0.5 * Math.sin(omega * 1e-3) ** 2) / 1e-6 / 100;
    expectClose(station.routes.gradient_difference2.value, exact, {
      relative: 1e-3,
      because: "four samples at the ends have no difference",
    });
  });
  it("has a spectrum in which nothing is left for an integral scale at frequency 0", () => {
    expect(isEstimate(station.routes["T_int_low-frequency"])).toBe(false);
  });
  it("has all of its variance in the bins of its line", () => {
    const { curves } = station;
    const k = omega / 10;
    let near = 0;
    let all = 0;
    curves?.k1.forEach((k1, i) => {
      const width = ((curves.k1[i + 1] ?? k1) - (curves.k1[i - 1] ?? 0)) / 2;
      all += curves.E11[i] * width;
      if (Math.abs(k1 - k) < 0.2 * k) near += curves.E11[i] * width;
    });
    expectClose(near / all, 1, { relative: 0.02, because: "the side lobes of a Hann window" });
  });
});

describe("a step half way", () => {
  const station = stationOf({ u: signals["a step"] });
  it("has variance 1, and the integral time of its triangular correlation: a sixth of its length", () => {
    expectClose(station.uu.value, 1, { relative: 1e-9, because: "closed form" });
    expectClose(station.T_int.value, (count * 1e-3) / 6, {
      relative: 1e-3,
      because: "R = 1 - 3 l/N, closed form",
    });
  });
  it("is six integral times long: no interval, and the flag says so", () => {
    expect(codes(station)).toContain("short-record");
    expect(isEstimate(station.uu) && station.uu.low).toBeNull();
  });
});

describe("a spike", () => {
  const station = stationOf({ u: signals["a spike"] });
  it("has the variance and the flatness of one sample in N: h² (N-1)/N² and nearly N", () => {
    expectClose(station.uu.value, (100 * (count - 1)) / count ** 2, {
      relative: 1e-9,
      because: "closed form",
    });
    expectClose(station.routes.flatness_u.value, count, { relative: 1e-3, because: "N - 2 + 1/N" });
    expect(isEstimate(station.routes.flatness_u) && station.routes.flatness_u.why_low).toMatch(
      /part of the record/,
    );
  });
  it("is white: no gradient is claimed", () => expect(isEstimate(station.lambda)).toBe(false));
});

describe("a stream at rest", () => {
  const station = stationOf({ u: signals["a stream at rest"].map((u) => u - 0.5) });
  it("has moments and an integral time, but no lengths and no gradients", () => {
    expect(isEstimate(station.uu) && isEstimate(station.T_int)).toBe(true);
    const { gradient_difference2 } = station.routes;
    for (const q of [station.L11, station.gradient, station.lambda, station.Tu, gradient_difference2]) {
      expect(isEstimate(q)).toBe(false);
      if (!isEstimate(q)) expect(q.why).toMatch(/mean velocity is not positive/);
    }
    expect(codes(station)).toContain("reversed-flow");
  });
});

describe("a record without any signal", () => {
  it("is refused if u is constant", () => {
    expect(() => stationOf({ u: new Float64Array(count).fill(10) })).toThrow(
      expect.objectContaining({ code: "constant-signal" }),
    );
  });
  it("is refused if it has two samples", () => {
    expect(() => stationOf({ u: Float64Array.of(10, 11) })).toThrow(
      expect.objectContaining({ code: "too-few-samples" }),
    );
  });
  it("may have a v that is constant: no coefficient with it is claimed", () => {
    const station = stationOf({ u: signals["an exponential correlation"], v: new Float64Array(count) });
    expectClose(station.vv.value, 0, { absolute: 0, because: "nothing moves" });
    expect(isEstimate(station.routes.rho_uv)).toBe(false);
    expect(isEstimate(station.isotropy_uv)).toBe(false);
  });
});
