import type { Data } from "plotly.js";
import { labelOf } from "../core/catalogue.ts";
import type { ComparedQuantity } from "../core/comparison.ts";
import { withReference } from "../core/symbolRuns.ts";
import { displayOf, unitOf } from "../core/unitText.ts";
import { linearRange, logRange } from "./axisRange.ts";
import { caseMark } from "./caseMark.ts";
import { type ComparedPair, distanceFrom, inLengths, type LaidCase, laidCases } from "./comparedPair.ts";
import type { FigureOptions } from "./figureSpec.ts";
import { levelLine, shadedBand, uprightLine } from "./pageShapes.ts";
import { type Box, type Decor, linearAxis, logAxis, type Panel, type PanelAxis } from "./panel.ts";
import { endsOf } from "./stationPoints.ts";
import { caseLine, type PlottedPoint, stationTrace } from "./stationTrace.ts";
import { referenceSymbol, titleWithUnit } from "./streamwise.ts";
import { symbolHtml } from "./symbolHtml.ts";
import { logTicks } from "./ticks.ts";
import { faded } from "./tokens.ts";
import { isUsed } from "./windowOf.ts";

/** A point of a case on the common coordinate, with both ends that its origin's interval gives it. */
interface LaidPoint extends PlottedPoint {
  readonly from: number | null;
  readonly to: number | null;
}

/**
 * One quantity of all cases on what they are laid over one another by, each with the interval of its origin as a band
 * along the axis; and below it the ratio of every other case to the first one, on the tolerance band.
 */
export function overlayPanels(
  pairs: readonly ComparedPair[],
  quantity: ComparedQuantity,
  [upper, lower]: readonly [Box, Box],
  options: FigureOptions,
): { panels: readonly [Panel, Panel]; decor: Partial<Decor> } {
  const { align } = pairs[0].comparison;
  const laid = laidCases(pairs);
  const { factor, unit } = displayOf(labelOf(quantity), options.units);
  const points = laid.map((one) => laidPoints(one, laid, align, quantity, factor));
  const ratios = pairs.map(({ comparison }) => comparison.quantities[quantity].curve);
  const across = acrossAxis(
    laid,
    align,
    [
      ...points
        .flat()
        .filter(({ used }) => used || align === "x")
        .map(({ x }) => x),
      ...ratios.flatMap(({ xi }) => xi),
    ],
    options,
  );
  const title = titleWithUnit(symbolHtml(labelOf(quantity).symbol), unit);
  const ends = points.flat().filter(({ y }) => y !== null);
  const up = ends.flatMap(({ y, low, high }) => [y, low, high]);
  const panel: Panel = {
    box: upper,
    x: { ...across, title: "", labels: false },
    y: isStraight(quantity) ? linearAxis(linearRange(up), title) : logAxis(logRange(up), title),
    traces: [
      ...laid.flatMap(({ of }, i) => originBand(points[i], of.mark, options)),
      ...laid.map(({ of }, i) => stationTrace(points[i], of.mark, of.name, options)),
    ],
    letter: "a",
  };
  const below = ratioPanelOf(pairs, quantity, across, lower, options);
  return { panels: [panel, below.panel], decor: below.decor };
}

/** A ratio of rms velocities stays near one; all else falls or grows as a power. */
const isStraight = (quantity: ComparedQuantity) => quantity === "isotropy_uv";

function laidPoints(
  { of, x0, ends }: LaidCase,
  all: readonly LaidCase[],
  align: "x0" | "x" | "Tu",
  quantity: ComparedQuantity,
  factor: number,
): LaidPoint[] {
  const length = inLengths(all.map((one) => one.of)) ? (of.length ?? 1) : 1;
  const at = (origin: number | null, x: number) => {
    const distance = origin === null ? null : distanceFrom(origin, x, of, length);
    return distance !== null && distance > 0 ? distance : null;
  };
  return of.stations.map((station) => {
    const { value, low, high } = endsOf(station[quantity]);
    const times = (end: number | null) => (end === null ? null : end * factor);
    const Tu = endsOf(station.Tu);
    const place = align === "x" ? station.x : align === "Tu" ? Tu.value : at(x0, station.x);
    const [from, to] =
      align !== "x0" || ends === null ? [null, null] : [at(ends[1], station.x), at(ends[0], station.x)];
    const used = isUsed(of, station.x);
    return {
      x: place,
      y: place === null ? null : times(value),
      low: times(low),
      high: times(high),
      used,
      station: station.x,
      from,
      to,
    };
  });
}

function acrossAxis(
  laid: readonly LaidCase[],
  align: "x0" | "x" | "Tu",
  places: readonly (number | null)[],
  options: FigureOptions,
): PanelAxis {
  const cases = laid.map(({ of }) => of);
  const time = options.along === "t";
  if (align === "x") {
    const label = labelOf(time ? "t" : "x");
    return linearAxis(
      linearRange(places),
      titleWithUnit(symbolHtml(label.symbol), unitOf(label.dimension, options.units)),
    );
  }
  const [low, high] = logRange(places);
  if (align === "Tu") {
    // downstream is to the right: Tu falls along the axis
    const ticks = logTicks(100 * low, 100 * high);
    const shares = (values: readonly number[]) => values.map((value) => value / 100);
    const marks = { major: shares(ticks.major), text: ticks.text, minor: shares(ticks.minor) };
    return {
      ...logAxis([low, high], titleWithUnit(symbolHtml(labelOf("Tu").symbol), "%")),
      range: [high, low],
      ticks: marks,
    };
  }
  const divided = inLengths(cases);
  const label = labelOf(
    (time ? (key: string) => key.replaceAll("x", "t") : String)(divided ? "(x-x0)/ell" : "x-x0"),
  );
  const title = symbolHtml(withReference(label.symbol, referenceSymbol(cases)));
  return logAxis([low, high], titleWithUnit(title, divided ? "" : unitOf(label.dimension, options.units)));
}

/** Between neighbouring stations, each drawn out along the axis by the interval of the origin. */
function originBand(points: readonly LaidPoint[], mark: number, options: FigureOptions): Partial<Data>[] {
  const whole = points.filter(({ used, y, from, to }) => used && y !== null && from !== null && to !== null);
  if (whole.length < 2) return [];
  const pieces = whole.slice(1).map((next, i) => [whole[i], next] as const);
  const fill = faded(caseMark(options.tokens, mark).colour, 0.18);
  const x = pieces.flatMap(([a, b]) => [a.from, a.to, b.to, b.from, a.from, null]);
  const y = pieces.flatMap(([a, b]) => [a.y, a.y, b.y, b.y, a.y, null]);
  const outline = caseLine(x, y, mark, options, { weightPt: 0, dashed: false });
  return [{ ...outline, fill: "toself", fillcolor: fill, line: { width: 0 } } as Partial<Data>];
}

function ratioPanelOf(
  pairs: readonly ComparedPair[],
  quantity: ComparedQuantity,
  x: PanelAxis,
  box: Box,
  options: FigureOptions,
): { panel: Panel; decor: Partial<Decor> } {
  const { tolerance } = pairs[0].comparison;
  const band = [1 / (1 + tolerance), 1 + tolerance] as const;
  const curves = pairs.map(({ comparison, second }) => ({
    mark: second.mark,
    ...comparison.quantities[quantity].curve,
  }));
  const range = logRange([
    ...curves.flatMap(({ ratio, low, high }) => [...ratio, ...low, ...high].map(withinReason)),
    ...band.map((end) => end ** 1.3),
  ]);
  const panel: Panel = {
    box,
    x,
    y: logAxis(range, "ratio"),
    traces: [
      ...curves.flatMap((curve) => ratioBand(curve, options)),
      ...curves.map(({ xi, ratio, mark }) =>
        caseLine(xi, ratio, mark, options, { weightPt: 0.95, dashed: true }),
      ),
    ],
    letter: "b",
  };
  const from = pairs.length === 1 ? pairs[0].comparison.equivalent_beyond.from : null;
  return {
    panel,
    decor: {
      shapes: [
        shadedBand(panel, band, options),
        ...levelLine(panel, 1, options, false),
        ...(from === null ? [] : uprightLine(panel, from, options)),
      ],
    },
  };
}

/** An interval that knows next to nothing does not set the scale. */
function withinReason(ratio: number | null): number | null {
  return ratio === null ? null : Math.min(Math.max(ratio, 0.4), 2.5);
}

function ratioBand(
  {
    xi,
    low,
    high,
    mark,
  }: {
    xi: readonly number[];
    low: readonly (number | null)[];
    high: readonly (number | null)[];
    mark: number;
  },
  options: FigureOptions,
): Partial<Data>[] {
  const kept = xi.map((_, i) => i).filter((i) => low[i] !== null && high[i] !== null);
  if (kept.length < 2) return [];
  const back = [...kept].reverse();
  const outline = caseLine(
    [...kept, ...back].map((i) => xi[i]),
    [...kept.map((i) => low[i]), ...back.map((i) => high[i])],
    mark,
    options,
    { weightPt: 0, dashed: false },
  );
  const fill = faded(caseMark(options.tokens, mark).colour, 0.14);
  return [{ ...outline, fill: "toself", fillcolor: fill, line: { width: 0 } } as Partial<Data>];
}
