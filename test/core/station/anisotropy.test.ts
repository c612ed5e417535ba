import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { isEstimate } from "../../../src/core/quantity.ts";
import { anisotropy } from "../../../src/core/station/anisotropy.ts";
import { profileStation } from "../../../src/core/station/profileStation.ts";
import { expectClose } from "../../support/expectClose.ts";
import { readRows } from "../../support/readRows.ts";
import { settings } from "./records.ts";

// Tavoularis & Karnik (1989), J. Fluid Mech. 204, 457, case A; AGARD-AR-345 data set HOM22
const shear = readRows(
  new URL("../../reference/homogeneous_shear/tavoularis_karnik1989_caseA.csv", import.meta.url),
);
const last = shear[shear.length - 1];
const [uu, vv, ww, uv] = ["uu", "vv", "ww", "uv"].map((name) => Number(last[`${name}_m2_s2`]));

describe("the stress tensor of homogeneous shear flow, Tavoularis & Karnik (1989), last station", () => {
  const { xi, eta, weights } = anisotropy(uu, vv, ww, uv, 0, 0);
  // b_ij and its eigenvalues 0.2760, -0.0743, -0.2016 were computed with NumPy from the published stresses
  it("has the invariants b_ij b_ij = 0.12233 and b_ij b_jk b_ki = 0.012407", () => {
    expectClose(6 * eta ** 2, 0.12233, { relative: 5e-5, because: "five digits" });
    expectClose(6 * xi ** 3, 0.012407, { relative: 5e-5, because: "five digits" });
  });
  it("has the barycentric weights of its eigenvalues", () => {
    const close = { absolute: 2e-4, because: "eigenvalues of four digits" };
    expectClose(weights[0], 0.276 + 0.0743, close);
    expectClose(weights[1], 2 * (-0.0743 + 0.2016), close);
    expectClose(weights[2], 3 * -0.2016 + 1, { absolute: 3e-4, because: "three times four digits" });
  });
  it("stands among the routes of a profile, with rho_uv = -0.4987", () => {
    const row = { file: "shear.csv", line: 8, x: 26.3, values: { U: 13, uu, vv, ww, uv } };
    const station = profileStation(row, settings);
    expectClose(station.routes.rho_uv.value, -0.4987, { absolute: 5e-5, because: "four digits" });
    expectClose(station.routes.anisotropy_eta.value, eta, { relative: 1e-12, because: "the same" });
    expectClose(station.routes.barycentric_3.value, weights[2], { relative: 1e-12, because: "the same" });
  });
  it("is flagged where no velocities can have the stresses", () => {
    const row = {
      file: "p.csv",
      line: 2,
      x: 1,
      values: { U: 13, uu, vv, ww, uv: -1.1 * Math.sqrt(uu * vv) },
    };
    expect(profileStation(row, settings).flags.map(({ code }) => code)).toContain("not-realizable");
    const sound = { ...row, values: { ...row.values, uv } };
    expect(profileStation(sound, settings).flags.map(({ code }) => code)).not.toContain("not-realizable");
  });
  it("is not guessed from u alone", () => {
    const station = profileStation({ file: "p.csv", line: 2, x: 1, values: { U: 13, uu } }, settings);
    expect(isEstimate(station.routes.anisotropy_eta)).toBe(false);
  });
});

describe("the anisotropy of a tensor", () => {
  // the three corners, after Banerjee et al. (2007), J. Turbulence 8, N32; xi and eta after Pope (2000) §11.3.2
  it.each([
    ["one component", [1, 0, 0], [1 / 3, 1 / 3], [1, 0, 0]],
    ["two components", [1, 1, 0], [-1 / 6, 1 / 6], [0, 1, 0]],
    ["isotropy", [1, 1, 1], [0, 0], [0, 0, 1]],
  ] as const)("is that of its corner: %s", (_, [a, b, c], [xi, eta], weights) => {
    const found = anisotropy(a, b, c, 0, 0, 0);
    const close = { absolute: 1e-7, because: "a cosine near its end" };
    expectClose(found.xi, xi, close);
    expectClose(found.eta, eta, close);
    weights.forEach((weight, i) => {
      expectClose(found.weights[i], weight, close);
    });
  });
  it("does not depend on the axes, its weights add up to 1, and none is negative", () => {
    const number = fc.double({ min: -1, max: 1, noNaN: true });
    const angle = fc.double({ min: 0, max: 6, noNaN: true });
    fc.assert(
      fc.property(fc.array(number, { minLength: 9, maxLength: 9 }), angle, (m, turn) => {
        // m mᵀ is a tensor that velocities can have
        const t = (i: number, j: number) => [0, 1, 2].reduce((s, k) => s + m[3 * i + k] * m[3 * j + k], 0);
        const [xx, yy, zz, xy, xz, yz] = [t(0, 0), t(1, 1), t(2, 2), t(0, 1), t(0, 2), t(1, 2)];
        fc.pre(xx + yy + zz > 1e-3);
        const base = anisotropy(xx, yy, zz, xy, xz, yz);
        const [c, s] = [Math.cos(turn), Math.sin(turn)];
        const turned = anisotropy(
          c * c * xx + 2 * c * s * xy + s * s * yy,
          s * s * xx - 2 * c * s * xy + c * c * yy,
          zz,
          (c * c - s * s) * xy + c * s * (yy - xx),
          c * xz + s * yz,
          c * yz - s * xz,
        );
        const close = { absolute: 1e-6, because: "the cube root and the arc cosine near their ends" };
        expectClose(turned.eta, base.eta, close);
        base.weights.forEach((weight, i) => {
          expectClose(turned.weights[i], weight, close);
          expect(weight).toBeGreaterThan(-1e-6);
        });
        expectClose(base.weights[0] + base.weights[1] + base.weights[2], 1, close);
      }),
      { seed: 20261201, numRuns: 200 },
    );
  });
});
