import { labelOf } from "../core/catalogue.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { logRange } from "./axisRange.ts";
import { placeCells } from "./cells.ts";
import type { FigureOptions, FigureSpec, PickedCurve } from "./figureSpec.ts";
import { legend } from "./legend.ts";
import { lineWeight } from "./lineWeight.ts";
import { levelLine } from "./pageShapes.ts";
import { type Box, joinDecor, linearAxis, logAxis, type Panel } from "./panel.ts";
import { pickedRows } from "./spectrumFigure.ts";
import { caseLine } from "./stationTrace.ts";
import { symbolHtml } from "./symbolHtml.ts";

/** Slope of an inertial range. */
const inertial = -5 / 3;
const slopes = [-5, 1] as const;
const ratios = [0, 2.5] as const;

interface Line {
  readonly picked: PickedCurve;
  readonly x: readonly number[];
  readonly y: readonly (number | null)[];
}

/** Local slope of the picked spectra, and E22 against what it would be in isotropic flow, scale by scale. */
export function localSpectrumFigure(picked: readonly PickedCurve[], options: FigureOptions): FigureSpec {
  const there = picked.filter(({ station }) => station.curves?.local !== undefined);
  const scaled = there.every(({ station }) => station.L11.value !== null);
  const across = labelOf(scaled ? "k1_L11" : "k1");
  const lines = [slopeLines, ratioLines].map((of) => there.flatMap((one) => of(one, scaled)));
  const cells = placeCells(2, 54, options);
  const slope = panelOf(lines[0], "local_slope", slopes, cells.boxes[0], "a");
  const ratio = panelOf(lines[1], "E22_over_isotropic", ratios, cells.boxes[1], "b");
  function panelOf(
    of: readonly Line[],
    key: string,
    range: readonly [number, number],
    box: Box,
    letter: string,
  ): Panel {
    return {
      box,
      x: logAxis(logRange(lines.flat().flatMap(({ x }) => [...x])), symbolHtml(across.symbol)),
      y: linearAxis(range, symbolHtml(labelOf(key).symbol)),
      traces: of.map(({ picked: one, x, y }) =>
        caseLine(x, y, one.of.mark, options, { weightPt: lineWeight(one, there), dashed: true }),
      ),
      letter,
    };
  }
  return assembleFigure(
    {
      key: "spectrum-local",
      widthMm: cells.widthMm,
      heightMm: cells.heightMm,
      panels: [slope, ratio],
      decor: joinDecor(
        { shapes: [...levelLine(slope, inertial, options), ...levelLine(ratio, 1, options, false)] },
        legend(pickedRows(there, options), slope, options),
      ),
      table: {
        heading: ["case", "x", across.key, "quantity", "value"],
        rows: lines.flatMap((each, i) =>
          each.flatMap(({ picked: one, x, y }) =>
            x.map((value, j) => [
              one.of.name,
              one.station.x,
              value,
              i === 0 ? "local_slope" : "E22_over_isotropic",
              y[j],
            ]),
          ),
        ),
      },
    },
    options,
  );
}

function slopeLines(picked: PickedCurve, scaled: boolean): Line[] {
  const local = picked.station.curves?.local;
  if (!local) return [];
  return [{ picked, x: placesOf(picked, local.k1, scaled), y: [...local.slope].map(inside(slopes)) }];
}

function ratioLines(picked: PickedCurve, scaled: boolean): Line[] {
  const local = picked.station.curves?.local;
  if (!local?.E22) return [];
  const { E22, E22_isotropic } = local;
  const y = [...E22].map((value, i) => (E22_isotropic[i] > 0 ? value / E22_isotropic[i] : null));
  return [{ picked, x: placesOf(picked, local.k1, scaled), y: y.map(inside(ratios)) }];
}

function placesOf({ station }: PickedCurve, k1: Float64Array, scaled: boolean): number[] {
  const unit = scaled ? (station.L11.value ?? 1) : 1;
  return [...k1].map((k) => k * unit);
}

/** What leaves the frame leaves a gap. */
const inside =
  ([low, high]: readonly [number, number]) =>
  (value: number | null) =>
    value !== null && Number.isFinite(value) && value >= low && value <= high ? value : null;
