import { describe, expect, it } from "vitest";
import { jackknife } from "../../../src/core/signal/jackknife.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { expectClose } from "../../support/expectClose.ts";

const rounding = { relative: 1e-12, because: "rounding" };

/** Value of a statistic over all groups, and without each. */
function leftOut(groups: readonly Float64Array[], statistic: (x: Float64Array) => number) {
  const joined = (parts: readonly Float64Array[]) => Float64Array.from(parts.flatMap((part) => [...part]));
  return {
    whole: statistic(joined(groups)),
    replicates: groups.map((_, j) => statistic(joined(groups.filter((_, k) => k !== j)))),
    weights: groups.map((group) => group.length),
  };
}

const mean = (x: Float64Array) => x.reduce((sum, value) => sum + value, 0) / x.length;

function groupsOf(sizes: readonly number[], seed: number): Float64Array[] {
  const random = seededRandom(seed);
  return sizes.map((length) => Float64Array.from({ length }, () => random.gaussian()));
}

describe("the jackknife over groups of unequal size", () => {
  // the pseudo-values of a mean are the group means: (1/B) Σ (mean_j - mean)²/(n/m_j - 1)
  it.each([[[3, 1]], [[10, 25, 25, 10, 40]], [[1, 2, 3, 4, 5, 6, 7]]])(
    "of a mean over groups of %s is the spread of the group means, each by its weight",
    (sizes) => {
      const groups = groupsOf(sizes, 12);
      const { whole, replicates, weights } = leftOut(groups, mean);
      const n = sizes.reduce((sum, size) => sum + size, 0);
      const terms = groups.map((group) => (mean(group) - whole) ** 2 / (n / group.length - 1));
      const variance = terms.reduce((sum, term) => sum + term, 0) / groups.length;
      const error = jackknife(whole, replicates, weights);
      expectClose(error?.standard, Math.sqrt(variance), rounding);
      expect(error?.freedom).toBe(sizes.length - 1);
    },
  );

  it("counts weights against each other only: halving all of them changes nothing", () => {
    const { whole, replicates, weights } = leftOut(groupsOf([4, 9, 6], 3), mean);
    const half = weights.map((weight) => weight / 2);
    expectClose(
      jackknife(whole, replicates, half)?.standard,
      jackknife(whole, replicates, weights)?.standard ?? 0,
      rounding,
    );
  });

  it("is on average the error of a mean square of independent numbers", () => {
    const sizes = Array.from({ length: 20 }, (_, j) => 10 + (j % 3) * 5);
    const n = sizes.reduce((sum, size) => sum + size, 0);
    const random = seededRandom(100);
    const runs = 300;
    let square = 0;
    for (let run = 0; run < runs; run++) {
      const sums = sizes.map((size) => {
        let sum = 0;
        for (let i = 0; i < size; i++) sum += random.gaussian() ** 2;
        return sum;
      });
      const whole = sums.reduce((sum, part) => sum + part, 0);
      const replicates = sums.map((part, j) => (whole - part) / (n - sizes[j]));
      square += (jackknife(whole / n, replicates, sizes)?.standard ?? 0) ** 2 / runs;
    }
    // the variance of the mean of n squares of standard normal numbers is 2/n
    expectClose(square, 2 / n, {
      relative: 0.08,
      because: "300 estimates with 19 degrees of freedom, whose squares have flat tails: three errors",
    });
  });

  it("says nothing where a value without a group is no number, or all groups' value is none", () => {
    expect(jackknife(1, [1, Number.NaN, 2], [1, 1, 1])).toBeNull();
    expect(jackknife(Number.POSITIVE_INFINITY, [1, 2], [1, 1])).toBeNull();
    expect(jackknife(1, [], [])).toBeNull();
  });
});
