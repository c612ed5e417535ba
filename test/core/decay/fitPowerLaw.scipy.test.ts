import { readFileSync } from "node:fs";
import { describe, it } from "vitest";
import { fitPowerLaw } from "../../../src/core/decay/fitPowerLaw.ts";
import { expectClose } from "../../support/expectClose.ts";

interface SciPyFit {
  lnA: number;
  x0: number;
  n: number;
  covariance: number[];
}
interface Fixture {
  x: number[];
  q: number[];
  error: number[];
  fits: Record<string, SciPyFit>;
}

// SciPy 1.17.1, scipy.optimize.curve_fit; the script beside the fixture is make_decay.py
const fixture: Fixture = JSON.parse(
  readFileSync(new URL("../../reference/scipy/decay.json", import.meta.url), "utf8"),
);
const values = {
  relative: 1e-7,
  because: "curve_fit stops when a step no longer lowers the sum: half the digits",
};
const covariances = { relative: 1e-5, because: "a covariance follows the values, correlated to 0.98" };

describe.each(Object.entries(fixture.fits))("a law fitted as by SciPy's curve_fit: %s", (name, expected) => {
  const error = name.includes("known") ? fixture.error : null;
  const residuals = name.startsWith("log") ? "log" : "linear";
  const fit = fitPowerLaw({ x: fixture.x, q: fixture.q, error }, { residuals });

  it("has the same A, x0 and n", () => {
    expectClose(Math.log(fit.A), expected.lnA, values);
    expectClose(fit.x0, expected.x0, values);
    expectClose(fit.n, expected.n, values);
  });
  it("has the same covariance of ln A, x0 and n", () => {
    for (let at = 0; at < 9; at++) expectClose(fit.covariance?.[at], expected.covariance[at], covariances);
  });
});
