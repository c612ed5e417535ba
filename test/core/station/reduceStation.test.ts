import { isDeepStrictEqual } from "node:util";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import { taylorFactors } from "../../../src/core/station/stationValues.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { exponential, partOf, settings, smoothRecord, stationOf, whiteNoise } from "./records.ts";

const seed = 20261201;

/** Every quantity of a station, its routes among them. */
function quantitiesOf(station: StationResult): [string, Quantity][] {
  const own = Object.entries(station).filter(
    (entry): entry is [string, Quantity] =>
      typeof entry[1] === "object" && entry[1] !== null && "value" in entry[1],
  );
  return [
    ...own,
    ...Object.entries(station.routes).map(([name, q]): [string, Quantity] => [`routes.${name}`, q]),
  ];
}

function numberOf(quantity: Quantity): number {
  if (!isEstimate(quantity)) throw new Error(`missing: ${quantity.why}`);
  return quantity.value;
}

function codes(station: StationResult): string[] {
  return station.flags.map(({ code }) => code);
}

const record = smoothRecord(20_000, 11);
const plain = stationOf(record);

describe("a station of one record", () => {
  it("gives every quantity a finite value with two finite ends, or a reason", () => {
    for (const [name, q] of quantitiesOf(plain)) {
      if (!isEstimate(q)) {
        expect(q.why.length, name).toBeGreaterThan(10);
        continue;
      }
      expect(Number.isFinite(q.value), name).toBe(true);
      for (const [end, why] of [
        [q.low, q.why_low],
        [q.high, q.why_high],
      ] as const) {
        if (end === null) expect(why, name).toBeTruthy();
        else expect(Number.isFinite(end), name).toBe(true);
      }
      if (q.low !== null && q.high !== null) expect(q.low < q.value && q.value < q.high, name).toBe(true);
    }
  });
  it("has an error of U as large as independent integral times give", () => {
    // Lenschow, Mann & Kristensen (1994): se(U) = u' sqrt(2 T_int/T)
    const law = Math.sqrt((2 * numberOf(plain.T_int) * numberOf(plain.uu)) / (plain.duration ?? 0));
    expect(isEstimate(plain.U) && plain.U.error?.scale).toBe("linear");
    expectClose(isEstimate(plain.U) ? plain.U.error?.standard : null, law, {
      relative: 0.5,
      because: "some twenty groups tell an error to a sixth, and T_int is known to a fifth",
    });
  });
  it("has a spectrum that integrates to the variance", () => {
    const long = stationOf({ u: smoothRecord(200_000, 9).u });
    expectClose(long.facts.recoveredVariance, 1, {
      relative: 0.02,
      because: "the ends of a record weigh less in its segments",
    });
  });
  it("has a mean-square gradient that the fourth-order difference stays below, and a second-order one further", () => {
    const [spectral, fourth, second] = ["gradient_u", "gradient_difference4", "gradient_difference2"].map(
      (name) => numberOf(plain.routes[name]),
    );
    expect(fourth).toBeLessThan(spectral);
    expect(second).toBeLessThan(fourth);
  });
  it("keeps blocks whose plain sums are its own quantities", () => {
    const { blocks } = plain;
    if (blocks === null) throw new Error("no blocks");
    const total = (name: string) => {
      const at = blocks.fields.indexOf(name);
      let sum = 0;
      for (let row = 0; row < blocks.rows; row++) sum += blocks.data[row * blocks.fields.length + at];
      return sum;
    };
    const weight = total("weight");
    const close = { relative: 1e-10, because: "rounding" };
    expectClose(total("u"), 0, { absolute: 1e-8, because: "sums about the mean cancel" });
    expectClose(total("uu") / weight, numberOf(plain.uu), close);
    expectClose(total("area_u") / total("uu"), numberOf(plain.T_int), close);
    expectClose(total("rate_u") / weight / numberOf(plain.U) ** 2, numberOf(plain.gradient), close);
  });
  it("obeys its own definitions", () => {
    const [U, uu, k, lambda, epsilon, L11] = [
      plain.U,
      plain.uu,
      plain.k,
      plain.lambda,
      plain.epsilon,
      plain.L11,
    ].map(numberOf);
    const close = { relative: 1e-12, because: "definitions" };
    const nu = 1.5e-5;
    expectClose(numberOf(plain.Tu), Math.sqrt((2 * k) / 3) / U, close);
    expectClose(numberOf(plain.routes.lambda_f), Math.SQRT2 * lambda, close);
    expectClose(numberOf(plain.eta), (nu ** 3 / epsilon) ** 0.25, close);
    expectClose(numberOf(plain.Re_lambda), (Math.sqrt(uu) * lambda) / nu, close);
    expectClose(numberOf(plain.C_epsilon), (epsilon * L11) / uu ** 1.5, close);
    expectClose(numberOf(plain.Re_L), (Math.sqrt(uu) * L11) / nu, close);
    expectClose(L11, U * numberOf(plain.T_int), close);
  });
});

/** How a quantity changes when velocities are a times, times b times as large (and nu follows as L²/T). */
const powers: Record<string, [number, number]> = {
  U: [1, 0],
  uu: [2, 0],
  uv: [2, 0],
  k: [2, 0],
  Tu: [0, 0],
  isotropy_uv: [0, 0],
  T_int: [0, 1],
  L11: [1, 1],
  lambda: [1, 1],
  gradient: [0, -2],
  epsilon: [2, -1],
  eta: [1, 1],
  Re_lambda: [0, 0],
  Re_L: [0, 0],
  C_epsilon: [0, 0],
  S_dudx: [0, 0],
};

describe("a station in other units", () => {
  it("keeps what is without dimension and scales the rest, intervals included", () => {
    fc.assert(
      fc.property(fc.integer({ min: -10, max: 10 }), fc.integer({ min: -10, max: 10 }), (i, j) => {
        const [a, b] = [2 ** i, 2 ** j];
        const scaled = stationOf(
          { u: record.u.map((x) => a * x), v: record.v.map((x) => a * x), w: record.w.map((x) => a * x) },
          { kinematicViscosity: 1.5e-5 * a * a * b },
          { step: 1e-3 * b },
        );
        for (const [name, [p, q]] of Object.entries(powers)) {
          const key = name as "U";
          const [found, base] = [scaled[key], plain[key]];
          if (!isEstimate(found) || !isEstimate(base)) throw new Error(`${name} is missing`);
          const factor = a ** p * b ** q;
          const close = { relative: 1e-9, absolute: 1e-12 * factor, because: "rounding of decimal steps" };
          expectClose(found.value, base.value * factor, close);
          expectClose(found.low, (base.low ?? 0) * factor, close);
          expectClose(found.high, (base.high ?? 0) * factor, close);
        }
      }),
      { seed, numRuns: 6 },
    );
  });
  it("from metres to millimetres: lengths a thousandfold, numbers the same", () => {
    const mm = stationOf(
      {
        u: record.u.map((x) => 1000 * x),
        v: record.v.map((x) => 1000 * x),
        w: record.w.map((x) => 1000 * x),
      },
      { kinematicViscosity: 15 },
    );
    const close = { relative: 1e-9, because: "rounding of a factor that is no power of two" };
    expectClose(numberOf(mm.L11), 1000 * numberOf(plain.L11), close);
    expectClose(numberOf(mm.eta), 1000 * numberOf(plain.eta), close);
    expectClose(numberOf(mm.Re_lambda), numberOf(plain.Re_lambda), close);
  });
});

describe("a station in blocks of another size", () => {
  it("has the same values: only their errors are formed over other groups", () => {
    const part = partOf(record);
    const coarse = partOf(record, {
      record: { plan: { ...part.plan, blockSamples: 16 * part.plan.blockSamples } },
    });
    const [found, base] = [coarse, part].map((one) => reduceStation([one], settings));
    for (const [name, quantity] of quantitiesOf(base)) {
      const other = new Map(quantitiesOf(found)).get(name);
      if (!isEstimate(quantity)) continue;
      expectClose(other?.value, quantity.value, {
        relative: 1e-9,
        absolute: 1e-12,
        because: `rounding, ${name}`,
      });
    }
  });
});

describe("several records at one x", () => {
  const parts = [1, 2, 3].map((i) =>
    partOf(smoothRecord(12_000, 40 * i), { origin: { file: "long.csv", y: 0.1 * i } }),
  );
  const joined = reduceStation(parts, settings);
  it("give the same bits in any order", () => {
    for (const order of [
      [2, 0, 1],
      [1, 2, 0],
    ]) {
      const again = reduceStation(
        order.map((i) => parts[i]),
        settings,
      );
      expect(isDeepStrictEqual(again, joined)).toBe(true);
    }
  });
  it("taken at once average their variances, each about its own mean", () => {
    const shifted = partOf(
      { ...smoothRecord(12_000, 40), u: smoothRecord(12_000, 40).u.map((u) => u + 5) },
      { origin: { file: "other.csv", y: 9 } },
    );
    const both = reduceStation([parts[0], shifted], { ...settings, probes: "all" });
    const alone = reduceStation([parts[0]], settings);
    expectClose(numberOf(both.uu), numberOf(alone.uu), {
      relative: 1e-10,
      because: "a constant adds no variance",
    });
    expectClose(numberOf(both.U), numberOf(alone.U) + 2.5, {
      relative: 1e-10,
      because: "the mean of both means",
    });
    expect(both.blocks?.rows).toBe(alone.blocks?.rows);
    expect(codes(both)).toContain("inhomogeneous");
    // the same eddies twice are no more than once
    const error = (q: Quantity) => (isEstimate(q) ? q.error?.standard : null);
    expectClose(error(both.uu), error(alone.uu) ?? 0, {
      relative: 1e-6,
      because: "the second tells nothing new",
    });
  });
  it("taken one after another count as so much longer a record", () => {
    const apart = reduceStation(parts, { ...settings, simultaneous: false });
    expectClose(apart.facts.integralTimes, 3 * (joined.facts.integralTimes ?? 0), {
      relative: 1e-9,
      because: "three lengths",
    });
    expect(apart.blocks?.rows).toBe(3 * (joined.blocks?.rows ?? 0));
    expectClose(numberOf(apart.k), numberOf(joined.k), { relative: 1e-10, because: "the same sums" });
  });
  it("whose pilots chose other lags and segments still join", () => {
    const other = partOf(smoothRecord(12_000, 500), {
      origin: { file: "z.csv" },
      settings: { segment: 512 },
    });
    const both = reduceStation([parts[0], other], settings);
    expect(both.facts.segment).toBe(512);
    expectClose(both.facts.recoveredVariance, 1, {
      relative: 0.1,
      because: "the ends of a record weigh less in its segments",
    });
  });
});

describe("signals with a known answer", () => {
  it("an exponential correlation gives back its time, by every route", () => {
    const station = stationOf({ u: exponential(400_000, 25, 17).map((u) => u + 10) });
    for (const route of ["zero-crossing", "one-over-e", "exponential", "low-frequency"]) {
      expectClose(numberOf(station.routes[`T_int_${route}`]), 0.025, {
        relative: 0.12,
        because: "three standard errors of the crossing at 16 000 integral times",
      });
    }
    expectClose(numberOf(station.L11), 10 * numberOf(station.T_int), {
      relative: 1e-2,
      because: "U is 10 within its error",
    });
  });
  it("white noise has no scale and no gradient, and is flagged", () => {
    const station = stationOf({ u: whiteNoise(30_000, 3).map((u) => u + 10) });
    expect(numberOf(station.T_int)).toBeLessThan(1e-3);
    expect(codes(station)).toContain("resolution");
    expect(isEstimate(station.gradient)).toBe(false);
  });
  it("a sine keeps its variance, and its integral time is its period over 2π", () => {
    const u = Float64Array.from({ length: 40_000 }, (_, i) => 10 + Math.sin((2 * Math.PI * i) / 200));
    const station = stationOf({ u });
    expectClose(numberOf(station.uu), 0.5, { relative: 1e-9, because: "whole periods" });
    expectClose(numberOf(station.T_int), 0.2 / (2 * Math.PI), {
      relative: 5e-3,
      because: "200 points a period, ends of the record",
    });
    expectClose(numberOf(station.gradient), (0.5 * (2 * Math.PI * 5) ** 2) / 100, {
      relative: 0.02,
      because: "the window widens the line",
    });
  });
});

describe("what is not known is said", () => {
  it("u alone: isotropy is assumed, v is missing", () => {
    const station = stationOf({ u: record.u });
    expect(codes(station)).toContain("isotropy-assumed");
    expect(station.vv).toEqual({ value: null, why: "v was not measured" });
    expectClose(numberOf(station.k), 1.5 * numberOf(station.uu), { relative: 1e-12, because: "definition" });
    expectClose(numberOf(station.epsilon), 15 * 1.5e-5 * numberOf(station.gradient), {
      relative: 1e-12,
      because: "definition",
    });
  });
  it("u and v: w is taken like v", () => {
    const station = stationOf({ u: record.u, v: record.v });
    expect(codes(station)).toContain("axisymmetry-assumed");
    expectClose(numberOf(station.k), numberOf(station.uu) / 2 + numberOf(station.vv), {
      relative: 1e-12,
      because: "definition",
    });
    const gradients = numberOf(station.routes.gradient_u) + 2 * numberOf(station.routes.gradient_v);
    expectClose(numberOf(station.epsilon), 3 * 1.5e-5 * gradients, {
      relative: 1e-12,
      because: "definition",
    });
  });
  it("without a viscosity: lambda stands, eta does not", () => {
    const station = stationOf(record, { kinematicViscosity: null });
    expect(isEstimate(station.lambda)).toBe(true);
    expect(station.eta).toEqual({ value: null, why: "no kinematic viscosity is given" });
    expect(codes(station)).toContain("no-viscosity");
  });
  it("a short record: values without intervals, and why", () => {
    const station = stationOf({ u: exponential(2000, 40, 2).map((u) => u + 10) });
    expect(codes(station)).toContain("short-record");
    expect(isEstimate(station.uu) && station.uu.why_low).toMatch(/integral times long/);
  });
  it("a large-eddy simulation: scales wait for the decay, their resolved values stand beside", () => {
    const station = stationOf(record, { kind: "les" });
    for (const q of [station.epsilon, station.lambda, station.eta, station.Re_lambda])
      expect(isEstimate(q)).toBe(false);
    expect(numberOf(station.routes.lambda_gradient)).toBe(numberOf(plain.lambda));
    expect(codes(station)).toContain("resolved-scales");
  });
  it("a measurement whose sensor is longer than four eta: its length in them", () => {
    const eta = numberOf(plain.eta);
    const flagOf = (sensorLength: number) =>
      stationOf(record, { kind: "measurement", sensorLength }).flags.find(
        ({ code }) => code === "sensor-length",
      );
    expect(flagOf(3.9 * eta)).toBeUndefined();
    expectClose(flagOf(8 * eta)?.value, 8, { relative: 1e-9, because: "definition" });
  });
  it("a correlation that never falls to zero: a lower bound in words", () => {
    const ramp = Float64Array.from({ length: 600 }, (_, i) => 10 + (i < 300 ? 0 : 1) + 1e-3 * Math.sin(i));
    const station = stationOf({ u: ramp });
    expect(numberOf(station.uu)).toBeGreaterThan(0.2);
    if (!isEstimate(station.T_int)) expect(station.T_int.why).toMatch(/or more/);
    else expect(codes(station)).toContain("short-record");
  });
  it("flow that reverses is flagged", () => {
    const station = stationOf({ u: record.u.map((u) => u - 9.9) });
    expect(codes(station)).toContain("reversed-flow");
  });
  it("a linear trend goes where the user wants it gone, and only there", () => {
    const tilted = record.u.map((u, i) => u + i / 10_000);
    const kept = numberOf(stationOf({ u: tilted }).uu);
    const removed = numberOf(stationOf({ u: tilted }, { detrend: "linear" }).uu);
    expectClose(removed, numberOf(plain.uu), {
      relative: 0.02,
      because: "the fit takes a little of the signal too",
    });
    expect(kept).toBeGreaterThan(removed + 0.2);
  });
});

describe("Taylor's hypothesis", () => {
  it("is corrected by component, by the factors of Lumley (1965)", () => {
    const corrected = stationOf(record, { taylorCorrection: true });
    const [U, uu, vv, ww] = [plain.U, plain.uu, plain.vv, plain.ww].map(numberOf);
    const factors = {
      gradient_u: 1 + (uu + 2 * vv + 2 * ww) / U ** 2,
      gradient_v: 1 + (uu + vv / 2 + ww) / U ** 2,
      gradient_w: 1 + (uu + vv + ww / 2) / U ** 2,
    };
    for (const [name, factor] of Object.entries(factors)) {
      expectClose(numberOf(plain.routes[name]) / numberOf(corrected.routes[name]), factor, {
        relative: 1e-12,
        because: "definition",
      });
    }
    expect(codes(corrected)).not.toContain("taylor-doubtful");
  });
  it("in isotropic flow takes 5 uu/U² from the longitudinal gradient and 2.5 from the lateral ones", () => {
    // Heskestad (1965), J. Appl. Mech. 32, 735; Wyngaard & Clifford (1977), J. Atmos. Sci. 34, 922
    const [u, v, w] = taylorFactors(0.09, 0.09, 0.09, 3, true);
    const close = { relative: 1e-14, because: "closed form" };
    expectClose(u, 1 + (5 * 0.09) / 9, close);
    expectClose(v, 1 + (2.5 * 0.09) / 9, close);
    expectClose(w, 1 + (2.5 * 0.09) / 9, close);
  });
  it("is doubtful where it changes the gradient by more than a tenth", () => {
    const slow = stationOf({ ...record, u: record.u.map((u) => u - 5) }, { taylorCorrection: true });
    expect(codes(slow)).toContain("taylor-doubtful");
  });
});
