import type { Annotations, Shape } from "plotly.js";
import { labelOf } from "../core/catalogue.ts";
import { comparedQuantities } from "../core/comparison.ts";
import { assembleFigure } from "./assembleFigure.ts";
import type { ComparedPair } from "./comparedPair.ts";
import { type ComparedRow, placeRows, rowsPanel } from "./comparedRows.ts";
import { drawingOf, symbolFamily } from "./drawing.ts";
import type { FigureOptions, FigureSpec, FigureTable } from "./figureSpec.ts";
import { formatNumber, formatRange } from "./formatNumber.ts";
import { decimalsOf } from "./formatQuantity.ts";
import { caseRows, legendBelow } from "./legend.ts";
import { pageNote } from "./pageNote.ts";
import { pageLine, shadedBand, uprightLine } from "./pageShapes.ts";
import { joinDecor, type Panel } from "./panel.ts";
import { endsOf } from "./stationPoints.ts";
import { symbolHtml } from "./symbolHtml.ts";

/** Texts keep clear of the figure's edge. */
const edge = 0.4;
/** From this width on the numbers stand beside the bars. */
const withNumbersFrom = 120;

/** The ratio of every compared quantity, other case to the one held against, with its 95 % interval on the tolerance band. */
export function comparisonFigure(pairs: readonly ComparedPair[], options: FigureOptions): FigureSpec {
  const wide = options.widthMm >= withNumbersFrom && !options.stacked;
  const { widthMm } = options;
  const { rows, deep } = placeRows(pairs);
  const heightMm = deep + (wide ? 18 : 14);
  const top = heightMm - (wide ? 6 : 2);
  const box = { left: wide ? 47 : 13, right: widthMm - (wide ? 54 : 24), bottom: top - deep, top };
  const panel = rowsPanel(pairs, rows, box, options);
  const { tolerance } = pairs[0].comparison;
  const band = [1 / (1 + tolerance), 1 + tolerance] as const;
  const others = pairs.map(({ second }) => second);
  return assembleFigure(
    {
      key: "comparison",
      widthMm,
      heightMm,
      panels: [panel],
      decor: joinDecor(
        { shapes: [shadedBand(panel, band, options, "x"), ...uprightLine(panel, 1, options, false)] },
        { shapes: wide ? rowRules(rows, panel, widthMm, options) : [] },
        { notes: rows.flatMap((row) => rowNotes(row, panel, widthMm, wide, options)) },
        { notes: wide ? headNotes(panel, widthMm, options) : [] },
        pairs.length > 1 ? legendBelow(caseRows(others), options) : {},
      ),
      table: comparisonTable(pairs),
    },
    options,
  );
}

/** Hairlines between quantities, beside the panel. */
function rowRules(
  rows: readonly ComparedRow[],
  { box }: Panel,
  widthMm: number,
  options: FigureOptions,
): Partial<Shape>[] {
  const line = { color: options.tokens.rule, width: drawingOf(options).pt(0.5) };
  const group = (box.top - box.bottom) / comparedQuantities.length;
  return rows
    .filter(({ named }) => named)
    .slice(1)
    .flatMap((_, i) => {
      const y = box.top - (i + 1) * group;
      return [pageLine([0, y], [box.left, y], line), pageLine([box.right, y], [widthMm, y], line)];
    });
}

function rowNotes(
  { key, below, of, named }: ComparedRow,
  { box }: Panel,
  widthMm: number,
  wide: boolean,
  options: FigureOptions,
): Partial<Annotations>[] {
  const y = box.top - below;
  const { numeral, symbol: face } = drawingOf(options);
  const grey = { ...numeral, color: options.tokens.ink2 };
  const label = labelOf(key);
  const at = (text: string, x: number, xanchor: "left" | "right", font = numeral) =>
    pageNote(text, x, y, { xanchor, yanchor: "middle", font });
  const names = named
    ? [
        ...(wide ? [at(label.name, edge, "left")] : []),
        at(symbolHtml(label.symbol), box.left - 2.4, "right", { ...face, family: symbolFamily }),
      ]
    : [];
  const { value, low, high } = endsOf(of.ratio);
  if (value === null)
    return [
      ...names,
      wide ? at("not compared", widthMm - edge, "right", grey) : at("–", box.right + 2, "left"),
    ];
  const verdict = of.verdict === "different" ? "<b>different</b>" : (of.verdict ?? "–");
  if (!wide) return [...names, at(verdict, box.right + 2, "left")];
  const decimals = Math.min(decimalsOf({ value, low, high }, 3), 3);
  const largest = endsOf(of.largest).value;
  return [
    ...names,
    at(formatNumber(value, decimals), box.right + 10, "right"),
    ...(low !== null && high !== null
      ? [at(formatRange(low, high, decimals), box.right + 11.6, "left", grey)]
      : []),
    ...(largest === null ? [] : [at(formatNumber(largest, 2), widthMm - 19, "right", grey)]),
    at(verdict, widthMm - edge, "right"),
  ];
}

function headNotes({ box }: Panel, widthMm: number, options: FigureOptions): Partial<Annotations>[] {
  const { numeral } = drawingOf(options);
  const font = { ...numeral, color: options.tokens.ink2 };
  const at = (text: string, x: number, xanchor: "left" | "right") =>
    pageNote(text, x, box.top + 2.8, { xanchor, yanchor: "middle", font });
  return [
    at("quantity", edge, "left"),
    at("ratio", box.right + 10, "right"),
    at("95\u202f%", box.right + 11.6, "left"),
    at("largest", widthMm - 19, "right"),
    at("verdict", widthMm - edge, "right"),
  ];
}

function comparisonTable(pairs: readonly ComparedPair[]): FigureTable {
  return {
    heading: ["first", "second", "quantity", "ratio", "low", "high", "largest", "verdict", "equivalent_from"],
    rows: pairs.flatMap(({ comparison: { cases, quantities } }) =>
      comparedQuantities.map((key) => {
        const { ratio, largest, verdict, equivalent_from } = quantities[key];
        const { value, low, high } = endsOf(ratio);
        return [...cases, key, value, low, high, endsOf(largest).value, verdict, equivalent_from];
      }),
    ),
  };
}
