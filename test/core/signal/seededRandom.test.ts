import { describe, expect, it } from "vitest";
import { chiSquareTail } from "../../../src/core/signal/distributions/chiSquareTail.ts";
import { normalCdf } from "../../../src/core/signal/distributions/normalCdf.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import reference from "../../reference/random/random.json" with { type: "json" };
import { expectClose } from "../../support/expectClose.ts";

describe("a seed kept in a file", () => {
  // the published generator in whole numbers; the script lies beside the file
  it.each(reference.streams)("of $seed gives the published generator's numbers", ({ seed, uniform }) => {
    const random = seededRandom(seed);
    expect(uniform.map(() => random.uniform())).toEqual(uniform);
  });
  it("counts by its integer part", () => {
    expect(seededRandom(7.9).uniform()).toBe(seededRandom(7).uniform());
  });
});

describe("normal numbers", () => {
  it("come in pairs from two uniform ones, at a radius and an angle (Box & Muller 1958)", () => {
    const [u, v] = reference.streams[1].uniform;
    const random = seededRandom(reference.streams[1].seed);
    const radius = Math.sqrt(-2 * Math.log(1 - u));
    const rounding = { relative: 1e-14, because: "the same formula" };
    expectClose(random.gaussian(), radius * Math.cos(2 * Math.PI * v), rounding);
    expectClose(random.gaussian(), radius * Math.sin(2 * Math.PI * v), rounding);
    const [, , next] = reference.streams[1].uniform;
    expectClose(
      Math.hypot(random.gaussian(), random.gaussian()),
      Math.sqrt(-2 * Math.log(1 - next)),
      rounding,
    );
  });
  it("fill twenty cells of equal chance evenly, and do not follow one another", () => {
    const [count, cells] = [40_000, 20];
    const random = seededRandom(3);
    const x = Float64Array.from({ length: count }, () => random.gaussian());
    const counts = new Float64Array(cells);
    for (const value of x) counts[Math.floor(cells * normalCdf(value))]++;
    const expected = count / cells;
    const square = counts.reduce((sum, found) => sum + (found - expected) ** 2 / expected, 0);
    expect(chiSquareTail(square, cells - 1)).toBeGreaterThan(0.001);
    let product = 0;
    for (let i = 1; i < count; i++) product += x[i] * x[i - 1];
    expectClose(product / count, 0, { absolute: 3 / Math.sqrt(count), because: "three standard errors" });
  });
});

it("whole numbers below seven are 0 to 6, each as often as another", () => {
  const random = seededRandom(9);
  const counts = new Float64Array(7);
  for (let i = 0; i < 14_000; i++) counts[random.below(7)]++;
  const square = counts.reduce((sum, found) => sum + (found - 2000) ** 2 / 2000, 0);
  expect(chiSquareTail(square, 6)).toBeGreaterThan(0.001);
  expect(counts.reduce((sum, found) => sum + found, 0)).toBe(14_000);
});
