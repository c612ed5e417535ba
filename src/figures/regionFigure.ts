import type { Data } from "plotly.js";
import { arguedOf } from "./arguedOf.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { linearRange, logRange } from "./axisRange.ts";
import { placeCells, usualRoom } from "./cells.ts";
import type { FigureCase, FigureOptions, FigureSpec, FigureTable } from "./figureSpec.ts";
import { jointRegionPanel, originTitle } from "./jointRegionPanel.ts";
import { jointRegionsOf, type Region } from "./jointRegions.ts";
import { type Box, joinDecor, linearAxis, logAxis, type Panel } from "./panel.ts";
import { caseLine, loneMarker } from "./stationTrace.ts";
import { linearTicks } from "./ticks.ts";

/** Of the scan upstream of the first station, so many times the least scatter is still shown. */
const scatterShown = 8;
/** With more cases than this one panel holds the regions of all. */
const mostApart = 2;

/**
 * The joint region of n and x0 by profile, by covariance and by refits; beside it the classical scan: scatter of ln q about
 * the best line against the origin it is drawn from.
 */
export function regionFigure(cases: readonly FigureCase[], options: FigureOptions): FigureSpec {
  const argued = cases.filter((of) => arguedOf(of) !== null);
  // few cases have a panel each: their regions are small beside the distance between them
  const groups = argued.length <= mostApart ? argued.map((of) => [of]) : [argued];
  const cells = placeCells(groups.length + 1, 66, options, { ...usualRoom, top: 4.4 });
  const regions = groups.map((group, i) => jointRegionPanel(group, cells.boxes[i], "abc"[i], options, true));
  const scan = scanPanel(argued, cells.boxes[groups.length], "abc"[groups.length], options);
  return assembleFigure(
    {
      key: "joint-region",
      widthMm: cells.widthMm,
      heightMm: cells.heightMm,
      panels: [...regions.map(({ panel }) => panel), scan],
      decor: joinDecor(...regions.map(({ decor }) => decor)),
      table: regionTable(argued),
    },
    options,
  );
}

/** The scan of one case, x0 in the unit of the axis, rms in %, as far as it is drawn. */
function scanOf(of: FigureCase): { x0: number[]; rms: number[]; least: number } | null {
  const found = arguedOf(of);
  const scan = found?.argument.originScan;
  if (!found?.decay.law || !scan || scan.rms.length === 0) return null;
  const { length } = found.decay.law;
  const rms = scan.rms.map((value) => 100 * value);
  return { x0: scan.x0.map((place) => place / length), rms, least: rms.indexOf(Math.min(...rms)) };
}

function scanPanel(cases: readonly FigureCase[], box: Box, letter: string, options: FigureOptions): Panel {
  const scans = cases.flatMap((of) => {
    const scan = scanOf(of);
    return scan === null ? [] : [{ of, scan }];
  });
  const shown = scans.flatMap(({ scan }) =>
    scan.rms.filter((value) => value <= scatterShown * scan.rms[scan.least] && value > 0),
  );
  const places = scans.flatMap(({ scan }) =>
    scan.x0.filter((_, i) => scan.rms[i] <= scatterShown * scan.rms[scan.least]),
  );
  const range = linearRange(places);
  return {
    box,
    x: linearAxis(range, originTitle(cases, options), { ticks: linearTicks(...range, 6) }),
    y: logAxis(logRange(shown), "rms of the residuals (%)"),
    traces: scans.flatMap(({ of: { mark }, scan }): Partial<Data>[] => [
      caseLine(scan.x0, scan.rms, mark, options, { weightPt: 0.95, dashed: true }),
      loneMarker({ x: scan.x0[scan.least], y: scan.rms[scan.least] }, mark, options, 1.8),
    ]),
    letter,
  };
}

function regionTable(cases: readonly FigureCase[]): FigureTable {
  return {
    heading: ["case", "curve", "level", "n", "x0/ell", "rms_percent"],
    rows: cases.flatMap((of) => {
      const regions = jointRegionsOf(of);
      const scan = scanOf(of);
      const curve = (name: string, level: number | null, { n, x0 }: Omit<Region, "closed">) =>
        n.map((value, i) => [of.name, name, level, value, x0[i], null]);
      return [
        ...(regions === null
          ? []
          : [
              ...curve("profile", 0.68, regions.inner),
              ...curve("profile", 0.95, regions.outer),
              ...regions.ellipses.flatMap((one, i) => curve("covariance", [0.68, 0.95][i], one)),
              ...curve("refit", null, regions.cloud),
            ]),
        ...(scan === null
          ? []
          : scan.x0.map((x0, i) => [of.name, "scan of x0", null, null, x0, scan.rms[i]])),
      ];
    }),
  };
}
