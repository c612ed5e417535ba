import { describe, expect, it } from "vitest";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { bandBorders } from "../../../src/core/station/bandBorders.ts";
import { joinCorrelations } from "../../../src/core/station/joinCorrelations.ts";
import { joinParts } from "../../../src/core/station/joinParts.ts";
import { joinSpectra } from "../../../src/core/station/joinSpectra.ts";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import { requiredDuration } from "../../../src/core/station/requiredDuration.ts";
import { sampling } from "../../../src/core/station/sampling.ts";
import { joinedError, withError } from "../../../src/core/station/stationErrors.ts";
import { stationGradients } from "../../../src/core/station/stationGradients.ts";
import type { StationPart } from "../../../src/core/station/stationPart.ts";
import { lateral } from "../../../src/core/station/stationValues.ts";
import { structureSums } from "../../../src/core/station/structureSums.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { exponential, partOf, type Signal, settings, smooth, whiteNoise } from "./records.ts";

const close = { relative: 1e-9, absolute: 1e-12, because: "the definition, summed in another order" };
const step = 1e-3;
const count = 3000;
/** Shorter memories than elsewhere, so that three thousand samples are some hundreds of integral times. */
function quick(samples: number, seed: number): Float64Array {
  let value = 0;
  return exponential(samples, 3, seed).map((one) => {
    value = 0.5 * value + 0.5 * one;
    return value;
  });
}
const u = quick(count, 1).map((value) => 10 + value);
const v = quick(count, 2);
const w = quick(count, 3).map((value, i) => 0.8 * value + 0.3 * v[i]);
const whole = partOf({ u, v, w }, { settings: { segment: 64 } });
const station = reduceStation([whole], settings);
const codes = ({ flags }: StationResult) => flags.map(({ code }) => code);
const flagOf = ({ flags }: StationResult, code: string) => flags.find((flag) => flag.code === code);
const whyOf = (quantity: Quantity) => (isEstimate(quantity) ? "" : quantity.why);
const mean = (x: Float64Array) => x.reduce((sum, value) => sum + value, 0) / x.length;
const centred = (x: Float64Array) => x.map((value) => value - mean(x));
const productAt = (x: Float64Array, l: number, y = x) => {
  let sum = 0;
  for (let i = l; i < x.length; i++) sum += x[i] * y[i - l];
  return sum;
};
/** Welch's one-sided density by its definition, of segments of 64. */
function density(x: Float64Array, f: number, y = x): number {
  let [sum, segments] = [0, 0];
  const part = (of: Float64Array, from: number, turn: (angle: number) => number) => {
    let total = 0;
    for (let i = 0; i < 64; i++)
      total += 0.5 * (1 - Math.cos((2 * Math.PI * i) / 64)) * of[from + i] * turn((2 * Math.PI * f * i) / 64);
    return total;
  };
  for (let from = 0; from + 64 <= x.length; from += 32, segments++)
    sum +=
      part(x, from, Math.cos) * part(y, from, Math.cos) + part(x, from, Math.sin) * part(y, from, Math.sin);
  return (2 * step * sum) / (segments * 0.375 * 64);
}

describe("the curves of a station", () => {
  const { curves } = station;
  if (curves === null) throw new Error("no curves");
  const U = mean(u);
  const [a, b, c] = [u, v, w].map(centred);

  it("are Welch's spectra in wavenumber, k1 = 2πf/U", () => {
    const unit = (2 * Math.PI) / (U * 64 * step);
    [1, 2, 9].forEach((f) => {
      expectClose(curves.k1[f - 1], f * unit, close);
      expectClose(curves.E11[f - 1], (density(a, f) * U) / (2 * Math.PI), close);
      expectClose(curves.E22?.[f - 1], (density(b, f) * U) / (2 * Math.PI), close);
      expectClose(curves.E33?.[f - 1], (density(c, f) * U) / (2 * Math.PI), close);
      expectClose(curves.E12?.[f - 1], (density(a, f, b) * U) / (2 * Math.PI), close);
    });
  });
  it("have 36 K/19 degrees of freedom, or 2 T df of a band", () => {
    const segments = Math.floor((count - 64) / 32) + 1;
    expectClose(curves.freedom, (36 * segments) / 19, close);
    expectClose(curves.freedoms?.[0], Math.max((36 * segments) / 19, (2 * count) / 64), close);
    expect([station.facts.segment, station.facts.segments]).toEqual([64, segments]);
  });
  it("are correlations over their value at 0, up to four zero crossings", () => {
    [0, 1, 5].forEach((l) => {
      expectClose(curves.rho_u[l], productAt(a, l) / productAt(a, 0), close);
      expectClose(curves.rho_v?.[l], productAt(b, l) / productAt(b, 0), close);
      expectClose(curves.rho_w?.[l], productAt(c, l) / productAt(c, 0), close);
      expectClose(curves.lag[l], l * step, close);
    });
    expect(curves.lag.length).toBe(Math.ceil((4 * (station.facts.tauStar ?? 0)) / step) + 1);
  });
  it("of u alone have no others", () => {
    const alone = reduceStation([partOf({ u })], settings).curves;
    expect([alone?.E22, alone?.E33, alone?.E12, alone?.rho_v, alone?.rho_w]).toEqual([
      null,
      null,
      null,
      null,
      null,
    ]);
  });
  it("have a local slope where there are bands enough, for u and what else is measured", () => {
    expect(curves.local?.E22?.length).toBe(curves.local?.k1.length);
    expect(curves.local?.E33).not.toBeNull();
    const long = reduceStation([partOf({ u }, { settings: { segment: 512 } })], settings).curves?.local;
    expect(long?.k1.length).toBeGreaterThan(10);
    expect([long?.E22, long?.E33]).toEqual([null, null]);
  });
});

describe("records of one x put together", () => {
  const short: Signal = { u: quick(1000, 11).map((value) => 10.1 + value), v: quick(1000, 12) };
  const parts = [
    partOf({ u, v, w }, { origin: { file: "b.csv", y: 0.1 }, settings: { segment: 128 } }),
    partOf(short, { origin: { file: "a.csv", y: 0.2 }, settings: { segment: 64 } }),
  ];
  const record = joinParts(parts, settings);
  const [x, y] = [centred(u), centred(short.u)];

  it("that were not taken together are each about its own mean, and count by length", () => {
    expect(record.together).toBe(false);
    expect(record.parts.map(({ origin }) => origin.file)).toEqual(["a.csv", "b.csv"]);
    expect(record.components).toEqual(["u", "v"]);
    expectClose(record.means[0], (3000 * mean(u) + 1000 * mean(short.u)) / 4000, close);
    expect([record.samples, record.repeats]).toEqual([4000, 1]);
    expectClose(record.duration, 4, close);
    expectClose(record.span, 4, close);
    const sum = (name: string) =>
      record.rows.reduce((total, row) => total + row[record.fields.indexOf(name)], 0);
    expectClose(sum("uu"), productAt(x, 0) + productAt(y, 0), close);
    expectClose(sum("uv"), productAt(x, 0, centred(v)) + productAt(y, 0, centred(short.v ?? v)), close);
    expectClose(sum("u"), 0, { absolute: 1e-9, because: "sums about means" });
    expect(record.rows.length).toBe(record.blocks.length);
  });
  it("have one correlation: sums of products over sums of samples, or of pairs", () => {
    const [biased, unbiased] = [false, true].map((way) => joinCorrelations(record, way));
    [0, 1, 7].forEach((l) => {
      const products = productAt(x, l) + productAt(y, l);
      expectClose(biased?.covariance[0][l], products / 4000, close);
      expectClose(unbiased?.covariance[0][l], products / (4000 - 2 * l), close);
    });
    expect([biased?.step, biased?.stride]).toEqual([step, 1]);
  });
  it("have one spectrum, on the bins of the shortest segment, by length", () => {
    const spectra = joinSpectra(record);
    const of = (one: StationPart) => joinSpectra(joinParts([one], settings));
    const [long, brief] = [of(parts[0]), of(parts[1])];
    expect([spectra?.size, spectra?.segments]).toEqual([64, (long?.segments ?? 0) + (brief?.segments ?? 0)]);
    const fine = long?.density[0] ?? new Float64Array(0);
    // a bin of the coarser spectrum takes a finer one, and half of each neighbour
    const coarse = (fine[9] / 2 + fine[10] + fine[11] / 2) / 2;
    expectClose(spectra?.density[0][5], (3000 * coarse + 1000 * (brief?.density[0][5] ?? 0)) / 4000, close);
    expect(spectra?.cross).not.toBeNull();
  });
  it("that were taken together are averaged row by row, and last as long as one", () => {
    const rake = [0, 1, 2].map((i) =>
      partOf({ u: quick(count, 20 + i).map((value) => 10 + value) }, { origin: { y: 0.1 * i } }),
    );
    const joined = joinParts(rake, settings);
    expect(joined.together).toBe(true);
    expectClose(joined.span, 3, close);
    expectClose(joined.duration, 9, close);
    expect(joined.rows.length).toBe(rake[0].blocks.rows);
    const sum = joined.rows.reduce((total, row) => total + row[joined.fields.indexOf("uu")], 0);
    const each = [0, 1, 2].map((i) => productAt(centred(quick(count, 20 + i)), 0));
    expectClose(sum, (each[0] + each[1] + each[2]) / 3, close);
    expect(joined.blocks[2].map(({ block }) => block)).toEqual([2, 2, 2]);
    expect(joinParts(rake, { ...settings, simultaneous: false }).together).toBe(false);
    const late = { ...rake[2], start: 0.6 * step };
    expect(joinParts([rake[0], rake[1], late], settings).together).toBe(false);
    expect(joinParts([rake[0], rake[1], late], { ...settings, simultaneous: true }).together).toBe(true);
    const same = rake.map((one) => ({ ...one, origin: { ...one.origin, y: 1 } }));
    expect(joinParts(same, settings).together).toBe(false);
  });
  it("of another time step count for the moments only, and that is said", () => {
    const other = partOf(short, { origin: { file: "c.csv", y: 0.3, step: 2e-3 } });
    const found = reduceStation([partOf({ u, v }, { origin: { y: 0.1, file: "b.csv" } }), other], settings);
    expect(flagOf(found, "probes-joined")?.value).toBe(1);
    expect(flagOf(found, "probes-joined")?.text).toMatch(/^1 of 2 records has another time step/);
    expectClose(found.uu.value, (productAt(x, 0) + productAt(y, 0)) / 4000, close);
    expect(found.sources.map(({ name }) => name)).toEqual(["b.csv", "c.csv"]);
  });
});

describe("how the gradient varies along a record", () => {
  const record = joinParts([whole], settings);
  const spectra = joinSpectra(record);
  const times = {
    routes: station.routes as never,
    tauStar: station.facts.tauStar,
    scale: station.T_int.value,
  };
  const [found] = stationGradients(record, spectra, times);

  it("is told by short segments in each block, and their mean is the record's value", () => {
    const { bands, blocks } = whole;
    if (bands === null) throw new Error("no bands");
    expect(found.rule.floor).toBe(0);
    const borders = bandBorders(bands.size);
    const at = (block: number) => {
      let power = 0;
      for (let band = 0; band < borders.length; band++) power += bands.sums[0][block * bands.count + band];
      const width = 1 / (bands.size * step);
      const rate =
        ((2 * Math.PI * width) ** 2 * width * 2 * step * power) /
        (bands.segments[block] * 0.375 * bands.size);
      const row = record.rows[block];
      const variance = row[record.fields.indexOf("uu")] / row[0];
      return row[0] * (rate - (4 / 3) * (Math.PI * width) ** 2 * variance);
    };
    expectClose(found.rows[7] / found.rows[3], at(7) / at(3), close);
    const total = found.rows.reduce((sum, value) => sum + value, 0);
    expectClose(total / count, found.rate, close);
    expect(blocks.rows).toBe(found.rows.length);
  });
  it("is taken like the record's where a block has no segment of its own", () => {
    const bands = whole.bands && {
      ...whole.bands,
      segments: whole.bands.segments.map((n, b) => (b === 5 ? 0 : n)),
    };
    const holed = joinParts([{ ...whole, bands }], settings);
    const [one] = stationGradients(holed, spectra, times);
    expectClose(one.rows[5], 64 * one.rate, close);
  });
  it("is not formed of samples that are not correlated", () => {
    expect(stationGradients(record, spectra, { ...times, scale: 0.99 * step })).toEqual([]);
    expect(stationGradients(record, spectra, { ...times, scale: 1.01 * step }).length).toBe(3);
    expect(stationGradients(record, null, times)).toEqual([]);
  });
});

describe("structure functions of a station", () => {
  it("are held at the lags where they bound the dissipation best, between lambda and L11", () => {
    const record = joinParts([whole], settings);
    const [from, to] = [2 * step, 4 * step];
    const found = structureSums(record, from, to);
    const table = whole.increments;
    if (!found || !table) throw new Error("none");
    const between = table.lags.filter((lag) => lag >= 2 && lag <= 4);
    expect(between.length).toBeGreaterThan(1);
    const sums = between.map((lag) => {
      const at = table.lags.indexOf(lag);
      const of = (entry: number) => {
        let sum = 0;
        for (let block = 0; block < whole.blocks.rows; block++)
          sum += table.sums[(block * table.lags.length + at) * 3 + entry];
        return sum;
      };
      return { lag, second: (of(1) / of(0)) ** 1.5 / lag, third: of(2) / of(0) / lag };
    });
    const best = (key: "second" | "third") => sums.reduce((p, q) => (q[key] > p[key] ? q : p)).lag;
    expectClose(found.second.lag, best("second") * step, close);
    expectClose(found.third.lag, best("third") * step, close);
    expect(structureSums(record, 0.1 * step, 0.9 * step)).toBeNull();
  });
});

describe("doubts about a station", () => {
  it("are told of wavenumbers times eta below 0.9, and not of more", () => {
    expect(codes(reduceStation([whole], { ...settings, kinematicViscosity: 1 }))).not.toContain("resolution");
    const low = flagOf(station, "resolution");
    expectClose(low?.value, station.facts.k1max_eta ?? 0, close);
    expectClose(station.facts.k1max_eta, (Math.PI / (step * mean(u))) * (station.eta.value ?? 0), close);
    expect(low?.text).toMatch(/upper bounds/);
  });
  it("are told of components that were not measured", () => {
    const alone = reduceStation([partOf({ u })], settings);
    expect(flagOf(alone, "isotropy-assumed")?.concerns).toContain("Tu");
    const pair = reduceStation([partOf({ u, w })], settings);
    expect(flagOf(pair, "axisymmetry-assumed")?.text).toBe("v was not measured and is taken like w.");
    expect(flagOf(pair, "axisymmetry-assumed")?.concerns).toContain("epsilon");
    expect(whyOf(pair.vv)).toBe("v was not measured");
    expect(lateral(1, Number.NaN, Number.NaN)).toEqual([1, 1]);
    expect(lateral(1, 2, Number.NaN)).toEqual([2, 2]);
    expect(lateral(1, Number.NaN, 3)).toEqual([3, 3]);
    expect(lateral(1, 2, 3)).toEqual([2, 3]);
  });
  it("are told of a flow that reverses, with its lowest speed, and of a doubtful correction, with its factor", () => {
    const slow = reduceStation([partOf({ u: u.map((value) => value - 8.5), v, w })], {
      ...settings,
      taylorCorrection: true,
    });
    expect(flagOf(slow, "reversed-flow")?.value).toBe(Math.min(...u) - 8.5);
    const [uu, vv, ww, U] = [slow.uu, slow.vv, slow.ww, slow.U].map(({ value }) => value ?? 0);
    expectClose(flagOf(slow, "taylor-doubtful")?.value, 1 + (uu + 2 * vv + 2 * ww) / U ** 2, close);
    expect(slow.facts.taylorFactors?.length).toBe(3);
    expectClose(slow.facts.taylorFactors?.[1], 1 + (uu + vv / 2 + ww) / U ** 2, close);
    const off = reduceStation([partOf({ u: u.map((value) => value - 8.5), v, w })], settings);
    expect(flagOf(off, "taylor-doubtful")).toBeUndefined();
    expect(off.facts.taylorFactor).toBe(1);
  });
  it("are told of a spectrum that rises to its end", () => {
    const white = whiteNoise(count, 6);
    const rising = smooth(count, 8).map((value, i) => {
      const bend = i < 2 ? 0 : white[i] - 2 * white[i - 1] + white[i - 2];
      return 10 + value + 0.03 * bend;
    });
    const found = reduceStation([partOf({ u: rising })], settings);
    expect(flagOf(found, "aliasing")?.value).toBeGreaterThan(0.1);
    expect(codes(station)).not.toContain("aliasing");
  });
  it("are told of a spectrum that ends in noise, by the share beyond the cut", () => {
    const white = whiteNoise(count, 6);
    const soft = smooth(count, 8);
    const noisy = soft.map((value, i) => 10 + value + 0.06 * white[i]);
    const found = reduceStation([partOf({ u: noisy })], { ...settings, kinematicViscosity: 1e-4 });
    expect(flagOf(found, "noise-floor")?.value).toBe(found.facts.shareBeyondCutoff);
    expectClose(found.facts.k1max_eta, (found.facts.cutoff ?? 0) * (found.eta.value ?? 0), close);
    expect(flagOf(found, "resolution")?.text).toMatch(/extrapolated beyond/);
    // white noise of variance s² up to Nyquist, π/(U dt)
    expectClose(found.facts.noiseFloor, (0.06 ** 2 * step * (found.U.value ?? 0)) / Math.PI, {
      relative: 0.3,
      because: "a spectrum's scatter",
    });
  });
  it("are told of a record too short, by its length in integral times", () => {
    const short = reduceStation([partOf({ u: u.slice(0, 300) })], settings);
    const length = 0.3 / (short.T_int.value ?? 1);
    expect(length).toBeLessThan(100);
    expectClose(flagOf(short, "short-record")?.value, length, close);
    expectClose(short.facts.integralTimes, length, close);
    expect(short.facts.groups).toBe(0);
    expect(flagOf(station, "short-record")).toBeUndefined();
  });
  it("are told of a beginning unlike the rest, in time, with the time of flight", () => {
    const begun = u.map((value, i) => value + (i < 256 ? 4 : 0));
    const found = flagOf(reduceStation([partOf({ u: begun }, { origin: { x: 2.5 } })], settings), "start-up");
    expectClose(found?.value, 0.256, close);
    expect(found?.text).toMatch(
      /mean of u.*after 0.256 of time.*From x = 0 the flow takes 0.2[45] to this station/,
    );
    const upstream = flagOf(
      reduceStation([partOf({ u: begun }, { origin: { x: -1 } })], settings),
      "start-up",
    );
    expect(upstream?.text).not.toMatch(/From x = 0/);
    const louder = v.map((value, i) => value * (i < 320 ? 6 : 1));
    const loud = flagOf(reduceStation([partOf({ u, v: louder })], settings), "start-up");
    expect(loud?.text).toMatch(/the variance of its beginning/);
    // White's rule may take a block or two of the rest with it
    expect(loud?.value).toBeGreaterThanOrEqual(0.32);
    expect(loud?.value).toBeLessThan(0.5);
    const drifting = u.map((value, i) => value + (4 * i) / count);
    expect(flagOf(reduceStation([partOf({ u: drifting })], settings), "trend")?.value).toBeGreaterThan(4.5);
  });
  it("are told of an inflow that is replayed: its period, and as many independent times as it has", () => {
    const box = quick(600, 5);
    const again = Float64Array.from({ length: 4800 }, (_, i) => 10 + box[i % 600]);
    const found = reduceStation([partOf({ u: again })], settings);
    expectClose(flagOf(found, "replayed-inflow")?.value, 0.6, {
      relative: 0.005,
      because: "a fraction of a sample",
    });
    expectClose(found.facts.integralTimes, 0.6 / (found.T_int.value ?? 1), {
      relative: 0.005,
      because: "the same",
    });
  });
  it("that do not concern U leave it: uncorrelated samples have moments and no gradient", () => {
    const noise = reduceStation([partOf({ u: whiteNoise(count, 7).map((value) => 10 + value) })], settings);
    expect(flagOf(noise, "resolution")?.value).toBeLessThan(1);
    expect(whyOf(noise.lambda)).toMatch(/nothing above its noise floor/);
    expect(whyOf(noise.routes.gradient_difference2_expected)).toMatch(/nothing above its noise floor/);
    expect(isEstimate(noise.U) && noise.U.low !== null).toBe(true);
  });
});

describe("why a value is missing", () => {
  it("names what was not measured, what was not given, or that the stream rests", () => {
    const alone = reduceStation([partOf({ u })], { ...settings, kinematicViscosity: null });
    const missingOf: Record<string, RegExp> = {
      ...{
        isotropy_uv: /^v was not/,
        isotropy_uw: /^w was not/,
        uw: /^w was not/,
        vw: /^v was not/,
        vv: /^v was not/,
      },
      ...{
        eta: /viscosity/,
        Re_lambda: /viscosity/,
        epsilon: /viscosity/,
        C_epsilon: /viscosity/,
        Re_L: /viscosity/,
      },
    };
    for (const [name, pattern] of Object.entries(missingOf))
      expect(whyOf((alone as unknown as Record<string, Quantity>)[name]), name).toMatch(pattern);
    const routes: Record<string, RegExp> = {
      ...{ skewness_v: /^v was not/, flatness_w: /^w was not/, gradient_w: /^w was not/, K_v: /^v was not/ },
      ...{ rho_uv: /^v was not/, rho_uw: /^w was not/, rho_vw: /^v was not/, anisotropy_xi: /^v was not/ },
      ...{ barycentric_3: /^v was not/, L_v_ratio: /^v was not/, L_w_ratio: /^w was not/, L_v: /^v was not/ },
      ...{
        "epsilon_u-gradient": /viscosity/,
        eta_gradient: /viscosity/,
        "epsilon_all-gradients": /not all three/,
      },
    };
    for (const [name, pattern] of Object.entries(routes))
      expect(whyOf(alone.routes[name]), name).toMatch(pattern);
    expectClose(alone.lambda.value, Math.sqrt((alone.uu.value ?? 0) / (alone.gradient.value ?? 1)), close);
    const still = reduceStation([partOf({ u: u.map((value) => value - 10.5), v, w })], settings);
    for (const q of [
      still.L11,
      still.lambda,
      still.Tu,
      still.epsilon,
      still.epsilon_inertial,
      still.routes.gradient_v,
    ])
      expect(whyOf(q)).toMatch(/mean velocity is not positive|whole segment/);
    expectClose(still.uu.value, station.uu.value ?? 0, close);
    expect(still.curves).toBeNull();
    expect([still.facts.taylorFactor, still.facts.k1max_eta, still.facts.noiseFloor]).toEqual([
      null,
      null,
      null,
    ]);
    const constant = reduceStation([partOf({ u, v: new Float64Array(count) })], settings);
    expect(whyOf(constant.routes.skewness_v)).toBe("the fluctuation is zero");
  });
});

describe("errors put together", () => {
  it("of a product add in the square, with the freedom of Welch and Satterthwaite", () => {
    const a = { standard: 0.3, freedom: 9, scale: "log" as const };
    const b = { standard: 0.4, freedom: 4, scale: "log" as const };
    const both = joinedError(a, b);
    expectClose(both.standard, 0.5, close);
    expectClose(both.freedom, 0.25 ** 2 / (0.09 ** 2 / 9 + 0.16 ** 2 / 4), close);
    expectClose(joinedError(a, { ...b, freedom: null }).freedom, (0.25 ** 2 * 9) / 0.09 ** 2, close);
    expectClose(joinedError({ ...a, freedom: null }, b).freedom, (0.25 ** 2 * 4) / 0.16 ** 2, close);
    expect(joinedError({ ...a, freedom: null }, { ...b, freedom: null }).freedom).toBeNull();
  });
  it("give ends by Student's t, in the logarithm where the value is positive", () => {
    // t(0.975, 9) = 2.262157, t(0.975, ∞) = 1.959964: tables
    const linear = withError(5, { standard: 0.3, freedom: 9, scale: "linear" });
    const log = withError(5, { standard: 0.3, freedom: null, scale: "log" });
    if (!isEstimate(linear) || !isEstimate(log)) throw new Error("missing");
    expectClose(linear.low, 5 - 0.3 * 2.262157, { relative: 1e-6, because: "seven digits of a table" });
    expectClose(linear.high, 5 + 0.3 * 2.262157, { relative: 1e-6, because: "seven digits of a table" });
    expectClose(log.low, 5 * Math.exp(-0.3 * 1.959964), {
      relative: 1e-6,
      because: "seven digits of a table",
    });
    expectClose(log.high, 5 * Math.exp(0.3 * 1.959964), {
      relative: 1e-6,
      because: "seven digits of a table",
    });
  });
  it("of a length by its own law, and of a product with it by both", () => {
    const { T_int, Re_L, facts } = station;
    const standard = Math.sqrt((4 * (facts.tauStar ?? 0)) / 3);
    expectClose(isEstimate(T_int) ? T_int.error?.standard : 0, standard, close);
    const own = isEstimate(Re_L) ? (Re_L.error?.standard ?? 0) : 0;
    expect(own).toBeGreaterThan(standard);
    expectClose(Re_L.value, (Math.sqrt(station.uu.value ?? 0) * (station.L11.value ?? 0)) / 1.5e-5, close);
  });
  it("are none below a hundred integral times, nor of a replayed record with too few groups in a period", () => {
    const record = joinParts([whole], settings);
    const of = (scale: number, repeats = 1) =>
      sampling(
        { ...record, repeats, span: record.span / repeats },
        { routes: {} as never, tauStar: 2 * scale, scale },
      );
    expect(of(0.0301).groups).toBeNull();
    expect(of(0.0299).groups?.count).toBe(10);
    expectClose(of(0.0299).scaleError?.standard, Math.sqrt((8 * 0.0299) / 3), close);
    expect(of(0.0299).integralTimes).toBeCloseTo(3 / 0.0299, 9);
    // 47 blocks: five in each of nine periods, and not in each of ten
    expect(of(0.001, 9).groups?.count).toBe(46);
    expect(of(0.001, 10).why).toMatch(/too long against one period/);
    expect(of(0.01, 9).why).toMatch(/one period of the replayed record is 33 integral times/);
    const unknown = sampling(record, { routes: {} as never, tauStar: null, scale: null });
    expect([unknown.integralTimes, unknown.groups]).toEqual([null, null]);
  });
});

describe("how long to sample", () => {
  it("L11: the law of its error solved for the length", () => {
    const { L11 } = requiredDuration(station, 0.02);
    expectClose(L11.value, 4 * (station.facts.tauStar ?? 0) * (1.959963985 / Math.log(1.02)) ** 2, {
      relative: 1e-8,
      because: "ten digits of the quantile",
    });
  });
  it("no less than a hundred integral times, and nothing where there is nothing to begin from", () => {
    const { Tu, L11 } = requiredDuration(station, 5);
    const least = 100 * (station.T_int.value ?? 0);
    expectClose(Tu.value, least, close);
    expectClose(L11.value, least, close);
    expect(whyOf(requiredDuration(station, 0).Tu)).toMatch(/not above zero/);
    const short = reduceStation([partOf({ u: u.slice(0, 300) })], settings);
    expect(whyOf(requiredDuration(short, 0.1).Tu)).toMatch(/no interval yet/);
  });
});
