import type { Data } from "plotly.js";
import { labelOf } from "../core/catalogue.ts";
import { displayOf } from "../core/unitText.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { logRange } from "./axisRange.ts";
import { type BodyPath, bodyOf, bodyPath, type PlanePoint, targetLength } from "./bodyPath.ts";
import { placeCells } from "./cells.ts";
import { drawingOf } from "./drawing.ts";
import type { FigureCase, FigureOptions, FigureSpec, FigureTable } from "./figureSpec.ts";
import { caseRows, legend } from "./legend.ts";
import { levelLine, uprightLine } from "./pageShapes.ts";
import { joinDecor, logAxis, type Panel } from "./panel.ts";
import { endsOf } from "./stationPoints.ts";
import { caseLine, stationTrace } from "./stationTrace.ts";
import { titleWithUnit } from "./streamwise.ts";
import { symbolHtml } from "./symbolHtml.ts";
import { isUsed } from "./windowOf.ts";

const heightMm = 66;

/** Every case as a path in the plane of intensity and integral scale: where the body stands on it, and the targets. */
export function bodyFigure(cases: readonly FigureCase[], options: FigureOptions): FigureSpec {
  const cells = placeCells(1, heightMm, options);
  const perChord = cases.every((of) => bodyOf(of)?.chord != null);
  const label = labelOf(perChord ? "L11_chord" : "L11");
  const scale = displayOf(label, options.units);
  const paths = cases.map((of) => bodyPath(of, perChord, scale.factor));
  const targets = distinct(paths.map(({ target }) => target));
  const points = paths.flatMap((path) => [...path.points, ...path.body]);
  const traces = [
    ...cases.map((of, i) => caseLine(...lineOf(paths[i].points), of.mark, options, lineLook)),
    ...cases.map((of, i) => withAcross(paths[i].points, of, options)),
    ...paths.flatMap(({ body }) => body.map((point) => ringTrace(point, options))),
    ...targets.flatMap((target) => crossTrace(target, options)),
  ];
  const tu = labelOf("Tu");
  const panel: Panel = {
    box: cells.boxes[0],
    x: logAxis(
      logRange(
        [...points, ...targets].map(({ x }) => x),
        0.07,
      ),
      titleWithUnit(symbolHtml(tu.symbol), displayOf(tu, options.units).unit),
    ),
    y: logAxis(
      logRange([...points.flatMap(({ y, low, high }) => [y, low, high]), ...targets.map(({ y }) => y)], 0.07),
      titleWithUnit(symbolHtml(label.symbol), scale.unit),
    ),
    traces,
    letter: "",
  };
  const shapes = targets.flatMap(({ x, y }) => [
    ...(x === null ? [] : uprightLine(panel, x, options)),
    ...(y === null ? [] : levelLine(panel, y, options)),
  ]);
  return assembleFigure(
    {
      key: "body",
      widthMm: cells.widthMm,
      heightMm: cells.heightMm,
      panels: [panel],
      decor: joinDecor({ shapes }, legend(caseRows(cases), panel, options)),
      table: pathTable(cases),
    },
    options,
  );
}

type Target = BodyPath["target"];

/** Targets of cases that want the same are drawn once. */
function distinct(targets: readonly Target[]): readonly Target[] {
  return targets.filter(({ x, y }, i) => targets.findIndex((each) => each.x === x && each.y === y) === i);
}

/** It joins stations and is no law: as thin as an extension. */
const lineLook = { weightPt: 0.5, dashed: true };

function lineOf(points: readonly PlanePoint[]): [readonly (number | null)[], readonly (number | null)[]] {
  const used = points.filter((point) => point.used);
  return [used.map(({ x }) => x), used.map(({ y }) => y)];
}

/** Markers with bars both ways. */
function withAcross(points: readonly PlanePoint[], of: FigureCase, options: FigureOptions): Partial<Data> {
  const trace = stationTrace(points, of.mark, of.name, options);
  const bars = "error_y" in trace ? trace.error_y : undefined;
  return { ...trace, error_x: acrossBars(points, bars ?? {}) } as Partial<Data>;
}

function acrossBars(points: readonly PlanePoint[], look: object): object {
  const reach = (from: number | null, to: number | null) =>
    from === null || to === null ? null : Math.max(to - from, 0);
  return {
    ...look,
    array: points.map(({ x, right }) => reach(x, right)),
    arrayminus: points.map(({ x, left }) => reach(left, x)),
    visible: points.some(({ left, right }) => left !== null || right !== null),
    copy_ystyle: false,
  };
}

/** The ring around the place of the body, in ink: it belongs to no one case. */
function ringTrace(point: PlanePoint, options: FigureOptions): Partial<Data> {
  const { mm, pt } = drawingOf(options);
  const { ink } = options.tokens;
  const look = { type: "data", symmetric: false, color: ink, thickness: pt(0.6), width: mm(0.5) };
  const reach = (from: number | null, to: number | null) => [
    from === null || to === null ? null : Math.max(to - from, 0),
  ];
  return {
    type: "scatter",
    mode: "markers",
    name: "body",
    x: [point.x],
    y: [point.y],
    hoverinfo: "skip",
    marker: {
      symbol: "circle-open",
      size: mm(3.2),
      color: ink,
      line: { color: ink, width: pt(0.8) },
    },
    error_x: acrossBars([point], look),
    error_y: {
      ...look,
      array: reach(point.y, point.high),
      arrayminus: reach(point.low, point.y),
      visible: point.low !== null || point.high !== null,
    },
  } as Partial<Data>;
}

function crossTrace({ x, y }: Target, options: FigureOptions): Partial<Data>[] {
  if (x === null || y === null) return [];
  const { mm, pt } = drawingOf(options);
  const { ink } = options.tokens;
  return [
    {
      type: "scatter",
      mode: "markers",
      name: "target",
      x: [x],
      y: [y],
      hoverinfo: "skip",
      marker: { symbol: "cross-thin-open", size: mm(2.6), color: ink, line: { color: ink, width: pt(1.2) } },
    } as Partial<Data>,
  ];
}

function pathTable(cases: readonly FigureCase[]): FigureTable {
  const ends = (quantity: Parameters<typeof endsOf>[0]) => {
    const { value, low, high } = endsOf(quantity);
    return [value, low, high];
  };
  return {
    heading: [
      "case",
      "place",
      "x",
      "Tu",
      "Tu_low",
      "Tu_high",
      "L11",
      "L11_low",
      "L11_high",
      "chord",
      "in_window",
    ],
    rows: cases.flatMap((of) => {
      const body = bodyOf(of);
      const chord = body?.chord ?? null;
      const stations = of.stations.map(({ x, Tu, L11 }) => [
        ...[of.name, "station", x, ...ends(Tu), ...ends(L11), chord],
        isUsed(of, x) ? 1 : 0,
      ]);
      if (body === null) return stations;
      const none = [null, null];
      return [
        ...stations,
        [of.name, "body", body.x, ...ends(body.at.Tu), ...ends(body.at.L11), chord, null],
        [
          ...[of.name, "target", null, body.targets.Tu?.target ?? null, ...none],
          ...[targetLength(body), ...none, chord, null],
        ],
      ];
    }),
  };
}
