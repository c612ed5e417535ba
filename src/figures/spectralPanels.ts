import { labelOf } from "../core/catalogue.ts";
import type { SpectrumPair } from "../core/comparison.ts";
import { withReference } from "../core/symbolRuns.ts";
import { unitOf } from "../core/unitText.ts";
import { linearRange, logRange } from "./axisRange.ts";
import { type ComparedPair, inLengths } from "./comparedPair.ts";
import type { FigureCase, FigureOptions, PickedCurve } from "./figureSpec.ts";
import { middlePair } from "./middlePair.ts";
import { type Box, linearAxis, logAxis, type Panel } from "./panel.ts";
import { type SpectrumCurve, spectrumCurves } from "./spectrumCurves.ts";
import { caseLine, stationTrace } from "./stationTrace.ts";
import { referenceSymbol, titleWithUnit } from "./streamwise.ts";
import { symbolHtml } from "./symbolHtml.ts";

/** What is drawn of a spectrum below its largest value, decades. */
const depth = 7;

/** Spectra of the middle pair of stations in Kolmogorov form; every station once. */
export function kolmogorovCurves(pairs: readonly ComparedPair[]): SpectrumCurve[] {
  const picked = pairs.flatMap(({ comparison, first, second }): PickedCurve[] => {
    const middle = middlePair(comparison);
    if (middle === null) return [];
    return [first, second].flatMap((of, side) => {
      const station = of.stations.find(({ x }) => x === middle.x[side]);
      return station ? [{ of, station, letter: "" }] : [];
    });
  });
  const once = picked.filter((one, i) => picked.findIndex(({ station }) => station === one.station) === i);
  return spectrumCurves(once, "kolmogorov");
}

/** Those spectra over one another, and the distance of every pair of stations with what chance makes of it. */
export function spectralPanels(
  pairs: readonly ComparedPair[],
  curves: readonly SpectrumCurve[],
  [upper, lower]: readonly [Box, Box],
  options: FigureOptions,
): readonly [Panel, Panel] {
  return [spectraOver(curves, upper, options), distancePanel(pairs, lower, options)];
}

function spectraOver(curves: readonly SpectrumCurve[], box: Box, options: FigureOptions): Panel {
  const [across, up] = ["k1_eta", "E11_kolmogorov"].map((key) => symbolHtml(labelOf(key).symbol));
  const top = Math.max(...curves.flatMap(({ y }) => y), 0);
  const isShown = (value: number) => value > top / 10 ** depth;
  const places = curves.flatMap(({ x, y }) => x.filter((_, i) => isShown(y[i])));
  const values = curves.flatMap(({ y }) => y.filter(isShown));
  return {
    box,
    x: logAxis(logRange(places, 0.03), across),
    y: logAxis(logRange(values), up),
    traces: curves.map(({ picked, x, y }) =>
      caseLine(x, y, picked.of.mark, options, { weightPt: 1, dashed: true }),
    ),
    letter: "c",
  };
}

function distancePanel(pairs: readonly ComparedPair[], box: Box, options: FigureOptions): Panel {
  const all = pairs.flatMap(({ comparison }) => comparison.spectra.pairs);
  const cases = pairs.flatMap(({ first, second }) => [first, second]);
  const divided = inLengths(cases);
  const label = labelOf(divided ? "(x-x0)/ell" : "x-x0");
  const title = symbolHtml(withReference(label.symbol, referenceSymbol(cases)));
  const up = linearRange(
    all.flatMap(({ distance, chance_95 }) => [distance.value, chance_95]),
    { include: [0], margin: 0.14 },
  );
  return {
    box,
    x: logAxis(
      logRange(all.map(({ xi }) => xi[1])),
      titleWithUnit(title, divided ? "" : unitOf(label.dimension, options.units)),
    ),
    y: linearAxis([0, up[1]], symbolHtml(labelOf("spectral_distance").symbol)),
    traces: pairs.flatMap(({ comparison: { spectra }, second }) =>
      distanceTraces(spectra.pairs, second, options),
    ),
    letter: "d",
  };
}

/** A marker for each pair, open where it lies no farther apart than by chance; lines: the mean of chance, and its 95 %. */
function distanceTraces(pairs: readonly SpectrumPair[], of: FigureCase, options: FigureOptions) {
  const x = pairs.map(({ xi }) => xi[1]);
  const line = (value: (pair: SpectrumPair) => number, dashed: boolean) =>
    caseLine(x, pairs.map(value), of.mark, options, { weightPt: dashed ? 0.45 : 0.7, dashed: false });
  const points = pairs.map(({ xi, x: places, distance, p }) => ({
    x: xi[1],
    y: distance.value,
    low: null,
    high: p < 0.05 ? distance.value : null,
    used: p < 0.05,
    station: places[1],
  }));
  return [
    line(({ chance }) => chance, false),
    line(({ chance_95 }) => chance_95, true),
    stationTrace(points, of.mark, of.name, options),
  ];
}
