import { describe, expect, it } from "vitest";
import { argueCases } from "../../../src/core/compare/argueCases.ts";
import type { CompareSettings } from "../../../src/core/comparison.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { expectClose } from "../../support/expectClose.ts";
import { type LawOfStations, lawStations, plainSettings, spacedFrom } from "../../support/lawStations.ts";

const first: LawOfStations = { A: 0.06, x0: 3, n: 1.25, ell: 1, U: 6, nu: 1.5e-5, B: 0.2, m: 0.375 };
const settings: DecaySettings = { ...plainSettings, referenceLength: 1, window: [0, 500] };

function aCase(
  name: string,
  law: LawOfStations,
  seed: number,
  error = 0.005,
  choice: Partial<DecaySettings> = {},
) {
  const random = seededRandom(seed);
  const moved = () => Math.exp(error * random.gaussian());
  const places = spacedFrom(law.x0, law.x0 + 8, law.x0 + 100, 14);
  return { name, stations: lawStations(law, places, error, moved), settings: { ...settings, ...choice } };
}

function compare(cases: ReturnType<typeof aCase>[], choice: Partial<CompareSettings> = {}) {
  return argueCases(cases, { align: "x0", tolerance: 0.1, ...choice }).comparisons;
}

function expectHeld(quantity: Quantity, truth: number) {
  if (!isEstimate(quantity) || quantity.low === null || quantity.high === null)
    throw new Error("no interval");
  expect(quantity.low).toBeLessThan(truth);
  expect(quantity.high).toBeGreaterThan(truth);
}

describe("two laws of known ratio, shift and exponent", () => {
  // 1.2 times the energy, nine lengths farther downstream
  const second = { ...first, A: 1.2 * first.A, x0: 12 };
  const [found] = compare([aCase("a", first, 1), aCase("b", second, 2)]);

  it("have the ratio of their coefficients, for Tu its root", () => {
    expect(found.aligned_with).toBe("common n");
    expectHeld(found.quantities.Tu.ratio, Math.sqrt(1.2));
    // lambda² = 10 nu k/eps does not know A
    expectHeld(found.quantities.lambda.ratio, 1);
    expect(found.quantities.lambda.verdict).toBe("equivalent");
  });
  it("have their origins as far apart as they were made, by one exponent and by each its own", () => {
    expectHeld(found.extra_distance, 9);
    for (const way of [found.origins.own, found.origins.common]) {
      if (way === null) throw new Error("both ways are to be shown");
      expectHeld(way.extra_distance, 9);
      expectHeld(way.x0[0], 3);
      expectHeld(way.x0[1], 12);
      expectHeld(way.n[0], 1.25);
    }
    expect(found.extra_distance).toEqual(found.origins.common?.extra_distance);
  });
  it("know the shift better with one exponent than with one each", () => {
    const width = ({ low, high }: { low?: number | null; high?: number | null }) => (high ?? 0) - (low ?? 0);
    const { own, common } = found.origins;
    expect(width((common?.extra_distance ?? {}) as object)).toBeLessThan(
      0.8 * width((own?.extra_distance ?? {}) as object),
    );
  });
  it("have equal Tu where both laws say, at the place that was chosen", () => {
    const at = 40;
    const [chosen] = compare([aCase("a", first, 11), aCase("b", second, 12)], { at });
    // A (x - 3)^-n = 1.2 A (x' - 12)^-n
    const place = 12 + (at - 3) * 1.2 ** (1 / 1.25);
    expect(chosen.matched.x[0].value).toBe(at);
    expectHeld(chosen.matched.x[1], place);
    expectHeld(chosen.matched_distance, place - at);
    expectHeld(chosen.matched.Tu, Math.sqrt((2 / 3) * 0.06 * 37 ** -1.25));
  });
  it("have none at a place whose intensity the other case does not reach, with the reason", () => {
    const [chosen] = compare([aCase("a", first, 1), aCase("b", { ...first, A: 1e-3 }, 2)], { at: 12 });
    expect(chosen.matched_distance).toMatchObject({ value: null, why: expect.stringMatching(/nowhere/) });
    const [outside] = compare([aCase("a", first, 1), aCase("b", second, 2)], { at: 2 });
    expect(outside.matched_distance).toMatchObject({ value: null, why: expect.stringMatching(/outside/) });
  });
  it("look at the body's place where none is chosen, and at the middle where the body stands elsewhere", () => {
    const body = { x: 50, chord: null, Tu: null, L11: null };
    const [atBody] = compare([aCase("a", first, 1, 0.005, { body }), aCase("b", second, 2)]);
    expect(atBody.matched.x[0].value).toBe(50);
    const away = { ...body, x: 900 };
    const [middle] = compare([aCase("a", first, 1, 0.005, { body: away }), aCase("b", second, 2)]);
    expect(middle.matched.x[0].value).toBeLessThan(103);
  });
});

describe("two laws whose exponents differ", () => {
  const cases = [aCase("a", first, 3), aCase("b", { ...first, n: 1.5, x0: 12 }, 4)];
  it("are shifted each by its own unless one is asked for, and both ways stand there", () => {
    const [auto] = compare(cases);
    expect(auto.aligned_with).toBe("own n");
    expectHeld(auto.extra_distance, 9);
    const [forced] = compare(cases, { exponent: "common" });
    expect(forced.aligned_with).toBe("common n");
    expect(forced.extra_distance).toEqual(auto.origins.common?.extra_distance);
    expect(forced.origins).toEqual(auto.origins);
    expect(forced.common_n.AICc?.own).toBeLessThan(forced.common_n.AICc?.common ?? 0);
  });
});

describe("more than two cases", () => {
  const cases = [
    aCase("a", first, 5),
    aCase("b", { ...first, x0: 12 }, 6),
    aCase("c", { ...first, x0: 7 }, 7),
    { ...aCase("short", first, 8), stations: aCase("short", first, 8).stations.slice(0, 2) },
  ];
  it("are all held against the one chosen, in their order; against the first where it is none of them", () => {
    const names = (against: string | null) => compare(cases, { against }).map((one) => one.cases.join("|"));
    expect(names("c")).toEqual(["c|a", "c|b", "c|short"]);
    expect(names(null)).toEqual(["a|b", "a|c", "a|short"]);
    expect(names("gone")).toEqual(["a|b", "a|c", "a|short"]);
  });
  it("have one origin each in all pairs", () => {
    const [b, c] = compare(cases);
    expect(b.origins.common?.x0[0]).toEqual(c.origins.common?.x0[0]);
    expect(b.aligned_with).toBe("common n");
    expectHeld(b.extra_distance, 9);
    expectHeld(c.extra_distance, 4);
  });
  it("turn the sign of the shift with the case that is held against", () => {
    const [towards] = compare(cases.slice(0, 2));
    const [back] = compare(cases.slice(0, 2), { against: "b" });
    expectClose(back.extra_distance.value, -(towards.extra_distance.value ?? 0), {
      relative: 1e-6,
      because: "the same two fits",
    });
  });
  it("give a reason for the pair with a case that has no law", () => {
    const [, , short] = compare(cases);
    expect(short.why).toMatch(/short/);
    expect(short.origins).toEqual({ own: null, common: null });
    expect(short.equivalent_beyond).toMatchObject({ from: null, why: expect.stringMatching(/short/) });
  });
  it("draw the same for a case whatever it is held against", () => {
    const [two] = compare(cases.slice(0, 2), { exponent: "own" });
    const [four] = compare(cases, { exponent: "own" });
    expect(four.quantities.Tu).toEqual(two.quantities.Tu);
  });
});

describe("a decay in time beside one along x", () => {
  const pair = [aCase("tunnel", first, 51), aCase("box", first, 52, 0.005, { along: "t" })];
  const why = (quantity: Quantity) => (isEstimate(quantity) ? "" : quantity.why);

  it("has no shift and no distance to it, which would be metres less seconds", () => {
    const [found] = compare(pair);
    for (const none of [found.extra_distance, found.origins.own?.extra_distance, found.matched_distance])
      expect(why(none ?? { value: null, why: "" })).toMatch(/^box decays in time/);
  });
  it("is laid over it where both have a scale of their own, and at equal Tu, but not at equal x", () => {
    expectHeld(compare(pair)[0].quantities.lambda.ratio, 1);
    expect(compare(pair, { align: "Tu" })[0].why).toBeNull();
    expect(compare(pair, { align: "x" })[0].why).toMatch(/^box decays in time/);
    const unscaled = pair.map((one) => ({ ...one, settings: { ...one.settings, referenceLength: null } }));
    expect(compare(unscaled)[0].why).toMatch(/^box decays in time/);
  });
});

describe("a case without units beside one in SI units", () => {
  const pair = [aCase("tunnel", first, 61), aCase("solver", first, 62, 0.005, { units: "nondimensional" })];
  const [found] = compare(pair);

  it("has no ratio of lengths, no shift and no distance, for metres do not divide by them", () => {
    const { L11, lambda, eta } = found.quantities;
    for (const none of [L11.ratio, lambda.ratio, eta.ratio, found.extra_distance, found.matched_distance])
      expect(isEstimate(none) ? "" : none.why).toMatch(/^solver is nondimensional/);
    expect(lambda.verdict).toBeNull();
    expect(found.equivalent_beyond.from).toBeNull();
  });
  it("is compared in what has no unit, at equal distance over each one's own scale", () => {
    expectHeld(found.quantities.Tu.ratio, 1);
    expect(compare(pair, { align: "x" })[0].why).toMatch(/^solver is nondimensional/);
  });
});

describe("laws along the time of flight", () => {
  // U grows by 4 % along the window: both laws hold in the time of flight
  const course = (x: number) => 6 * (1 + 0.0004 * x);
  const flown = (name: string, x0: number, seed: number) => {
    const random = seededRandom(seed);
    const along = (x: number) => (6 * Math.log(course(x) / 6)) / (6 * 0.0004);
    const law = { ...first, x0: along(x0) };
    const places = spacedFrom(x0, x0 + 8, x0 + 100, 14);
    const made = lawStations(law, places.map(along), 0.005, () => Math.exp(0.005 * random.gaussian()));
    const stations = made.map((station, i) => {
      const U = course(places[i]);
      const Tu = Math.sqrt((2 / 3) * (station.k.value ?? 0)) / U;
      return {
        ...station,
        x: places[i],
        U: { value: U, low: U * 0.9999, high: U * 1.0001 },
        Tu: { value: Tu, low: Tu * 0.995, high: Tu * 1.005 },
      };
    });
    return { name, stations, settings: { ...settings, coordinate: "flight" as const } };
  };
  it("are compared along it, and their shift is given in x", () => {
    const [found] = compare([flown("a", 3, 1), flown("b", 12, 2)]);
    expectHeld(found.extra_distance, 9);
    expectHeld(found.origins.own?.x0[1] ?? { value: null, why: "" }, 12);
  });
});
