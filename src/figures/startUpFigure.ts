import { labelOf } from "../core/catalogue.ts";
import { isEstimate } from "../core/quantity.ts";
import type { StationResult } from "../core/stationResult.ts";
import { unitOf } from "../core/unitText.ts";
import { assembleFigure } from "./assembleFigure.ts";
import { linearRange } from "./axisRange.ts";
import { type BlockPoint, blockTraces } from "./blockTrace.ts";
import { placeCells } from "./cells.ts";
import type { FigureCase, FigureOptions, FigureSpec } from "./figureSpec.ts";
import { levelLine, shadedBand, uprightLine } from "./pageShapes.ts";
import { type Box, joinDecor, linearAxis, type Panel } from "./panel.ts";
import { caseLine } from "./stationTrace.ts";
import { titleWithUnit } from "./streamwise.ts";
import { symbolHtml } from "./symbolHtml.ts";

/** A station whose records are looked at from their beginning. */
export interface StartUpOf {
  readonly of: FigureCase;
  readonly station: StationResult;
  /** Time left out of the records. */
  readonly startup: number;
  /** Time that the checks propose to leave out; null: none. */
  readonly proposed: number | null;
}

/** Block means and block variances of a station against time, with what is left out and what could be. */
export function startUpFigure(shown: StartUpOf, options: FigureOptions): FigureSpec {
  const traces = blockTraces(shown.station, shown.startup);
  const cells = placeCells(2, 54, options);
  const panels = (["mean", "variance"] as const).map((what, i) =>
    panelOf(shown, traces, what, cells.boxes[i], options),
  );
  return assembleFigure(
    {
      key: "start-up",
      widthMm: cells.widthMm,
      heightMm: cells.heightMm,
      panels,
      decor: joinDecor(...panels.map((panel) => ({ shapes: marks(shown, panel, options) }))),
      table: {
        heading: ["case", "x", "record", "time", "mean", "variance"],
        rows: traces.flatMap((trace, r) =>
          trace.map(({ time, mean, variance }) => [
            shown.of.name,
            shown.station.x,
            r + 1,
            time,
            mean,
            variance,
          ]),
        ),
      },
    },
    options,
  );
}

function panelOf(
  { of, startup, proposed }: StartUpOf,
  traces: readonly (readonly BlockPoint[])[],
  what: "mean" | "variance",
  box: Box,
  options: FigureOptions,
): Panel {
  const values = traces.flatMap((trace) => trace.map((point) => point[what]));
  const times = traces.flatMap((trace) => trace.map(({ time }) => time));
  const end = 1.03 * Math.max(...times, startup, proposed ?? 0, 1e-12);
  const time = labelOf("t");
  return {
    box,
    x: linearAxis([0, end], titleWithUnit(symbolHtml(time.symbol), unitOf(time.dimension, options.units))),
    y: linearAxis(linearRange(values, { include: [1] }), symbolHtml(labelOf(`block_${what}`).symbol)),
    traces: traces.map((trace) =>
      caseLine(
        trace.map((point) => point.time),
        trace.map((point) => point[what]),
        of.mark,
        options,
        { weightPt: traces.length > 1 ? 0.5 : 1, dashed: false },
      ),
    ),
    letter: what === "mean" ? "a" : "b",
  };
}

/** Shaded: left out. Dashed: what the checks propose. Solid: the time of flight from x = 0. */
function marks({ station, startup, proposed }: StartUpOf, panel: Panel, options: FigureOptions) {
  const { U, x } = station;
  const flight = isEstimate(U) && U.value > 0 && x > 0 ? x / U.value : null;
  return [
    ...(startup > 0 ? [shadedBand(panel, [0, startup], options, "x")] : []),
    ...levelLine(panel, 1, options, false),
    ...(proposed === null ? [] : uprightLine(panel, proposed, options)),
    ...(flight === null ? [] : uprightLine(panel, flight, options, false)),
  ];
}
