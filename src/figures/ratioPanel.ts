import { labelOf } from "../core/catalogue.ts";
import { linearRange, streamwiseRange } from "./axisRange.ts";
import type { FigureAxis, FigureCase, FigureOptions } from "./figureSpec.ts";
import { flagPennants } from "./flagPennants.ts";
import { levelLine, shadedBand } from "./pageShapes.ts";
import { type Box, type Decor, linearAxis, type Panel } from "./panel.ts";
import { type QuantityKey, stationPoints } from "./stationPoints.ts";
import { stationTrace } from "./stationTrace.ts";
import { streamwiseTitle } from "./streamwise.ts";
import { symbolHtml } from "./symbolHtml.ts";

/** A ratio that ought to be one, along the stream, on its tolerance band. */
export function ratioPanel(
  cases: readonly FigureCase[],
  key: QuantityKey,
  axis: FigureAxis,
  box: Box,
  letter: string,
  options: FigureOptions,
): { panel: Panel; decor: Partial<Decor> } {
  const points = cases.map((of) => stationPoints(of, key, axis));
  const all = points.flat();
  const shown = all.filter(({ y }) => y !== null);
  const band = [1 / (1 + options.tolerance), 1 + options.tolerance] as const;
  const range = linearRange(
    shown.flatMap(({ y, low, high }) => [y, low, high]),
    { include: band },
  );
  const panel: Panel = {
    box,
    x: linearAxis(streamwiseRange(all.map(({ x }) => x)), streamwiseTitle(cases, axis, options)),
    y: linearAxis(range, symbolHtml(labelOf(key).symbol)),
    traces: cases.map((of, i) => stationTrace(points[i], of.mark, of.name, options)),
    letter,
  };
  return {
    panel,
    decor: {
      shapes: [
        shadedBand(panel, band, options),
        ...levelLine(panel, 1, options, false),
        ...cases.flatMap((of, i) => flagPennants(of, key, points[i], panel, options)),
      ],
    },
  };
}
