import { describe, expect, it } from "vitest";
import type { ReductionFailure } from "../../../src/core/failure.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { CutSieve } from "../../../src/core/station/branchCuts.ts";
import { examineSteps } from "../../../src/core/station/examineSteps.ts";
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
