import { describe, expect, it } from "vitest";
import { roundedStep } from "../../../src/core/station/roundedTimes.ts";
import { isEqualStep, printQuantum } from "../../../src/core/station/stepRule.ts";
import { expectClose } from "../../support/expectClose.ts";

const exact = { relative: 1e-12, because: "rounding" };
const stamps = (count: number, of: (i: number) => number) =>
  Float64Array.from({ length: count }, (_, i) => of(i));
const printed = (count: number, of: (i: number) => number, digits: number) =>
  stamps(count, (i) => Number(of(i).toFixed(digits)));

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
