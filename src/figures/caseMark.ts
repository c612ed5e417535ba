import type { Tokens } from "./tokens.ts";

export type MarkerShape = "circle" | "square" | "triangle-up" | "diamond" | "triangle-down" | "cross";

/** What tells a case apart: colour, marker and dash, kept for its life. */
export interface CaseMark {
  readonly colour: string;
  readonly marker: MarkerShape;
  /** On and off lengths in px at 5 px to the mm; empty: solid. */
  readonly dash: readonly number[];
  /** From the seventh case on the marks repeat in open form. */
  readonly open: boolean;
}

const shapes: readonly MarkerShape[] = [
  "circle",
  "square",
  "triangle-up",
  "diamond",
  "triangle-down",
  "cross",
];
const dashes: readonly (readonly number[])[] = [
  [],
  [5.4, 2.2],
  [1.6, 1.8],
  [8, 2, 1.6, 2],
  [8, 2, 1.6, 2, 1.6, 2],
  [11, 3.2],
];

export function caseMark(tokens: Tokens, index: number): CaseMark {
  const place = index % shapes.length;
  return {
    colour: tokens.cases[place],
    marker: shapes[place],
    dash: dashes[place],
    open: index >= shapes.length,
  };
}
