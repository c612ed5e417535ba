import type { Data } from "plotly.js";
import { labelOf } from "../core/catalogue.ts";
import { lawPlace } from "../core/decay/lawDistance.ts";
import { linearRange, logRange, present } from "./axisRange.ts";
import { caseMark } from "./caseMark.ts";
import { type DecayEntry, decayEntries } from "./decayPoints.ts";
import { drawingOf } from "./drawing.ts";
import type { FigureAxis, FigureCase, FigureOptions } from "./figureSpec.ts";
import { commonQuantity } from "./intensityScale.ts";
import { lawAt, lawPositions } from "./lawCurve.ts";
import { type Box, linearAxis, logAxis, type Panel, type PanelAxis } from "./panel.ts";
import { caseLine, stationTrace } from "./stationTrace.ts";
import { streamwise, streamwiseTitle } from "./streamwise.ts";
import { symbolHtml } from "./symbolHtml.ts";
import { linearTicks } from "./ticks.ts";
import { faded } from "./tokens.ts";

const stripMm = 17.3;
const betweenMm = 2;
const lawSamples = 60;

/** The decay panel and, where a law was fitted, the strip of residuals under it. */
export function decayPanels(
  cases: readonly FigureCase[],
  axis: FigureAxis,
  box: Box,
  letter: string,
  options: FigureOptions,
): Panel[] {
  const hasLaw = cases.some(({ decay }) => decay?.law);
  const entries = cases.map(decayEntries);
  const places = cases.flatMap((of, i) => entries[i].map(({ x }) => streamwise(of, x, axis)));
  const title = streamwiseTitle(cases, axis, options);
  const x = placeAxis(places, title);
  const y = logAxis(
    logRange(
      entries.flat().map(({ q }) => q),
      0.1,
    ),
    quantityTitle(cases),
    {
      mirrored: !["k", "uu"].includes(commonQuantity(cases)),
    },
  );
  const upper = hasLaw ? { ...box, bottom: box.bottom + stripMm + betweenMm } : box;
  const traces = [
    ...cases.flatMap((of) => lawTraces(of, axis, x.range, options)),
    ...cases.map((of, i) => pointTrace(of, entries[i], axis, "q", options)),
  ];
  if (!hasLaw) return [{ box, x, y, traces, letter }];
  return [
    { box: upper, x: { ...x, title: "", labels: false }, y, traces, letter },
    residualStrip(cases, entries, axis, { ...box, top: box.bottom + stripMm }, x, options),
  ];
}

/** Logarithmic where all positions are downstream of zero. */
function placeAxis(places: readonly (number | null)[], title: string): PanelAxis {
  const all = present(places);
  return all.every((place) => place > 0)
    ? logAxis(logRange(all), title)
    : linearAxis(linearRange(all), title);
}

function quantityTitle(cases: readonly FigureCase[]): string {
  const kind = commonQuantity(cases);
  return symbolHtml(labelOf(kind === "k" ? "k/U2" : kind === "uu" ? "uu/U2" : "q").symbol);
}

function pointTrace(
  of: FigureCase,
  entries: readonly DecayEntry[],
  axis: FigureAxis,
  what: "q" | "residual",
  options: FigureOptions,
): Partial<Data> {
  const points = entries.map((entry) => ({
    x: streamwise(of, entry.x, axis),
    y: entry[what],
    low: what === "q" ? entry.low : entry.residualLow,
    high: what === "q" ? entry.high : entry.residualHigh,
    used: entry.used,
    station: entry.x,
  }));
  return stationTrace(points, of.mark, of.name, options, what === "q" ? 1.5 : 1.3);
}

/** Band and thick law inside the window; the law thin over the whole panel. */
function lawTraces(
  of: FigureCase,
  axis: FigureAxis,
  range: readonly [number, number],
  options: FigureOptions,
): Partial<Data>[] {
  const law = of.decay?.law;
  if (!law || !of.decay) return [];
  const back = (place: number) =>
    axis === "x" ? place : axis === "x/ell" ? place * (of.length ?? 1) : lawPlace(law, place * law.length);
  const nearest = lawPlace(law, law.length * 1e-3);
  const curve = (from: number, to: number) => {
    const at = lawPositions(law, Math.max(from, nearest), to, lawSamples);
    return { at: at.map((x) => streamwise(of, x, axis)), law: at.map((x) => lawAt(law, x)) };
  };
  const whole = curve(back(range[0]), back(range[1]));
  const inner = curve(...windowEnds(of));
  const values = (part: typeof whole) => part.law.map((point) => point?.value ?? null);
  return [
    bandTrace(
      inner.at,
      inner.law.map((p) => p?.low ?? null),
      inner.law.map((p) => p?.high ?? null),
      of.mark,
      options,
    ),
    caseLine(whole.at, values(whole), of.mark, options, { weightPt: 0.45, dashed: false }),
    caseLine(inner.at, values(inner), of.mark, options, { weightPt: 0.95, dashed: true }),
  ];
}

/** First and last station that were fitted. */
function windowEnds({ decay }: FigureCase): [number, number] {
  const used = decay?.points.filter((point) => point.used).map(({ x }) => x) ?? [];
  return used.length > 0 ? [Math.min(...used), Math.max(...used)] : [0, 0];
}

function bandTrace(
  x: readonly (number | null)[],
  low: readonly (number | null)[],
  high: readonly (number | null)[],
  mark: number,
  options: FigureOptions,
): Partial<Data> {
  return {
    type: "scatter",
    mode: "none",
    x: [...x, ...[...x].reverse()],
    y: [...high, ...[...low].reverse()],
    fill: "toself",
    fillcolor: faded(caseMark(options.tokens, mark).colour, 0.22),
    hoverinfo: "skip",
  } as Partial<Data>;
}

/** Departures from the law in per cent, with the band of the law around zero. */
function residualStrip(
  cases: readonly FigureCase[],
  entries: readonly (readonly DecayEntry[])[],
  axis: FigureAxis,
  box: Box,
  x: PanelAxis,
  options: FigureOptions,
): Panel {
  const size = residualSize(entries.flat());
  const y = linearAxis([-size, size], "residual (%)", { ticks: linearTicks(-size, size, 3) });
  const bands = cases.flatMap((of) => {
    const law = of.decay?.law;
    if (!law) return [];
    const at = lawPositions(law, ...windowEnds(of), lawSamples);
    const relative = at.map((position) => {
      const point = lawAt(law, position);
      return point === null ? null : 100 * (point.high / point.value - 1);
    });
    const down = relative.map((value) => (value === null ? null : 100 * (1 / (1 + value / 100) - 1)));
    return [
      bandTrace(
        at.map((position) => streamwise(of, position, axis)),
        down,
        relative,
        of.mark,
        options,
      ),
    ];
  });
  const points = cases.flatMap((of, i) => [
    pointTrace(of, entries[i].filter(isWithin(size)), axis, "residual", options),
    beyondTrace(of, entries[i], axis, size, options),
  ]);
  return { box, x, y, traces: [...bands, ...points], letter: "" };
}

const isWithin = (size: number) => (entry: DecayEntry) => Math.abs(entry.residual ?? 0) <= size;

/** Open arrowheads at the edge of the strip for stations that lie beyond it. */
function beyondTrace(
  of: FigureCase,
  entries: readonly DecayEntry[],
  axis: FigureAxis,
  size: number,
  options: FigureOptions,
): Partial<Data> {
  const beyond = entries.filter((entry) => !isWithin(size)(entry));
  const { mm, pt } = drawingOf(options);
  const up = beyond.map(({ residual }) => (residual ?? 0) > 0);
  return {
    type: "scatter",
    mode: "markers",
    x: beyond.map(({ x }) => streamwise(of, x, axis)),
    y: up.map((above) => (above ? 0.86 : -0.86) * size),
    customdata: beyond.map(({ x }) => x),
    hoverinfo: "none",
    marker: {
      symbol: up.map((above) => (above ? "arrow-up-open" : "arrow-down-open")),
      size: mm(1.3),
      color: caseMark(options.tokens, of.mark).colour,
      line: { color: caseMark(options.tokens, of.mark).colour, width: pt(0.6) },
    },
  } as Partial<Data>;
}

/** Holds every bar of the window; points outside may widen it to three times that. */
function residualSize(entries: readonly DecayEntry[]): number {
  const reach = (of: readonly DecayEntry[]) =>
    Math.max(
      ...present(
        of.flatMap(({ residual, residualLow, residualHigh }) => [residual, residualLow, residualHigh]),
      ).map(Math.abs),
      0,
    );
  const inner = Math.max(reach(entries.filter(({ used }) => used)), 0.5);
  const outer = reach(entries);
  return 1.2 * Math.max(inner, Math.min(outer, 3 * inner));
}
