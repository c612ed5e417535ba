import type { Annotations, Data, Shape } from "plotly.js";
import { labelOf } from "../core/catalogue.ts";
import {
  type ComparedQuantity,
  type ComparedRatio,
  type Comparison,
  comparedQuantities,
} from "../core/comparison.ts";
import { withReference } from "../core/symbolRuns.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { logRange } from "./axisRange.ts";
import { drawingOf, symbolFamily } from "./drawing.ts";
import type { FigureOptions, FigureSpec, FigureTable } from "./figureSpec.ts";
import { formatNumber, formatRange } from "./formatNumber.ts";
import { decimalsOf } from "./formatQuantity.ts";
import { shortened } from "./legend.ts";
import { pageNote } from "./pageNote.ts";
import { pageLine, shadedBand, uprightLine } from "./pageShapes.ts";
import { joinDecor, logAxis, type Panel } from "./panel.ts";
import { endsOf } from "./stationPoints.ts";
import { escapeText, symbolHtml } from "./symbolHtml.ts";
import { linearTicks } from "./ticks.ts";

const rowMm = 6.4;
/** Texts keep clear of the figure's edge. */
const edge = 0.4;
/** From this width on the numbers stand beside the bars. */
const withNumbersFrom = 120;
const widest: readonly [number, number] = [0.4, 2.5];

/** The ratio of every compared quantity, second case to first, with its 95 % interval on the tolerance band. */
export function comparisonFigure(comparison: Comparison, symbol: string, options: FigureOptions): FigureSpec {
  const wide = options.widthMm >= withNumbersFrom && !options.stacked;
  const { widthMm } = options;
  const heightMm = comparedQuantities.length * rowMm + (wide ? 18 : 14);
  const panel = ratioRows(comparison, widthMm, heightMm, wide, symbol, options);
  const rows = comparedQuantities.map((key, i) => {
    const y = panel.box.top - (i + 0.5) * rowMm;
    return { key, y, of: comparison.quantities[key] };
  });
  const band = [1 / (1 + comparison.tolerance), 1 + comparison.tolerance] as const;
  return assembleFigure(
    {
      key: "comparison",
      widthMm,
      heightMm,
      panels: [panel],
      decor: joinDecor(
        { shapes: [shadedBand(panel, band, options, "x"), ...uprightLine(panel, 1, options, false)] },
        { shapes: wide ? rowRules(panel, widthMm, options) : [] },
        { notes: rows.flatMap((row) => rowNotes(row, panel, widthMm, wide, symbol, options)) },
        { notes: wide ? headNotes(panel, widthMm, options) : [] },
      ),
      table: comparisonTable(comparison),
    },
    options,
  );
}

function ratioRows(
  comparison: Comparison,
  widthMm: number,
  heightMm: number,
  wide: boolean,
  symbol: string,
  options: FigureOptions,
): Panel {
  const top = heightMm - (wide ? 6 : 2);
  const box = {
    left: wide ? 47 : 13,
    right: wide ? widthMm - 54 : widthMm - 24,
    bottom: top - comparedQuantities.length * rowMm,
    top,
  };
  const ratios = comparedQuantities.map((key) => comparison.quantities[key]);
  const ends = ratios.flatMap(({ ratio, curve }) => {
    const { value, low, high } = endsOf(ratio);
    return [value, low, high, ...curve.ratio];
  });
  const tolerance = 1 + 1.3 * comparison.tolerance;
  const range = logRange(
    [...ends, 1 / tolerance, tolerance].map((end) => (end === null ? null : clamp(end))),
    0.05,
  );
  const [first, second] = comparison.cases.map((name) => escapeText(shortened(name)));
  const at =
    comparison.align === "x"
      ? "<i>x</i>"
      : `(<i>x</i> − <i>x</i><sub>0</sub>)/${symbolHtml(withReference([{ text: "ℓ" }], symbol))}`;
  const title = `${second}/${first}${comparison.align === "Tu" ? ", at equal <i>Tu</i>" : `, at equal ${at}`}`;
  const rows: readonly [number, number] = [0, comparedQuantities.length];
  return {
    box,
    x: logAxis(range, title, { ticks: linearTicks(...range) }),
    y: {
      log: false,
      range: rows,
      ticks: { major: [], text: [], minor: [] },
      title: "",
      labels: false,
      mirrored: true,
    },
    traces: comparedQuantities.flatMap((key, i) =>
      rowTraces(comparison.quantities[key], comparedQuantities.length - i - 0.5, options),
    ),
    letter: "",
  };
}

const clamp = (ratio: number) => Math.min(Math.max(ratio, widest[0]), widest[1]);

/** Single positions as small ticks, the interval as a bar, the mean as a dot: open where undecided. */
function rowTraces(
  { ratio, curve, verdict }: ComparedRatio,
  y: number,
  options: FigureOptions,
): Partial<Data>[] {
  const { value, low, high } = endsOf(ratio);
  if (value === null) return [];
  const { mm, pt } = drawingOf(options);
  const { ink, ink3, paper } = options.tokens;
  const base = { type: "scatter", hoverinfo: "skip" } as const;
  const bar = low !== null && high !== null ? [low, high] : [];
  return [
    {
      ...base,
      mode: "markers",
      x: thinned(curve.ratio),
      y: thinned(curve.ratio).map(() => y),
      marker: { symbol: "line-ns-open", size: mm(1.3), color: ink3, line: { width: pt(0.5), color: ink3 } },
    },
    { ...base, mode: "lines", x: bar, y: bar.map(() => y), line: { color: ink, width: pt(1.2) } },
    {
      ...base,
      mode: "markers",
      x: [value],
      y: [y],
      marker: {
        symbol: "circle",
        size: mm(1.8),
        opacity: 1,
        color: verdict === "undecided" || verdict === null ? paper : ink,
        line: { color: ink, width: pt(0.8) },
      },
    },
  ] as Partial<Data>[];
}

/** At most nine positions, evenly spread, so that the ticks can be told apart. */
function thinned(values: readonly number[]): number[] {
  const step = Math.max((values.length - 1) / 8, 1);
  const count = values.length === 0 ? 0 : Math.floor((values.length - 1) / step + 1e-9) + 1;
  return Array.from({ length: count }, (_, i) => values[Math.round(i * step)]);
}

function rowRules({ box }: Panel, widthMm: number, options: FigureOptions): Partial<Shape>[] {
  const line = { color: options.tokens.rule, width: drawingOf(options).pt(0.5) };
  return comparedQuantities.slice(1).flatMap((_, i) => {
    const y = box.top - (i + 1) * rowMm;
    return [pageLine([0, y], [box.left, y], line), pageLine([box.right, y], [widthMm, y], line)];
  });
}

interface Row {
  readonly key: ComparedQuantity;
  readonly y: number;
  readonly of: ComparedRatio;
}

function rowNotes(
  { key, y, of }: Row,
  { box }: Panel,
  widthMm: number,
  wide: boolean,
  symbol: string,
  options: FigureOptions,
): Partial<Annotations>[] {
  const { numeral, symbol: face } = drawingOf(options);
  const grey = { ...numeral, color: options.tokens.ink2 };
  const label = labelOf(key);
  const over = label.dimension === "L" ? `/${symbolHtml(withReference([{ text: "ℓ" }], symbol))}` : "";
  const at = (text: string, x: number, xanchor: "left" | "right", font = numeral) =>
    pageNote(text, x, y, { xanchor, yanchor: "middle", font });
  const names = [
    ...(wide ? [at(label.name, edge, "left")] : []),
    at(symbolHtml(label.symbol) + over, box.left - 2.4, "right", { ...face, family: symbolFamily }),
  ];
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

function comparisonTable({ quantities }: Comparison): FigureTable {
  return {
    heading: ["quantity", "ratio", "low", "high", "largest", "verdict"],
    rows: comparedQuantities.map((key) => {
      const { ratio, largest, verdict } = quantities[key];
      const { value, low, high } = endsOf(ratio);
      return [key, value, low, high, endsOf(largest).value, verdict];
    }),
  };
}
