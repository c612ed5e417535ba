import { describe, expect, it } from "vitest";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { studentTail } from "../../../src/core/signal/distributions/studentTail.ts";
import { recordsByProbe } from "../../../src/core/station/commonMeans.ts";
import { joinParts } from "../../../src/core/station/joinParts.ts";
import type { Leaves } from "../../../src/core/station/probeLeaves.ts";
import { alikeAlone, alikeTogether } from "../../../src/core/station/probeTests.ts";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import { expectClose } from "../../support/expectClose.ts";
import { close, count, mean, quick, whyOf } from "./quickStation.ts";
import { partOf, settings } from "./records.ts";

/** Ten groups of equal weight whose values without each are ±d about the whole: se = d √9, by the jackknife. */
const leaves = (value: number, d: number, turn = 0): Leaves => ({
  value,
  without: Array.from({ length: 10 }, (_, g) => value + ((g + turn) % 2 === 0 ? d : -d)),
  weights: new Float64Array(10).fill(1),
});

describe("values at several probes", () => {
  it("of two that are independent are held against each other by Welch's test (1947)", () => {
    const [a, b] = [leaves(5, 0.1), leaves(6.5, 0.2)];
    const [va, vb] = [0.09, 0.36];
    const freedom = (va + vb) ** 2 / (va ** 2 / 9 + vb ** 2 / 9);
    const p = studentTail(1.5 / Math.sqrt(va + vb), freedom);
    const found = alikeAlone([a, b], 1);
    expectClose(found.p, p, { relative: 1e-8, because: "two tail functions" });
    for (const one of found.each) expectClose(one, p, { relative: 1e-8, because: "two tail functions" });
    // of a record that repeats itself four times, with twice the error
    expectClose(alikeAlone([a, b], 4).p, studentTail(0.75 / Math.sqrt(va + vb), freedom), {
      relative: 1e-8,
      because: "two tail functions",
    });
  });
  it("of three of which one stands out give that one the least probability", () => {
    const { p, each } = alikeAlone([leaves(5, 0.1), leaves(5.1, 0.1), leaves(7, 0.1)], 1);
    expect(each.indexOf(Math.min(...each))).toBe(2);
    expect(p).toBeLessThan(0.01);
    expect(alikeAlone([leaves(5, 0.1), leaves(5, 0), leaves(7, 0.1)], 1)).toEqual({
      p: 1,
      each: [1, 1, 1],
    });
  });
  it("that share their eddies are told apart by the error of their difference", () => {
    // the same ± in both: what is left of it in the difference is half of the difference of the two
    const [a, b] = [leaves(5, 0.1), leaves(5.02, 0.11)];
    const departure = 0.01;
    const p = studentTail(departure / (0.005 * 3), 9);
    const found = alikeTogether([a, b], 1);
    expectClose(found.p, p, { relative: 1e-8, because: "rounding of a difference" });
    expect(found.each.length).toBe(2);
    const three = alikeTogether([a, b, leaves(5.01, 0.105)], 1);
    expectClose(three.p, Math.min(1, 3 * Math.min(...three.each)), close);
    // values alike but for rounding do not differ
    expect(alikeTogether([leaves(5, 0.1), leaves(5, 0.1)], 1).p).toBe(1);
  });
});

describe("probes at one x", () => {
  const rake = (shifts: readonly number[], factors: readonly number[] = []) =>
    shifts.map((shift, i) =>
      partOf(
        { u: quick(count, 40 + i).map((value) => 10 + shift + (factors[i] ?? 1) * value) },
        { origin: { file: "rake.csv", y: 0.1 * i } },
      ),
    );
  const uOf = (i: number, shift = 0) => 10 + shift + mean(quick(count, 40 + i));

  it("that agree are averaged, and stand beside the station", () => {
    const station = reduceStation(rake([0, 0, 0]), settings);
    expect(station.flags.map(({ code }) => code)).not.toContain("inhomogeneous");
    expect(station.probes?.map(({ agrees }) => agrees)).toEqual([true, true, true]);
    expectClose(station.U.value, (uOf(0) + uOf(1) + uOf(2)) / 3, close);
    expectClose(station.probes?.[1].U.value, uOf(1), close);
    expect(station.probes?.map(({ y, file }) => `${file} ${y}`)).toEqual([
      "rake.csv 0",
      "rake.csv 0.1",
      "rake.csv 0.2",
    ]);
  });
  it("of which one differs in U leave that one out", () => {
    const station = reduceStation(rake([0, 2, 0]), settings);
    expect(station.probes?.map(({ departs }) => departs)).toEqual([[], ["U"], []]);
    expectClose(station.U.value, (uOf(0) + uOf(2)) / 2, close);
    expect(station.samples).toBe(2 * count);
    const flag = station.flags.find(({ code }) => code === "inhomogeneous");
    expect(flag?.value).toBeLessThan(0.01);
    expect(flag?.text).toMatch(/2 of 3 which agree.*y = 0.1/);
    const all = reduceStation(rake([0, 2, 0]), { ...settings, probes: "all" });
    expectClose(all.U.value, (uOf(0) + uOf(1, 2) + uOf(2)) / 3, close);
    expect(all.flags.find(({ code }) => code === "inhomogeneous")?.text).toMatch(/averaged, as chosen/);
  });
  it("two that differ in U have no U, and keep the moments of the fluctuation", () => {
    const station = reduceStation(rake([0, 2]), settings);
    expect(whyOf(station.U)).toMatch(
      /no larger part of the 2 probes .* agrees in U: at y = 0 U .*; at y = 0.1 U/,
    );
    for (const q of [station.L11, station.lambda, station.Tu, station.epsilon])
      expect(isEstimate(q)).toBe(false);
    for (const q of [station.uu, station.k, station.T_int, station.routes.skewness_u] as Quantity[])
      expect(isEstimate(q)).toBe(true);
    expect([station.curves, station.blocks]).toEqual([null, null]);
    expect(isEstimate(reduceStation(rake([0, 2]), { ...settings, referenceSpeed: 10 }).Tu)).toBe(true);
  });
  it("two that differ in u' have no moments, and keep U", () => {
    const station = reduceStation(rake([0, 0], [1, 2]), settings);
    expect(whyOf(station.uu)).toMatch(/agrees in u'/);
    expect(isEstimate(station.U)).toBe(true);
    expect(isEstimate(station.routes.skewness_u)).toBe(false);
    // what is missing for a reason of its own keeps it
    expect(whyOf(station.vv)).toBe("v was not measured");
  });
  it("that are short are not tested", () => {
    const short = [0, 3].map((shift, i) =>
      partOf({ u: quick(200, 40 + i).map((value) => 10 + shift + value) }, { origin: { y: i } }),
    );
    const station = reduceStation(short, settings);
    expect(station.probes?.map(({ agrees }) => agrees)).toEqual([null, null]);
    expect(isEstimate(station.U) && station.U.value).toBeGreaterThan(10);
    expect(station.probes?.every(({ U }) => isEstimate(U) && U.low === null)).toBe(true);
  });
});

describe("records of one probe", () => {
  const whole = quick(count, 60).map((value, i) => 10 + value + (i < 1500 ? 0.4 : -0.4));
  const times = whole.map((_, i) => i * 1e-3);
  const halves = (y: number | null, late = 0) =>
    [0, 1].map((h) =>
      partOf(
        {
          u: whole.slice(1500 * h, 1500 * (h + 1)),
          t: times.slice(1500 * h, 1500 * (h + 1)).map((t) => t + h * late),
        },
        { origin: { file: `${h}.csv`, y } },
      ),
    );
  it("one after another are about their common mean, so that what is slower than each is kept", () => {
    for (const y of [null, 0.2]) {
      const record = joinParts(halves(y), settings);
      const sum = record.rows.reduce((total, row) => total + row[record.fields.indexOf("uu")], 0);
      const square = whole.reduce((total, value) => total + (value - mean(whole)) ** 2, 0);
      expectClose(sum, square, close);
      expectClose(record.means[0], mean(whole), close);
    }
    expect(recordsByProbe(halves(null)).length).toBe(1);
    // at places not known, times that overlap are of two probes
    expect(recordsByProbe(halves(null, -0.5)).length).toBe(2);
    expect(recordsByProbe(halves(null, 3)).length).toBe(1);
  });
  it("are two probes' where they stand at two places, or measure other components", () => {
    const [a, b] = halves(0.2);
    expect(recordsByProbe([a, { ...b, origin: { ...b.origin, y: 0.3 } }]).length).toBe(2);
    expect(recordsByProbe([a, { ...b, origin: { ...b.origin, z: 0.3 } }]).length).toBe(2);
    expect(recordsByProbe([a, { ...b, components: ["u", "v"] }]).length).toBe(2);
    // at one place that is known, records that all begin at 0 are one after another
    expect(recordsByProbe([a, { ...b, start: a.start }]).length).toBe(1);
    expect(recordsByProbe([a, { ...b, start: a.start + 0.5 }]).length).toBe(2);
    const unknown = halves(null);
    expect(recordsByProbe([unknown[0], { ...unknown[1], start: unknown[0].start }]).length).toBe(2);
  });
});
