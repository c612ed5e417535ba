import type { Data } from "plotly.js";
import { type ComparedQuantity, type ComparedRatio, comparedQuantities } from "../core/comparison.ts";
import { withReference } from "../core/symbolRuns.ts";
import { logRange } from "./axisRange.ts";
import { caseMark } from "./caseMark.ts";
import { type ComparedPair, inLengths } from "./comparedPair.ts";
import { drawingOf } from "./drawing.ts";
import type { FigureOptions } from "./figureSpec.ts";
import { shortened } from "./legend.ts";
import { type Box, logAxis, type Panel } from "./panel.ts";
import { endsOf } from "./stationPoints.ts";
import { referenceSymbol } from "./streamwise.ts";
import { escapeText, symbolHtml } from "./symbolHtml.ts";
import { linearTicks } from "./ticks.ts";

/** Height of a row where each quantity has one, and of one of several; between the rows of two quantities. */
const [rowMm, thinRowMm, betweenMm] = [6.4, 3.7, 2.4];
const widest: readonly [number, number] = [0.4, 2.5];

/** One ratio with its place among the rows, mm below the top of the panel. */
export interface ComparedRow {
  readonly key: ComparedQuantity;
  readonly of: ComparedRatio;
  readonly below: number;
  /** Mark of the second case; null with a single pair, where ink will do. */
  readonly mark: number | null;
  /** Whether the name of the quantity stands before it. */
  readonly named: boolean;
}

/** Quantities from top to bottom, under each the pairs in their order. */
export function placeRows(pairs: readonly ComparedPair[]): { rows: ComparedRow[]; deep: number } {
  const single = pairs.length === 1;
  const group = single ? rowMm : pairs.length * thinRowMm + betweenMm;
  const rows = comparedQuantities.flatMap((key, i) =>
    pairs.map(
      ({ comparison, second }, j): ComparedRow => ({
        key,
        of: comparison.quantities[key],
        below: i * group + (single ? rowMm / 2 : betweenMm / 2 + (j + 0.5) * thinRowMm),
        mark: single ? null : second.mark,
        named: j === 0,
      }),
    ),
  );
  return { rows, deep: comparedQuantities.length * group };
}

/** The panel of all rows, on an axis of ratios. */
export function rowsPanel(
  pairs: readonly ComparedPair[],
  rows: readonly ComparedRow[],
  box: Box,
  options: FigureOptions,
): Panel {
  const deep = box.top - box.bottom;
  const ends = rows.flatMap(({ of: { ratio, curve } }) => {
    const { value, low, high } = endsOf(ratio);
    return [value, low, high, ...curve.ratio];
  });
  const tolerance = 1 + 1.3 * pairs[0].comparison.tolerance;
  const range = logRange(
    [...ends, 1 / tolerance, tolerance].map((end) => (end === null ? null : clamp(end))),
    0.05,
  );
  return {
    box,
    x: logAxis(range, ratioTitle(pairs), { ticks: linearTicks(...range) }),
    y: {
      log: false,
      range: [0, deep],
      ticks: { major: [], text: [], minor: [] },
      title: "",
      labels: false,
      mirrored: true,
    },
    traces: rows.flatMap((row) => rowTraces(row, deep, options)),
    letter: "",
  };
}

/** "simulation/screen, at equal (x − x0)/M". */
function ratioTitle(pairs: readonly ComparedPair[]): string {
  const [{ comparison, first, second }] = pairs;
  const cases = pairs.flatMap((pair) => [pair.first, pair.second]);
  const over = inLengths(cases)
    ? `/${symbolHtml(withReference([{ text: "ℓ" }], referenceSymbol(cases)))}`
    : "";
  const at = {
    x: "<i>x</i>",
    x0: over === "" ? "<i>x</i> − <i>x</i><sub>0</sub>" : `(<i>x</i> − <i>x</i><sub>0</sub>)${over}`,
    Tu: "<i>Tu</i>",
  }[comparison.align];
  const above = pairs.length === 1 ? escapeText(shortened(second.name)) : "each";
  return `${above}/${escapeText(shortened(first.name))}, at equal ${at}`;
}

const clamp = (ratio: number) => Math.min(Math.max(ratio, widest[0]), widest[1]);

/** Single positions as small ticks, the interval as a bar, the mean as a marker: open where undecided. */
function rowTraces(
  { of: { ratio, curve, verdict }, below, mark }: ComparedRow,
  deep: number,
  options: FigureOptions,
): Partial<Data>[] {
  const { value, low, high } = endsOf(ratio);
  if (value === null) return [];
  const y = deep - below;
  const { mm, pt } = drawingOf(options);
  const { ink, ink3, paper } = options.tokens;
  const sign = mark === null ? { colour: ink, marker: "circle" as const } : caseMark(options.tokens, mark);
  const base = { type: "scatter", hoverinfo: "skip" } as const;
  const bar = low !== null && high !== null ? [low, high] : [];
  const single = thinned(curve.ratio);
  return [
    {
      ...base,
      mode: "markers",
      x: single,
      y: single.map(() => y),
      marker: {
        symbol: "line-ns-open",
        size: mm(mark === null ? 1.3 : 0.9),
        color: ink3,
        line: { width: pt(0.5), color: ink3 },
      },
    },
    { ...base, mode: "lines", x: bar, y: bar.map(() => y), line: { color: sign.colour, width: pt(1.2) } },
    {
      ...base,
      mode: "markers",
      x: [value],
      y: [y],
      marker: {
        symbol: sign.marker,
        size: mm(1.8),
        opacity: 1,
        color: verdict === "undecided" || verdict === null ? paper : sign.colour,
        line: { color: sign.colour, width: pt(0.8) },
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
