import { describe, expect, it } from "vitest";
import { bandShape, cutBand } from "../../../src/app/ruler/bandShape.ts";
import { laneHeight, tickLength } from "../../../src/app/ruler/laneHeight.ts";
import { lawTuFactor } from "../../../src/app/ruler/lawTuFactor.ts";
import { expectClose } from "../../support/expectClose.ts";

const law = { A: 0.16, x0: 0.08, n: 1.25, length: 0.025, covariance: [], quantile: 2 };
const map = { at: 70, perX: 420 };
const lane = { width: 890, height: 44 };
const lawTu = Math.sqrt(2 / 3);
const TuAt = (x: number) => lawTu * Math.sqrt(law.A * ((x - law.x0) / law.length) ** -law.n);

describe("the band of a law", () => {
  const band = bandShape(law, lawTu, map, lane);
  it("is as wide as the tick of a station that lies on the law", () => {
    for (const x of [0.3, 0.6, 1.2]) {
      const here = cutBand(band, map.at + map.perX * x, map.at + map.perX * x + 1).half[0];
      expectClose(2 * here, tickLength(TuAt(x), 44), {
        relative: 2e-3,
        because: "the outline is straight between points 6 px apart",
      });
    }
  });
  it("begins where it fills the lane and ends with the scale", () => {
    expectClose(2 * band.half[0], 41, { relative: 1e-9, because: "solved in closed form" });
    expectClose(band.px[band.px.length - 1], 890, { relative: 1e-12, because: "the last point is set" });
  });
  it("wanes all the way downstream", () => {
    expect(band.half.every((half, i) => i === 0 || half < band.half[i - 1])).toBe(true);
  });
  it("is empty for a law that grows or lies off the scale, never without a number", () => {
    expect(bandShape({ ...law, n: -0.4 }, lawTu, map, lane).px).toEqual([]);
    expect(bandShape({ ...law, x0: 9 }, lawTu, map, lane).px).toEqual([]);
  });
});

describe("a tick", () => {
  it("is 2.7 px long per percent in a lane of 44, five at least, and stays in the lane", () => {
    expectClose(tickLength(0.06, 44), 16.2, { relative: 1e-12, because: "a product" });
    expect(tickLength(0.001, 44)).toBe(5);
    expect(tickLength(0.9, 44)).toBe(40);
  });
});

describe("a lane", () => {
  it.each([
    [1, false, 44],
    [2, false, 44],
    [3, false, 34],
    [5, false, 26],
    [2, true, 26],
  ])("of %d, low window %s, is %d px high", (cases, low, height) => {
    expect(laneHeight(cases, low)).toBe(height);
  });
});

describe("the intensity of a law", () => {
  const decay = { quantity: "k", speed: 6 } as Parameters<typeof lawTuFactor>[0];
  it("is the root of two thirds of k/Us², with Us against the speed of Tu", () => {
    expectClose(lawTuFactor(decay, 5), (6 / 5) * Math.sqrt(2 / 3), {
      relative: 1e-15,
      because: "closed form",
    });
  });
  it("is the root of uu/Us² as it stands, and none of a given quantity", () => {
    expect(lawTuFactor({ ...decay, quantity: "uu" }, null)).toBe(1);
    expect(lawTuFactor({ ...decay, quantity: "q", speed: null }, null)).toBeNull();
  });
});
