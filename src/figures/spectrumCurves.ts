import { bandAverage } from "./bandAverage.ts";
import type { PickedCurve } from "./figureSpec.ts";

export type SpectrumForm = "compensated" | "kolmogorov" | "dimensional";

export interface SpectrumCurve {
  readonly picked: PickedCurve;
  readonly x: readonly number[];
  readonly y: readonly number[];
}

const bandsPerDecade = 24;

/** The form asked for where every picked station has what it needs, else the dimensional spectrum. */
export function possibleForm(picked: readonly PickedCurve[], wanted: SpectrumForm): SpectrumForm {
  const scaled = picked.every(({ station }) => station.epsilon.value !== null && station.eta.value !== null);
  return scaled ? wanted : "dimensional";
}

/**
 * Spectra of the picked stations in one form, band-averaged:
 *     compensated  k1^(5/3) E11/ε^(2/3) against k1 η
 *     kolmogorov   E11/(ε ν⁵)^(1/4) against k1 η, with ν = (ε η⁴)^(1/3)
 *     dimensional  E11 against k1
 */
export function spectrumCurves(picked: readonly PickedCurve[], form: SpectrumForm): SpectrumCurve[] {
  return picked.flatMap((one) => {
    const { curves, epsilon, eta } = one.station;
    if (curves === null) return [];
    const { k1, E } = bandAverage(curves.k1, curves.E11, bandsPerDecade);
    if (form === "dimensional" || epsilon.value === null || eta.value === null)
      return [{ picked: one, x: k1, y: E }];
    const [rate, length] = [epsilon.value, eta.value];
    // (ε ν⁵)^(1/4) with ν³ = ε η⁴
    const unit = rate ** (2 / 3) * length ** (5 / 3);
    const y =
      form === "kolmogorov"
        ? E.map((value) => value / unit)
        : E.map((value, i) => (k1[i] ** (5 / 3) * value) / rate ** (2 / 3));
    return [{ picked: one, x: k1.map((k) => k * length), y }];
  });
}
