import type { FigureOptions } from "./figureSpec.ts";

/** Families as the page declares them; signs that the text face lacks come from the second. */
export const symbolFamily = '"STIX Two Text", "STIX Two Math", Georgia, serif';
export const numeralFamily = '"Source Sans 3", "STIX Two Math", system-ui, sans-serif';

/** Sizes of the printed figure in px of the drawing. */
export interface Drawing {
  readonly mm: (length: number) => number;
  readonly pt: (size: number) => number;
  readonly symbol: { readonly family: string; readonly size: number; readonly color: string };
  readonly numeral: { readonly family: string; readonly size: number; readonly color: string };
}

const mmPerPt = 25.4 / 72;

export function drawingOf({ scale, tokens }: Pick<FigureOptions, "scale" | "tokens">): Drawing {
  const mm = (length: number) => length * scale;
  const pt = (size: number) => size * mmPerPt * scale;
  return {
    mm,
    pt,
    symbol: { family: symbolFamily, size: pt(8.5), color: tokens.ink },
    numeral: { family: numeralFamily, size: pt(7.5), color: tokens.ink },
  };
}

/** A dash given in px at 5 px to the mm, at the drawing's own scale. */
export function dashOf(dash: readonly number[], scale: number): string {
  return dash.length === 0 ? "solid" : dash.map((length) => `${round((length * scale) / 5)}px`).join(",");
}

const round = (length: number) => Math.round(length * 100) / 100;
