import { describe, expect, it } from "vitest";
import { fillJoint, jointLayout, pairIndex } from "../../../src/core/signal/jointMoments.ts";
import { mergeJoint } from "../../../src/core/signal/mergeJoint.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { shiftJoint } from "../../../src/core/signal/shiftJoint.ts";
import { expectClose } from "../../support/expectClose.ts";

const random = seededRandom(21);
const count = 60;
const u = Float64Array.from({ length: count }, () => random.gaussian() + 2);
const columns = [
  u,
  u.map((value) => value ** 2 + random.gaussian()),
  u.map((value) => random.gaussian() - 0.5 * value),
];
const weights = Float64Array.from({ length: count }, () => 0.25 + random.uniform());
const layout = jointLayout(3);
const rounding = { relative: 1e-11, because: "rounding" };

/** Σ w f over samples from .. to - 1. */
function weighted(from: number, to: number, w: Float64Array | null, f: (i: number) => number): number {
  let sum = 0;
  for (let i = from; i < to; i++) sum += (w === null ? 1 : w[i]) * f(i);
  return sum;
}

/** The row as its definition has it. */
function expectRow(row: Float64Array, from: number, to: number, w: Float64Array | null): void {
  const n = weighted(from, to, w, () => 1);
  const means = columns.map((x) => weighted(from, to, w, (i) => x[i]) / n);
  expectClose(row[0], n, rounding);
  columns.forEach((x, a) => {
    const power = (p: number) => weighted(from, to, w, (i) => (x[i] - means[a]) ** p);
    expectClose(row[layout.mean + a], means[a], rounding);
    expectClose(row[layout.third + a], power(3), rounding);
    expectClose(row[layout.fourth + a], power(4), rounding);
    for (let b = a; b < 3; b++) {
      const product = weighted(from, to, w, (i) => (x[i] - means[a]) * (columns[b][i] - means[b]));
      expectClose(row[layout.second + pairIndex(3, a, b)], product, rounding);
    }
  });
}

const filled = (from: number, to: number, w: Float64Array | null) => {
  const row = new Float64Array(layout.length).fill(7);
  fillJoint(row, layout, columns, from, to, w);
  return row;
};

describe.each([
  ["counted alike", null],
  ["weighed by their time steps", weights],
])("joint moments of three components, samples %s", (_, w) => {
  it("are the means and the sums of powers about them", () => {
    expectRow(filled(0, count, w), 0, count, w);
    expectRow(filled(11, 40, w), 11, 40, w);
  });
  it("are the same where two unequal parts are merged", () => {
    const row = filled(5, 22, w);
    mergeJoint(row, filled(22, count, w), layout);
    expectRow(row, 5, count, w);
  });
  it("about another point are the plain sums of powers about it", () => {
    const about = [0.3, -1, 2];
    const out = new Float64Array(layout.length);
    shiftJoint(filled(0, count, w), layout, about, out);
    expectClose(
      out[0],
      weighted(0, count, w, () => 1),
      rounding,
    );
    columns.forEach((x, a) => {
      const power = (p: number) => weighted(0, count, w, (i) => (x[i] - about[a]) ** p);
      expectClose(out[layout.mean + a], power(1), rounding);
      expectClose(out[layout.third + a], power(3), rounding);
      expectClose(out[layout.fourth + a], power(4), rounding);
      for (let b = a; b < 3; b++) {
        const product = weighted(0, count, w, (i) => (x[i] - about[a]) * (columns[b][i] - about[b]));
        expectClose(out[layout.second + pairIndex(3, a, b)], product, rounding);
      }
    });
  });
});

describe("no samples", () => {
  it("give a row of zeros, and add nothing", () => {
    const none = filled(9, 9, null);
    expect(none.every((value) => value === 0)).toBe(true);
    expect(filled(9, 12, new Float64Array(count)).every((value) => value === 0)).toBe(true);
    const row = filled(0, 30, null);
    const before = row.slice();
    mergeJoint(row, none, layout);
    expect(row).toEqual(before);
  });
  it("added to no samples are none, not NaN", () => {
    const row = filled(9, 9, null);
    mergeJoint(row, filled(3, 3, null), layout);
    expect(Array.from(row)).toEqual(new Array(layout.length).fill(0));
  });
  it("take over whatever is added to them", () => {
    const row = filled(9, 9, null);
    mergeJoint(row, filled(0, 30, null), layout);
    expectRow(row, 0, 30, null);
  });
});
