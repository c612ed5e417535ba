import { describe, expect, it } from "vitest";
import { fitPowerLaw } from "../../../src/core/decay/fitPowerLaw.ts";
import { expectClose } from "../../support/expectClose.ts";
import { readNistPowerLaw } from "../../support/readNistPowerLaw.ts";

// NIST StRD, nonlinear regression, "higher difficulty": y = b1 (b2 + x)^(-1/b3), all y negative.
// Read as a decay law with q = -y: A = -b1, x0 = -b2, n = 1/b3.
const bennett5 = readNistPowerLaw("Bennett5");
const q = bennett5.y.map((y) => -y);
const [b1, b2, b3] = bennett5.certified;
const parameters = {
  relative: 1e-9,
  because: "NIST certifies eleven digits; the parameters correlate to 0.99999",
};
const deviations = { relative: 1e-7, because: "NIST certifies eleven digits of each standard deviation" };

const starts = bennett5.starts.map(([, start2, start3]) => ({ x0: -start2, n: 1 / start3 }));

describe.each([...starts, null])("the law of Bennett5, linear residuals, begun at %j", (start) => {
  const fit = fitPowerLaw({ x: bennett5.x, q, error: null }, { residuals: "linear", start });

  it("says that it converged", () => expect(fit.converged).toBe(true));
  it("has the certified virtual origin", () => expectClose(fit.x0, -b2.value, parameters));
  it("has the certified exponent", () => expectClose(fit.n, 1 / b3.value, parameters));
  it("has the certified level", () => expectClose(fit.A, -b1.value, parameters));
  it("has the certified residual sum", () =>
    expectClose(fit.residualSum, bennett5.residualSum, {
      relative: 1e-9,
      because: "eleven digits are certified",
    }));
  it("has the certified standard deviations", () => {
    expectClose(fit.standardError?.A, b1.standardDeviation, deviations);
    expectClose(fit.standardError?.x0, b2.standardDeviation, deviations);
    expectClose(fit.standardError?.n, b3.standardDeviation / b3.value ** 2, deviations);
  });
});

// NIST StRD "DanWood": y = b1 x^b2, a power law about a held origin that grows instead of decaying.
const danWood = readNistPowerLaw("DanWood");
describe.each(danWood.starts)("the law of DanWood, x0 = 0 held, begun at (%d, %d)", (_level, exponent) => {
  const fit = fitPowerLaw(
    { x: danWood.x, q: danWood.y, error: null },
    { residuals: "linear", x0: 0, start: { x0: 0, n: -exponent } },
  );
  const [level, power] = danWood.certified;

  it("has the certified level and exponent", () => {
    expect(fit.converged).toBe(true);
    expectClose(fit.A, level.value, parameters);
    expectClose(fit.n, -power.value, parameters);
  });
  it("has the certified standard deviations and residual sum", () => {
    expectClose(fit.standardError?.A, level.standardDeviation, deviations);
    expectClose(fit.standardError?.n, power.standardDeviation, deviations);
    expectClose(fit.residualSum, danWood.residualSum, parameters);
  });
});
