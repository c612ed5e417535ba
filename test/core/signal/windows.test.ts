import { describe, it } from "vitest";
import { crossDensity } from "../../../src/core/signal/crossDensity.ts";
import { startCrossPower } from "../../../src/core/signal/crossPower.ts";
import { hannWindow } from "../../../src/core/signal/hannWindow.ts";
import { seededRandom } from "../../../src/core/signal/seededRandom.ts";
import { startWelch } from "../../../src/core/signal/welch.ts";
import { welchDensity } from "../../../src/core/signal/welchDensity.ts";
import { expectClose } from "../../support/expectClose.ts";
import { readRows } from "../../support/readRows.ts";

// computed from the closed forms of the periodic windows; the same as Harris (1978), Proc. IEEE 66, 51, has them
const row = readRows(new URL("../../reference/constants/windows.csv", import.meta.url)).find(
  ({ window }) => window === "hann",
);
const size = 1024;
const window = hannWindow(size);
const sum = (of: (w: number, i: number) => number) => window.reduce((total, w, i) => total + of(w, i), 0);

describe("the Hann window", () => {
  const digits = { absolute: 1e-5, because: "five printed digits" };
  it("has its gain, mean square and equivalent noise bandwidth", () => {
    expectClose(sum((w) => w) / size, Number(row?.coherent_gain_S1_over_N), digits);
    expectClose(sum((w) => w * w) / size, Number(row?.mean_square_S2_over_N), digits);
    const bandwidth = (size * sum((w) => w * w)) / sum((w) => w) ** 2;
    expectClose(bandwidth, Number(row?.ENBW_bins_N_S2_over_S1sq), digits);
  });
  it("loses 1.4236 dB between two bins", () => {
    const re = sum((w, i) => w * Math.cos((Math.PI * i) / size));
    const im = sum((w, i) => w * Math.sin((Math.PI * i) / size));
    const loss = 20 * Math.log10(Math.hypot(re, im) / sum((w) => w));
    expectClose(loss, Number(row?.scalloping_loss_dB), { absolute: 1e-4, because: "four printed decimals" });
  });
  it("leaves half-overlapping segments correlated by a sixth", () => {
    const overlap = sum((w, i) => (i < size / 2 ? w * window[i + size / 2] : 0)) / sum((w) => w * w);
    expectClose(overlap, Number(row?.autocorr_at_50pct_overlap), digits);
  });
});

describe("a Welch estimate of white noise, 50 % overlap", () => {
  // Welch (1967): 36 K/19 degrees of freedom for K segments; a band of width df has 2 T df, its bins being correlated
  const segment = 64;
  const segments = 8;
  const length = (segment / 2) * (segments + 1);
  const random = seededRandom(20261201);
  const runs = 3000;
  const bands = [1, 4, 16];
  const sums = bands.map(() => ({ mean: 0, square: 0 }));
  for (let run = 0; run < runs; run++) {
    const x = Float64Array.from({ length }, () => random.gaussian());
    const welch = startWelch(segment);
    welch.add(x, 0, length);
    bands.forEach((width, b) => {
      let level = 0;
      for (let f = 8; f < 8 + width; f++) level += welch.power[f] / width;
      sums[b].mean += level / runs;
      sums[b].square += level ** 2 / runs;
    });
  }
  const freedom = sums.map(({ mean, square }) => (2 * mean ** 2) / (square - mean ** 2));
  const close = { relative: 0.1, because: "the variance of 3000 values is known to 2.6 %, three errors" };
  it("has 36 K/19 degrees of freedom a bin", () => {
    expectClose(freedom[0], (36 * segments) / 19, close);
  });
  it("has 2 T df in a band of several bins", () => {
    expectClose(freedom[1], (2 * length * 4) / segment, close);
    expectClose(freedom[2], (2 * length * 16) / segment, close);
  });
});

describe("the co-spectrum of two sequences", () => {
  const random = seededRandom(7);
  const x = Float64Array.from({ length: 4000 }, () => random.gaussian());
  const y = x.map((value) => 0.6 * value + 0.8 * random.gaussian() + 1);
  function spectra(offset: number) {
    const cross = startCrossPower(256);
    const first = startWelch(256, (_, transform) => cross.first(transform));
    const second = startWelch(256, (_, transform) => cross.second(transform));
    const shifted = x.map((value) => value + offset);
    // chunks that hold several segments: u's transforms wait for v's
    for (let from = 0; from < x.length; from += 1000) {
      first.add(shifted, from, from + 1000);
      second.add(y, from, from + 1000);
    }
    const totals = { size: 256, segments: first.segments, power: cross.power };
    const a = { edges: first.edges, mean: offset };
    const b = { edges: second.edges, mean: 1 };
    return { density: crossDensity(totals, 0.5, a, b), first };
  }
  it("integrates to the covariance", () => {
    const { density } = spectra(0);
    let covariance = 0;
    for (let i = 0; i < x.length; i++) covariance += (x[i] * (y[i] - 1)) / x.length;
    const total = density.reduce((all, value) => all + value, 0) / (256 * 0.5);
    expectClose(total, covariance, { relative: 0.03, because: "the ends of a record weigh less" });
  });
  it("does not feel what is taken out of the means afterwards", () => {
    const [plain, shifted] = [spectra(0).density, spectra(3).density];
    plain.forEach((value, f) => {
      expectClose(shifted[f], value, { absolute: 1e-10, because: "rounding" });
    });
  });
  it("of a sequence with itself is its spectrum", () => {
    const cross = startCrossPower(256);
    const welch = startWelch(256, (_, transform) => {
      cross.first(transform);
      cross.second(transform);
    });
    welch.add(x, 0, x.length);
    const totals = { size: 256, segments: welch.segments, power: welch.power, edges: welch.edges };
    const side = { edges: welch.edges, mean: 0 };
    const own = welchDensity(totals, 0.5, 0);
    crossDensity({ ...totals, power: cross.power }, 0.5, side, side).forEach((value, f) => {
      expectClose(value, own[f], { relative: 1e-12, because: "the same sums" });
    });
  });
});
