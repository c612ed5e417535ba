import { describe, expect, it } from "vitest";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import { lateral } from "../../../src/core/station/stationValues.ts";
import { expectClose } from "../../support/expectClose.ts";
import {
  close,
  codes,
  count,
  flagOf,
  mean,
  quick,
  station,
  step,
  u,
  v,
  w,
  whole,
  whyOf,
} from "./quickStation.ts";
import { partOf, settings, smooth, whiteNoise } from "./records.ts";

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
