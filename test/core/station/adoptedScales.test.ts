import { describe, expect, it } from "vitest";
import type { ReductionFailure } from "../../../src/core/failure.ts";
import { bare, missing } from "../../../src/core/quantity.ts";
import { adoptedDissipation, dissipationReason } from "../../../src/core/station/adoptedDissipation.ts";
import { inertialScales } from "../../../src/core/station/inertialScales.ts";
import { transferables } from "../../../src/core/station/stationPart.ts";
import { expectClose } from "../../support/expectClose.ts";
import { close, u, v, whole } from "./quickStation.ts";
import { partOf, type Signal, settings } from "./records.ts";

const nu = 1.5e-5;
const leaves = { value: 4, without: [3, 5], further: 0.08 };
const variance = { value: 0.25, without: [0.2, 0.3] };

describe("the scales of an adopted dissipation", () => {
  it("from an inertial range are those of isotropic flow, whole and without each group", () => {
    const found = inertialScales(leaves, variance, nu);
    const at = (epsilon: number, uu: number) => ({
      lambda: Math.sqrt((15 * nu * uu) / epsilon),
      eta: (nu ** 3 / epsilon) ** 0.25,
      Re_lambda: (Math.sqrt(uu) * Math.sqrt((15 * nu * uu) / epsilon)) / nu,
      C_over_L: epsilon / uu ** 1.5,
    });
    // the relative error of epsilon that no group tells goes with the power of it
    const powers = { lambda: 0.5, eta: 0.25, Re_lambda: 0.5, C_over_L: 1 };
    for (const name of ["lambda", "eta", "Re_lambda", "C_over_L"] as const) {
      expectClose(found[name].value, at(4, 0.25)[name], close);
      expectClose(found[name].without[0], at(3, 0.2)[name], close);
      expectClose(found[name].without[1], at(5, 0.3)[name], close);
      expectClose(found[name].further, powers[name] * 0.08, close);
    }
  });
  const gradient = {
    ...{ epsilon_gradient: bare(1, "-"), lambda: bare(2, "-"), eta: bare(3, "-"), Re_lambda: bare(4, "-") },
  };
  const choice = {
    ...{ gradient, C_epsilon: bare(5, "-"), variance },
    inertial: { quantity: bare(4, "-"), leaves },
    quantity: ({ value }: { value: number }) => bare(value, "-"),
    timesLength: ({ value }: { value: number }) => bare(10 * value, "-"),
  };
  const values = (
    more: Partial<typeof settings>,
    from: Parameters<typeof adoptedDissipation>[1] = choice,
  ) => {
    const { epsilon, lambda, eta, Re_lambda, C_epsilon } = adoptedDissipation({ ...settings, ...more }, from);
    return [epsilon, lambda, eta, Re_lambda, C_epsilon].map(({ value }) => value);
  };
  it("are the gradients' by default, and the decay's for a large-eddy simulation or on request", () => {
    expect(values({})).toEqual([1, 2, 3, 4, 5]);
    expect(values({ kind: "les", dissipation: "gradient" })).toEqual([1, 2, 3, 4, 5]);
    expect(values({ kind: "dns" })).toEqual([1, 2, 3, 4, 5]);
    for (const more of [{ kind: "les" }, { dissipation: "decay" }] as const)
      expect(values(more)).toEqual([null, null, null, null, null]);
  });
  it("are the inertial range's on request, if there is one and a viscosity", () => {
    const [epsilon, lambda, , , C] = values({ dissipation: "inertial" });
    expect(epsilon).toBe(4);
    expectClose(lambda, Math.sqrt((15 * nu * 0.25) / 4), close);
    expectClose(C, 10 * 32, close);
    const why = missing("no range");
    const none = { ...choice, inertial: { quantity: why, leaves: null } };
    expect(values({ dissipation: "inertial" }, none)).toEqual([null, null, null, null, null]);
    expect(values({ dissipation: "inertial", kinematicViscosity: null })).toEqual([4, 4, 4, 4, 4]);
  });
  it("have their reason beside them", () => {
    const reason = (more: Partial<typeof settings>, components = 3) =>
      dissipationReason({ ...settings, ...more }, components);
    expect(reason({ dissipation: "gradient" })).toMatch(/from the gradients, as chosen/);
    expect(reason({ dissipation: "decay" })).toMatch(/decay law, as chosen/);
    expect(reason({ dissipation: "inertial", kind: "les" })).toMatch(/inertial range, as chosen/);
    expect(reason({ kind: "les" })).toMatch(/resolved motion/);
    expect([1, 2, 3].map((n) => reason({}, n))).toEqual([
      expect.stringMatching(/u alone/),
      expect.stringMatching(/two gradients/),
      expect.stringMatching(/all three/),
    ]);
  });
});

describe("a part that goes to another thread", () => {
  it("takes every buffer along, each once", () => {
    const buffers = transferables(whole);
    expect(new Set(buffers).size).toBe(buffers.length);
    expect(buffers).toEqual(
      expect.arrayContaining([
        whole.blocks.data.buffer,
        whole.lags?.products[2].buffer,
        whole.bands?.segments.buffer,
      ]),
    );
    const twice = transferables({ ...whole, lags: null, bands: null, spectrum: null, increments: null });
    expect(twice).toEqual([whole.blocks.data.buffer]);
  });
});

describe("a record that cannot be reduced", () => {
  const codeOf = (signal: Signal, step: number | null = 1e-3) => {
    try {
      partOf(signal, { origin: { step, file: "bad.csv" } });
    } catch (error) {
      const { code, where, facts } = error as ReductionFailure;
      return [code, where.file, facts.found];
    }
    return null;
  };
  it("says what it is, with the file and what was found", () => {
    expect(codeOf({ u: u.slice(0, 63) })).toEqual(["too-few-samples", "bad.csv", "63 samples"]);
    expect(codeOf({ u: u.slice(0, 1) })).toEqual(["too-few-samples", "bad.csv", "1 sample"]);
    expect(codeOf({ u: new Float64Array(0) })?.slice(0, 2)).toEqual(["too-few-samples", "bad.csv"]);
    expect(codeOf({ u: u.slice(0, 64) })).toBeNull();
    expect(codeOf({ u: new Float64Array(90).fill(3.5), v: v.slice(0, 90) })).toEqual([
      "constant-signal",
      "bad.csv",
      "3.5 in every sample",
    ]);
    const holed = v.slice(0, 90);
    holed[70] = Number.NaN;
    expect(codeOf({ u: u.slice(0, 90), v: holed })?.slice(0, 2)).toEqual(["not-a-number", "bad.csv"]);
    expect(codeOf({ u }, null)?.slice(0, 2)).toEqual(["no-time", "bad.csv"]);
    const back = u.slice(0, 90).map((_, i) => -i);
    const [code, file, found] = codeOf({ u: u.slice(0, 90), t: back }) ?? [];
    expect([code, file]).toEqual(["backward-time", "bad.csv"]);
    expect(found).toMatch(/^time -1 there, and 1 samples/);
  });
});
