import { describe, expect, it } from "vitest";
import { verdicts } from "../../../src/core/compare/verdicts.ts";
import { expectClose } from "../../support/expectClose.ts";

const one = (logarithm: number, standard: number) => verdicts([{ logarithm, standard }], 0.1)[0];
const margin = Math.log(1.1);

describe("a verdict at 10 %", () => {
  it("is equivalent just when the 90 % interval lies inside 1/1.1 to 1.1", () => {
    expect(one(margin - 1.65 * 0.02, 0.02).verdict).toBe("equivalent");
    expect(one(margin - 1.64 * 0.02, 0.02).verdict).toBe("undecided");
    expect(one(-(margin - 1.65 * 0.02), 0.02).verdict).toBe("equivalent");
  });
  it("is different just when it lies wholly outside", () => {
    expect(one(margin + 1.65 * 0.02, 0.02).verdict).toBe("different");
    expect(one(-(margin + 1.65 * 0.02), 0.02).verdict).toBe("different");
    expect(one(margin + 1.64 * 0.02, 0.02).verdict).toBe("undecided");
  });
  it("is undecided on wide errors, whatever the ratio", () => expect(one(0, 0.2).verdict).toBe("undecided"));
  it("needs no error where there is none", () => {
    expect(one(0, 0).verdict).toBe("equivalent");
    expect(one(0.2, 0).verdict).toBe("different");
  });
});

describe("several verdicts at once", () => {
  // Holm (1979): p of 0.01, 0.03, 0.04 become 0.03, 0.06, 0.06
  it("adjust their p by Holm's method", () => {
    // room of z standard errors gives p = P(Z > z): 2.3263, 1.8808 and 1.7507 (printed tables of the normal)
    const ratios = [2.32634787, 1.88079361, 1.75068607].map((z) => ({
      logarithm: margin - z * 0.01,
      standard: 0.01,
    }));
    const judged = verdicts(ratios, 0.1);
    const because = "the normal quantiles are given to nine digits";
    expectClose(judged[0].p_equivalent, 0.03, { relative: 1e-6, because });
    expectClose(judged[1].p_equivalent, 0.06, { relative: 1e-6, because });
    expectClose(judged[2].p_equivalent, 0.06, { relative: 1e-6, because });
    expect(judged.map(({ verdict }) => verdict)).toEqual(["equivalent", "undecided", "undecided"]);
  });
});
