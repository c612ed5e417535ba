import type { Data } from "plotly.js";
import { caseMark } from "./caseMark.ts";
import { drawingOf } from "./drawing.ts";
import type { FigureOptions } from "./figureSpec.ts";

/** An open marker of a case: rings a place on one of its curves. */
export function openRing(at: { x: number; y: number }, mark: number, options: FigureOptions): Partial<Data> {
  const { mm, pt } = drawingOf(options);
  const sign = caseMark(options.tokens, mark);
  return {
    type: "scatter",
    mode: "markers",
    x: [at.x],
    y: [at.y],
    hoverinfo: "skip",
    marker: {
      symbol: sign.marker,
      size: mm(1.3),
      color: options.tokens.paper,
      line: { color: sign.colour, width: pt(0.6) },
    },
  } as Partial<Data>;
}
