import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { isEstimate } from "../../../src/core/quantity.ts";
import { expectClose } from "../../support/expectClose.ts";
import { stationOf } from "./records.ts";

// JHTDB channel flow, one point: Graham et al. (2016), J. Turbulence 17, 181; see test/reference/jhtdb/README.md
const text = readFileSync(
  new URL("../../reference/jhtdb/jhtdb_channel_point_uvw.csv", import.meta.url),
  "utf8",
);
const rows = text
  .trim()
  .split("\n")
  .slice(1)
  .map((line) => line.split(",").map(Number));
const column = (c: number) => Float64Array.from(rows, (row) => row[c]);
const signal = { t: column(0), u: column(1), v: column(2), w: column(3) };
const station = stationOf(signal, { kinematicViscosity: 5e-5 });
const moments = { relative: 1e-8, because: "the published figures have nine digits" };

describe("the point record of the JHTDB channel", () => {
  it("has the moments of its data set", () => {
    expectClose(station.U.value, 0.445885005763, moments);
    expectClose(station.uu.value, 1.81704248e-2, moments);
    expectClose(station.vv.value, 4.2836898e-4, moments);
    expectClose(station.ww.value, 3.10071592e-3, moments);
    expectClose(station.uv.value, -1.20150742e-3, moments);
    expectClose(station.routes.skewness_u.value, 0.14773, { relative: 1e-5, because: "six digits" });
    expectClose(station.routes.flatness_u.value, 2.509481, { relative: 1e-6, because: "seven digits" });
  });
  it("has the correlation coefficient of u and v published with it, -0.4307", () => {
    const { uu, vv, uv } = station;
    const coefficient = (uv.value ?? 0) / Math.sqrt((uu.value ?? 0) * (vv.value ?? 0));
    expectClose(coefficient, -0.43066, { relative: 2e-5, because: "five digits" });
    expectClose(station.routes.rho_uv.value, coefficient, { relative: 1e-12, because: "definition" });
  });
  it("is far from isotropic: one component dominates, as beside a wall", () => {
    // b_11 = 0.504, the largest that b_ij holds being 2/3
    const { uu, k } = station;
    expectClose((uu.value ?? 0) / (2 * (k.value ?? 1)) - 1 / 3, 0.504, {
      absolute: 5e-4,
      because: "three digits",
    });
    const { barycentric_1, barycentric_3 } = station.routes;
    expect(barycentric_1.value ?? 0).toBeGreaterThan(2 * (barycentric_3.value ?? 1));
  });
  it("has an integral time of 0.3608, or of 0.3657 by the unbiased correlation", () => {
    const unbiased = stationOf(signal, { correlation: "unbiased" });
    expectClose(station.T_int.value, 0.3608, { relative: 2e-4, because: "four digits" });
    expectClose(unbiased.T_int.value, 0.3657, { relative: 2e-4, because: "four digits" });
    expectClose(station.facts.tauStar, 208 * 0.0065, {
      relative: 5e-3,
      because: "the crossing is at lag 208",
    });
  });
  it("is some 70 integral times long: it has no interval, and says why", () => {
    expectClose(station.facts.integralTimes, 72, {
      relative: 0.01,
      because: "4000 steps of 0.0065 over 0.3608",
    });
    expect(station.flags.map(({ code }) => code)).toContain("short-record");
    expect(isEstimate(station.k) && station.k.low).toBeNull();
  });
});
