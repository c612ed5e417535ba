import { logBins } from "../signal/logBins.ts";

/** Constant of the one-dimensional longitudinal spectrum. */
const constant = 0.49;
const leastReynolds = 100;
const tolerance = 0.1;
const perDecade = 20;
/** Bins in a quarter of a decade. */
const quarter = 5;

/** A spectrum in bands of a twentieth of a decade that hold three points or more. */
export interface RangeSpectrum {
  /** ln k1, and ln E11. */
  readonly x: readonly number[];
  readonly y: readonly number[];
}

export interface InertialRange {
  /** m²/s³. */
  readonly epsilon: number;
  readonly spectrum: RangeSpectrum;
  /** Its first band, and the one after its last. */
  readonly first: number;
  readonly end: number;
}

/**
 * Dissipation from an inertial range,
 *     E11 = 0.49 epsilon^(2/3) k1^(-5/3),
 * only where the slopes fitted to two adjoining quarter decades both lie within 0.1 of -5/3, and Re_lambda > 100.
 * Finite Reynolds numbers make it some 10 % low at Re_lambda 100.
 * @param k1  wavenumbers, rad/m, equally spaced, ascending
 * @param E11 one-sided spectrum at them, m³/s²
 * @param reynolds  Re_lambda; NaN: not known
 * @returns   epsilon with the bands that it rests on, or why it is not reported
 * @see   Pope (2000) eq. (6.243); Mydlarski & Warhaft (1996), J. Fluid Mech. 320, 331, on finite Reynolds numbers
 */
export function inertialRange(k1: Float64Array, E11: Float64Array, reynolds: number): InertialRange | string {
  if (Number.isNaN(reynolds)) return "without a viscosity it is not known whether there is an inertial range";
  if (reynolds <= leastReynolds) {
    return `Re_lambda is ${reynolds.toPrecision(3)}: an inertial range needs more than ${leastReynolds}`;
  }
  return nearestRange(banded(k1, E11)) ?? "no half decade of the spectrum has a slope within 0.1 of -5/3";
}

/** The dissipation of such a range alone. */
export function dissipationFromInertialRange(
  k1: Float64Array,
  E11: Float64Array,
  reynolds: number,
): number | string {
  const found = inertialRange(k1, E11, reynolds);
  return typeof found === "string" ? found : found.epsilon;
}

/** The half decade whose slopes are nearest to -5/3; null where none is near enough. */
export function nearestRange(spectrum: RangeSpectrum): InertialRange | null {
  const { x, y } = spectrum;
  let best: number | null = null;
  let nearest = tolerance;
  for (let i = 0; i + 2 * quarter <= x.length; i++) {
    const first = Math.abs(slope(x, y, i, i + quarter) + 5 / 3);
    const second = Math.abs(slope(x, y, i + quarter, i + 2 * quarter) + 5 / 3);
    const worse = Math.max(first, second);
    if (!(worse <= nearest)) continue;
    nearest = worse;
    best = i;
  }
  if (best === null) return null;
  let sum = 0;
  const end = best + 2 * quarter;
  for (let j = best; j < end; j++) sum += 1.5 * (y[j] + (5 / 3) * x[j] - Math.log(constant));
  return { epsilon: Math.exp(sum / (2 * quarter)), spectrum, first: best, end };
}

function banded(k1: Float64Array, E11: Float64Array): RangeSpectrum {
  const borders = logBins(1, k1.length + 1, perDecade);
  const x: number[] = [];
  const y: number[] = [];
  for (let b = 0; b + 1 < borders.length; b++) {
    const [from, to] = [borders[b] - 1, borders[b + 1] - 1];
    if (to - from < 3) continue;
    let k = 0;
    let E = 0;
    for (let i = from; i < to; i++) {
      k += k1[i] / (to - from);
      E += E11[i] / (to - from);
    }
    if (!(E > 0)) continue;
    x.push(Math.log(k));
    y.push(Math.log(E));
  }
  return { x, y };
}

function slope(x: readonly number[], y: readonly number[], from: number, to: number): number {
  const n = to - from;
  let [mx, my] = [0, 0];
  for (let i = from; i < to; i++) {
    mx += x[i] / n;
    my += y[i] / n;
  }
  let [xx, xy] = [0, 0];
  for (let i = from; i < to; i++) {
    xx += (x[i] - mx) ** 2;
    xy += (x[i] - mx) * (y[i] - my);
  }
  return xy / xx;
}
