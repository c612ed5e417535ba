import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { ReductionFailure } from "../../../src/core/failure.ts";
import { isEstimate } from "../../../src/core/quantity.ts";
import type { ProfileRow } from "../../../src/core/records.ts";
import { profileStation } from "../../../src/core/station/profileStation.ts";
import { expectClose } from "../../support/expectClose.ts";
import { settings } from "./records.ts";

function rowOf(values: ProfileRow["values"]): ProfileRow {
  return { file: "profile.csv", line: 7, x: 2.1, values };
}

describe("Comte-Bellot & Corrsin 1971, table 4: scales from u' and epsilon", () => {
  // J. Fluid Mech. 48, 273; M = 5.08 cm, nu = U0 M/34000 = 0.149412 cm²/s; units cm, s
  const table = readFileSync(
    new URL("../../reference/cbc1971/cbc1971_table4_gross_properties.csv", import.meta.url),
    "utf8",
  );
  const lines = table.split("\n").filter((line) => line.trim() !== "" && !line.startsWith("#"));
  const heading = lines[0].split(",");
  const at = (line: string, start: string) =>
    Number(line.split(",")[heading.findIndex((one) => one.startsWith(start))]);
  it.each(lines.slice(1))("%s", (line) => {
    const [rms, epsilon] = [at(line, "u1_rms"), at(line, "epsilon")];
    const station = profileStation(rowOf({ U: 1000, u_rms: rms, epsilon }), {
      ...settings,
      kinematicViscosity: 0.149412,
    });
    const close = { relative: 0.01, because: "the table is printed to three digits" };
    expectClose(station.lambda.value, at(line, "lambda"), close);
    expectClose(station.eta.value, at(line, "eta"), close);
    expectClose(station.Re_lambda.value, at(line, "R_lambda"), close);
  });
});

describe("a row of statistics", () => {
  it("has no interval but that of q, from its standard error", () => {
    const station = profileStation(rowOf({ q: 0.01, se: 0.0002, uu: 1, U: 10 }), settings);
    expect(isEstimate(station.uu) && station.uu.low).toBeNull();
    if (!isEstimate(station.q)) throw new Error("q is missing");
    expectClose(station.q.low, 0.01 * Math.exp(-1.959964 * 0.02), {
      relative: 1e-7,
      because: "normal, in the logarithm",
    });
    expectClose(station.q.error?.standard, 0.02, { relative: 1e-12, because: "relative" });
  });
  it("takes what is not given from what is: w like v, epsilon from lambda", () => {
    const station = profileStation(
      rowOf({ U: 10, u_rms: 0.3, v_rms: 0.2, lambda: 0.003, L: 0.02 }),
      settings,
    );
    const close = { relative: 1e-12, because: "definitions" };
    expectClose(station.k.value, 0.045 + 0.04, close);
    expectClose(station.epsilon.value, (15 * 1.5e-5 * 0.09) / 9e-6, close);
    expectClose(station.Re_L.value, (0.3 * 0.02) / 1.5e-5, close);
    expectClose(station.T_int.value, 0.002, close);
    expect(station.flags.map(({ code }) => code)).toEqual(["axisymmetry-assumed"]);
  });
  it("names file, line and column of what cannot be", () => {
    for (const values of [{ uu: -1 }, { U: 3 }] as const) {
      try {
        profileStation(rowOf(values), settings);
        expect.unreachable();
      } catch (error) {
        if (!(error instanceof ReductionFailure)) throw error;
        expect(error.where).toEqual({ file: "profile.csv", line: 7 });
        expect(["not-a-number", "no-velocity"]).toContain(error.code);
      }
    }
  });
});

describe("what a row of statistics gives", () => {
  const close = { relative: 1e-12, because: "definitions" };
  const full = { U: 10, uu: 0.09, vv: 0.04, ww: 0.05, uv: -0.012, lambda: 0.003, L: 0.02 };
  const of = (values: ProfileRow["values"], more: Partial<typeof settings> = {}) =>
    profileStation(rowOf(values), { ...settings, ...more });
  const codesOf = (station: ReturnType<typeof of>) => station.flags.map(({ code }) => code);
  const whyOf = (quantity: ReturnType<typeof of>["U"]) => (isEstimate(quantity) ? "" : quantity.why);
  const nu = 1.5e-5;

  it("is every quantity that follows from it, and no more", () => {
    const station = of(full);
    const epsilon = (15 * nu * 0.09) / 0.003 ** 2;
    const known = {
      ...{ U: 10, uu: 0.09, vv: 0.04, ww: 0.05, uv: -0.012, k: 0.09, Tu: Math.sqrt(0.06) / 10 },
      ...{ isotropy_uv: 1.5, isotropy_uw: Math.sqrt(0.09 / 0.05), T_int: 0.002, L11: 0.02, lambda: 0.003 },
      ...{ gradient: 0.09 / 9e-6, epsilon, epsilon_gradient: epsilon, eta: (nu ** 3 / epsilon) ** 0.25 },
      ...{ Re_lambda: (0.3 * 0.003) / nu, Re_L: (0.3 * 0.02) / nu, C_epsilon: (epsilon * 0.02) / 0.027 },
    };
    for (const [name, value] of Object.entries(known))
      expectClose((station as unknown as Record<string, { value: number }>)[name].value, value, close);
    expectClose(station.routes.lambda_f.value, 0.003 * Math.SQRT2, close);
    expectClose(station.routes.rho_uv.value, -0.012 / 0.06, close);
    for (const q of [
      station.uw,
      station.vw,
      station.S_dudx,
      station.balance,
      station.epsilon_decay,
      station.epsilon_inertial,
      station.q,
    ])
      expect(isEstimate(q)).toBe(false);
    expect([station.x, station.samples, station.duration, station.curves, station.blocks]).toEqual([
      2.1,
      0,
      null,
      null,
      null,
    ]);
    expect([codesOf(station), station.facts.components, station.sources]).toEqual([[], ["u", "v", "w"], []]);
    expect(station.facts).toMatchObject({ step: null, groups: 0, segments: 0, taylorFactor: null });
  });
  it("is taken from rms values where there are no squares, and squares come first", () => {
    const station = of({ U: 10, u_rms: 0.3, v_rms: 0.2, w_rms: 0.1, uu: 0.16 });
    expectClose(station.uu.value, 0.16, close);
    expectClose(station.vv.value, 0.04, close);
    expectClose(station.ww.value, 0.01, close);
  });
  it("u alone, or u and w: the others are taken like what there is, and that is flagged", () => {
    const alone = of({ U: 10, uu: 0.09 });
    expectClose(alone.k.value, 0.135, close);
    expect(codesOf(alone)).toEqual(["isotropy-assumed"]);
    expect([whyOf(alone.vv), whyOf(alone.isotropy_uv)]).toEqual([
      "the profile has no column vv or v_rms",
      "u and v are not both given",
    ]);
    const pair = of({ U: 10, uu: 0.09, ww: 0.05 });
    expectClose(pair.k.value, 0.095, close);
    expect(pair.flags.map(({ text }) => text)).toEqual(["v is not given and is taken like w."]);
    expect(of({ U: 10, uu: 0.09, vv: 0.05 }).flags[0].text).toMatch(/^w is not given and is taken like v/);
  });
  it("with a dissipation gives lambda from it, and without either waits for the decay", () => {
    const station = of({ U: 10, uu: 0.09, epsilon: 2, L: 0.02 });
    expectClose(station.lambda.value, Math.sqrt((15 * nu * 0.09) / 2), close);
    expect(whyOf(station.epsilon_gradient)).toMatch(/no column lambda/);
    expectClose(of({ ...full, epsilon: 2 }).epsilon.value, 2, close);
    const neither = of({ U: 10, uu: 0.09 });
    for (const q of [neither.lambda, neither.epsilon, neither.eta, neither.Re_lambda])
      expect(whyOf(q)).toMatch(/decay law/);
    for (const q of [neither.L11, neither.Re_L, neither.C_epsilon]) expect(whyOf(q)).toMatch(/no column L$/);
    const waits = of(full, { dissipation: "decay" });
    expect(whyOf(waits.epsilon)).toMatch(/decay law/);
    expectClose(waits.lambda.value, 0.003, close);
    expectClose(waits.epsilon_gradient.value, (15 * nu * 0.09) / 9e-6, close);
  });
  it("without a viscosity has no Reynolds number, and is flagged; without U no intensity but by a reference", () => {
    const station = of(full, { kinematicViscosity: null });
    expect(codesOf(station)).toEqual(["no-viscosity"]);
    for (const q of [station.epsilon, station.eta, station.Re_lambda, station.Re_L])
      expect(whyOf(q)).toMatch(/no kinematic viscosity/);
    const { U: _U, ...still } = full;
    expect(whyOf(of(still).Tu)).toMatch(/neither U nor a reference speed/);
    expectClose(of(still, { referenceSpeed: 20 }).Tu.value, Math.sqrt(0.06) / 20, close);
    expect(whyOf(of({ q: 1 }).Tu)).toMatch(/no column uu/);
  });
  it("of stresses that no velocities can have is flagged, with the negative weight", () => {
    const station = of({ ...full, uv: -0.08 });
    expect(codesOf(station)).toContain("not-realizable");
    expectClose(
      station.flags.find(({ code }) => code === "not-realizable")?.value,
      station.routes.barycentric_3.value ?? 0,
      close,
    );
    expect(station.routes.barycentric_3.value).toBeLessThan(0);
    // at the border: uv² = uu vv
    expect(codesOf(of({ ...full, uv: -0.06 }))).toEqual([]);
    const alone = of({ U: 1, uu: 1 });
    expect([whyOf(alone.routes.rho_uv), whyOf(alone.routes.anisotropy_xi)]).toEqual([
      "the profile has no columns uu, vv and uv",
      "uu, vv and ww are not all given",
    ]);
    const { uv: _uv, ...without } = full;
    expectClose(of(without).routes.barycentric_1.value, (0.09 - 0.05) / 0.18, close);
    expectClose(of(without).routes.barycentric_3.value, (3 * 0.04) / 0.18, close);
  });
  it("has an error of q only where the profile gives one", () => {
    for (const values of [{ q: 2 }, { q: 2, se: 0 }]) {
      const { q } = of(values);
      expect(isEstimate(q) && q.low === null && q.why_low).toMatch(/no standard error/);
    }
    expect(whyOf(of(full).q)).toMatch(/no column q/);
  });
  it.each(["uu", "vv", "ww", "u_rms", "v_rms", "w_rms", "q", "lambda", "L", "epsilon", "se"] as const)(
    "cannot be from a %s that is negative, nor but for se from zero",
    (name) => {
      expect(() => of({ ...full, [name]: -1e-9 })).toThrow(name);
      if (name === "se") expect(() => of({ ...full, q: 1, se: 0 })).not.toThrow();
      else expect(() => of({ ...full, [name]: 0 })).toThrow(`${name} is not positive`);
    },
  );
  it("carries the note of its file", () => {
    const note = { name: "profile.csv", bytes: 12, x: 2.1, position: "column" } as const;
    expect(profileStation(rowOf(full), settings, note).sources).toEqual([note]);
  });
});
