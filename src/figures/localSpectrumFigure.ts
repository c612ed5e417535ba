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

/** Local slope of the picked spectra, and E22 and E33 against what they would be in isotropic flow, scale by scale. */
export function localSpectrumFigure(picked: readonly PickedCurve[], options: FigureOptions): FigureSpec {
  const there = picked.filter(({ station }) => station.curves?.local !== undefined);
  const scaled = there.every(({ station }) => station.L11.value !== null);
  const across = labelOf(scaled ? "k1_L11" : "k1");
  const all = [
    { key: "local_slope", range: slopes, level: inertial, lines: linesOf(slopeLines) },
    { key: "E22_over_isotropic", range: ratios, level: 1, lines: linesOf(ratioLines("E22")) },
    { key: "E33_over_isotropic", range: ratios, level: 1, lines: linesOf(ratioLines("E33")) },
  ];
  const shown = all.filter(({ lines }, i) => i === 0 || lines.length > 0);
  const cells = placeCells(shown.length, 54, options);
  const panels = shown.map(({ key, range, lines }, i) =>
    panelOf(lines, key, range, cells.boxes[i], shown.length > 1 ? "abc"[i] : ""),
  );
  function linesOf(of: (picked: PickedCurve, scaled: boolean) => Line[]): Line[] {
    return there.flatMap((one) => of(one, scaled));
  }
  function panelOf(
    of: readonly Line[],
    key: string,
    range: readonly [number, number],
    box: Box,
    letter: string,
  ): Panel {
    return {
      box,
      x: logAxis(
        logRange(all.flatMap(({ lines }) => lines.flatMap(({ x }) => [...x]))),
        symbolHtml(across.symbol),
      ),
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
      panels,
      decor: joinDecor(
        ...shown.map(({ level }, i) => ({ shapes: levelLine(panels[i], level, options, i === 0) })),
        legend(pickedRows(there, options), panels[0], options),
      ),
      table: {
        heading: ["case", "x", across.key, "quantity", "value"],
        rows: shown.flatMap(({ key, lines }) =>
          lines.flatMap(({ picked: one, x, y }) =>
            x.map((value, j) => [one.of.name, one.station.x, value, key, y[j]]),
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

const ratioLines =
  (of: "E22" | "E33") =>
  (picked: PickedCurve, scaled: boolean): Line[] => {
    const local = picked.station.curves?.local;
    const measured = local?.[of];
    if (!local || !measured) return [];
    const y = [...measured].map((value, i) =>
      local.E22_isotropic[i] > 0 ? value / local.E22_isotropic[i] : null,
    );
    return [{ picked, x: placesOf(picked, local.k1, scaled), y: y.map(inside(ratios)) }];
  };

function placesOf({ station }: PickedCurve, k1: Float64Array, scaled: boolean): number[] {
  const unit = scaled ? (station.L11.value ?? 1) : 1;
  return [...k1].map((k) => k * unit);
}

/** What leaves the frame leaves a gap. */
const inside =
  ([low, high]: readonly [number, number]) =>
  (value: number | null) =>
    value !== null && Number.isFinite(value) && value >= low && value <= high ? value : null;
