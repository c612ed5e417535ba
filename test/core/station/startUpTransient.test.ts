import { describe, expect, it } from "vitest";
import { startUpTransient } from "../../../src/core/station/startUpTransient.ts";
import { expectClose } from "../../support/expectClose.ts";
import { exponential, stationOf } from "./records.ts";

const samples = 20_000;
const scale = 10;
/** u about 10, with a beginning that fades in time. */
function started(fade: number, { mean = 0, rms = 0 }: { mean?: number; rms?: number }, seed: number) {
  return exponential(samples, scale, seed).map((value, i) => {
    const left = Math.exp(-i / fade);
    return 10 + mean * left + value * (1 + rms * left);
  });
}
const flagOf = (u: Float64Array, code: string) =>
  stationOf({ u }, {}, { x: 3 }).flags.find((flag) => flag.code === code);

describe("the beginning of a record", () => {
  it("of a steady flow is not taken for a transient: once in a hundred or less", () => {
    let found = 0;
    for (let seed = 1; seed <= 200; seed++) {
      const x = exponential(7000, 7, seed);
      const blocks = Array.from({ length: 70 }, (_, b) => x.subarray(100 * b, 100 * (b + 1)));
      const means = blocks.map((block) => block.reduce((sum, value) => sum + value, 0) / 100);
      const variances = blocks.map(
        (block, b) => block.reduce((sum, value) => sum + (value - means[b]) ** 2, 0) / 100,
      );
      if (startUpTransient(means, variances) !== null) found++;
    }
    // binomial: seven or more of 200 have a probability of 0.4 % at a rate of 1 %
    expect(found).toBeLessThanOrEqual(6);
  });
  it("in which the mean settles is found, and when it has", () => {
    const flag = flagOf(started(500, { mean: 3 }, 4), "start-up");
    // e^(-t/fade) falls from 3 to the rms of a block's mean, some 0.3, in 2.3 fades
    expect(flag?.value).toBeGreaterThan(0.5);
    expect(flag?.value).toBeLessThan(3);
    expect(flag?.text).toContain("Leave so much out");
    expect(flag?.text).toContain("From x = 0 the flow takes 0.30 ");
  });
  it("in which the fluctuation grows is found by its variance", () => {
    const flag = flagOf(started(1000, { rms: -0.95 }, 5), "start-up");
    expect(flag?.text).toContain("variance");
    expect(flag?.value).toBeGreaterThan(0.5);
    expect(flag?.value).toBeLessThan(5);
  });
  it("once it is left out, is found no more, and the moments are those of the steady flow", () => {
    const u = started(500, { mean: 3 }, 4);
    const cut = Math.round((flagOf(u, "start-up")?.value ?? 0) / 1e-3);
    expect(flagOf(u.slice(cut), "start-up")).toBeUndefined();
    const steady = exponential(samples, scale, 4).map((value) => value + 10);
    const [kept, whole, truth] = [u.slice(cut), u, steady].map((x) => stationOf({ u: x }).uu.value ?? 0);
    expectClose(kept, truth, { relative: 0.05, because: "a twentieth of the record is gone" });
    expect(whole / truth).toBeGreaterThan(1.05);
  });
  it("of a record that drifts all along is no start-up but a trend", () => {
    const u = exponential(samples, scale, 6).map((value, i) => 10 + value + (3 * i) / samples);
    expect(flagOf(u, "start-up")).toBeUndefined();
    expect(flagOf(u, "trend")?.value).toBeGreaterThan(4.5);
  });
});
