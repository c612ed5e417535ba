import { describe, expect, it } from "vitest";
import {
  flightCourse,
  placeAlong,
  placeBack,
  quantityBack,
  rateAlong,
} from "../../../src/core/decay/flightCourse.ts";
import { lawDistance, lawPlace, lawRate } from "../../../src/core/decay/lawDistance.ts";
import { speedVariation } from "../../../src/core/decay/speedVariation.ts";
import { bare, estimate, missing } from "../../../src/core/quantity.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, stationAt } from "../../support/lawStations.ts";

const close = { relative: 1e-12, absolute: 1e-12, because: "closed form" };
const streamOf = (pairs: readonly (readonly [number, number])[]) =>
  pairs.map(([x, U]) => stationAt(x, { U: bare(U, "") }));

/** U = 2 at x = 1, 4 at 3, 4 at 6, 1 at 7: rising, level, falling; Us = 5. */
const course = flightCourse(
  streamOf([
    [1, 2],
    [3, 4],
    [6, 4],
    [7, 1],
  ]),
  5,
);
if (course === null) throw new Error("no course");
const U = (x: number) => (x < 1 ? 2 : x < 3 ? 2 + (x - 1) : x < 6 ? 4 : x < 7 ? 4 - 3 * (x - 6) : 1);

/** s = x1 + Us times the integral of dx/U, by Simpson's rule. */
function flownTo(x: number): number {
  const steps = 4000;
  const h = (x - 1) / steps;
  let sum = 0;
  for (let i = 0; i < steps; i++) {
    const at = 1 + i * h;
    sum += (h / 6) * (1 / U(at) + 4 / U(at + h / 2) + 1 / U(at + h));
  }
  return 1 + 5 * sum;
}

describe("the time of flight as a length", () => {
  it.each([-3, 0.5, 1, 1.7, 3, 4.4, 6, 6.9, 7, 12])(
    "is Us times the integral of dx/U from the first station, to x = %d",
    (x) => {
      expectClose(placeAlong(course, x), flownTo(x), {
        relative: 1e-6,
        absolute: 1e-6,
        because: "Simpson's rule over kinks",
      });
    },
  );
  it.each([-3, 0.5, 1, 1.7, 3, 4.4, 6, 6.9, 7, 12])("comes back to x = %d, and grows there by Us/U", (x) => {
    expectClose(placeBack(course, placeAlong(course, x)), x, close);
    expectClose(rateAlong(course, x), 5 / U(x), close);
  });
  it("is x itself in a stream of one speed counted in that speed, or without a course", () => {
    const steady = flightCourse(
      streamOf([
        [1, 3],
        [2, 3],
        [4, 3],
      ]),
      3,
    );
    for (const of of [steady, null])
      for (const x of [-1, 1.5, 4, 9]) {
        expectClose(placeAlong(of, x), x, close);
        expectClose(placeBack(of, x), x, close);
        expectClose(rateAlong(of, x), 1, close);
      }
  });
  it("passes over stations without a U above zero, and takes the first of two at one place", () => {
    const stations = [
      ...streamOf([
        [0, 0],
        [1, 2],
        [1, 9],
        [2, -1],
        [3, 4],
      ]),
      stationAt(2.5, {}),
    ];
    const found = flightCourse(stations, 5);
    expect([found?.x, found?.U]).toEqual([
      [1, 3],
      [2, 4],
    ]);
    expect(found?.s[0]).toBe(1);
    expectClose(found?.s[1], 1 + 5 * Math.LN2, close);
  });
  it("is not to be had where no station carries a U, or without a speed to count it in", () => {
    expect(flightCourse([stationAt(1, {})], 5)).toBeNull();
    expect(flightCourse([], 5)).toBeNull();
    expect(flightCourse(streamOf([[1, 2]]), 0)).toBeNull();
  });
  it("carries a place along it back to x with its interval, and its error over ds/dx", () => {
    const s = placeAlong(course, 2);
    const place = estimate(s, s - 1, Infinity, { standard: 0.3, freedom: 9, scale: "linear" });
    const back = quantityBack(course, place);
    expectClose(back.value, 2, close);
    if (back.value === null) throw new Error("missing");
    expectClose(back.low, placeBack(course, s - 1), close);
    expect(back.high).toBeNull();
    expectClose(back.error?.standard, (0.3 * 3) / 5, close);
    expect(back.why_high).toBe("no upper limit");
    expect(quantityBack(course, missing("none"))).toEqual(missing("none"));
    expect(quantityBack(null, place)).toBe(place);
    const held = quantityBack(course, bare(s, "held"));
    expect(held).toMatchObject({ low: null, high: null, why_low: "held" });
  });
});

describe("distances from the origin of a law", () => {
  it("count along its course, and lead back to the place", () => {
    const law = { x0: 0.2, flight: course };
    expectClose(lawDistance(law, 4), flownTo(4) - flownTo(0.2), {
      relative: 1e-6,
      because: "Simpson's rule",
    });
    expectClose(lawPlace(law, lawDistance(law, 4)), 4, close);
    expectClose(lawRate(law, 4), 5 / 4, close);
  });
  it("are x - x0 without one", () => {
    expect([lawDistance({ x0: 0.5 }, 2), lawPlace({ x0: 0.5 }, 1.5), lawRate({ x0: 0 }, 7)]).toEqual([
      1.5, 2, 1,
    ]);
    expect(lawDistance({ x0: 3, flight: null }, 2)).toBe(-1);
  });
});

describe("how much a stream varies", () => {
  it("is largest less smallest over the mean, and the gap between their intervals", () => {
    const stations = [known(4, 0.01), known(6, 0.01), known(5, 0.01)].map((speed, x) =>
      stationAt(x, { U: speed }),
    );
    const found = speedVariation(stations);
    expect([found?.mean, found?.range]).toEqual([5, 0.4]);
    const z = 1.959963984540054 * 0.01;
    expectClose(found?.beyondErrors, (6 * Math.exp(-z) - 4 * Math.exp(z)) / 5, {
      relative: 1e-9,
      because: "closed form",
    });
    expectClose(
      speedVariation(
        streamOf([
          [0, 4],
          [1, 6],
        ]),
      )?.beyondErrors,
      0.4,
      close,
    );
  });
  it("is not told of one station, or where one carries no U above zero", () => {
    expect(speedVariation(streamOf([[0, 4]]))).toBeNull();
    expect(
      speedVariation(
        streamOf([
          [0, 4],
          [1, 0],
        ]),
      ),
    ).toBeNull();
    expect(
      speedVariation([
        stationAt(0, {}),
        ...streamOf([
          [1, 4],
          [2, 5],
        ]),
      ]),
    ).toBeNull();
    expect(speedVariation([])).toBeNull();
  });
});
