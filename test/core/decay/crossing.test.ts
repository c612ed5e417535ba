import { describe, expect, it } from "vitest";
import { crossing } from "../../../src/core/decay/crossing.ts";
import { expectClose } from "../../support/expectClose.ts";

const within = (searched: number) => {
  return { absolute: 1.01e-6 * searched, because: "found to a millionth of the distance searched" };
};
const away = Number.POSITIVE_INFINITY;

/** Excess -1 at the start, and how often it was asked for. */
function asked(excess: (at: number) => number) {
  let calls = 0;
  const counted = (at: number) => {
    calls++;
    return excess(at);
  };
  return { counted, calls: () => calls };
}

describe("the end of a profile", () => {
  it.each([0.01, 0.3, 1, 2.5, 40])("is found from a first step of %d, above and below", (step) => {
    // a parabola's root has a straight excess; a skew one bends
    const skew = (at: number) => Math.expm1(at) / Math.expm1(3) - 1;
    expectClose(crossing(skew, 0, step, away, -1), 3, within(Math.max(step, 4.5)));
    expectClose(
      crossing((at) => -at / 2 - 1, 0, -step, -away, -1),
      -2,
      found,
    );
    expectClose(
      crossing((at) => (at - 5) / 3 - 1, 5, step, away, -1),
      8,
      found,
    );
  });
  it("costs few evaluations: a straight excess with the right step takes one or two, a fifth power under thirty", () => {
    const straight = asked((at) => at / 2 - 1);
    crossing(straight.counted, 0, 2, away, -1);
    expect(straight.calls()).toBeLessThanOrEqual(2);
    const bent = asked((at) => at ** 5 - 1);
    expectClose(crossing(bent.counted, 0, 0.5, away, -1), 1, within(1.2));
    expect(bent.calls()).toBeLessThan(30);
  });
  it("is none where the excess stays below zero up to the limit, which is tried itself", () => {
    const flat = asked((at) => -Math.exp(-at));
    expect(crossing(flat.counted, 0, 1, 6, -1)).toBeNull();
    expect(crossing((at) => Math.abs(at) / 10 - 1, 0, -1, -9.9, -1)).toBeNull();
    expectClose(
      crossing((at) => Math.abs(at) / 9.9 - 1, 0, -1, -10, -1),
      -9.9,
      found,
    );
    expect(crossing((at) => -1 - 1 / at, 0, 1, away, -1)).toBeNull();
  });
  it("may be the limit itself", () => {
    expectClose(
      crossing((at) => at / 4 - 1, 0, 3, 4, -1),
      4,
      found,
    );
  });
});
