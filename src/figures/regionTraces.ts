import type { Data } from "plotly.js";
import { caseMark } from "./caseMark.ts";
import { dashOf, drawingOf } from "./drawing.ts";
import type { FigureCase, FigureOptions } from "./figureSpec.ts";
import type { Region, Regions } from "./jointRegions.ts";
import { caseLine, loneMarker } from "./stationTrace.ts";
import { faded } from "./tokens.ts";

/** The fitted pair, x0 in the unit of the axis. */
export interface Best {
  readonly n: number;
  readonly x0: number;
}

export function bestFit({ decay }: FigureCase): Best | null {
  return decay?.law ? { n: decay.law.n, x0: decay.law.x0 / decay.law.length } : null;
}

/** One case in the plane of n and x0. */
export interface FittedRegion {
  readonly of: FigureCase;
  readonly best: Best;
  readonly regions: Regions | null;
}

/** Value and ends of an adopted interval, as far as there are ends. */
type Ends = (decay: FigureCase["decay"], key: "n" | "x0") => readonly number[];

/** Regions and best fit of one case. */
export function regionTraces({ of, best, regions }: FittedRegion, options: FigureOptions): Partial<Data>[] {
  return [
    ...(regions === null ? [] : outlineTraces(regions, of.mark, options)),
    loneMarker({ x: best.n, y: best.x0 }, of.mark, options, 1.8),
  ];
}

/** The same with the refits under and the ellipses of the covariance over them. */
export function detailTraces(one: FittedRegion, options: FigureOptions): Partial<Data>[] {
  const { of, regions } = one;
  if (regions === null) return regionTraces(one, options);
  return [
    cloudTrace(regions, of.mark, options),
    ...regionTraces(one, options),
    ...regions.ellipses.map((ellipse) => ellipseTrace(ellipse, options)),
  ];
}

/** Filled in the case's colour; empty and dotted in grey while a newer fit waits for its own regions. */
function outlineTraces(
  { inner, outer, stale }: Regions,
  mark: number,
  options: FigureOptions,
): Partial<Data>[] {
  const sign = caseMark(options.tokens, mark);
  const { pt } = drawingOf(options);
  return [
    { region: outer, share: 0.14 },
    { region: inner, share: 0.22 },
  ].map(({ region, share }) => ({
    ...caseLine(region.n, region.x0, mark, options, { weightPt: 0.7, dashed: true }),
    ...(stale ? {} : { fill: "toself", fillcolor: faded(sign.colour, share) }),
    line: stale
      ? { color: options.tokens.ink3, width: pt(0.7), dash: dashOf([1.6, 1.8], options.scale) }
      : { color: sign.colour, width: pt(0.7), dash: dashOf(sign.dash, options.scale) },
  })) as Partial<Data>[];
}

function ellipseTrace({ n, x0 }: Region, options: FigureOptions): Partial<Data> {
  const { pt } = drawingOf(options);
  const line = { color: options.tokens.ink2, width: pt(0.4), dash: "solid" };
  return { ...caseLine(n, x0, 0, options, { weightPt: 0.4, dashed: false }), line } as Partial<Data>;
}

function cloudTrace({ cloud }: Regions, mark: number, options: FigureOptions): Partial<Data> {
  return {
    type: "scatter",
    mode: "markers",
    x: [...cloud.n],
    y: [...cloud.x0],
    hoverinfo: "skip",
    marker: {
      symbol: "circle",
      size: drawingOf(options).mm(0.6),
      color: caseMark(options.tokens, mark).colour,
      opacity: 0.6,
    },
  } as Partial<Data>;
}

/** The adopted intervals of n and x0 as thin bars: they may reach further than the region of this one window. */
export function intervalBars(
  { of, best }: FittedRegion,
  ends: Ends,
  options: FigureOptions,
): Partial<Data>[] {
  const bars = { weightPt: 0.6, dashed: false };
  const [n, x0] = [ends(of.decay, "n").slice(1), ends(of.decay, "x0").slice(1)];
  const level = (values: readonly number[], at: number) => values.map(() => at);
  return [
    caseLine(n, level(n, best.x0), of.mark, options, bars),
    caseLine(level(x0, best.n), x0, of.mark, options, bars),
  ];
}
