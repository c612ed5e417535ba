import { labelOf } from "../core/catalogue.ts";
import { displayOf } from "../core/unitText.ts";
import type { FigureOptions, PickedCurve } from "./figureSpec.ts";
import { lineWeight } from "./lineWeight.ts";
import { openRing } from "./openRing.ts";
import { levelLine } from "./pageShapes.ts";
import { type Box, type Decor, linearAxis, type Panel } from "./panel.ts";
import { caseLine } from "./stationTrace.ts";
import { titleWithUnit } from "./streamwise.ts";
import { symbolHtml } from "./symbolHtml.ts";

/** Correlation of u around the lag at which a replayed record comes back; ringed: the period that counts. */
export function revivalPanel(
  revived: readonly PickedCurve[],
  box: Box,
  letter: string,
  options: FigureOptions,
): { panel: Panel; decor: Partial<Decor> } {
  const scaled = revived.every(({ station }) => station.T_int.value !== null);
  const lag = labelOf("lag");
  const { factor, unit } = displayOf({ ...lag, milli: true }, options.units);
  const curves = revived.flatMap((one) => {
    const revival = one.station.curves?.revival;
    if (revival === undefined) return [];
    const per = scaled ? 1 / (one.station.T_int.value ?? 1) : factor;
    const x = Array.from(revival.lag, (tau) => tau * per);
    return [{ one, x, y: Array.from(revival.rho), top: { x: revival.period * per, y: revival.peak } }];
  });
  const places = curves.flatMap(({ x }) => x);
  const values = curves.flatMap(({ y }) => y);
  const panel: Panel = {
    box,
    x: linearAxis(
      [Math.min(...places), Math.max(...places)],
      scaled ? symbolHtml(labelOf("r/L11").symbol) : titleWithUnit(symbolHtml(lag.symbol), unit),
    ),
    y: linearAxis([Math.min(-0.15, ...values) - 0.05, 1.1], symbolHtml(labelOf("rho").symbol)),
    traces: [
      ...curves.map(({ one, x, y }) =>
        caseLine(x, y, one.of.mark, options, { weightPt: lineWeight(one, revived), dashed: true }),
      ),
      ...curves.map(({ one, top }) => openRing(top, one.of.mark, options)),
    ],
    letter,
  };
  return { panel, decor: { shapes: levelLine(panel, 0, options, false) } };
}
