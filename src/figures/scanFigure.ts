import type { Data, Shape } from "plotly.js";
import type { ScannedWindow } from "../core/decayArgument.ts";
import { type ArguedDecay, arguedOf } from "./arguedOf.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { linearRange } from "./axisRange.ts";
import { caseMark } from "./caseMark.ts";
import { placeCells } from "./cells.ts";
import { clippedRange } from "./clippedRange.ts";
import { drawingOf } from "./drawing.ts";
import type { FigureAxis, FigureCase, FigureOptions, FigureSpec, FigureTable } from "./figureSpec.ts";
import { originTitle } from "./jointRegionPanel.ts";
import { caseRows, legend } from "./legend.ts";
import { isInside, pageLine } from "./pageShapes.ts";
import { type Box, type Decor, joinDecor, linearAxis, type Panel, placeX } from "./panel.ts";
import { endsOf } from "./stationPoints.ts";
import { caseLine, stationTrace } from "./stationTrace.ts";
import { commonAxis, streamwise, streamwiseTitle } from "./streamwise.ts";
import { faded } from "./tokens.ts";

const rowMm = 58;
const tickMm = 2.2;

/** One case with the fit that was argued: places are counted from that fit's origin. */
interface Scanned {
  readonly of: FigureCase;
  readonly argued: ArguedDecay;
  readonly length: number;
}

/** n and x0 with their intervals against the first station used, and below against the last. */
export function scanFigure(cases: readonly FigureCase[], options: FigureOptions): FigureSpec {
  const scanned = cases.flatMap((of): Scanned[] => {
    const argued = arguedOf(of);
    return argued === null
      ? []
      : [{ of: { ...of, decay: argued.decay }, argued, length: argued.decay.law?.length ?? 1 }];
  });
  const axis = commonAxis(
    scanned.map(({ of }) => of),
    options.axis,
  );
  const lower = placeCells(2, rowMm, options);
  const boxes = [
    ...lower.boxes.map((box) => ({
      ...box,
      top: box.top + lower.heightMm,
      bottom: box.bottom + lower.heightMm,
    })),
    ...lower.boxes,
  ];
  const plans = [
    { of: "n", side: "first" },
    { of: "x0", side: "first" },
    { of: "n", side: "last" },
    { of: "x0", side: "last" },
  ] as const;
  const drawn = plans.map((plan, i) => scanPanel(scanned, plan, axis, boxes[i], "abcd"[i], options));
  return assembleFigure(
    {
      key: "window-scan",
      widthMm: lower.widthMm,
      heightMm: 2 * lower.heightMm,
      panels: drawn.map(({ panel }) => panel),
      decor: joinDecor(
        legend(caseRows(scanned.map(({ of }) => of)), drawn[0].panel, options),
        ...drawn.map(({ decor }) => decor),
      ),
      table: scanTable(scanned),
    },
    options,
  );
}

interface Plan {
  readonly of: "n" | "x0";
  readonly side: "first" | "last";
}

function scanPanel(
  scanned: readonly Scanned[],
  plan: Plan,
  axis: FigureAxis,
  box: Box,
  letter: string,
  options: FigureOptions,
): { panel: Panel; decor: Partial<Decor> } {
  const cases = scanned.map(({ of }) => of);
  const points = scanned.map((one) => pointsOf(one, plan, axis));
  const places = scanned.flatMap(({ of }) => of.decay?.points.map(({ x }) => streamwise(of, x, axis)) ?? []);
  const along = streamwiseTitle(cases, axis, options);
  const range = clippedRange(
    points.flat().flatMap(({ y, low, high }) => [y, low, high]),
    scanned.map(({ argued: { decay }, length }) => ({
      adopted: decay[plan.of],
      given: decay.given_window[plan.of],
      unit: plan.of === "n" ? 1 : length,
    })),
  );
  const panel: Panel = {
    box,
    x: linearAxis(linearRange(places, { margin: 0.04 }), `${plan.side} station used, ${along}`),
    y: linearAxis(range, plan.of === "n" ? "<i>n</i>" : originTitle(cases, options)),
    traces: [
      ...scanned.flatMap((one) => unionTrace(one, plan, axis, options)),
      ...scanned.map(({ of }, i) => stationTrace(points[i], of.mark, of.name, options)),
    ],
    letter,
  };
  return {
    panel,
    decor: { shapes: scanned.flatMap((one) => criterionTicks(one, plan, axis, panel, options)) },
  };
}

/** One point for each window; the adopted one alone counts as used. */
function pointsOf({ of, argued, length }: Scanned, plan: Plan, axis: FigureAxis) {
  const unit = plan.of === "n" ? 1 : length;
  return argued.argument.scan[plan.side].map((window) => {
    const { value, low, high } = endsOf(window[plan.of]);
    const over = (end: number | null) => (end === null ? null : end / unit);
    return {
      x: streamwise(of, window.x, axis),
      y: over(value),
      low: over(low),
      high: over(high),
      used: window.adopted,
      station: window.x,
    };
  });
}

/** The adopted interval as a block over the starts whose intervals it unites. */
function unionTrace(
  { of, argued, length }: Scanned,
  plan: Plan,
  axis: FigureAxis,
  options: FigureOptions,
): Partial<Data>[] {
  const united = plan.side === "first" ? argued.argument.scan.first.filter(({ inUnion }) => inUnion) : [];
  const { low, high } = endsOf(argued.decay[plan.of]);
  if (united.length < 2 || low === null || high === null) return [];
  const unit = plan.of === "n" ? 1 : length;
  const [from, to] = [united[0].x, united[united.length - 1].x].map((x) => streamwise(of, x, axis));
  const outline = caseLine(
    [from, to, to, from, from],
    [low, low, high, high, low].map((end) => end / unit),
    of.mark,
    options,
    { weightPt: 0.45, dashed: false },
  );
  const fillcolor = faded(caseMark(options.tokens, of.mark).colour, 0.12);
  return [{ ...outline, fill: "toself", fillcolor } as Partial<Data>];
}

/** Short lines up from the frame where a condition of physics is first (or last) held, no interval against it. */
function criterionTicks(
  { of, argued }: Scanned,
  { side }: Plan,
  axis: FigureAxis,
  panel: Panel,
  options: FigureOptions,
): Partial<Shape>[] {
  const { scan } = argued.argument;
  const held = (side === "first" ? scan.start : scan.end).flatMap(
    ({ notContradicted }) => notContradicted.value ?? [],
  );
  const line = { color: caseMark(options.tokens, of.mark).colour, width: drawingOf(options).pt(1) };
  return [...new Set(held)].flatMap((x) => {
    const place = streamwise(of, x, axis);
    if (place === null || !isInside(panel.x.range, place)) return [];
    const at = placeX(panel, place);
    return [pageLine([at, panel.box.bottom], [at, panel.box.bottom + tickMm], line)];
  });
}

function scanTable(scanned: readonly Scanned[]): FigureTable {
  const row = (name: string, varied: string, { x, stations, n, x0, p, adopted }: ScannedWindow) => {
    const [exponent, origin] = [endsOf(n), endsOf(x0)];
    const numbers = [exponent.value, exponent.low, exponent.high, origin.value, origin.low, origin.high];
    return [name, varied, x, stations, ...numbers, p, adopted ? 1 : 0];
  };
  return {
    heading: [
      ...["case", "varied", "x", "stations", "n", "n_low", "n_high", "x0", "x0_low", "x0_high", "p"],
      "adopted",
    ],
    rows: scanned.flatMap(({ of, argued: { argument } }) => [
      ...argument.scan.first.map((window) => row(of.name, "first", window)),
      ...argument.scan.last.map((window) => row(of.name, "last", window)),
    ]),
  };
}
