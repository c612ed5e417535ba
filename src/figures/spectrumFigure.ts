import { labelOf } from "../core/catalogue.ts";
import { unitOf } from "../core/unitText.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { logRange } from "./axisRange.ts";
import { placeCells } from "./cells.ts";
import { correlationPanel } from "./correlationPanel.ts";
import { drawingOf } from "./drawing.ts";
import type { FigureOptions, FigureSpec, FigureTable, PickedCurve } from "./figureSpec.ts";
import { formatPosition, withUnit } from "./formatNumber.ts";
import { type LegendRow, legend, shortened } from "./legend.ts";
import { lineWeight } from "./lineWeight.ts";
import { pageNote } from "./pageNote.ts";
import { levelLine } from "./pageShapes.ts";
import { type Box, type Decor, joinDecor, logAxis, type Panel, placeY } from "./panel.ts";
import { possibleForm, type SpectrumCurve, type SpectrumForm, spectrumCurves } from "./spectrumCurves.ts";
import { caseLine } from "./stationTrace.ts";
import { titleWithUnit } from "./streamwise.ts";
import { escapeText, symbolHtml } from "./symbolHtml.ts";

/** Level of the compensated one-sided spectrum in an inertial range: Pope (2000). */
const plateau = 0.49;
/** What is drawn of a spectrum's range below its largest value. */
const depth = { compensated: 2.4, kolmogorov: 9, dimensional: 9 } as const;
const labels = {
  compensated: ["k1_eta", "E11_compensated"],
  kolmogorov: ["k1_eta", "E11_kolmogorov"],
  dimensional: ["k1", "E11"],
} as const;

/** Spectra of the picked stations, and their autocorrelations with the first zero ringed. */
export function spectrumFigure(
  picked: readonly PickedCurve[],
  options: FigureOptions,
  wanted: SpectrumForm = "compensated",
): FigureSpec {
  const form = possibleForm(picked, wanted);
  const curves = spectrumCurves(picked, form);
  const cells = placeCells(2, 66, options);
  const spectra = spectraPanel(curves, form, cells.boxes[0], options);
  const correlation = correlationPanel(picked, cells.boxes[1], "b", options);
  return assembleFigure(
    {
      key: "spectra",
      widthMm: cells.widthMm,
      heightMm: cells.heightMm,
      panels: [spectra, correlation.panel],
      decor: joinDecor(
        form === "compensated" ? plateauLine(spectra, options) : {},
        correlation.decor,
        legend(pickedRows(picked, options), correlation.panel, options),
      ),
      table: spectrumTable(curves, form),
    },
    options,
  );
}

function spectraPanel(
  curves: readonly SpectrumCurve[],
  form: SpectrumForm,
  box: Box,
  options: FigureOptions,
): Panel {
  const [across, up] = labels[form].map((key) => {
    const label = labelOf(key);
    return titleWithUnit(symbolHtml(label.symbol), unitOf(label.dimension, options.units));
  });
  const top = Math.max(...curves.flatMap(({ y }) => y), 0);
  const isShown = (value: number) => value > top / 10 ** depth[form];
  const values = curves.flatMap(({ y }) => y.filter(isShown));
  const places = curves.flatMap(({ x, y }) => x.filter((_, i) => isShown(y[i])));
  return {
    box,
    x: logAxis(logRange(places, 0.03), across),
    y: logAxis(logRange(form === "compensated" ? [...values, 2 * plateau] : values), up),
    traces: curves.map(({ picked, x, y }) =>
      caseLine(x, y, picked.of.mark, options, {
        weightPt: lineWeight(
          picked,
          curves.map((c) => c.picked),
        ),
        dashed: true,
      }),
    ),
    letter: "a",
  };
}

function plateauLine(panel: Panel, options: FigureOptions): Partial<Decor> {
  const { symbol } = drawingOf(options);
  return {
    shapes: levelLine(panel, plateau, options),
    notes: [
      pageNote(`<i>C</i><sub>1</sub> = ${plateau}`, panel.box.right - 1.6, placeY(panel, plateau) + 1.9, {
        xanchor: "right",
        yanchor: "middle",
        font: symbol,
      }),
    ],
  };
}

function pickedRows(picked: readonly PickedCurve[], options: FigureOptions): LegendRow[] {
  const unit = options.units === "SI" ? (options.along === "t" ? "s" : "m") : "";
  return picked.map((one) => ({
    mark: one.of.mark,
    text: `${escapeText(shortened(one.of.name))}, ${withUnit(formatPosition(one.station.x), unit)}`,
    letter: escapeText(one.letter),
    marker: false,
    weightPt: lineWeight(one, picked),
  }));
}

function spectrumTable(curves: readonly SpectrumCurve[], form: SpectrumForm): FigureTable {
  return {
    heading: ["case", "x", ...labels[form]],
    rows: curves.flatMap(({ picked, x, y }) =>
      x.map((value, i) => [picked.of.name, picked.station.x, value, y[i]]),
    ),
  };
}
