import { describe, expect, it } from "vitest";
import { niceTicks } from "../../../src/app/ruler/niceTicks.ts";
import { rulerScale } from "../../../src/app/ruler/rulerScale.ts";
import { whiskerEnds } from "../../../src/app/ruler/whiskerEnds.ts";
import { estimate, missing } from "../../../src/core/quantity.ts";
import { expectClose } from "../../support/expectClose.ts";
import { lawless, screenCase, simulationCase } from "./rulerFixture.tsx";

const rounding = { absolute: 1e-9, because: "a handful of roundings of px" };
const both = [screenCase(), simulationCase()];
const px = (scale: ReturnType<typeof rulerScale>, i: number, x: number) => {
  const map = scale.maps[i];
  return map === null ? null : map.at + map.perX * x;
};

describe("the marks of a scale", () => {
  it.each([
    [-0.17, 1.93, 890, 0.2, 1],
    [-0.17, 1.93, 358, 0.2, 1],
    [-4, 80, 890, 10, 0],
    [0, 0.05, 890, 0.005, 3],
    [0, 3.4e4, 890, 5e3, 0],
  ])("from %d to %d over %d px step by %d", (from, to, width, step, decimals) => {
    const ticks = niceTicks(from, to, width);
    expectClose(ticks.step, step, { relative: 1e-12, because: "a step is a product of two numbers" });
    expect(ticks.decimals).toBe(decimals);
  });
  it("are four to a step of two and five to a step of one or five", () => {
    const twos = niceTicks(0, 2, 890);
    expect(twos.minors.filter((mark) => mark < twos.majors[1])).toHaveLength(3);
    const tens = niceTicks(0, 80, 890);
    expect(tens.minors.filter((mark) => mark < tens.majors[1])).toHaveLength(4);
  });
  it("never crowd their numerals, however narrow the ruler", () => {
    for (const width of [120, 200, 300, 532, 1600]) {
      const { step, decimals } = niceTicks(-0.2, 1.9, width);
      expect((step * width) / 2.1).toBeGreaterThan(6 * (2 + decimals));
    }
  });
});

describe("the ruler's scale", () => {
  it("places a station at one px for all cases when it counts x", () => {
    const scale = rulerScale(both, "x", 890);
    expectClose(px(scale, 0, 0.4), px(scale, 1, 0.4) ?? 0, rounding);
  });
  it("does not move a station when x is divided by one length for all", () => {
    const x = rulerScale(both, "x", 890);
    const over = rulerScale(both, "x/ell", 890);
    // the ends are rounded to a tenth of a mark of either scale: a mark is at most a ninth of the ruler
    expectClose(px(over, 0, 0.4), px(x, 0, 0.4) ?? 0, { absolute: 12, because: "a tenth of a mark" });
  });
  it("brings every flag to stand over zero when it counts from the virtual origins", () => {
    const scale = rulerScale(both, "(x-x0)/ell", 890);
    const zero = (-scale.from / (scale.to - scale.from)) * 890;
    both.forEach((one, i) => {
      expectClose(px(scale, i, one.x0.value ?? Number.NaN), zero, rounding);
    });
  });
  it("gives no place to a case without an origin there", () => {
    expect(rulerScale([screenCase(), lawless()], "(x-x0)/ell", 890).maps[1]).toBeNull();
  });
  it("holds all stations with room for their brackets, the flags and the whiskers", () => {
    const scale = rulerScale(both, "x", 890);
    expect(px(scale, 1, 0.15)).toBeGreaterThan(18);
    expect(px(scale, 1, 1.8)).toBeLessThan(890 - 20);
    expect(px(scale, 1, both[1].x0.value ?? 0)).toBeGreaterThan(30);
    expect(px(scale, 1, -5.8 * 0.025)).toBeGreaterThan(0);
  });
  it("does not run after an origin far upstream", () => {
    const far = screenCase({ x0: estimate(-50, -90, -10) });
    const scale = rulerScale([far], "x", 890);
    expect(px(scale, 0, 0.15)).toBeLessThan(890 / 2);
    expect(whiskerEnds(far.x0, { at: 200, perX: 400 }, 890)).toBeNull();
  });
  it("is still a scale for one station and for none", () => {
    const one = lawless({ stations: [{ x: 0.4, Tu: null, quality: "waiting" }] });
    for (const scale of [rulerScale([one], "x", 890), rulerScale([lawless({ stations: [] })], "x", 890)]) {
      expect(scale.to).toBeGreaterThan(scale.from);
      expect(scale.ticks.majors.length).toBeGreaterThan(1);
    }
  });
});

describe("the whisker of an origin", () => {
  const map = { at: 100, perX: 400 };
  it("has an arrow where its interval leaves the scale or has no end", () => {
    expect(whiskerEnds(estimate(0, -1, 0.1), map, 890)).toMatchObject({
      low: 1,
      lowLeaves: true,
      highLeaves: false,
    });
    expect(whiskerEnds(estimate(0, -0.1, Number.POSITIVE_INFINITY), map, 890)).toMatchObject({
      lowLeaves: false,
      high: 889,
      highLeaves: true,
    });
  });
  it("is not drawn where there is no interval", () => {
    expect(whiskerEnds({ value: 0.08, low: null, high: null }, map, 890)).toBeNull();
    expect(whiskerEnds(missing("no law"), map, 890)).toBeNull();
  });
});
