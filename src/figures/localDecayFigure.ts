import type { Data } from "plotly.js";
import type { LocalDecay } from "../core/decayArgument.ts";
import type { DecayResult, PowerLaw } from "../core/decayResult.ts";
import type { Quantity } from "../core/quantity.ts";
import { arguedOf } from "./arguedOf.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { logRange } from "./axisRange.ts";
import { caseMark } from "./caseMark.ts";
import { placeCells } from "./cells.ts";
import { clippedRange } from "./clippedRange.ts";
import type { FigureCase, FigureOptions, FigureSpec, FigureTable } from "./figureSpec.ts";
import { caseRows, legend } from "./legend.ts";
import { levelLine } from "./pageShapes.ts";
import { type Box, joinDecor, linearAxis, logAxis, type Panel, type PanelAxis } from "./panel.ts";
import { endsOf } from "./stationPoints.ts";
import { caseLine, type PlottedPoint, stationTrace } from "./stationTrace.ts";
import { streamwise, streamwiseTitle } from "./streamwise.ts";
import { faded } from "./tokens.ts";
import { isUsed } from "./windowOf.ts";

interface Local {
  readonly of: FigureCase;
  readonly decay: DecayResult;
  readonly law: PowerLaw;
  readonly local: LocalDecay;
}

const axis = "(x-x0)/ell";

/** The local exponent along the stream, and the energy with its law divided out: level where one law holds. */
export function localDecayFigure(cases: readonly FigureCase[], options: FigureOptions): FigureSpec {
  const shown = cases.flatMap((of): Local[] => {
    const argued = arguedOf(of);
    if (argued === null) return [];
    const { decay, argument } = argued;
    if (decay.law === null || argument.local === null) return [];
    return [{ of: { ...of, decay }, decay, law: decay.law, local: argument.local }];
  });
  const of = shown.map((one) => one.of);
  const cells = placeCells(2, 60, options);
  const places = shown.flatMap((one) => one.local.x.map((x) => streamwise(one.of, x, axis)));
  const x = logAxis(logRange(places), streamwiseTitle(of, axis, options));
  const exponent = exponentPanel(shown, x, cells.boxes[0], options);
  const level = compensatedPanel(shown, x, cells.boxes[1], options);
  return assembleFigure(
    {
      key: "local-decay",
      widthMm: cells.widthMm,
      heightMm: cells.heightMm,
      panels: [exponent, level],
      decor: joinDecor(legend(caseRows(of), exponent, options), { shapes: levelLine(level, 1, options) }),
      table: localTable(shown),
    },
    options,
  );
}

function pointsOf({ of, local }: Local, values: readonly Quantity[], unit = 1): PlottedPoint[] {
  return values.map((quantity, i) => {
    const { value, low, high } = endsOf(quantity);
    const over = (end: number | null) => (end === null ? null : end / unit);
    return {
      ...{ x: streamwise(of, local.x[i], axis), y: over(value), low: over(low), high: over(high) },
      ...{ used: isUsed(of, local.x[i]), station: local.x[i] },
    };
  });
}

function exponentPanel(shown: readonly Local[], x: PanelAxis, box: Box, options: FigureOptions): Panel {
  const points = shown.map((one) => pointsOf(one, one.local.exponent));
  const range = clippedRange(
    points.flat().flatMap(({ y, low, high }) => [y, low, high]),
    shown.map(({ decay: { n } }) => ({ adopted: n, given: n, unit: 1 })),
  );
  return {
    box,
    x,
    y: linearAxis(range, "local exponent"),
    traces: [
      ...shown.flatMap((one) => exponentBand(one, options)),
      ...shown.map(({ of }, i) => stationTrace(points[i], of.mark, of.name, options)),
    ],
    letter: "a",
  };
}

/** The adopted exponent over its window: line, and band of its interval. */
function exponentBand({ of, decay, law }: Local, options: FigureOptions): Partial<Data>[] {
  const [from, to] = decay.window.map((x) => streamwise(of, x, axis));
  const { low, high } = endsOf(decay.n);
  const line = caseLine([from, to], [law.n, law.n], of.mark, options, { weightPt: 0.95, dashed: true });
  if (low === null || high === null) return [line];
  const fill = { fill: "toself", fillcolor: faded(caseMark(options.tokens, of.mark).colour, 0.14) };
  const outline = caseLine([from, to, to, from], [low, low, high, high], of.mark, options, {
    weightPt: 0,
    dashed: false,
  });
  return [{ ...outline, mode: "none", ...fill } as Partial<Data>, line];
}

function compensatedPanel(shown: readonly Local[], x: PanelAxis, box: Box, options: FigureOptions): Panel {
  const points = shown.map((one) => pointsOf(one, one.local.compensated, one.law.A));
  const inside = points.flat().filter(({ used }) => used);
  const reach = Math.max(
    ...inside.flatMap(({ low, high, y }) => [low, high, y].map((end) => Math.abs((end ?? 1) - 1))),
    0.01,
  );
  const all = points.flat().flatMap(({ y }) => y ?? []);
  const [least, most] = [Math.min(...all, 1 - reach), Math.max(...all, 1 + reach)];
  const range: [number, number] = [
    Math.max(least - 0.2 * reach, 1 - 5 * reach),
    Math.min(most + 0.2 * reach, 1 + 5 * reach),
  ];
  return {
    box,
    x,
    y: linearAxis(range, "compensated energy"),
    traces: shown.map(({ of }, i) => stationTrace(points[i], of.mark, of.name, options)),
    letter: "b",
  };
}

function localTable(shown: readonly Local[]): FigureTable {
  return {
    heading: [
      ...["case", "x", axis, "local_exponent", "local_exponent_low", "local_exponent_high"],
      ...["compensated", "compensated_low", "compensated_high", "in_window"],
    ],
    rows: shown.flatMap(({ of, local }) =>
      local.x.map((x, i) => {
        const [exponent, level] = [endsOf(local.exponent[i]), endsOf(local.compensated[i])];
        return [
          ...[of.name, x, streamwise(of, x, axis), exponent.value, exponent.low, exponent.high],
          ...[level.value, level.low, level.high, isUsed(of, x) ? 1 : 0],
        ];
      }),
    ),
  };
}
