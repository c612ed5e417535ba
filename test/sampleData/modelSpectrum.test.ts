import { describe, it } from "vitest";
import { solvedModelSpectrum } from "../../sample-data/maker/modelSpectrum.mjs";
import {
  integralScale,
  moment,
  oneDimensionalSpectra,
} from "../../sample-data/maker/oneDimensionalSpectra.mjs";
import reference from "../reference/scipy/modelSpectrum.json";
import { expectClose } from "../support/expectClose.ts";

const solverTolerance = { relative: 1e-7, because: "two solvers and two quadratures of the same equations" };
const tableTolerance = { relative: 1e-5, because: "trapezoid over 200 points a decade" };

// Pope (2000) eqs. 6.246-6.248, solved by SciPy: test/reference/scipy/make_modelSpectrum.py.
describe.each(reference.rows)("the model spectrum at Re_lambda = $Re_lambda", (row) => {
  const viscosity = 20 / 3 / row.Re_lambda ** 2; // k = epsilon = 1
  const model = solvedModelSpectrum({ k: 1, epsilon: 1, viscosity });
  const { k1, E11, E22 } = oneDimensionalSpectra(model.energy, model.range);

  it("has the constants that SciPy finds", () => {
    expectClose(model.cL, row.c_L, solverTolerance);
    expectClose(model.cEta, row.c_eta, solverTolerance);
  });
  it("holds its energy, a third in each component", () => {
    expectClose(moment(k1, E11, 0), 2 / 3, tableTolerance);
    expectClose(moment(k1, E22, 0), 2 / 3, tableTolerance);
  });
  it("dissipates what it should: epsilon = 15 nu <(du/dx)²> = 7.5 nu <(dv/dx)²>", () => {
    expectClose(15 * viscosity * moment(k1, E11, 2), 1, tableTolerance);
    expectClose(7.5 * viscosity * moment(k1, E22, 2), 1, tableTolerance);
  });
  it("has the integral scale that SciPy finds from its energy spectrum", () =>
    expectClose(integralScale(k1, E11), row.L11_over_L, tableTolerance));
  it("is isotropic: E22 = (E11 - k1 dE11/dk1)/2 (Pope eq. 6.218)", () => {
    for (let i = 1; i < k1.length - 1; i++) {
      if (E11[i] < 1e-9 * E11[0]) break;
      const slope = (Math.log(E11[i + 1] / E11[i - 1]) / Math.log(k1[i + 1] / k1[i - 1])) * E11[i];
      expectClose(E22[i], (E11[i] - slope) / 2, {
        relative: 2e-3,
        because: "central difference on the table",
      });
    }
  });
});
