import { describe, expect, it } from "vitest";
import { chooseWindow } from "../../../src/core/decay/chooseWindow.ts";
import { decayPoints } from "../../../src/core/decay/decayPoints.ts";
import { fitWindow } from "../../../src/core/decay/fitWindow.ts";
import { laterStarts } from "../../../src/core/decay/laterWindows.ts";
import { unionOfWindows } from "../../../src/core/decay/unionOfWindows.ts";
import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { known, plainSettings, spacedFrom, stationAt } from "../../support/lawStations.ts";

const xs = spacedFrom(3, 6, 100, 12);
const exact = (i: number) => (xs[i] - 3) ** -1.25;
type Change = (i: number) => Partial<StationResult>;

/** The automatic window over an exact law whose stations are moved, or carry more. */
function windowOf(factor: (i: number) => number, more: Change = () => ({}), count = xs.length) {
  const stations = xs
    .slice(0, count)
    .map((x, i) => stationAt(x, { q: known(exact(i) * factor(i), 0.01), ...more(i) }));
  return chooseWindow(decayPoints(stations, plainSettings).points, plainSettings);
}
const places = ({ first, last }: { first: number; last: number }) => [first, last];

describe("the longest run of stations that agrees with one law", () => {
  it("is all of an exact law, with nothing left out", () => {
    const all = windowOf(() => 1);
    expect(places(all)).toEqual([0, 11]);
    expect([all.leftOut, all.withoutPlateau]).toEqual([0, false]);
  });
  it("leaves out what departs at its start, and counts it", () => {
    const window = windowOf((i) => (i < 3 ? 2 - i / 4 : 1));
    expect(places(window)).toEqual([3, 11]);
    expect(window.leftOut).toBe(3);
  });
  it("leaves out what departs at its end", () => {
    expect(places(windowOf((i) => (i > 8 ? 2 : 1)))).toEqual([0, 8]);
  });
  it("of two as long is the later: a near field stands at the start", () => {
    // one wild station in the middle leaves five and six, or six and five
    expect(places(windowOf((i) => (i === 6 ? 3 : 1)))).toEqual([0, 5]);
    expect(places(windowOf((i) => (i === 5 ? 3 : 1)))).toEqual([6, 11]);
    const eleven = windowOf((i) => (i === 5 ? 3 : 1), undefined, 11);
    expect(places(eleven)).toEqual([6, 10]);
  });
  it("of four stations is all of them; of five it is tested", () => {
    const four = windowOf((i) => (i === 2 ? 3 : 1), undefined, 4);
    expect(places(four)).toEqual([0, 3]);
    expect(four.withoutPlateau).toBe(false);
    const five = windowOf((i) => (i === 2 ? 3 : 1), undefined, 5);
    expect([places(five), five.withoutPlateau]).toEqual([[0, 4], true]);
  });
});

describe("where ratios settle", () => {
  const ratio =
    (key: "isotropy_uv" | "isotropy_uw", from: number): Change =>
    (i) => ({
      [key]: known(i < from ? 1.5 : 1, 0.01),
    });
  const of = (...changes: Change[]) =>
    windowOf(
      () => 1,
      (i) => Object.assign({}, ...changes.map((change) => change(i))),
    );

  it.each(["isotropy_uv", "isotropy_uw"] as const)("by %s is where a window may begin", (key) => {
    const window = of(ratio(key, 2));
    expect(window.first).toBe(2);
    // what lies before is not left out by a test
    expect(window.leftOut).toBe(0);
    expect(window.reason).toMatch(
      key === "isotropy_uv" ? /after u'\/v' has settled/ : /after u'\/w' has settled/,
    );
  });
  it("is the later of two, both named where they agree", () => {
    expect(of(ratio("isotropy_uv", 2), ratio("isotropy_uw", 4)).first).toBe(4);
    expect(of(ratio("isotropy_uv", 4), ratio("isotropy_uw", 2)).reason).toMatch(/after u'\/v' has settled/);
    expect(of(ratio("isotropy_uv", 3), ratio("isotropy_uw", 3)).reason).toMatch(
      /u'\/v' and u'\/w' have settled/,
    );
  });
  it("counts up to half of the stations; a ratio that settles later has not been seen to settle", () => {
    expect(of(ratio("isotropy_uv", 6)).first).toBe(6);
    expect(of(ratio("isotropy_uv", 7)).first).toBe(0);
  });
  it("of few stations leaves five of them", () => {
    const eight = (from: number) => windowOf(() => 1, ratio("isotropy_uv", from), 8).first;
    expect([eight(3), eight(4)]).toEqual([3, 0]);
  });
  it("from the first station on is not worth a word, nor what never settles", () => {
    expect(of(ratio("isotropy_uv", 0)).reason).not.toMatch(/settled/);
    expect(of(ratio("isotropy_uv", 11)).reason).not.toMatch(/settled/);
  });
  it("is said where no run agrees either", () => {
    const wild = windowOf((i) => (i % 2 ? 2 : 1), ratio("isotropy_uv", 2));
    expect([wild.first, wild.last, wild.withoutPlateau]).toEqual([2, 11, true]);
    expect(wild.reason).toMatch(/settled/);
  });
});

describe("the starts that join the interval of an automatic window", () => {
  it("lie up to two and a half times its first distance from the origin, five stations at the least", () => {
    expect(laterStarts([2, 3, 4, 5, 5.01, 6, 7, 8, 9, 10], 0)).toEqual([0, 1, 2, 3]);
    expect(laterStarts([2, 3, 4, 5, 6, 7], 0)).toEqual([0, 1]);
    expect(laterStarts([12, 13, 14, 15, 16, 17, 18, 19, 20], 10)).toEqual([0, 1, 2, 3]);
    expect(laterStarts([2, 3, 4], 0)).toEqual([0]);
  });
});

describe("the union over windows", () => {
  const law = (from: number, to: number, error: number) => {
    const points = xs
      .slice(from, to)
      .map((x, i) => ({ x, q: exact(from + i) * (i % 2 ? 1.004 : 0.997), smoothedError: error }));
    return fitWindow(points, plainSettings);
  };
  const ends = (quantity: Quantity) => {
    if (!isEstimate(quantity)) throw new Error("missing");
    return [quantity.low, quantity.high];
  };
  const [whole, later] = [law(0, 12, 0.005), law(4, 12, 0.005)];
  const refused = { refused: "falls like an exponential" };

  it.each(["n", "x0"] as const)("of %s has the value of the first, and the outermost ends of all", (key) => {
    const [own, other] = [ends(unionOfWindows([whole], key)), ends(unionOfWindows([later], key))];
    const union = unionOfWindows([whole, later], key);
    expect(union.value).toBe(unionOfWindows([whole], key).value);
    expect(ends(union)).toEqual([Math.min(own[0] ?? 0, other[0] ?? 0), Math.max(own[1] ?? 0, other[1] ?? 0)]);
    expect(isEstimate(union) ? union.error : null).toEqual(
      (() => {
        const alone = unionOfWindows([whole], key);
        return isEstimate(alone) ? alone.error : null;
      })(),
    );
  });
  it("is open above for n and below for x0 where a later start has no law", () => {
    const n = unionOfWindows([whole, refused], "n");
    expect(ends(n)).toEqual([ends(unionOfWindows([whole], "n"))[0], null]);
    expect(n).toMatchObject({ why_high: expect.stringMatching(/later start/) });
    const x0 = unionOfWindows([whole, refused], "x0");
    expect(ends(x0)).toEqual([null, ends(unionOfWindows([whole], "x0"))[1]]);
    expect(x0).toMatchObject({ why_low: expect.stringMatching(/later start/) });
  });
  it("is open where one of them is, for that one's reason or its own", () => {
    const open = law(7, 12, 0.2);
    expect(ends(unionOfWindows([open], "n"))[1]).toBeNull();
    const union = unionOfWindows([whole, open], "n");
    expect(union).toMatchObject({ high: null, why_high: expect.stringMatching(/later start/) });
    expect(unionOfWindows([open, whole], "n")).toMatchObject({
      high: null,
      why_high: expect.stringMatching(/span/),
    });
  });
  it("of a held number is that number", () => {
    const points = xs.map((x, i) => ({ x, q: exact(i), smoothedError: 0.01 }));
    const held = fitWindow(points, { ...plainSettings, x0: 3 });
    expect(unionOfWindows([held, held], "x0")).toMatchObject({
      value: 3,
      low: null,
      high: null,
      why_low: "held, not fitted",
    });
  });
});
