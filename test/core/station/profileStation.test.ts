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
