import type { Annotations, Data, Shape } from "plotly.js";
import { type DecayRoute, routeKeys } from "../core/decayArgument.ts";
import type { Quantity } from "../core/quantity.ts";
import { type ArguedDecay, arguedOf } from "./arguedOf.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { clippedRange } from "./clippedRange.ts";
import { drawingOf } from "./drawing.ts";
import type { FigureCase, FigureOptions, FigureSpec, FigureTable } from "./figureSpec.ts";
import { originTitle } from "./jointRegionPanel.ts";
import { caseRows, legend } from "./legend.ts";
import { pageNote } from "./pageNote.ts";
import { pageLine } from "./pageShapes.ts";
import { type Box, joinDecor, linearAxis, type Panel } from "./panel.ts";
import { routeName } from "./routeNames.ts";
import { endsOf } from "./stationPoints.ts";
import { caseLine, stationTrace } from "./stationTrace.ts";

const namesMm = 30;
const topMm = 2.4;
const footMm = 11;
/** Height of a row: of one case, and more for each further one. */
const rowMm = { first: 5.6, more: 2.4 };

interface Routed {
  readonly of: FigureCase;
  readonly argued: ArguedDecay;
}

/** n and x0 with their intervals by every route, a row each, side by side (or below one another where it is narrow). */
export function routesFigure(cases: readonly FigureCase[], options: FigureOptions): FigureSpec {
  const routed = cases.flatMap((of): Routed[] => {
    const argued = arguedOf(of);
    return argued === null ? [] : [{ of, argued }];
  });
  const keys = rowKeys.filter((key) => routed.some(({ argued }) => rowOf(argued, key)));
  const height = keys.length * (rowMm.first + rowMm.more * Math.max(routed.length - 1, 0)) + topMm + footMm;
  const stacked = options.stacked || options.widthMm < 120;
  const { widthMm } = options;
  const half = (widthMm - namesMm - 2.2 - 4) / 2;
  const boxAt = (left: number, right: number, base: number): Box => ({
    left,
    right,
    bottom: base + footMm,
    top: base + height - topMm,
  });
  const boxes = stacked
    ? [boxAt(namesMm, widthMm - 2.2, height), boxAt(namesMm, widthMm - 2.2, 0)]
    : [boxAt(namesMm, namesMm + half, 0), boxAt(namesMm + half + 4, widthMm - 2.2, 0)];
  const panels = (["n", "x0"] as const).map((of, i) =>
    routePanel(routed, keys, of, boxes[i], "ab"[i], options),
  );
  return assembleFigure(
    {
      key: "routes",
      widthMm,
      heightMm: stacked ? 2 * height : height,
      panels,
      decor: joinDecor(
        legend(caseRows(routed.map(({ of }) => of)), panels[1], options),
        ...panels.map((panel, i) => ({
          shapes: rowRules(panel, keys.length, options),
          notes: i === 0 || stacked ? rowNames(panel, keys, options) : [],
        })),
      ),
      table: routesTable(routed),
    },
    options,
  );
}

/** The adopted numbers over those of each route. */
const rowKeys = ["adopted", ...routeKeys] as const;
type RowKey = (typeof rowKeys)[number];

function rowOf({ decay, argument }: ArguedDecay, key: RowKey): Pick<DecayRoute, "n" | "x0"> | undefined {
  return key === "adopted" ? decay : argument.routes.find((route) => route.key === key);
}

function routePanel(
  routed: readonly Routed[],
  keys: readonly RowKey[],
  of: "n" | "x0",
  box: Box,
  letter: string,
  options: FigureOptions,
): Panel {
  const unitOf = ({ argued }: Routed) => (of === "n" ? 1 : (argued.decay.law?.length ?? 1));
  const lines = routed.map((one, i) =>
    keys.flatMap((key, row) => {
      const found = rowOf(one.argued, key);
      if (found === undefined) return [];
      const within = (0.62 * (i + 0.5 - routed.length / 2)) / Math.max(routed.length, 1);
      return [{ y: keys.length - row - 0.5 - within, ...over(found[of], unitOf(one)) }];
    }),
  );
  const x = linearAxis(
    clippedRange(
      lines.flat().flatMap(({ value, low, high }) => [value, low, high]),
      routed.map((one) => ({
        adopted: one.argued.decay[of],
        given: one.argued.decay.given_window[of],
        unit: unitOf(one),
      })),
    ),
    of === "n"
      ? "<i>n</i>"
      : originTitle(
          routed.map((one) => one.of),
          options,
        ),
  );
  return {
    box,
    x,
    y: {
      ...linearAxis([0, Math.max(keys.length, 1)], ""),
      ticks: { major: [], text: [], minor: [] },
      labels: false,
    },
    traces: routed.flatMap((one, i) => routeTraces(one.of, lines[i], x.range, options)),
    letter: keys.length > 0 ? letter : "",
  };
}

interface Line {
  readonly y: number;
  readonly value: number | null;
  readonly low: number | null;
  readonly high: number | null;
  readonly open: readonly [boolean, boolean];
}

/** Value and ends in the unit of the axis; a side without an end, where the other has one, is open. */
function over(quantity: Quantity, unit: number): Omit<Line, "y"> {
  const { value, low, high } = endsOf(quantity);
  const some = low !== null || high !== null;
  const by = (end: number | null) => (end === null ? null : end / unit);
  return {
    value: by(value),
    low: by(low),
    high: by(high),
    open: [some && low === null, some && high === null],
  };
}

/** Bars first, markers over them: filled where there is an interval, open where the number was held. */
function routeTraces(
  { mark, name }: FigureCase,
  lines: readonly Line[],
  [least, most]: readonly [number, number],
  options: FigureOptions,
): Partial<Data>[] {
  const bars = lines.map(({ y, low, high, open }) => {
    const ends = [low ?? (open[0] ? least : null), high ?? (open[1] ? most : null)];
    return caseLine(ends, [y, y], mark, options, { weightPt: 0.8, dashed: false });
  });
  const points = lines.map(({ y, value, low, high }) => ({
    ...{ x: value, y, used: low !== null || high !== null, station: 0 },
    // the bars lie along the other axis: ends at the marker draw none and still tell that there is an interval
    low: low === null && high === null ? null : y,
    high: null,
  }));
  return [
    ...bars,
    { ...stationTrace(points, mark, name, options, 1.6), customdata: undefined } as Partial<Data>,
  ];
}

function rowRules({ box }: Panel, rows: number, options: FigureOptions): Partial<Shape>[] {
  const line = { color: options.tokens.rule, width: drawingOf(options).pt(0.5) };
  return Array.from({ length: Math.max(rows - 1, 0) }, (_, i) => {
    const y = box.bottom + ((i + 1) * (box.top - box.bottom)) / rows;
    return pageLine([box.left, y], [box.right, y], line);
  });
}

function rowNames({ box }: Panel, keys: readonly RowKey[], options: FigureOptions): Partial<Annotations>[] {
  const { numeral } = drawingOf(options);
  return keys.map((key, row) =>
    pageNote(
      key === "adopted"
        ? key
        : routeName(key, options.along).replaceAll(
            "<i>x</i><sub>0</sub>",
            `<i>${options.along}</i><sub>0</sub>`,
          ),
      box.left - 2,
      box.top - ((row + 0.5) * (box.top - box.bottom)) / keys.length,
      {
        xanchor: "right",
        yanchor: "middle",
        font: numeral,
      },
    ),
  );
}

function routesTable(routed: readonly Routed[]): FigureTable {
  return {
    heading: [
      "case",
      "route",
      "n",
      "n_low",
      "n_high",
      "x0",
      "x0_low",
      "x0_high",
      "note",
      "why_no_n",
      "why_no_x0",
    ],
    rows: routed.flatMap(({ of, argued: { decay, argument } }) =>
      [{ name: "adopted", n: decay.n, x0: decay.x0, note: null }, ...argument.routes].map(
        ({ name, n, x0, note }) => {
          const [exponent, origin] = [endsOf(n), endsOf(x0)];
          const numbers = [
            exponent.value,
            exponent.low,
            exponent.high,
            origin.value,
            origin.low,
            origin.high,
          ];
          return [of.name, name, ...numbers, note, whyOf(n), whyOf(x0)];
        },
      ),
    ),
  };
}

const whyOf = (quantity: Quantity) => (quantity.value === null ? quantity.why : null);
