import { describe, expect, it } from "vitest";
import { fillJoint, jointLayout } from "../../../src/core/signal/jointMoments.ts";
import { startLagProducts } from "../../../src/core/signal/lagProducts.ts";
import { mergeJoint } from "../../../src/core/signal/mergeJoint.ts";
import { startWelch } from "../../../src/core/signal/welch.ts";
import { welchDensity } from "../../../src/core/signal/welchDensity.ts";
import scipy from "../../reference/scipy/signal.json" with { type: "json" };
import { expectClose } from "../../support/expectClose.ts";

/** The signal of make_signal.py, line by line. */
function seededSignal(count: number): Float64Array {
  let state = 12345;
  let last = 0;
  return Float64Array.from({ length: count }, () => {
    // 1664525 x exceeds 2^53: the product is taken in two halves
    const low = (state & 0xffff) * 1664525;
    const high = ((state >>> 16) * 1664525) % 65536;
    state = (low + high * 65536 + 1013904223) % 4294967296;
    last = 0.9 * last + state / 4294967296 - 0.5;
    return last + 0.15 * last ** 2 + 3;
  });
}

const u = seededSignal(scipy.count);
const tight = { relative: 1e-10, because: "two correct double computations differ by rounding only" };

/** Within 1e-10 of the largest value: small bins are differences of large ones. */
function expectCurve(found: ArrayLike<number>, expected: readonly number[]): void {
  const scale = Math.max(...expected.map(Math.abs));
  expected.forEach((value, i) => {
    expectClose(found[i], value, { absolute: 1e-10 * scale, because: "rounding, relative to the peak" });
  });
}

describe(`a seeded signal against ${scipy.made_with}`, () => {
  const layout = jointLayout(1);
  const whole = new Float64Array(layout.length);
  const row = new Float64Array(layout.length);
  for (let from = 0; from < u.length; from += 128) {
    fillJoint(row, layout, [u], from, Math.min(from + 128, u.length), null);
    mergeJoint(whole, row, layout);
  }
  const mean = whole[layout.mean];
  const centred = u.map((value) => value - mean);

  it("is the same signal", () => {
    expect(Array.from(u.subarray(0, 3))).toEqual(scipy.first);
    expect(u[u.length - 1]).toBe(scipy.last);
  });
  it("has its mean, variance, skewness and flatness, merged from blocks", () => {
    const variance = whole[layout.second] / u.length;
    expectClose(mean, scipy.mean, tight);
    expectClose(variance, scipy.variance, tight);
    expectClose(whole[layout.third] / u.length / variance ** 1.5, scipy.skew, tight);
    expectClose(whole[layout.fourth] / u.length / variance ** 2, scipy.kurtosis, tight);
  });
  it.each([16, 64, 512])("has its correlation, in chunks of %i", (chunk) => {
    const lags = startLagProducts(512, chunk, 1);
    const products = new Float64Array(512);
    for (let from = 0; from < u.length; from += chunk)
      lags.add(centred, from, Math.min(from + chunk, u.length));
    lags.flush(products);
    expectCurve(products, scipy.correlate);
  });
  it.each([0, 2.5])("has its Welch spectrum, summed about the mean less %d", (offset) => {
    const welch = startWelch(scipy.size);
    const x = centred.map((value) => value + offset);
    for (let from = 0; from < u.length; from += 100) welch.add(x, from, Math.min(from + 100, u.length));
    const totals = { size: scipy.size, segments: welch.segments, power: welch.power, edges: welch.edges };
    expectCurve(welchDensity(totals, 1 / scipy.rate, offset), scipy.welch);
  });
});
