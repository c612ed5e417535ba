import { describe, expect, it } from "vitest";
import { anyFourier } from "../../../src/core/signal/anyFourier.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { expectClose } from "../../support/expectClose.ts";

const random = seededRandom(11);

describe.each([2, 3, 5, 12, 16, 97, 250])("the transform of %d real numbers", (size) => {
  const x = Float64Array.from({ length: size }, () => random.gaussian());
  const norm = Math.sqrt(x.reduce((sum, value) => sum + value * value, 0));

  it("is the sum that defines it", () => {
    const found = anyFourier(size).forward(x);
    for (let f = 0; f <= size / 2; f++) {
      let [re, im] = [0, 0];
      x.forEach((value, n) => {
        re += value * Math.cos((2 * Math.PI * f * n) / size);
        im -= value * Math.sin((2 * Math.PI * f * n) / size);
      });
      const tolerance = { absolute: 1e-13 * size * norm, because: "rounding of a sum of that many terms" };
      expectClose(found[2 * f], re, tolerance);
      expectClose(found[2 * f + 1], im, tolerance);
    }
  });

  it("holds the sequence's energy", () => {
    const found = anyFourier(size).forward(x);
    let sum = 0;
    for (let f = 0; f <= size / 2; f++) {
      const once = f === 0 || 2 * f === size;
      sum += (once ? 1 : 2) * (found[2 * f] ** 2 + found[2 * f + 1] ** 2);
    }
    expectClose(sum / size, norm * norm, { relative: 1e-13, because: "Parseval's identity" });
  });
});

it("a long prime length keeps its digits", () => {
  const size = 9973;
  const wave = Float64Array.from({ length: size }, (_, n) => Math.cos((2 * Math.PI * 1234 * n) / size));
  const found = anyFourier(size).forward(wave);
  expectClose(found[2 * 1234], size / 2, { relative: 1e-11, because: "a cosine is in one bin alone" });
  expect(Math.abs(found[2 * 1235])).toBeLessThan(1e-8);
});

it.each([1, 0, -4, 2.5])("there is no transform of %d points", (size) => {
  expect(() => anyFourier(size)).toThrow(/transform/);
});

it("a length is planned once", () => expect(anyFourier(12)).toBe(anyFourier(12)));
