import { describe, expect, it } from "vitest";
import { crossing } from "../../../src/core/decay/crossing.ts";
import { expectClose } from "../../support/expectClose.ts";

const away = Number.POSITIVE_INFINITY;

/** How far a crossing may be off: a millionth of the longest distance searched. */
const within = (searched: number) => {
  return { absolute: 1.01e-6 * searched, because: "found to a millionth of the distance searched" };
};

/** An excess that counts how often it is asked for. */
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
    const far = within(Math.max(step, 5));
    const skew = (at: number) => Math.expm1(at) / Math.expm1(3) - 1;
    expectClose(crossing(skew, 0, step, away, -1), 3, far);
    const downward = (at: number) => -at / 2 - 1;
    expectClose(crossing(downward, 0, -step, -away, -1), -2, far);
    const elsewhere = (at: number) => (at - 5) / 3 - 1;
    expectClose(crossing(elsewhere, 5, step, away, -1), 8, far);
  });
  it("costs few evaluations: a straight excess with the right step two, a fifth power under thirty", () => {
    const straight = asked((at) => at / 2 - 1);
    crossing(straight.counted, 0, 2, away, -1);
    expect(straight.calls()).toBeLessThanOrEqual(2);
    const bent = asked((at) => at ** 5 - 1);
    expectClose(crossing(bent.counted, 0, 0.5, away, -1), 1, within(1.2));
    expect(bent.calls()).toBeLessThan(30);
  });
  it("is none where the excess stays below zero up to the limit, which is tried itself", () => {
    expect(crossing((at) => -Math.exp(-at), 0, 1, 6, -1)).toBeNull();
    const slow = (at: number) => Math.abs(at) / 9.9 - 1;
    expect(crossing(slow, 0, -1, -9.8, -1)).toBeNull();
    expectClose(crossing(slow, 0, -1, -10, -1), -9.9, within(10));
    expectClose(
      crossing((at) => at / 4 - 1, 0, 3, 4, -1),
      4,
      within(4),
    );
  });
  it("is given up where no step reaches it", () => {
    const level = asked((at) => -1 - 1 / at);
    expect(crossing(level.counted, 0, 1, away, -1)).toBeNull();
    expect(level.calls()).toBeLessThan(50);
  });
});
