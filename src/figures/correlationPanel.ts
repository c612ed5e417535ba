import type { Data } from "plotly.js";
import { labelOf } from "../core/catalogue.ts";
import { displayOf } from "../core/unitText.ts";
import { drawingOf } from "./drawing.ts";
import type { FigureOptions, PickedCurve } from "./figureSpec.ts";
import { lineWeight } from "./lineWeight.ts";
import { openRing } from "./openRing.ts";
import { pageNote } from "./pageNote.ts";
import { levelLine } from "./pageShapes.ts";
import { type Box, type Decor, linearAxis, type Panel, placeY } from "./panel.ts";
import { caseLine } from "./stationTrace.ts";
import { titleWithUnit } from "./streamwise.ts";
import { symbolHtml } from "./symbolHtml.ts";

/** Separations shown, in integral scales. */
const reach = 6;

interface Correlation {
  readonly picked: PickedCurve;
  readonly x: number[];
  readonly y: number[];
  /** First zero crossing on the same axis. */
  readonly zero: number | null;
}

/** Autocorrelation of u of the picked stations; ringed: the first zero, where the integral ends. */
export function correlationPanel(
  picked: readonly PickedCurve[],
  box: Box,
  letter: string,
  options: FigureOptions,
): { panel: Panel; decor: Partial<Decor> } {
  const scaled = picked.every(({ station }) => station.T_int.value !== null);
  const lag = labelOf("lag");
  const { factor, unit } = displayOf({ ...lag, milli: true }, options.units);
  const curves = picked.flatMap((one) => correlationOf(one, scaled, factor));
  const end = scaled ? reach : Math.max(...curves.flatMap(({ x }) => x[x.length - 1] ?? 1), 1e-12);
  const title = scaled ? symbolHtml(labelOf("r/L11").symbol) : titleWithUnit(symbolHtml(lag.symbol), unit);
  const least = Math.min(...curves.flatMap(({ x, y }) => y.filter((_, i) => x[i] <= end)), 0);
  const panel: Panel = {
    box,
    x: linearAxis([0, end], title),
    y: linearAxis([Math.min(-0.15, least - 0.05), 1], symbolHtml(labelOf("rho").symbol)),
    traces: [
      ...curves.map(({ picked: one, x, y }) =>
        caseLine(x, y, one.of.mark, options, { weightPt: lineWeight(one, picked), dashed: true }),
      ),
      ...curves.flatMap((curve) => zeroRing(curve, end, options)),
    ],
    letter,
  };
  return { panel, decor: levels(panel, options) };
}

function correlationOf(picked: PickedCurve, scaled: boolean, factor: number): Correlation[] {
  const { curves, T_int, facts } = picked.station;
  if (curves === null) return [];
  const unit = scaled && T_int.value !== null ? 1 / T_int.value : factor;
  const x = Array.from(curves.lag, (tau) => tau * unit);
  const beyond = x.findIndex((value) => scaled && value > reach);
  const count = beyond < 0 ? x.length : beyond + 1;
  const zero = facts.tauStar === null ? null : facts.tauStar * unit;
  return [{ picked, x: x.slice(0, count), y: Array.from(curves.rho_u.subarray(0, count)), zero }];
}

function zeroRing({ picked, zero }: Correlation, end: number, options: FigureOptions): Partial<Data>[] {
  return zero === null || zero > end ? [] : [openRing({ x: zero, y: 0 }, picked.of.mark, options)];
}

function levels(panel: Panel, options: FigureOptions): Partial<Decor> {
  const { numeral } = drawingOf(options);
  const level = 1 / Math.E;
  return {
    shapes: [...levelLine(panel, 0, options, false), ...levelLine(panel, level, options)],
    notes: [
      pageNote("1/e", panel.box.right - 1.6, placeY(panel, level) + 1.9, {
        xanchor: "right",
        yanchor: "middle",
        font: { ...numeral, color: options.tokens.ink2 },
      }),
    ],
  };
}
