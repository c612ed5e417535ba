import { numeralFamily, symbolFamily } from "../../figures/drawing.ts";

/** Letters of every font file that a figure can hold. */
const samples: readonly (readonly [string, string])[] = [
  [`16px ${numeralFamily}`, "0k"],
  [`16px ${symbolFamily}`, "kλ"],
  [`italic 16px ${symbolFamily}`, "kλ"],
];

let ready: Promise<unknown> | null = null;

/** Waits for the figures' fonts: Plotly measures each text once, in the font that is there at that moment. */
export function readyFonts(): Promise<unknown> {
  if (typeof document.fonts?.load !== "function") return Promise.resolve();
  // A font that cannot be had leaves its fallback: the figure is drawn all the same.
  ready ??= Promise.allSettled(samples.map(([font, text]) => document.fonts.load(font, text)));
  return ready;
}
