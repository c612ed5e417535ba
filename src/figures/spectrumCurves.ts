import { bandAverage } from "../core/signal/bandAverage.ts";
import { chiSquareQuantile } from "../core/signal/distributions/chiSquareQuantile.ts";
import type { PickedCurve } from "./figureSpec.ts";

export type SpectrumForm = "compensated" | "premultiplied" | "kolmogorov" | "dimensional";

/** Which of the one-sided spectra. */
export type SpectrumOf = "E11" | "E22" | "E33";

export interface SpectrumCurve {
  readonly picked: PickedCurve;
  readonly x: readonly number[];
  readonly y: readonly number[];
  /** Ends of the 95 % chi-square interval of each band. */
  readonly low: readonly number[];
  readonly high: readonly number[];
}

const bandsPerDecade = 24;

/** The form asked for where every picked station has what it needs, else the dimensional spectrum. */
export function possibleForm(picked: readonly PickedCurve[], wanted: SpectrumForm): SpectrumForm {
  const has = (...keys: readonly ("epsilon" | "eta" | "L11" | "uu")[]) =>
    picked.every(({ station }) => keys.every((key) => station[key].value !== null));
  if (wanted === "dimensional") return wanted;
  return (wanted === "premultiplied" ? has("L11", "uu") : has("epsilon", "eta")) ? wanted : "dimensional";
}

/**
 * Spectra of the picked stations in one form, band-averaged:
 *     compensated  k1^(5/3) E11/ε^(2/3) against k1 η
 *     kolmogorov   E11/(ε ν⁵)^(1/4) against k1 η, with ν = (ε η⁴)^(1/3)
 *     premultiplied k1 E11/⟨u²⟩ against k1 L11, so that equal areas of ln k1 carry equal shares of the variance
 *     dimensional  E11 against k1
 */
export function spectrumCurves(
  picked: readonly PickedCurve[],
  form: SpectrumForm,
  of: SpectrumOf = "E11",
): SpectrumCurve[] {
  return picked.flatMap((one) => {
    const { curves } = one.station;
    const spectrum = curves?.[of];
    if (!curves || !spectrum) return [];
    const bands = bandAverage(curves.k1, spectrum, bandsPerDecade, curves.freedoms ?? curves.freedom);
    const [across, up] = scalesOf(one, form, of);
    const y = bands.E.map((value, i) => up(value, bands.k1[i]));
    const ends = bands.freedom.map(chiSquareEnds);
    return [
      {
        picked: one,
        x: bands.k1.map((k) => k * across),
        y,
        low: y.map((value, i) => value * ends[i][0]),
        high: y.map((value, i) => value * ends[i][1]),
      },
    ];
  });
}

type Up = (E: number, k1: number) => number;

/** What k1 is multiplied with, and what becomes of E. */
function scalesOf({ station }: PickedCurve, form: SpectrumForm, of: SpectrumOf): readonly [number, Up] {
  const value = (key: "epsilon" | "eta" | "L11") => station[key].value ?? 1;
  const variance = { E11: station.uu, E22: station.vv, E33: station.ww }[of].value ?? 1;
  const [rate, length] = [value("epsilon"), value("eta")];
  // (ε ν⁵)^(1/4) with ν³ = ε η⁴
  const unit = rate ** (2 / 3) * length ** (5 / 3);
  switch (form) {
    case "dimensional":
      return [1, (E) => E];
    case "premultiplied":
      return [value("L11"), (E, k1) => (k1 * E) / variance];
    case "kolmogorov":
      return [length, (E) => E / unit];
    case "compensated":
      return [length, (E, k1) => (k1 ** (5 / 3) * E) / rate ** (2 / 3)];
  }
}

/** Quantiles by their freedom to three digits: bands ask for the same ones at every redraw. */
const kept = new Map<number, readonly [number, number]>();

/** Of a mean of periodograms with so many degrees of freedom: what it is multiplied with for its 95 % interval. */
function chiSquareEnds(exact: number): readonly [number, number] {
  const freedom = Number(exact.toPrecision(3));
  const known = kept.get(freedom);
  if (known) return known;
  const ends = [0.975, 0.025].map((p) => freedom / chiSquareQuantile(p, freedom));
  const pair = [ends[0], ends[1]] as const;
  kept.set(freedom, pair);
  return pair;
}
