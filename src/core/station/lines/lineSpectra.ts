import { anyFourier } from "../../signal/anyFourier.ts";
import type { JoinedLines } from "./joinLines.ts";
import type { LateralTotals, LinePart } from "./linePart.ts";

/** Spectra and correlations along lateral lines, all lines and snapshots together, about the common mean. */
export interface LineSpectra {
  /** Between points, the unit of the covariance's lags. */
  readonly step: number;
  /** Length of the line: of a periodic one with the step that closes it. */
  readonly length: number;
  readonly periodic: boolean;
  /** Lines times snapshots. */
  readonly lines: number;
  /** Per component of the station: one-sided density in 1/length, bins 0 … ⌊points/2⌋. */
  readonly density: readonly Float64Array[];
  /** Per component: covariance at lags 0 … ⌊points/2⌋. */
  readonly covariance: readonly Float64Array[];
}

/**
 * Spectra and covariances of lateral lines.
 * Periodic: E(κ_f) = g |X_f|²/(N² Δκ), Σ E Δκ the variance exactly, and the circular covariance.
 * Else: the same under a Hann window, of mean square 3/8, and the covariance of the zero-padded line up to half its
 * length, divided by the number of pairs N - l: over N the few integral scales of a line would make L11 too small
 * by some L11/length. g is 2, and 1 at f = 0 and at Nyquist.
 * @returns null where the points are not equally spaced, or for lines along x
 */
export function lineSpectra(lines: JoinedLines, periodic: boolean): LineSpectra | null {
  const { spacing: step, components, parts, means } = lines;
  const totals = parts.flatMap((part) => (part.spectra ? [{ part, spectra: part.spectra }] : []));
  if (step === null || totals.length < parts.length) return null;
  const size = lines.points.length;
  const count = totals.reduce((sum, { spectra }) => sum + spectra.lines, 0);
  const centred = components.map((_, c) =>
    added(totals.map(({ part, spectra }) => centredTotals(part, spectra, c, means[c], periodic))),
  );
  return {
    ...{ step, periodic, lines: count },
    length: size * step,
    density: centred.map(({ power }) => density(power, size, step, count * (periodic ? 1 : 0.375))),
    covariance: centred.map(({ products }) =>
      products.map((sum, l) => sum / (count * (periodic ? size : size - l))),
    ),
  };
}

interface Centred {
  /** Σ |X_f|², f = 0 … ⌊size/2⌋. */
  readonly power: Float64Array;
  /** Σ x_i x_(i-l). */
  readonly products: Float64Array;
}

function added(all: readonly Centred[]): Centred {
  const sum = (pick: (one: Centred) => Float64Array) =>
    pick(all[0]).map((_, i) => all.reduce((total, one) => total + pick(one)[i], 0));
  return { power: sum(({ power }) => power), products: sum(({ products }) => products) };
}

/** One part's sums with the common mean taken out, exactly: of a constant d all follows from the profile. */
function centredTotals(
  part: LinePart,
  { lines, profile, padded, hann }: LateralTotals,
  c: number,
  mean: number,
  periodic: boolean,
): Centred {
  const d = mean - part.reference[c];
  const size = profile[c].length;
  if (periodic) {
    const power = hann[c].map((_, f) => padded[c][2 * f]);
    const sum = profile[c].reduce((total, value) => total + value, 0);
    power[0] += d * size * (lines * d * size - 2 * sum);
    return { power, products: realInverse(power, size) };
  }
  const products = realInverse(padded[c], 2 * size)
    .subarray(0, size)
    .slice();
  const windowed = centredHann(hann[c], profile[c], lines, d);
  let [heads, tails, all] = [0, 0, 0];
  for (const value of profile[c]) all += value;
  for (let l = 0; l < products.length; l++) {
    products[l] += d * (lines * (size - l) * d - (2 * all - heads - tails));
    heads += profile[c][l];
    tails += profile[c][size - 1 - l];
  }
  return { power: windowed, products };
}

/** A constant d adds d size/2 to X_0 and -d size/4 to X_1 of a Hann window. */
function centredHann(power: Float64Array, profile: Float64Array, lines: number, d: number): Float64Array {
  const size = profile.length;
  const out = power.slice();
  let [zero, first] = [0, 0];
  profile.forEach((value, i) => {
    const angle = (2 * Math.PI * i) / size;
    const window = 0.5 * (1 - Math.cos(angle));
    zero += window * value;
    first += window * Math.cos(angle) * value;
  });
  const [d0, d1] = [(d * size) / 2, (-d * size) / 4];
  out[0] += lines * d0 * d0 - 2 * d0 * zero;
  out[1] += lines * d1 * d1 - 2 * d1 * first;
  return out;
}

/** The even real sequence whose transform is a real, even spectrum given by its bins 0 … ⌊size/2⌋. */
function realInverse(power: Float64Array, size: number): Float64Array {
  const even = new Float64Array(size);
  for (let f = 0; f < size; f++) even[f] = power[Math.min(f, size - f)];
  const out = anyFourier(size).forward(even);
  return Float64Array.from({ length: Math.floor(size / 2) + 1 }, (_, l) => out[2 * l] / size);
}

function density(power: Float64Array, size: number, step: number, weight: number): Float64Array {
  return power.map((value, f) => {
    const once = f === 0 || 2 * f === size;
    return ((once ? 1 : 2) * value * step) / (size * weight);
  });
}
