import { labelOf } from "../core/catalogue.ts";
import { bandAverage } from "../core/signal/bandAverage.ts";
import { unitOf } from "../core/unitText.ts";
import { linearRange, logRange } from "./axisRange.ts";
import { barsOf } from "./barsOf.ts";
import type { FigureOptions, PickedCurve } from "./figureSpec.ts";
import { lineWeight } from "./lineWeight.ts";
import { levelLine } from "./pageShapes.ts";
import { type Box, type Decor, linearAxis, logAxis, type Panel } from "./panel.ts";
import type { SpectrumCurve } from "./spectrumCurves.ts";
import { caseLine } from "./stationTrace.ts";
import { titleWithUnit } from "./streamwise.ts";
import { symbolHtml } from "./symbolHtml.ts";

/** Fewer bands than in a spectrum: a co-spectrum scatters about zero. */
const bandsPerDecade = 12;
const normal = 1.96;

/** The label of its wavenumber: in integral scales where every picked station has one. */
export function coSpectrumAcross(picked: readonly PickedCurve[]): "k1_L11" | "k1" {
  return picked.every(({ station }) => station.L11.value !== null) ? "k1_L11" : "k1";
}

/**
 * Co-spectra of u and v of the picked stations, k1 E12/(u'v'), so that the area over ln k1 is their correlation
 * coefficient. The error of a band is that of a co-spectrum without its quadrature part, which is not known and would
 * make it smaller,
 *     se² = (E11 E22 + E12²)/ν,   ν degrees of freedom
 * @see   Bendat & Piersol (2010), Random Data, §9.1 (from memory)
 */
export function coSpectrumCurves(picked: readonly PickedCurve[]): SpectrumCurve[] {
  const across = coSpectrumAcross(picked);
  return picked.flatMap((one) => {
    const { curves, uu, vv, L11 } = one.station;
    if (!curves?.E12 || !curves.E22 || uu.value === null || vv.value === null) return [];
    const freedom = curves.freedoms ?? curves.freedom;
    const of = (E: Float64Array) => bandAverage(curves.k1, E, bandsPerDecade, freedom);
    const [u, v, both] = [curves.E11, curves.E22, curves.E12].map(of);
    const scale = Math.sqrt(uu.value * vv.value);
    const unit = across === "k1_L11" ? (L11.value ?? 1) : 1;
    const error = both.E.map((E, i) => normal * Math.sqrt((u.E[i] * v.E[i] + E ** 2) / both.freedom[i]));
    const end = (side: 1 | -1) => both.k1.map((k, i) => (k * (both.E[i] + side * error[i])) / scale);
    return [
      {
        picked: one,
        x: both.k1.map((k) => k * unit),
        y: both.k1.map((k, i) => (k * both.E[i]) / scale),
        low: end(-1),
        high: end(1),
      },
    ];
  });
}

/** The panel: a straight ordinate, since a co-spectrum has a sign, and its zero. */
export function coSpectrumPanel(
  curves: readonly SpectrumCurve[],
  picked: readonly PickedCurve[],
  box: Box,
  options: FigureOptions,
): { panel: Panel; decor: Partial<Decor> } {
  const across = labelOf(coSpectrumAcross(picked));
  const all = curves.map((curve) => curve.picked);
  const panel: Panel = {
    box,
    x: logAxis(
      logRange(
        curves.flatMap(({ x }) => x),
        0.03,
      ),
      titleWithUnit(symbolHtml(across.symbol), unitOf(across.dimension, options.units)),
    ),
    y: linearAxis(
      linearRange(
        curves.flatMap(({ y }) => y),
        { include: [0], margin: 0.3 },
      ),
      symbolHtml(labelOf("E12_premultiplied").symbol),
    ),
    traces: curves.flatMap(({ picked: one, x, y, low, high }) => [
      caseLine(...barsOf(x, low, high), one.of.mark, options, { weightPt: 0.3, dashed: false }),
      caseLine(x, y, one.of.mark, options, { weightPt: lineWeight(one, all), dashed: true }),
    ]),
    letter: "a",
  };
  return { panel, decor: { shapes: levelLine(panel, 0, options, false) } };
}
