import { describe, expect, it } from "vitest";
import { everyStart } from "../../../src/core/decay/everyStart.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { fitWindow } from "../../../src/core/decay/fitWindow.ts";
import { nearField } from "../../../src/core/decay/nearField.ts";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";

const xs = spacedFrom(0, 6, 100, 16);
const law = (x: number) => 0.06 * (x - 3) ** -1.25;
/** Stations on a law with a near field of so much at x = 6 that dies out over six lengths, and scatter of 0.5 %. */
function stations(excess: number, seed: number) {
  const random = seededRandom(seed);
  return xs.map((x) => {
    const q = law(x) * (1 + excess * Math.exp(-(x - 6) / 6)) * Math.exp(0.005 * random.gaussian());
    return stationAt(x, { q: known(q, 0.005) });
  });
}
const holds = (n: Quantity | undefined) =>
  n !== undefined && isEstimate(n) && (n.low ?? -9) <= 1.25 && 1.25 <= (n.high ?? 9);
const flagged = (excess: number, seed: number) =>
  fitDecay(stations(excess, seed), plainSettings).flags.some(({ code }) => code === "near-field");
const shareOf = (excess: number, profiles: number) =>
  Array.from({ length: profiles }, (_, i) => flagged(excess, 100 + i)).filter(Boolean).length / profiles;

describe("a near field", () => {
  it("of 100 %, or 30 %, whose rest hides below the scatter of the window is told in all of forty profiles", () => {
    expect(shareOf(1, 40)).toBe(1);
    expect(shareOf(0.3, 40)).toBeGreaterThan(0.97);
  });
  it("is told on a pure law in fewer than one profile of twelve", () =>
    expect(shareOf(0, 120)).toBeLessThan(1 / 12));
  it("says how many stations it made leave, and by how much the last of them departs", () => {
    const decay = fitDecay(stations(1, 4), plainSettings);
    const at = decay.points.findIndex(({ used }) => used);
    const { left_out, departure } = decay.near_field ?? {};
    expect(left_out).toBe(at);
    const { A, x0, n } = decay.law ?? { A: 0, x0: 0, n: 0 };
    const before = decay.points[at - 1];
    expectClose(departure, before.q / (A * (before.x - x0) ** -n) - 1, {
      relative: 1e-12,
      because: "the same division",
    });
    const text = decay.flags.find(({ code }) => code === "near-field")?.text;
    expect(text).toContain(`${left_out} stations before`);
  });
  it("leaves the truth in the union over every start, which the adopted union loses in most profiles", () => {
    const held = { every: 0, adopted: 0 };
    for (let seed = 200; seed < 240; seed++) {
      const decay = fitDecay(stations(0.3, seed), plainSettings);
      const used = decay.points.filter((point) => point.used);
      if (holds(decay.n)) held.adopted++;
      if (holds(everyStart(used, plainSettings)?.n)) held.every++;
    }
    expect(held.every).toBeGreaterThanOrEqual(38);
    expect(held.adopted).toBeLessThan(20);
  });
  it("is looked for inside a window set by hand", () => {
    const decay = fitDecay(stations(0.1, 5), { ...plainSettings, window: [0, 200] });
    expect(decay.near_field?.left_out).toBe(0);
    expect(decay.near_field?.p).toBeLessThan(0.02);
    expect(decay.flags.find(({ code }) => code === "near-field")?.text).toContain("dies out");
  });
});

describe("the score of a dying term", () => {
  const origin = 3;
  /** ln q of a law with a term B exp(-(x - x1)/L), L = x1 - x0, and no scatter. */
  const points = (B: number, error: number | null) =>
    xs.map((x) => ({ x, q: law(x) * Math.exp(B * Math.exp(-(x - 6) / (6 - origin))), smoothedError: error }));
  const found = (B: number, error: number | null, held: { x0?: number; n?: number } = {}) => {
    const window = fitWindow(points(B, error), { ...plainSettings, ...held });
    if ("refused" in window) throw new Error(window.refused);
    return nearField(window);
  };

  it("gives back a small term that was put in: what A, n and x0 take up of it is taken out of both", () => {
    expectClose(found(1e-5, 0.001)?.excess, 1e-5, {
      relative: 0.02,
      because: "the length follows the fitted x0, and is among those tried",
    });
  });
  it("is not asked for where n or x0 is held: it would tell that they are held elsewhere", () => {
    expect(found(1e-5, 0.001, { x0: origin })).toBeNull();
    expect(found(1e-5, 0.001, { n: 1.25 })).toBeNull();
  });
  it("is as many standard errors as the errors say: ten times smaller errors, ten times the size", () => {
    const [rough, fine] = [found(1e-5, 1e-3)?.size ?? 0, found(1e-5, 1e-4)?.size ?? 0];
    expectClose(fine / rough, 10, { relative: 1e-6, because: "errors of all stations alike" });
  });
  it("keeps its sign", () => expect(found(-1e-5, 0.001)?.excess).toBeLessThan(0));
  it("is not asked of stations that leave nothing over", () => {
    const few = points(0, 0.01).slice(0, 4);
    const window = fitWindow(few, plainSettings);
    expect("refused" in window ? window : nearField(window)).toBeNull();
  });
  it("has a p that falls below one in ten in about one pure law of ten or fewer, errors known or from the scatter", () => {
    const random = seededRandom(8);
    for (const told of [0.01, null]) {
      let small = 0;
      for (let profile = 0; profile < 400; profile++) {
        const moved = xs.map((x) => ({
          x,
          q: law(x) * Math.exp(0.01 * random.gaussian()),
          smoothedError: told,
        }));
        const window = fitWindow(moved, plainSettings);
        if (!("refused" in window) && (nearField(window)?.p ?? 1) < 0.1) small++;
      }
      // Bonferroni over three lengths that resemble one another errs to this side
      expect(small / 400).toBeLessThan(0.13);
      expect(small / 400).toBeGreaterThan(0.02);
    }
  });
});
