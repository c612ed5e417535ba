import { describe, expect, it } from "vitest";
import { argueCases } from "../../../src/core/compare/argueCases.ts";
import { kolmogorovSpectrum } from "../../../src/core/compare/kolmogorovSpectrum.ts";
import { spectralDistance } from "../../../src/core/compare/spectralDistance.ts";
import { missing } from "../../../src/core/quantity.ts";
import { type SeededRandom, seededRandom } from "../../../src/core/signal/seededRandom.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, lawStations, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";

const nu = 1.5e-5;
const freedom = 40;
/** A shape that bends as spectra do: flat, then falling steeply, in Kolmogorov form. */
const shape = (place: number) => 300 * (1 + (60 * place) ** 2) ** (-5 / 6) * Math.exp(-5 * place);

/** A mean of periodograms: chi-square over its degrees of freedom. */
function periodogram(random: SeededRandom): number {
  let sum = 0;
  for (let i = 0; i < freedom; i++) sum += random.gaussian() ** 2;
  return sum / freedom;
}

interface Made {
  readonly epsilon?: number;
  /** Factor on the spectrum; on the dissipation that is believed; its error. */
  readonly times?: number;
  readonly believed?: number;
  readonly error?: number;
  readonly random?: SeededRandom | null;
  /** k1 eta of the first point. */
  readonly from?: number;
}

/** A station whose spectrum has the shape, at a twentieth of a decade, one point a band of the comparison and another. */
function station({
  epsilon = 1,
  times = 1,
  believed = 1,
  error = 0,
  random = null,
  from = 0.003,
}: Made): StationResult {
  const eta = (nu ** 3 / epsilon) ** 0.25;
  const k1 = Float64Array.from({ length: 25 }, (_, i) => (from / eta) * 10 ** (i / 10));
  const E11 = k1.map(
    (k) => times * (epsilon * nu ** 5) ** 0.25 * shape(k * eta) * (random === null ? 1 : periodogram(random)),
  );
  const none = new Float64Array(0);
  const told = epsilon * believed;
  return stationAt(1, {
    epsilon: known(told, error),
    eta: known((nu ** 3 / told) ** 0.25, error / 4),
    curves: { k1, E11, E22: null, E33: null, freedom, lag: none, rho_u: none, rho_v: null, rho_w: null },
  });
}

function apart(first: StationResult, second: StationResult) {
  const [a, b] = [kolmogorovSpectrum(first), kolmogorovSpectrum(second)];
  if (typeof a === "string" || typeof b === "string") throw new Error("no spectrum");
  const found = spectralDistance(a, b);
  if (typeof found === "string") throw new Error(found);
  return found;
}

describe("the distance of two spectra in Kolmogorov form", () => {
  it("is nothing for one curve at any dissipation and any viscous scale", () => {
    const same = apart(station({}), station({ epsilon: 30 }));
    expect(same.distance).toBeLessThan(1e-9);
    expect(same.bands).toBe(25);
    expect(same.p).toBeGreaterThan(0.999);
  });
  it("is the logarithm of a factor on one of them", () => {
    const because = "the same factor on every band";
    expectClose(apart(station({}), station({ times: Math.E ** 0.3 })).distance, 0.3, {
      relative: 1e-9,
      because,
    });
    expectClose(apart(station({ times: Math.E ** 0.3 }), station({})).distance, 0.3, {
      relative: 1e-9,
      because,
    });
  });
  it("reads the first spectrum between its bands where they do not fall together", () => {
    const { distance, bands } = apart(station({}), station({ from: 0.00367 }));
    // a straight line over a tenth of a decade misses the bend where the exponential ends the curve
    expect(distance).toBeLessThan(0.02);
    expect(bands).toBe(24);
  });
  it("grows with a dissipation that is off by what a shift along both axes makes", () => {
    // where the curve has slope s, ln E moves by (1 - s)/4 of the error in ln eps
    const off = 0.04;
    const [a, b] = [station({}), station({ believed: Math.exp(off) })];
    const found = apart(a, b);
    const spectrum = kolmogorovSpectrum(a);
    if (typeof spectrum === "string") throw new Error(spectrum);
    const { place, level } = spectrum;
    const moves = place
      .slice(1)
      .map((at, i) => (((1 - (level[i + 1] - level[i]) / (at - place[i])) / 4) * off) ** 2);
    const expected = Math.sqrt(moves.reduce((sum, move) => sum + move, 0) / moves.length);
    expectClose(found.distance, expected, {
      relative: 0.05,
      because: "slopes of the two sides of a band differ",
    });
  });
  it("lies above 95 % of chance 5 times in 100 where only the sampling of both differs", () => {
    const random = seededRandom(5);
    const trials = 600;
    let [above, square] = [0, 0];
    let chance = 0;
    for (let trial = 0; trial < trials; trial++) {
      const [a, b] = [0, 1].map(() =>
        station({ believed: Math.exp(0.03 * random.gaussian()), error: 0.03, random }),
      );
      const found = apart(a, b);
      if (found.distance > found.chance_95) above++;
      square += found.distance ** 2 / trials;
      chance = found.chance;
    }
    // 600 at 5 %: 30 with a standard deviation of 5.3
    expect(above).toBeGreaterThan(14);
    expect(above).toBeLessThan(46);
    expectClose(Math.sqrt(square), chance, { relative: 0.03, because: "600 trials of 25 bands" });
  });
  it("is refused where fewer than five bands are common", () => {
    const [a, b] = [kolmogorovSpectrum(station({})), kolmogorovSpectrum(station({ from: 0.4 }))];
    if (typeof a === "string" || typeof b === "string") throw new Error("no spectrum");
    expect(spectralDistance(a, b)).toMatch(/fewer than five bands/);
  });
  it("needs a spectrum and a dissipation", () => {
    expect(kolmogorovSpectrum(stationAt(1, {}))).toMatch(/no spectra/);
    expect(kolmogorovSpectrum({ ...station({}), epsilon: missing("no viscosity is given") })).toBe(
      "no viscosity is given",
    );
  });
});

describe("the spectra of two cases", () => {
  const law = { A: 0.06, x0: 3, n: 1.25, ell: 1, U: 6, nu, B: 0.2, m: 0.375 };
  const settings = { ...plainSettings, referenceLength: 1, window: [0, 500] as const };
  const random = seededRandom(8);
  function aCase(name: string, x0: number, places: readonly number[], times = 1) {
    const stations = lawStations({ ...law, x0 }, places, 0.005, () =>
      Math.exp(0.005 * random.gaussian()),
    ).map((one) => ({ ...one, curves: station({ epsilon: one.epsilon.value ?? 1, times, random }).curves }));
    return { name, stations, settings };
  }
  const near = spacedFrom(3, 11, 103, 12);
  it("are held against each other where stations stand at nearly equal distance from their origins", () => {
    const cases = [
      aCase("a", 3, near),
      aCase(
        "b",
        12,
        near.map((x) => x + 9 + 0.02 * (x - 3)),
      ),
    ];
    const { spectra } = argueCases(cases, { align: "x0", tolerance: 0.1 }).comparisons[0];
    expect(spectra.pairs).toHaveLength(12);
    for (const { xi } of spectra.pairs) expect(Math.abs(Math.log(xi[1] / xi[0]))).toBeLessThan(Math.log(1.1));
    const far = spectra.pairs.filter(({ p }) => p < 0.05).length;
    expect(far).toBeLessThanOrEqual(3);
  });
  it("differ by more than chance where one carries twice as much", () => {
    const cases = [
      aCase("a", 3, near),
      aCase(
        "b",
        12,
        near.map((x) => x + 9),
        2,
      ),
    ];
    const { spectra } = argueCases(cases, { align: "x0", tolerance: 0.1 }).comparisons[0];
    for (const { distance, chance_95, p } of spectra.pairs) {
      expect(distance.value).toBeGreaterThan(chance_95);
      expect(p).toBeLessThan(0.05);
    }
  });
  it("are not compared where no two stations stand near enough, with the reason", () => {
    const wide = [8, 16, 32, 64, 128].map((xi) => 3 + xi);
    const between = [11.3, 22.6, 45.2, 90.4, 181].map((xi) => 12 + xi);
    const { spectra } = argueCases([aCase("a", 3, wide), aCase("b", 12, between)], {
      align: "x0",
      tolerance: 0.1,
    }).comparisons[0];
    expect(spectra.pairs).toEqual([]);
    expect(spectra.why).toMatch(/no two stations stand within 10 %/);
  });
});
