import { describe, expect, it } from "vitest";
import { coarsenDensity } from "../../../src/core/signal/coarsenDensity.ts";
import { crossDensity } from "../../../src/core/signal/crossDensity.ts";
import { startCrossPower } from "../../../src/core/signal/crossPower.ts";
import { hannWindow } from "../../../src/core/signal/hannWindow.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { startWelch } from "../../../src/core/signal/welch.ts";
import { welchDensity } from "../../../src/core/signal/welchDensity.ts";
import { expectClose } from "../../support/expectClose.ts";

const size = 16;
const random = seededRandom(31);
const x = Float64Array.from({ length: 70 }, () => random.gaussian());

/** X_f of the windowed segment that begins at `from`, by the sum that defines it. */
function segmentAt(from: number, f: number): [number, number] {
  const window = hannWindow(size);
  let [re, im] = [0, 0];
  for (let n = 0; n < size; n++) {
    re += window[n] * x[from + n] * Math.cos((2 * Math.PI * f * n) / size);
    im -= window[n] * x[from + n] * Math.sin((2 * Math.PI * f * n) / size);
  }
  return [re, im];
}

describe("Welch segments of 16 out of 70 samples", () => {
  it("begin every 8 samples and end within the record: seven of them", () => {
    const middles: number[] = [];
    const welch = startWelch(size, (middle) => middles.push(middle));
    welch.add(x, 0, 70);
    expect(welch.segments).toBe(7);
    expect(middles).toEqual([8, 16, 24, 32, 40, 48, 56]);
  });
  it("are the same in pieces, and sum their power bin by bin", () => {
    const welch = startWelch(size);
    for (const [from, to] of [
      [0, 5],
      [5, 5],
      [5, 41],
      [41, 70],
    ])
      welch.add(x, from, to);
    welch.power.forEach((value, f) => {
      let sum = 0;
      for (let s = 0; s < 7; s++) sum += segmentAt(8 * s, f).reduce((all, part) => all + part * part, 0);
      expectClose(value, sum, { relative: 1e-11, because: "rounding" });
    });
    [0, 1].forEach((f) => {
      let sum = 0;
      for (let s = 0; s < 7; s++) sum += segmentAt(8 * s, f)[0];
      expectClose(welch.edges[f], sum, { relative: 1e-11, because: "rounding" });
    });
  });
  it("never lie across a restart", () => {
    const middles: number[] = [];
    const welch = startWelch(size, (middle) => middles.push(middle));
    welch.add(x, 0, 30);
    welch.restart();
    welch.add(x, 30, 70);
    expect(middles).toEqual([8, 16, 38, 46, 54, 62]);
  });
});

describe("a spectrum of a record shorter than a segment", () => {
  it("is zero in every bin, not NaN", () => {
    const totals = { size, segments: 0, power: new Float64Array(9), edges: new Float64Array(2) };
    const side = { edges: totals.edges, mean: 1 };
    expect(Array.from(welchDensity(totals, 0.1, 1))).toEqual(new Array(9).fill(0));
    expect(Array.from(crossDensity(totals, 0.1, side, side))).toEqual(new Array(9).fill(0));
  });
});

describe("a spectrum of a sine in the middle of a bin", () => {
  // amplitude a: variance a²/2, two thirds of it in its bin and a sixth in each neighbour (Hann)
  it("holds half the square of its amplitude in three bins", () => {
    const wave = Float64Array.from({ length: 400 }, (_, n) => 3 * Math.sin((2 * Math.PI * 5 * n) / size));
    const welch = startWelch(size);
    welch.add(wave, 0, 400);
    const density = welchDensity({ ...welch, size, segments: welch.segments }, 0.5, 0);
    const share = (f: number) => density[f] / (size * 0.5) / 4.5;
    const rounding = { relative: 1e-12, absolute: 1e-12, because: "closed form" };
    [0, 0, 0, 0, 1 / 6, 2 / 3, 1 / 6, 0, 0].forEach((expected, f) => {
      expectClose(share(f), expected, rounding);
    });
  });
});

describe("the cross power of two sequences", () => {
  it("multiplies segments of the same number, however far one sequence is ahead", () => {
    const cross = startCrossPower(2);
    const [a, b] = [Float64Array.of(1, 2, 3, 4), Float64Array.of(5, 6, 7, 8)];
    cross.first(a);
    // the array of a transform is written over by the next
    const reused = a.slice();
    cross.first(reused);
    reused.fill(Number.NaN);
    cross.second(b);
    cross.second(a);
    // Re(X conj Y): 1·5 + 2·6 and 3·7 + 4·8, then the squares of a
    expect(Array.from(cross.power)).toEqual([17 + 5, 53 + 25]);
    cross.second(b);
    expect(Array.from(cross.power)).toEqual([22, 78]);
    cross.first(b);
    cross.second(b);
    expect(Array.from(cross.power)).toEqual([22 + 61, 78 + 113]);
  });
});

describe("a spectrum brought onto wider bins", () => {
  const fine = Float64Array.from({ length: 9 }, (_, f) => 2 * f + 1);
  it("is the mean over each bin, half a bin at either end of it", () => {
    // bins of 4: of a straight line the mean is its value at the centre; the two end bins are half as wide
    const coarse = coarsenDensity(fine, 16, 4);
    expect(Array.from(coarse)).toEqual([(1 + 3 + 5 / 2) / 4, 9, (17 + 15 + 13 / 2) / 4]);
  });
  it("is the same spectrum where the width stays", () => {
    expect(coarsenDensity(fine, 16, 16)).toBe(fine);
  });
});
