import type { Annotations } from "plotly.js";

/** A text at a place of the page, mm. */
export function pageNote(
  text: string,
  x: number,
  y: number,
  options: Partial<Annotations>,
): Partial<Annotations> {
  return { text, x, y, xref: "x", yref: "y", showarrow: false, borderpad: 0, ...options };
}
