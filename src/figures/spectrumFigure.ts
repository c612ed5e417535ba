import { labelOf, type Run } from "../core/catalogue.ts";
import { unitOf } from "../core/unitText.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { logRange } from "./axisRange.ts";
import { barsOf } from "./barsOf.ts";
import { placeCells } from "./cells.ts";
import { correlationPanel } from "./correlationPanel.ts";
import { coSpectrumAcross, coSpectrumCurves, coSpectrumPanel } from "./coSpectrum.ts";
import { drawingOf } from "./drawing.ts";
import type { FigureOptions, FigureSpec, FigureTable, PickedCurve } from "./figureSpec.ts";
import { formatPosition, withUnit } from "./formatNumber.ts";
import { type LegendRow, legend, shortened } from "./legend.ts";
import { lineWeight } from "./lineWeight.ts";
import { pageNote } from "./pageNote.ts";
import { levelLine } from "./pageShapes.ts";
import { type Box, type Decor, joinDecor, logAxis, type Panel, placeY } from "./panel.ts";
import { revivalPanel } from "./revivalPanel.ts";
import {
  possibleForm,
  type SpectrumCurve,
  type SpectrumForm,
  type SpectrumOf,
  spectrumCurves,
} from "./spectrumCurves.ts";
import { caseLine } from "./stationTrace.ts";
import { titleWithUnit } from "./streamwise.ts";
import { escapeText, symbolHtml } from "./symbolHtml.ts";

/** Level of the compensated one-sided spectrum in an inertial range: Pope (2000). */
const plateau = 0.49;
/** What is drawn of a spectrum's range below its largest value. */
const depth = { compensated: 2.4, premultiplied: 2.4, kolmogorov: 9, dimensional: 9 } as const;
const labels = {
  compensated: ["k1_eta", "E11_compensated"],
  premultiplied: ["k1_L11", "E11_premultiplied"],
  kolmogorov: ["k1_eta", "E11_kolmogorov"],
  dimensional: ["k1", "E11"],
} as const;

/**
 * Spectra of the picked stations, or co-spectra of u and v, and their autocorrelations with the first zero ringed; where
 * a record is replayed, the correlation around the lag at which it comes back.
 */
export function spectrumFigure(
  picked: readonly PickedCurve[],
  options: FigureOptions,
  wanted: SpectrumForm = "compensated",
  component: SpectrumOf | "E12" = "E11",
): FigureSpec {
  const revived = picked.filter(({ station }) => station.curves?.revival !== undefined);
  const cells = placeCells(revived.length > 0 ? 3 : 2, 66, options);
  const first = firstPanel(picked, options, wanted, component, cells.boxes[0]);
  const correlation = correlationPanel(picked, cells.boxes[1], "b", options);
  const revival = revived.length > 0 ? [revivalPanel(revived, cells.boxes[2], "c", options)] : [];
  return assembleFigure(
    {
      key: "spectra",
      widthMm: cells.widthMm,
      heightMm: cells.heightMm,
      panels: [first.panel, correlation.panel, ...revival.map(({ panel }) => panel)],
      decor: joinDecor(
        first.decor,
        correlation.decor,
        ...revival.map(({ decor }) => decor),
        legend(pickedRows(picked, options), correlation.panel, options),
      ),
      table: first.table,
    },
    options,
  );
}

function firstPanel(
  picked: readonly PickedCurve[],
  options: FigureOptions,
  wanted: SpectrumForm,
  component: SpectrumOf | "E12",
  box: Box,
): { panel: Panel; decor: Partial<Decor>; table: FigureTable } {
  if (component === "E12") {
    const curves = coSpectrumCurves(picked);
    const table = curveTable(curves, coSpectrumAcross(picked), "E12_premultiplied");
    return { ...coSpectrumPanel(curves, picked, box, options), table };
  }
  const form = possibleForm(picked, wanted);
  const curves = spectrumCurves(picked, form, component);
  const panel = spectraPanel(curves, form, component, box, options);
  const [across, up] = labels[form];
  return {
    panel,
    decor: form === "compensated" && component === "E11" ? plateauLine(panel, options) : {},
    table: curveTable(curves, across, up.replace("E11", component)),
  };
}

function spectraPanel(
  curves: readonly SpectrumCurve[],
  form: SpectrumForm,
  component: SpectrumOf,
  box: Box,
  options: FigureOptions,
): Panel {
  const [across, up] = labels[form].map((key) => {
    const label = labelOf(key);
    return titleWithUnit(
      symbolHtml(ofComponent(label.symbol, component)),
      unitOf(label.dimension, options.units),
    );
  });
  const top = Math.max(...curves.flatMap(({ y }) => y), 0);
  const isShown = (value: number) => value > top / 10 ** depth[form];
  const values = curves.flatMap(({ y }) => y.filter(isShown));
  const places = curves.flatMap(({ x, y }) => x.filter((_, i) => isShown(y[i])));
  return {
    box,
    x: logAxis(logRange(places, 0.03), across),
    y: logAxis(logRange(form === "compensated" ? [...values, 2 * plateau] : values), up),
    traces: curves.flatMap(({ picked, x, y, low, high }) => [
      caseLine(...barsOf(x, low, high), picked.of.mark, options, { weightPt: 0.3, dashed: false }),
      caseLine(x, y, picked.of.mark, options, {
        weightPt: lineWeight(
          picked,
          curves.map((c) => c.picked),
        ),
        dashed: true,
      }),
    ]),
    letter: "a",
  };
}

const velocities = { E11: "u", E22: "v", E33: "w" } as const;

/** A symbol written for u, of another component: E11 -> E22, ⟨u²⟩ -> ⟨v²⟩. */
function ofComponent(symbol: readonly Run[], component: SpectrumOf): Run[] {
  return symbol.map((run) => ({
    ...run,
    text: run.text.replace("11", component.slice(1)).replace("u", velocities[component]),
  }));
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

export function pickedRows(picked: readonly PickedCurve[], options: FigureOptions): LegendRow[] {
  const unit = options.units === "SI" ? (options.along === "t" ? "s" : "m") : "";
  return picked.map((one) => ({
    mark: one.of.mark,
    text: `${escapeText(shortened(one.of.name))}, ${withUnit(formatPosition(one.station.x), unit)}`,
    letter: escapeText(one.letter),
    marker: false,
    weightPt: lineWeight(one, picked),
  }));
}

function curveTable(curves: readonly SpectrumCurve[], across: string, name: string): FigureTable {
  return {
    heading: ["case", "x", across, name, `${name}_low`, `${name}_high`],
    rows: curves.flatMap(({ picked, x, y, low, high }) =>
      x.map((value, i) => [picked.of.name, picked.station.x, value, y[i], low[i], high[i]]),
    ),
  };
}
