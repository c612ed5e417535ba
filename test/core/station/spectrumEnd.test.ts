import { describe, expect, it } from "vitest";
import { bandBorders } from "../../../src/core/station/bandBorders.ts";
import { differenceRates } from "../../../src/core/station/differenceRates.ts";
import { meanSquareRate, windowShare } from "../../../src/core/station/meanSquareRate.ts";
import { type NoiseRule, noiseFloor, scaleBin } from "../../../src/core/station/noiseFloor.ts";
import { spectrumTail, tailMoment } from "../../../src/core/station/spectrumTail.ts";
import { expectClose } from "../../support/expectClose.ts";

const exact = { relative: 1e-10, because: "a closed form" };
const size = 256;
const half = size / 2;
const borders = bandBorders(size);

/** A spectrum that is constant within each band, so that its bands' means are known to all digits. */
function banded(level: (centre: number, band: number) => number): Float64Array {
  const density = new Float64Array(half + 1);
  borders.forEach((from, band) => {
    const to = band === 0 ? half + 1 : borders[band - 1];
    for (let f = from; f < to; f++) density[f] = level((from + to - 1) / 2, band);
  });
  return density;
}

const plainRule: NoiseRule = { floor: 0, cut: 0, cutBin: half + 1, tail: null, shareBeyond: 0, slope: -5 };

describe("bands counted down from Nyquist", () => {
  it("begin at the whole bins from 32·10^(-b/20) on, down to bin 1", () => {
    const expected = [29, 26, 23, 21, 18, 17, 15, 13, 12, 11, 10, 9, 8, 7, 6, 6, 5, 5, 4, 4, 3, 3, 3, 3];
    expect(bandBorders(64)).toEqual([...expected, 2, 2, 2, 2, 2, 2, 1]);
  });
  it("have a border on a whole decade in spite of rounding", () => {
    expect(bandBorders(200)[19]).toBe(10);
    expect(bandBorders(2000)[39]).toBe(10);
  });
});

describe("a floor under a spectrum", () => {
  const powerLaw = (slope: number) => Float64Array.from({ length: half + 1 }, (_, f) => f ** slope);

  it("is not seen in a power law as steep as k^-1.01, and is in one of k^-0.99", () => {
    const [steep, flat] = [-1.01, -0.99].map((slope) => noiseFloor(powerLaw(slope), size, 1));
    expectClose(steep.slope, -1.01, exact);
    expect(steep).toMatchObject({ floor: 0, cut: 0, cutBin: half + 1, tail: null, shareBeyond: 0 });
    expectClose(flat.slope, -0.99, exact);
    // the mean over the top third, bins 86 to 128
    let sum = 0;
    for (let f = 86; f <= 128; f++) sum += f ** -0.99 / 43;
    expectClose(flat.floor, sum, exact);
  });
  it("is the mean over the top sixth or the top twelfth where it shows there only", () => {
    // bins from 128 (1 - 1/6) = 106.7 and from 128 (1 - 1/12) = 117.3 on
    for (const first of [107, 118]) {
      const density = Float64Array.from({ length: half + 1 }, (_, f) => (f < first ? (first / f) ** 8 : 1));
      const rule = noiseFloor(density, size, 1);
      expect(rule.slope).toBeLessThan(-1);
      expectClose(rule.floor, 1, exact);
    }
  });
  it("cuts at the lowest band that is under twice the floor, but not among the energetic ones", () => {
    const [kept, high] = [20, 10];
    const density = banded((_, band) => (band > kept ? 100 : band > high ? 1.99 : 1));
    const rule = noiseFloor(density, size, 1);
    expectClose(rule.floor, 1, exact);
    expect(rule.cut).toBe(kept + 1);
    expect(rule.cutBin).toBe(borders[kept]);
    expect(noiseFloor(density, size, borders[kept]).cut).toBe(kept + 1);
    expect(noiseFloor(density, size, borders[kept] + 1).cut).toBeLessThan(kept + 1);
    // moved: upward leaves one band less out
    expect(noiseFloor(density, size, 1, 1).cut).toBe(kept);
    expect(noiseFloor(density, size, 1, -2).cut).toBe(kept + 3);
    expect(noiseFloor(density, size, 1, 99).cut).toBe(1);
    expect(noiseFloor(density, size, 1, -99).cut).toBe(borders.length - 1);
  });
  it("of which no band is under the double leaves the spectrum whole, and is told", () => {
    const density = Float64Array.from({ length: half + 1 }, (_, f) => (f < 86 ? 50 : 1));
    const rule = noiseFloor(density, size, 129);
    expectClose(rule.floor, 1, exact);
    expect(rule).toMatchObject({ cut: 0, cutBin: half + 1, tail: null, shareBeyond: 0 });
  });
  it("is looked for above k L11 = 3: with k L11 = 2π f T_int that is bin 3 N/(2π T_int)", () => {
    expectClose(scaleBin(1024, 25), (3 * 1024) / (2 * Math.PI * 25), exact);
    expect(Number.isFinite(scaleBin(1024, 0))).toBe(true);
  });
});

describe("what goes on beyond the cut", () => {
  const [cut, floor, rate, level] = [12, 0.02, 0.06, 3];
  const from = borders[cut - 1];
  const density = banded((centre) => floor + level * Math.exp(-rate * (centre - from)));

  it("is the exponential through the octave below", () => {
    const tail = spectrumTail(density, floor, size, cut);
    expect(tail?.from).toBe(from);
    expectClose(tail?.rate, rate, exact);
    expectClose(tail?.level, level, exact);
  });
  it("weighs a band of n bins as n ((E - floor)/E)², and looks no further than an octave", () => {
    // a band of the octave lies off the line: SciPy's definition of a weighted least-squares line
    const off = banded((centre, band) => {
      const plain = level * Math.exp(-rate * (centre - from));
      return floor + (band === cut + 2 ? 1.5 * plain : band === cut + 6 ? 9 * plain : plain);
    });
    let [w, x, y, xx, xy] = [0, 0, 0, 0, 0];
    for (let band = cut; band < cut + 6; band++) {
      const [begin, end] = [borders[band], borders[band - 1]];
      if (end === begin) continue;
      const E = off[begin];
      const weight = (end - begin) * ((E - floor) / E) ** 2;
      const at = (begin + end - 1) / 2 - from;
      w += weight;
      x += weight * at;
      y += weight * Math.log(E - floor);
      xx += weight * at * at;
      xy += weight * at * Math.log(E - floor);
    }
    const slope = (w * xy - x * y) / (w * xx - x * x);
    const tail = spectrumTail(off, floor, size, cut);
    expectClose(tail?.rate, -slope, exact);
    expectClose(tail?.level, Math.exp((y - slope * x) / w), exact);
  });
  it("is nothing where the octave does not fall, or lies under the floor", () => {
    expect(
      spectrumTail(
        banded(() => 1),
        0.5,
        size,
        cut,
      ),
    ).toBeNull();
    expect(
      spectrumTail(
        banded((centre) => Math.exp(0.01 * centre)),
        0,
        size,
        cut,
      ),
    ).toBeNull();
    expect(
      spectrumTail(
        banded(() => 0.1),
        0.5,
        size,
        cut,
      ),
    ).toBeNull();
  });
  it("passes a band over that lies at its floor", () => {
    const holed = banded((centre, band) =>
      band === cut + 1 ? floor : floor + level * Math.exp(-rate * (centre - from)),
    );
    expectClose(spectrumTail(holed, floor, size, cut)?.rate, rate, exact);
  });
  it("has the second moment of an exponential from half a bin below its first bin to infinity", () => {
    const tail = { from: 40, level: 2.5, rate: 0.3 };
    // Simpson's rule over 200 bins, beyond which e^-60 is left
    let sum = 0;
    const steps = 40_000;
    const h = 200 / steps;
    for (let i = 0; i <= steps; i++) {
      const f = 39.5 + i * h;
      const weight = i === 0 || i === steps ? 1 : i % 2 === 0 ? 2 : 4;
      sum += (weight * h * f * f * tail.level * Math.exp(-tail.rate * (f - tail.from))) / 3;
    }
    expectClose(tailMoment(tail), sum, { relative: 1e-9, because: "Simpson's rule" });
  });
  it("is a share of the whole: that moment over itself and what lies below", () => {
    // a floor that the top third shows: E - floor falls to nothing long before
    const noisy = banded((centre) => floor + 50 * Math.exp(-0.15 * centre));
    const rule = noiseFloor(noisy, size, 1);
    if (rule.tail === null) throw new Error("no tail");
    let below = 0;
    for (let f = 1; f < rule.cutBin; f++) below += f * f * (noisy[f] - rule.floor);
    const beyond = tailMoment(rule.tail);
    expectClose(rule.shareBeyond, beyond / (below + beyond), exact);
    expect(rule.shareBeyond).toBeGreaterThan(0.001);
  });
  it("counts as all of it where no exponential can be fitted", () => {
    const rising = banded((centre, band) => (band > 20 ? 100 + centre : 1));
    expect(noiseFloor(rising, size, 1)).toMatchObject({ tail: null, shareBeyond: 1 });
  });
});

describe("the mean square of a derivative", () => {
  const [step, bin, E] = [2e-3, 20, 7];
  const width = 1 / (size * step);
  const line = new Float64Array(half + 1);
  line[bin] = E;

  it("of a line is its ω² times its variance", () => {
    expectClose(
      meanSquareRate(line, size, step, plainRule),
      (2 * Math.PI * bin * width) ** 2 * E * width,
      exact,
    );
  });
  it("has the floor taken out up to the cut, and the tail put on", () => {
    const tail = { from: 30, level: 0.4, rate: 0.2 };
    const rule = { ...plainRule, floor: 0.5, cut: 3, cutBin: 30, tail };
    let sum = tailMoment(tail);
    for (let f = 1; f < 30; f++) sum += f * f * (line[f] - 0.5);
    expectClose(meanSquareRate(line, size, step, rule), (2 * Math.PI * width) ** 2 * width * sum, exact);
  });
  it("of a constant under a Hann window is that of the window: mean w'² over mean w²", () => {
    const T = size * step;
    let [rise, square] = [0, 0];
    for (let i = 0; i < 1000; i++) {
      const angle = (2 * Math.PI * i) / 1000;
      square += (0.5 * (1 - Math.cos(angle))) ** 2;
      rise += ((Math.PI / T) * Math.sin(angle)) ** 2;
    }
    expectClose(windowShare(3, size, step), (3 * rise) / square, exact);
  });
  it("by central differences of a line is sin²(ω dt)/dt² of it, at fourth order (8 sin - sin 2)²/36", () => {
    const angle = (2 * Math.PI * bin) / size;
    const { second, fourth } = differenceRates(line, size, step, plainRule);
    expectClose(second, ((Math.sin(angle) / step) ** 2 * E) / (size * step), exact);
    const slope = (8 * Math.sin(angle) - Math.sin(2 * angle)) / (6 * step);
    expectClose(fourth, (slope ** 2 * E) / (size * step), exact);
  });
  it("by differences of a cut spectrum is that of the spectrum below and of the tail beyond", () => {
    const tail = { from: 15, level: 0.4, rate: 0.2 };
    const rule = { ...plainRule, floor: 0.5, cut: 3, cutBin: 15, tail };
    let sum = 0;
    for (let f = 1; f <= half; f++) {
      const level = f < 15 ? line[f] - 0.5 : 0.4 * Math.exp(-0.2 * (f - 15));
      sum += (level * (Math.sin((2 * Math.PI * f) / size) / step) ** 2) / (size * step);
    }
    expectClose(differenceRates(line, size, step, rule).second, sum, exact);
    const none = differenceRates(line, size, step, { ...rule, tail: null });
    let below = 0;
    for (let f = 1; f < 15; f++)
      below -= (0.5 * (Math.sin((2 * Math.PI * f) / size) / step) ** 2) / (size * step);
    expectClose(none.second, below, exact);
  });
});
