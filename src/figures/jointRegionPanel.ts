import type { Data } from "plotly.js";
import { labelOf } from "../core/catalogue.ts";
import { withReference } from "../core/symbolRuns.ts";
import { unitOf } from "../core/unitText.ts";
import { linearRange, present } from "./axisRange.ts";
import { caseMark } from "./caseMark.ts";
import { dashOf, drawingOf } from "./drawing.ts";
import type { FigureCase, FigureOptions } from "./figureSpec.ts";
import { jointRegion, type Region } from "./jointRegion.ts";
import { fewCases, shortened } from "./legend.ts";
import { pageNote } from "./pageNote.ts";
import { isInside, uprightLine } from "./pageShapes.ts";
import { type Box, type Decor, linearAxis, type Panel, placeX, placeY } from "./panel.ts";
import { caseLine, loneMarker } from "./stationTrace.ts";
import { isDivided, referenceSymbol, titleWithUnit } from "./streamwise.ts";
import { escapeText, symbolHtml } from "./symbolHtml.ts";
import { linearTicks } from "./ticks.ts";
import { faded } from "./tokens.ts";

/** Exponents that theories name; drawn where they fall inside the panel. */
const named = [
  { n: 1, text: "1" },
  { n: 6 / 5, text: "6/5" },
  { n: 10 / 7, text: "10/7" },
  { n: 5 / 2, text: "5/2" },
];

/** Joint 68 % and 95 % regions of n and x0/ℓ, one case each, with the best fits. */
export function jointRegionPanel(
  cases: readonly FigureCase[],
  box: Box,
  letter: string,
  options: FigureOptions,
): { panel: Panel; decor: Partial<Decor> } {
  const fitted = cases.filter(({ decay }) => decay?.law);
  const regions = fitted.map(({ decay }) => ({
    inner: decay === null ? null : jointRegion(decay, 0.68),
    outer: decay === null ? null : jointRegion(decay, 0.95),
  }));
  const x = linearAxis(
    exponentRange([...reach(regions, "n"), ...fitted.flatMap(({ decay }) => ends(decay, "n"))]),
    "<i>n</i>",
  );
  const yRange = linearRange([...reach(regions, "x0"), ...fitted.flatMap(({ decay }) => ends(decay, "x0"))], {
    margin: 0.12,
  });
  const y = linearAxis(yRange, originTitle(cases, options), { ticks: linearTicks(...yRange, 6) });
  const traces = fitted.flatMap((of, i) => caseTraces(of, regions[i], options));
  const panel: Panel = { box, x, y, traces, letter };
  const outlines = regions.map(({ outer }, i) => outer ?? bestFit(fitted[i]));
  return {
    panel,
    decor: {
      shapes: named.flatMap(({ n }) => uprightLine(panel, n, options)),
      notes: [...namedNotes(panel, options), ...caseNotes(fitted, outlines, panel, options)],
    },
  };
}

type Regions = { inner: Region | null; outer: Region | null };

/** Holds the regions and, where they are near, the exponents that theories name. */
function exponentRange(values: readonly number[]): [number, number] {
  const [low, high] = linearRange(values, { margin: 0.12 });
  const near = named.map(({ n }) => n).filter((n) => n > low - 0.15 && n < high + 0.15);
  return linearRange([low, high], { include: near, margin: 0.07 });
}

const reach = (regions: readonly Regions[], key: keyof Region) =>
  regions.flatMap(({ outer }) => outer?.[key] ?? []);

function ends(decay: FigureCase["decay"], key: "n" | "x0"): number[] {
  if (!decay?.law) return [];
  const { value, ...interval } = decay[key];
  if (value === null) return [];
  const unit = key === "n" ? 1 : decay.law.length;
  const [low, high] = "low" in interval ? [interval.low, interval.high] : [null, null];
  return present([value, low, high]).map((end) => end / unit);
}

function bestFit({ decay }: FigureCase): Region {
  return decay?.law ? { n: [decay.law.n], x0: [decay.law.x0 / decay.law.length] } : { n: [], x0: [] };
}

function originTitle(cases: readonly FigureCase[], { units, along }: FigureOptions): string {
  const label = labelOf(along === "t" ? "t0" : "x0");
  const divided = isDivided(cases);
  const over = divided ? `/${symbolHtml(withReference([{ text: "ℓ" }], referenceSymbol(cases)))}` : "";
  return titleWithUnit(symbolHtml(label.symbol) + over, divided ? "" : unitOf(label.dimension, units));
}

function caseTraces(of: FigureCase, { inner, outer }: Regions, options: FigureOptions): Partial<Data>[] {
  const sign = caseMark(options.tokens, of.mark);
  const outline = (region: Region | null, share: number): Partial<Data>[] =>
    region === null
      ? []
      : [
          {
            ...caseLine(region.n, region.x0, of.mark, options, { weightPt: 0.7, dashed: true }),
            fill: "toself",
            fillcolor: faded(sign.colour, share),
            line: {
              color: sign.colour,
              width: drawingOf(options).pt(0.7),
              dash: dashOf(sign.dash, options.scale),
            },
          } as Partial<Data>,
        ];
  const best = bestFit(of);
  const [n, x0] = [best.n[0], best.x0[0]];
  return [
    ...outline(outer, 0.14),
    ...outline(inner, 0.22),
    ...intervalBars(of, options),
    loneMarker({ x: n, y: x0 }, of.mark, options, 1.8),
  ];
}

/** The adopted intervals of n and x0 as thin bars: they may reach further than the region of this one window. */
function intervalBars(of: FigureCase, options: FigureOptions): Partial<Data>[] {
  const best = bestFit(of);
  const bars = { weightPt: 0.6, dashed: false };
  const [n, x0] = [ends(of.decay, "n"), ends(of.decay, "x0")];
  return [
    caseLine(
      n.slice(1),
      n.slice(1).map(() => best.x0[0]),
      of.mark,
      options,
      bars,
    ),
    caseLine(
      x0.slice(1).map(() => best.n[0]),
      x0.slice(1),
      of.mark,
      options,
      bars,
    ),
  ];
}

/** Names of the exponents over the frame; one that would run into its neighbour is left out. */
function namedNotes(panel: Panel, options: FigureOptions) {
  const { numeral } = drawingOf(options);
  return named
    .filter(({ n }) => isInside(panel.x.range, n))
    .map(({ n, text }) =>
      pageNote(text, placeX(panel, n), panel.box.top + 1.8, {
        xanchor: "center",
        yanchor: "middle",
        font: { ...numeral, color: options.tokens.ink2 },
      }),
    );
}

/** Names beside the regions: to the right of one where there is room, else to its left. */
function caseNotes(
  fitted: readonly FigureCase[],
  outlines: readonly Region[],
  panel: Panel,
  options: FigureOptions,
) {
  const { numeral } = drawingOf(options);
  // Many names would hide the regions; the legend of the other panel has them too.
  if (fitted.length > fewCases) return [];
  return fitted.flatMap(({ name }, i) => {
    const { n, x0 } = outlines[i];
    if (n.length === 0) return [];
    const [low, high] = [Math.min(...n), Math.max(...n)];
    const text = escapeText(shortened(name));
    const right = placeX(panel, (low + 2 * high) / 3) + 3;
    const fits = right + text.length * 1.3 < panel.box.right;
    const top = placeY(panel, Math.max(...x0));
    const bottom = placeY(panel, Math.min(...x0));
    const place = fits
      ? { x: right, y: top + (bottom - top) * 0.08, xanchor: "left" as const }
      : {
          x: placeX(panel, (2 * low + high) / 3) - 3,
          y: top + (bottom - top) * 0.62,
          xanchor: "right" as const,
        };
    return [
      pageNote(text, place.x, place.y, {
        xanchor: place.xanchor,
        bgcolor: options.tokens.paper,
        yanchor: "middle",
        font: { ...numeral, color: options.tokens.ink2 },
      }),
    ];
  });
}
