import type { Annotations, Shape } from "plotly.js";
import { labelOf } from "../core/catalogue.ts";
import { withReference } from "../core/symbolRuns.ts";
import { displayOf } from "../core/unitText.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { linearRange, logRange, present } from "./axisRange.ts";
import { placeCells } from "./cells.ts";
import { drawingOf } from "./drawing.ts";
import type { FigureAxis, FigureCase, FigureOptions, FigureSpec } from "./figureSpec.ts";
import { flagPennants } from "./flagPennants.ts";
import { impliedLine } from "./impliedLine.ts";
import { caseRows, legend } from "./legend.ts";
import { pageNote } from "./pageNote.ts";
import {
  type Box,
  joinDecor,
  linearAxis,
  logAxis,
  type Panel,
  type PanelAxis,
  placeX,
  placeY,
} from "./panel.ts";
import { stationPoints, stationTable } from "./stationPoints.ts";
import { type PlottedPoint, stationTrace } from "./stationTrace.ts";
import { commonAxis, isDivided, referenceSymbol, streamwiseTitle, titleWithUnit } from "./streamwise.ts";
import { symbolHtml } from "./symbolHtml.ts";

const lengths = ["L11", "lambda", "eta"] as const;
type Key = (typeof lengths)[number] | "Re_lambda";

/** Integral, Taylor and Kolmogorov lengths against the distance from the origin; beside them Re_λ. */
export function scalesFigure(cases: readonly FigureCase[], options: FigureOptions): FigureSpec {
  const wanted = commonAxis(cases, "(x-x0)/ell");
  const axis = wanted === "x" ? commonAxis(cases, options.axis) : wanted;
  const reynolds = cases.some(({ stations }) => stations.some(({ Re_lambda }) => Re_lambda.value !== null));
  const cells = placeCells(reynolds ? 2 : 1, 66, options);
  const x = placeAxis(cases, axis, options);
  const [first, second] = cells.boxes;
  const sizes = lengthPanel(cases, axis, x, first, reynolds ? "a" : "", options);
  const panels = reynolds ? [sizes, reynoldsPanel(cases, axis, x, second, options)] : [sizes];
  return assembleFigure(
    {
      key: "scales",
      widthMm: cells.widthMm,
      heightMm: cells.heightMm,
      panels,
      decor: joinDecor(
        {
          notes: lengthNames(cases, axis, sizes, options),
          shapes: [
            ...pennantsOf(lengths, sizes, cases, axis, options),
            ...panels.slice(1).flatMap((panel) => pennantsOf(["Re_lambda"], panel, cases, axis, options)),
          ],
        },
        legend(caseRows(cases), panels[panels.length - 1], options),
      ),
      table: stationTable(cases, [...lengths, "Re_lambda"], axis),
    },
    options,
  );
}

function pennantsOf(
  keys: readonly Key[],
  panel: Panel,
  cases: readonly FigureCase[],
  axis: FigureAxis,
  options: FigureOptions,
): Partial<Shape>[] {
  return seriesOf(cases, keys, axis, options).flatMap(({ of, key, points }) =>
    flagPennants(of, key, points, panel, options),
  );
}

function placeAxis(cases: readonly FigureCase[], axis: FigureAxis, options: FigureOptions): PanelAxis {
  const places = present(cases.flatMap((of) => stationPoints(of, "L11", axis).map(({ x }) => x)));
  const title = streamwiseTitle(cases, axis, options);
  // Room at the right end for the symbols of the lengths.
  return places.every((place) => place > 0)
    ? logAxis(logRange([...places, 1.22 * Math.max(...places)]), title)
    : linearAxis(linearRange(places, { margin: 0.11 }), title);
}

/** Lengths are divided by the reference length where every case has one, else in mm. */
function lengthPanel(
  cases: readonly FigureCase[],
  axis: FigureAxis,
  x: PanelAxis,
  box: Box,
  letter: string,
  options: FigureOptions,
): Panel {
  const divided = isDivided(cases);
  const label = labelOf(divided ? "length/ell" : "length");
  const { unit } = displayOf(label, options.units);
  const title = symbolHtml(withReference(label.symbol, referenceSymbol(cases)));
  const series = seriesOf(cases, lengths, axis, options);
  return {
    box,
    x,
    y: logAxis(
      logRange(
        series.flatMap(({ points }) => points.map(({ y }) => y)),
        0.1,
      ),
      titleWithUnit(title, unit),
    ),
    traces: tracesOf(series, axis, options),
    letter,
  };
}

function reynoldsPanel(
  cases: readonly FigureCase[],
  axis: FigureAxis,
  x: PanelAxis,
  box: Box,
  options: FigureOptions,
): Panel {
  const series = seriesOf(cases, ["Re_lambda"], axis, options);
  const values = series.flatMap(({ points }) => points.flatMap(({ y, low, high }) => [y, low, high]));
  return {
    box,
    x,
    y: logAxis(logRange(values, 0.12), symbolHtml(labelOf("Re_lambda").symbol)),
    traces: tracesOf(series, axis, options),
    letter: "b",
  };
}

interface Series {
  readonly of: FigureCase;
  readonly key: Key;
  readonly points: readonly PlottedPoint[];
}

function seriesOf(
  cases: readonly FigureCase[],
  keys: readonly Key[],
  axis: FigureAxis,
  options: FigureOptions,
): Series[] {
  return keys.flatMap((key) =>
    cases.map((of) => ({ of, key, points: stationPoints(of, key, axis, factorOf(of, key, cases, options)) })),
  );
}

function factorOf(of: FigureCase, key: Key, cases: readonly FigureCase[], { units }: FigureOptions): number {
  if (key === "Re_lambda") return 1;
  return isDivided(cases) && of.length !== null ? 1 / of.length : displayOf(labelOf("length"), units).factor;
}

function tracesOf(series: readonly Series[], axis: FigureAxis, options: FigureOptions) {
  const lines =
    axis === "(x-x0)/ell"
      ? series.flatMap(({ of, key, points }) => impliedLine(of, points, key, options))
      : [];
  return [...lines, ...series.map(({ of, points }) => stationTrace(points, of.mark, of.name, options))];
}

/** The symbol of each length at the right end of its points. */
function lengthNames(
  cases: readonly FigureCase[],
  axis: FigureAxis,
  panel: Panel,
  options: FigureOptions,
): Partial<Annotations>[] {
  return lengths.flatMap((key) => {
    const points = seriesOf(cases, [key], axis, options).flatMap((one) => one.points);
    const there = points.filter(({ x, y }) => x !== null && y !== null && y > 0);
    if (there.length === 0) return [];
    const last = there.reduce((a, b) => ((b.x ?? 0) > (a.x ?? 0) ? b : a));
    return [
      pageNote(
        symbolHtml(labelOf(key).symbol),
        placeX(panel, last.x ?? 1) + 1.7,
        placeY(panel, last.y ?? 1),
        {
          xanchor: "left",
          yanchor: "middle",
          font: drawingOf(options).symbol,
        },
      ),
    ];
  });
}
