import { describe, expect, it } from "vitest";
import type { ReductionFailure } from "../../../src/core/failure.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { CutSieve } from "../../../src/core/station/branchCuts.ts";
import { examineSteps } from "../../../src/core/station/examineSteps.ts";
import { roundedStep } from "../../../src/core/station/roundedTimes.ts";
import { isEqualStep, printQuantum } from "../../../src/core/station/stepRule.ts";
import { expectClose } from "../../support/expectClose.ts";
import { origin } from "./records.ts";

const exact = { relative: 1e-12, because: "rounding" };
const stamps = (count: number, of: (i: number) => number) =>
  Float64Array.from({ length: count }, (_, i) => of(i));
const printed = (count: number, of: (i: number) => number, digits: number) =>
  stamps(count, (i) => Number(of(i).toFixed(digits)));
const codeOf = (run: () => unknown) => {
  try {
    run();
  } catch (error) {
    const { code, where } = error as ReductionFailure;
    return [code, where?.file];
  }
  return null;
};

describe("the last digit of time stamps", () => {
  it.each([
    [[0, 0.1, 0.25], 0.01],
    [[3, 4, 7], 1],
    [[20, 50], 10],
    [[1000, 3000], 1000],
    [[20_000, 50_000], 1000],
    [[1e-6, 3e-6], 1e-6],
    [[0.1, Math.PI], 0],
    [[0.00005, 1], 1e-5],
  ] as const)("of %j is %d", (values, quantum) => {
    expectClose(printQuantum(Float64Array.from(values), 0, values.length), quantum, exact);
  });
  it("is looked for in the range asked for, and nowhere else", () => {
    expect(printQuantum(Float64Array.of(0.25, 1, 2, 0.125), 1, 3)).toBe(1);
  });
  it("is not told by a double that has no digits left: of 2·10^8 s, none below a hundredth", () => {
    expect(printQuantum(Float64Array.of(2e8, 2e8 + 0.01), 0, 2)).toBe(0.01);
    expect(printQuantum(Float64Array.of(2e8, 2e8 + 0.0001), 0, 2)).toBe(0);
  });
});

describe("a step is the record's", () => {
  it("within a thousandth of it", () => {
    const rule = { step: 2, quantum: 0.5 };
    expect([2, 2.0019, 1.9981].map((step) => isEqualStep(step, rule))).toEqual([true, true, true]);
    expect([2.0021, 1.9979].map((step) => isEqualStep(step, rule))).toEqual([false, false]);
  });
  it("and a digit more where the stamps are rounded", () => {
    const rule = { step: 2, quantum: 0.5, rounded: true };
    expect([2.502, 1.498].map((step) => isEqualStep(step, rule))).toEqual([true, true]);
    expect([2.51, 1.49].map((step) => isEqualStep(step, rule))).toEqual([false, false]);
  });
});

describe("the constant step behind rounded stamps", () => {
  const third = (i: number) => 7 + i / 300;

  it("is that of the straight line through them", () => {
    const t = printed(2000, third, 3);
    const found = roundedStep(t, 0, 2000, 1e-3);
    // least squares in closed form: Σ (i - m)(t - t_0) / Σ (i - m)²
    let [product, square] = [0, 0];
    for (let i = 0; i < 2000; i++) {
      product += (i - 999.5) * (t[i] - t[0]);
      square += (i - 999.5) ** 2;
    }
    expectClose(found, product / square, { relative: 1e-10, because: "rounding of two thousand terms" });
    expectClose(found, 1 / 300, { relative: 1e-5, because: "a digit over two thousand to the power 3/2" });
  });
  it("is looked for in the range asked for", () => {
    const t = printed(2000, (i) => (i < 500 ? -100 : 0) + third(i), 3);
    expect(roundedStep(t, 0, 2000, 1e-3)).toBeNull();
    expectClose(roundedStep(t, 500, 2000, 1e-3), 1 / 300, {
      relative: 2e-5,
      because: "fifteen hundred stamps",
    });
    expectClose(roundedStep(t, 0, 500, 1e-3), 1 / 300, { relative: 1e-4, because: "five hundred stamps" });
  });
  it("needs 32 stamps, a digit, and time that goes on", () => {
    const t = printed(40, third, 3);
    expect(roundedStep(t, 0, 31, 1e-3)).toBeNull();
    expect(roundedStep(t, 0, 32, 1e-3)).not.toBeNull();
    expect(roundedStep(t, 0, 40, 0)).toBeNull();
    expect(
      roundedStep(
        printed(40, (i) => -third(i), 3),
        0,
        40,
        1e-3,
      ),
    ).toBeNull();
    expect(
      roundedStep(
        printed(40, () => 2, 3),
        0,
        40,
        1e-3,
      ),
    ).toBeNull();
  });
  it("is none where one stamp lies a digit off, to either side", () => {
    for (const away of [2e-3, -2e-3]) {
      const t = printed(2000, third, 3);
      t[900] += away;
      expect(roundedStep(t, 0, 2000, 1e-3)).toBeNull();
    }
  });
  it("is none where the steps drift by more than a digit", () => {
    expect(
      roundedStep(
        printed(2000, (i) => i / 300 + 1e-9 * i * i, 3),
        0,
        2000,
        1e-3,
      ),
    ).toBeNull();
  });
  it("of stamps a digit apart shows all along: one missing sample is none", () => {
    // steps of 0.001 printed with three digits, one of them doubled; and steps of 0.00097 that round to 0.001
    expect(
      roundedStep(
        printed(64, (i) => (i < 63 ? i : i + 1) * 1e-3, 3),
        0,
        64,
        1e-3,
      ),
    ).toBeNull();
    expectClose(
      roundedStep(
        printed(2000, (i) => i * 0.00097, 3),
        0,
        2000,
        1e-3,
      ),
      0.00097,
      {
        relative: 1e-4,
        because: "two thousand stamps",
      },
    );
    // four of a thousand differ: fewer than five, and than one in a hundred
    expect(
      roundedStep(
        printed(1000, (i) => i * 0.000996, 3),
        0,
        1000,
        1e-3,
      ),
    ).toBeNull();
    expect(
      roundedStep(
        printed(300, (i) => i * 0.00098, 3),
        0,
        300,
        1e-3,
      ),
    ).not.toBeNull();
  });
});

describe("the steps of a record", () => {
  it("without a time column are the origin's, or a failure that names the file", () => {
    expect(examineSteps(null, 70, origin)).toEqual({
      ...{ step: 1e-3, quantum: 0, rounded: false, unequal: 0 },
      longest: [0, 70],
    });
    for (const step of [null, 0, -1]) {
      expect(codeOf(() => examineSteps(null, 70, { ...origin, step }))).toEqual(["no-time", "probe.csv"]);
    }
  });
  it("that are none at all are a failure", () => {
    expect(
      codeOf(() =>
        examineSteps(
          stamps(70, () => 3),
          70,
          origin,
        ),
      ),
    ).toEqual(["no-time", "probe.csv"]);
  });
  it("that are equal are their mean, with the last printed digit", () => {
    const facts = examineSteps(
      printed(500, (i) => 5 + 0.02 * i, 2),
      500,
      origin,
    );
    expectClose(facts.step, 0.02, exact);
    expect(facts).toMatchObject({ quantum: 0.01, rounded: false, unequal: 0, longest: [0, 500] });
  });
  it("have the finer digit of their two ends", () => {
    const t = stamps(9000, (i) => (i < 8000 ? 0.25 * i : 2000 + 0.25 * (i - 8000) + 0.0001));
    expectClose(examineSteps(t, 9000, origin).quantum, 1e-4, exact);
  });
  it("that are rounded are rebuilt", () => {
    const facts = examineSteps(
      printed(900, (i) => i / 300, 3),
      900,
      origin,
    );
    expect(facts).toMatchObject({ rounded: true, unequal: 0, quantum: 1e-3, longest: [0, 900] });
    expectClose(facts.step, 1 / 300, { relative: 3e-5, because: "nine hundred stamps" });
  });
  it("that are rounded are rebuilt in a record of a few milliseconds too", () => {
    const facts = examineSteps(
      printed(900, (i) => i / 300e3, 6),
      900,
      origin,
    );
    expect(facts).toMatchObject({ rounded: true, unequal: 0 });
    expectClose(facts.quantum, 1e-6, exact);
    expectClose(facts.step, 1 / 300e3, { relative: 3e-5, because: "nine hundred stamps" });
  });
  it("leave gaps aside: of more than ten steps, not of ten", () => {
    const broken = (gap: number) => stamps(1000, (i) => (i + (i < 300 ? 0 : gap - 1)) * Math.PI);
    const far = examineSteps(broken(10.1), 1000, origin);
    expect(far).toMatchObject({ unequal: 0, longest: [300, 1000], rounded: false });
    expectClose(far.step, Math.PI, exact);
    const near = examineSteps(broken(9.9), 1000, origin);
    expect(near).toMatchObject({ unequal: 1, longest: [0, 1000] });
    expectClose(near.step, Math.PI, exact);
    const first = examineSteps(
      stamps(1000, (i) => (i + (i < 700 ? 0 : 30)) * Math.PI),
      1000,
      origin,
    );
    expect(first.longest).toEqual([0, 700]);
  });
  it("of two that alternate are counted, and the usual one is the median's mean", () => {
    // two of three steps of about 1, one of 1.5; those of about 1 scatter by less than a thousandth
    const random = seededRandom(5);
    let time = 0;
    const usual: number[] = [];
    const t = stamps(601, (i) => {
      if (i === 0) return 0;
      const step = i % 3 === 0 ? 1.5 : 1 + 4e-4 * (random.uniform() - 0.5);
      if (i % 3 !== 0) usual.push(step);
      time += step;
      return time;
    });
    const facts = examineSteps(t, 601, origin);
    expect(facts).toMatchObject({ unequal: 200, rounded: false, longest: [0, 601], quantum: 0 });
    expectClose(facts.step, usual.reduce((sum, step) => sum + step, 0) / usual.length, {
      relative: 1e-9,
      because: "times of some hundreds are differenced",
    });
  });
  it("count no step between stamps alike as the usual one", () => {
    // each stamp three times, every fourth step a longer one: the median of those that go on is 1
    let time = 0;
    const t = stamps(900, (i) => {
      if (i % 3 === 0 && i > 0) time += (i / 3) % 4 === 0 ? 1.7 : 1;
      return time;
    });
    expectClose(examineSteps(t, 900, origin).step, 1, exact);
  });
});

describe("what restarts overtook", () => {
  it("goes where any later run began at its time or half a step after, and is told by the run that took it", () => {
    const random = seededRandom(8);
    for (let turn = 0; turn < 10; turn++) {
      const cuts = Array.from({ length: 3 }, (_, j) => ({
        sample: 10 * (j + 1) + Math.floor(8 * random.uniform()),
        time: Math.round(60 * random.uniform()) / 2,
        dropped: 0,
      }));
      const sieve = new CutSieve(cuts, 1);
      const dropped = [0, 0, 0];
      const kept: boolean[] = [];
      const wanted: boolean[] = [];
      for (let i = 0; i < 60; i++) {
        const time = Math.round(80 * random.uniform()) / 2;
        const by = cuts.findIndex((cut) => cut.sample > i && time > cut.time - 0.5);
        if (by >= 0) dropped[by]++;
        wanted.push(by < 0);
        kept.push(sieve.keeps(i, time));
      }
      expect(kept).toEqual(wanted);
      expect(sieve.tally()).toEqual(cuts.map((cut, j) => ({ ...cut, dropped: dropped[j] })));
    }
  });
});
