import { describe, expect, it } from "vitest";
import { splineAt, splineSecond } from "../../../src/core/signal/cubicSpline.ts";
import { EvenSteps } from "../../../src/core/station/evenSteps.ts";
import { ResamplingResponse } from "../../../src/core/station/resamplingResponse.ts";
import { expectClose } from "../../support/expectClose.ts";

const close = { relative: 1e-9, absolute: 1e-12, because: "the definition, summed in another order" };
const step = 0.5;
const count = 100;
const times = Float64Array.from({ length: count }, (_, i) => (i + (i % 3 === 1 ? 0.3 : 0)) * step);

/** Gain of the mean-square gradient of a sine at m/16 of Nyquist that is put onto even steps by a natural spline. */
function gainAt(m: number, points: number): number {
  const omega = (Math.PI * m) / 16 / step;
  let [re, im] = [0, 0];
  for (const phase of [0, Math.PI / 2]) {
    const y = times.map((t) => Math.cos(omega * t - phase));
    const [second, work] = [new Float64Array(count), new Float64Array(count)];
    splineSecond(times, y, count, second, work);
    for (let j = 0; j < points; j++) {
      const at = j * step;
      const i = Math.max(0, times.findIndex((t) => t > at) - 1);
      const value = splineAt(times, y, second, times.some((t) => t > at) ? i : count - 2, at);
      re += value * Math.cos(omega * at - phase);
      im += value * Math.sin(omega * at - phase);
    }
  }
  return (re * re + im * im) / points ** 2;
}
/** A spectrum of one line. */
function line(half: number, bin: number): Float64Array {
  const density = new Float64Array(half + 1);
  density[bin] = 3;
  return density;
}

describe("what a resampling does to the gradient", () => {
  const points = 99;
  const response = new ResamplingResponse(step);
  response.look(times, count, 0, count - 1, 0, points);

  it("is nothing before anything was resampled, and of no spectrum", () => {
    expect(new ResamplingResponse(step).loss(line(16, 3))).toBe(0);
    expect(response.loss(new Float64Array(17))).toBe(0);
  });
  it("of a sine is 1 - h², h what a spline leaves of its amplitude at the record's own times", () => {
    for (const m of [1, 5, 15, 16]) expectClose(response.loss(line(16, m)), 1 - gainAt(m, points), close);
    expect(response.loss(line(16, 15))).toBeGreaterThan(0.01);
  });
  it("between two frequencies lies on the straight line, and below the first on that from 1", () => {
    const between = (gainAt(7, points) + 3 * gainAt(8, points)) / 4;
    expectClose(response.loss(line(64, 31)), 1 - between, close);
    expectClose(response.loss(line(64, 1)), (1 - gainAt(1, points)) / 4, close);
  });
  it("of a spectrum weighs each frequency with its square", () => {
    const both = line(16, 3);
    both[9] = 1;
    const lost = 9 * 3 * (1 - gainAt(3, points)) + 81 * (1 - gainAt(9, points));
    expectClose(response.loss(both), lost / (9 * 3 + 81), close);
  });
  it("is looked at in the first sixteen windows and then in every 128th", () => {
    const counted = (windows: number) => {
      let asked = 0;
      const own = new ResamplingResponse(step);
      const watched = new Proxy(times, {
        get: (target, key) => {
          if (key === "0") asked++;
          const value = Reflect.get(target, key);
          return typeof value === "function" ? value.bind(target) : value;
        },
      });
      for (let w = 0; w < windows; w++) own.look(watched, 2, 0, 1, 0, 1);
      return asked;
    };
    const one = counted(1);
    expect(one).toBeGreaterThan(0);
    expect([16, 17, 128, 129, 130].map((windows) => counted(windows) / one)).toEqual([16, 16, 16, 17, 17]);
  });
});

describe("samples put onto even steps", () => {
  const made = (add: (even: EvenSteps) => void) => {
    const out: number[][] = [[], []];
    const even = new EvenSteps(step, 2, new ResamplingResponse(step), (columns, points) => {
      columns.forEach((column, c) => {
        out[c].push(...column.subarray(0, points));
      });
    });
    add(even);
    even.end();
    return out;
  };
  const f = (t: number) => Math.sin(0.7 * t) + 0.2 * t;

  it("have the natural spline through them, at the first sample and every step on, up to the last", () => {
    const [a, b] = made((even) => {
      times.forEach((t) => {
        even.add(100 + t, [f(t), 3 * t]);
      });
    });
    const y = times.map(f);
    const [second, work] = [new Float64Array(count), new Float64Array(count)];
    splineSecond(times, y, count, second, work);
    // the last sample, at 99 steps, is a grid point too
    expect(a.length).toBe(100);
    for (const j of [0, 1, 2, 50, 98]) {
      const i = times.findIndex((t) => t > j * step) - 1;
      expectClose(a[j], splineAt(times, y, second, i, j * step), close);
      expectClose(b[j], 3 * j * step, { relative: 1e-9, absolute: 1e-9, because: "times about 100" });
    }
    expectClose(a[99], f(99 * step), { relative: 1e-9, because: "the sample itself" });
  });
  it("over many windows are those of one spline through all", () => {
    const n = 2000;
    const at = Float64Array.from({ length: n }, (_, i) => (i + 0.4 * Math.sin(i * i)) * step);
    const y = at.map((t) => Math.sin(1.9 * t) + Math.sin(0.3 * t));
    const [second, work] = [new Float64Array(n), new Float64Array(n)];
    splineSecond(at, y, n, second, work);
    const start = at[0];
    const [a] = made((even) => {
      at.forEach((t, i) => {
        even.add(t, [y[i], 0]);
      });
    });
    let [worst, i] = [0, 0];
    a.forEach((value, j) => {
      const place = start + j * step;
      while (i < n - 2 && at[i + 1] <= place) i++;
      worst = Math.max(worst, Math.abs(value - splineAt(at, y, second, i, place)));
    });
    expect(a.length).toBe(Math.floor((at[n - 1] - start) / step + 1e-6) + 1);
    expect(worst).toBeLessThan(1e-12);
  });
  it("have a sample that was sent again in its place, and a piece of one sample that one", () => {
    const [a] = made((even) => {
      even.add(4, [1, 0]);
      even.add(4 + step, [99, 0]);
      even.replace([3, 0]);
      even.add(4 + 2 * step, [5, 0]);
      even.end();
      even.add(9, [7, 0]);
    });
    [1, 3, 5, 7].forEach((value, j) => {
      expectClose(a[j], value, close);
    });
    expect(a.length).toBe(4);
    expect(made(() => {})[0]).toEqual([]);
  });
  it("of steps far longer than the grid's are filled in between", () => {
    const [a] = made((even) => {
      for (let i = 0; i < 700; i++) even.add(i * 4 * step, [i, 0]);
    });
    expect(a.length).toBe(699 * 4 + 1);
    a.forEach((value, j) => {
      if (Math.abs(value - j / 4) > 1e-9) throw new Error(`${value} at ${j}`);
    });
  });
});
