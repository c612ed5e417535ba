import type { Data } from "plotly.js";
import { lawDistance } from "../core/decay/lawDistance.ts";
import type { DecayResult, PowerLaw } from "../core/decayResult.ts";
import type { Quantity } from "../core/quantity.ts";
import { arguedOf } from "./arguedOf.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { linearRange } from "./axisRange.ts";
import { placeCells } from "./cells.ts";
import { decayEntries } from "./decayPoints.ts";
import type { FigureAxis, FigureCase, FigureOptions, FigureSpec, FigureTable } from "./figureSpec.ts";
import { caseRows, legend } from "./legend.ts";
import { levelLine } from "./pageShapes.ts";
import { joinDecor, linearAxis, type Panel } from "./panel.ts";
import { endsOf } from "./stationPoints.ts";
import { caseLine, loneMarker, type PlottedPoint, stationTrace } from "./stationTrace.ts";
import { commonAxis, streamwise, streamwiseTitle } from "./streamwise.ts";

interface Straight {
  readonly of: FigureCase;
  readonly decay: DecayResult;
  readonly law: PowerLaw;
  /** Origin of the straight line alone, n held. */
  readonly zero: Quantity | null;
}

const lineSamples = 24;

/**
 * (q/A)^(-1/n) against x: with n held a straight line wherever the law holds, whose zero is the origin. Near the origin it
 * shows what a logarithmic axis hides.
 */
export function straightLineFigure(cases: readonly FigureCase[], options: FigureOptions): FigureSpec {
  const shown = cases.flatMap((of): Straight[] => {
    const argued = arguedOf(of);
    if (argued === null || argued.decay.law === null) return [];
    const { decay, argument } = argued;
    const zero = argument.routes.find(({ key }) => key === "straight-line")?.x0 ?? null;
    return [{ of: { ...of, decay }, decay, law: argued.decay.law, zero }];
  });
  const axis = commonAxis(
    shown.map(({ of }) => of),
    options.axis === "(x-x0)/ell" ? "x/ell" : options.axis,
  );
  const cells = placeCells(1, 66, options);
  const panel = linePanel(shown, axis, cells.boxes[0], options);
  return assembleFigure(
    {
      key: "straight-line",
      widthMm: cells.widthMm,
      heightMm: cells.heightMm,
      panels: [panel],
      decor: joinDecor(legend(caseRows(shown.map(({ of }) => of)), panel, options), {
        shapes: levelLine(panel, 0, options, false),
      }),
      table: lineTable(shown),
    },
    options,
  );
}

/** A station's energy to the power that makes the law a straight line of slope one over the reference length. */
const straightened = ({ law }: Straight, q: number | null) =>
  q === null ? null : (q / law.A) ** (-1 / law.n);

function pointsOf(one: Straight, axis: FigureAxis): PlottedPoint[] {
  return decayEntries(one.of).map(({ x, q, low, high, used }) => ({
    ...{ x: streamwise(one.of, x, axis), y: straightened(one, q), used, station: x },
    // a larger energy lies nearer the origin
    ...{ low: straightened(one, high), high: straightened(one, low) },
  }));
}

function linePanel(
  shown: readonly Straight[],
  axis: FigureAxis,
  box: Panel["box"],
  options: FigureOptions,
): Panel {
  const points = shown.map((one) => pointsOf(one, axis));
  const places = points.flat().map(({ x }) => x);
  const zeros = shown.flatMap((one) => zeroOf(one, axis).ends);
  return {
    box,
    x: linearAxis(
      linearRange([...places, ...zeros], { margin: 0.05 }),
      streamwiseTitle(
        shown.map(({ of }) => of),
        axis,
        options,
      ),
    ),
    y: linearAxis(
      linearRange(
        points.flat().map(({ y }) => y),
        { include: [0], margin: 0.06 },
      ),
      "(<i>q</i>/<i>A</i>)<sup>−1/<i>n</i></sup>",
    ),
    traces: shown.flatMap((one, i) => caseTraces(one, points[i], axis, options)),
    letter: "",
  };
}

/** The zero of the straight line and the ends of its interval, on the axis. */
function zeroOf({ of, law, zero }: Straight, axis: FigureAxis): { at: number; ends: number[] } {
  const { value, low, high } = zero === null ? endsOf({ value: null, why: "" }) : endsOf(zero);
  const placed = (x: number | null) => (x === null ? null : streamwise(of, x, axis));
  const at = placed(value ?? law.x0) ?? 0;
  return { at, ends: [placed(low) ?? at, at, placed(high) ?? at] };
}

function caseTraces(
  one: Straight,
  points: readonly PlottedPoint[],
  axis: FigureAxis,
  options: FigureOptions,
): Partial<Data>[] {
  const { of, decay, law } = one;
  const line = (from: number, to: number, weightPt: number, dashed: boolean) => {
    const xs = Array.from({ length: lineSamples }, (_, i) => from + ((to - from) * i) / (lineSamples - 1));
    return caseLine(
      xs.map((x) => streamwise(of, x, axis)),
      xs.map((x) => lawDistance(law, x) / law.length),
      of.mark,
      options,
      { weightPt, dashed },
    );
  };
  const last = Math.max(...decay.points.map(({ x }) => x));
  const zero = zeroOf(one, axis);
  return [
    line(law.x0, Math.max(last, law.x0), 0.45, false),
    line(decay.window[0], decay.window[1], 0.95, true),
    stationTrace(points, of.mark, of.name, options),
    caseLine(
      zero.ends,
      zero.ends.map(() => 0),
      of.mark,
      options,
      { weightPt: 1.6, dashed: false },
    ),
    loneMarker({ x: zero.at, y: 0 }, of.mark, options, 1.3),
  ];
}

function lineTable(shown: readonly Straight[]): FigureTable {
  return {
    heading: ["case", "x", "straightened", "straightened_low", "straightened_high", "in_window"],
    rows: shown.flatMap((one) =>
      pointsOf(one, "x").map(({ station, y, low, high, used }) => [
        ...[one.of.name, station, y, low, high, used ? 1 : 0],
      ]),
    ),
  };
}
