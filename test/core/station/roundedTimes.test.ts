import { isDeepStrictEqual } from "node:util";
import { describe, expect, it } from "vitest";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import type { RoundedTimes } from "../../../src/core/records.ts";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import { startRecord } from "../../../src/core/station/startRecord.ts";
import { expectClose } from "../../support/expectClose.ts";
import { blockOf, origin, partOf, settings, smoothRecord } from "./records.ts";

// a step of 1/300 printed with three digits and with two: 0.003, 0.007, 0.010 and 0.00, 0.00, 0.01, 0.01
const step = 1 / 300;
const clean = smoothRecord(16_000, 60);
const printed = (digits: number) => ({
  ...clean,
  t: clean.u.map((_, i) => Number((i * step).toFixed(digits))),
});
const part = (digits: number, times?: RoundedTimes) =>
  partOf(printed(digits), { record: times ? { times } : {} });
const station = (digits: number, times?: RoundedTimes) => reduceStation([part(digits, times)], settings);
const plain = reduceStation([partOf(clean, { origin: { step } })], settings);

const ofNoTime = ["U", "uu", "vv", "ww", "uv", "uw", "vw", "k", "Tu", "isotropy_uv", "isotropy_uw"] as const;
const ofTime = [
  ...["T_int", "L11", "lambda", "gradient", "epsilon", "epsilon_gradient", "epsilon_inertial"],
  ...["eta", "Re_lambda", "Re_L", "C_epsilon", "S_dudx"],
] as const;
const whyOf = (quantity: unknown) => (quantity as { why?: string }).why;
const numberIn = (quantity: Quantity | undefined) =>
  quantity && isEstimate(quantity) ? quantity.value : null;

describe.each([3, 2])("stamps of too few digits (%i) of which nobody said what they are", (digits) => {
  const asked = station(digits);

  it("leave the moments, with equal weights, as those of the samples", () => {
    for (const key of ofNoTime)
      expectClose(numberIn(asked[key]), numberIn(plain[key]) ?? 0, {
        relative: 1e-12,
        because: "the same sums",
      });
    for (const key of ["skewness_u", "flatness_v", "rho_uv", "anisotropy_xi", "barycentric_3"])
      expectClose(numberIn(asked.routes[key]), numberIn(plain.routes[key]) ?? 0, {
        relative: 1e-12,
        because: "the same sums",
      });
  });
  it("leave nothing that needs the time between samples, and say what to set", () => {
    for (const key of ofTime)
      expect(whyOf(asked[key as "T_int"]), key).toMatch(/set read\.times to "even" or "written"/);
    for (const [name, route] of Object.entries(asked.routes)) {
      if (/^(skewness|flatness|rho|anisotropy|barycentric)/.test(name)) continue;
      expect(whyOf(route), name).toContain("read.times");
    }
    expect(asked.facts).toMatchObject({ step: null, integralTimes: null, tauStar: null, segment: null });
    expect(asked.curves).toBeNull();
  });
  it("leave no interval, for the same reason: how many samples are independent is not known", () => {
    for (const key of ofNoTime) {
      const { low, why_low } = asked[key] as { low: number | null; why_low?: string };
      expect([key, low]).toEqual([key, null]);
      expect(why_low).toContain("read.times");
    }
  });
  it("are told with the step that they agree with", () => {
    const flag = asked.flags.find(({ code }) => code === "rounded-times");
    expectClose(flag?.value, step, { relative: 1e-6, because: "a digit over 16 000 to the power 3/2" });
    expect(flag?.text).toContain('Until read.times says "even" or "written"');
  });
});

describe.each([3, 2])("stamps of too few digits (%i) that are said to be even", (digits) => {
  it("give the record of the constant step", () => {
    const even = station(digits, "even");
    for (const key of [...ofNoTime, "T_int", "L11", "lambda", "epsilon", "S_dudx"] as const) {
      const [here, there] = [even[key], plain[key]];
      if (!isEstimate(here) || !isEstimate(there)) throw new Error(`${key} is missing`);
      const because = "the step is that of a straight line through the stamps";
      expectClose(here.value, there.value, { relative: 1e-5, because });
      expectClose(here.high, there.high ?? 0, { relative: 1e-4, because });
    }
    expect(even.flags.find(({ code }) => code === "rounded-times")?.text).toContain("stands in their place");
  });
});

describe("stamps of too few digits that are said to be as written", () => {
  it("are unequal steps: moments are weighted with them", () => {
    const written = part(3, "written");
    expect(written.flags.map(({ code }) => code)).toEqual(["unequal-steps"]);
    expect(written.samples).toBe(clean.u.length);
    // half of the steps either side of each sample, in thousandths: the trapezoid rule by hand
    const { t, u } = printed(3);
    let [sum, weight] = [0, 0];
    for (let i = 0; i < u.length; i++) {
      const own = ((t[i + 1] ?? t[i]) - (t[i - 1] ?? t[i])) / 2;
      sum += own * u[i];
      weight += own;
    }
    expectClose(numberIn(reduceStation([written], settings).U), sum / weight, {
      relative: 1e-10,
      because: "the same sums in another order",
    });
  });
  it("are one sample sent twice where a stamp comes twice: the newer one is kept", () => {
    const written = part(2, "written");
    expect(written.flags.map(({ code }) => code)).not.toContain("rounded-times");
    expect(written.samples).toBe(new Set(printed(2).t).size);
    expect(written.cuts?.first.every(({ kind }) => kind === "repeated")).toBe(true);
    const told = written.cuts === undefined ? 0 : written.cuts.first.length + written.cuts.more;
    expect(told).toBe(clean.u.length - written.samples);
  });
});

describe("what is said of rounded stamps", () => {
  it("changes nothing in a record whose stamps have all their digits", () => {
    const full = { ...clean, t: clean.u.map((_, i) => i * step) };
    const whole = partOf(full);
    for (const times of ["even", "written"] as const)
      expect(isDeepStrictEqual(partOf(full, { record: { times } }), whole)).toBe(true);
  });
  it("is asked once for a station: one record in doubt leaves all of them without times", () => {
    const sure = partOf(clean, { origin: { file: "a.csv", y: 0, step } });
    const doubt = partOf({ ...printed(3), ...smoothRecord(16_000, 90) }, { origin: { file: "b.csv", y: 1 } });
    const both = reduceStation([sure, doubt], settings);
    expect(both.samples).toBe(32_000);
    expect(whyOf(both.T_int)).toContain("read.times");
    expect(both.probes?.every(({ agrees, U }) => agrees === null && isEstimate(U) && U.low === null)).toBe(
      true,
    );
  });
  it("is not asked where the record past its pilot does not keep to the step", () => {
    const t = printed(3).t.map((time, i) => (i % 7 === 3 && i > 8000 ? time - 0.002 : time));
    const read = (plan: Parameters<typeof startRecord>[2]) => {
      const reducer = startRecord(origin, settings, { pilot: 4096, ...plan });
      reducer.add(blockOf({ ...clean, t }));
      return reducer.finish();
    };
    const first = read({});
    if (!("again" in first)) throw new Error("no second reading was asked for");
    const second = read({ plan: first.again });
    if (!("part" in second)) throw new Error("a third reading was asked for");
    expect(second.part.flags.map(({ code }) => code)).toEqual(["unequal-steps"]);
    expect(isEstimate(reduceStation([second.part], settings).T_int)).toBe(true);
  });
});
