import type { Annotations, Data, Shape } from "plotly.js";
import { linearTicks, logTicks, type Ticks } from "./ticks.ts";

/** A rectangle on the figure, mm from its lower left corner. */
export interface Box {
  readonly left: number;
  readonly right: number;
  readonly bottom: number;
  readonly top: number;
}

export interface PanelAxis {
  readonly log: boolean;
  /** In the axis' own numbers, not their logarithms. */
  readonly range: readonly [number, number];
  readonly ticks: Ticks;
  /** Markup of symbolHtml; empty: none. */
  readonly title: string;
  readonly labels: boolean;
  /** Ticks on the opposite side too; false where that side carries another scale. */
  readonly mirrored: boolean;
}

/** One boxed plot: its place, its axes and the traces drawn on them. */
export interface Panel {
  readonly box: Box;
  readonly x: PanelAxis;
  readonly y: PanelAxis;
  readonly traces: readonly Partial<Data>[];
  /** "a", "b"; empty: none. */
  readonly letter: string;
}

/** What stands on the figure outside the axes or across them, in mm of the page. */
export interface Decor {
  readonly traces: readonly Partial<Data>[];
  readonly shapes: readonly Partial<Shape>[];
  readonly notes: readonly Partial<Annotations>[];
  /** Room that it takes below the figure, mm; left out: none. */
  readonly belowMm?: number;
}

type AxisOptions = Partial<Omit<PanelAxis, "log" | "range" | "title">>;

export function logAxis(
  range: readonly [number, number],
  title: string,
  options: AxisOptions = {},
): PanelAxis {
  return { log: true, range, title, ticks: logTicks(...range), labels: true, mirrored: true, ...options };
}

export function linearAxis(
  range: readonly [number, number],
  title: string,
  options: AxisOptions = {},
): PanelAxis {
  return { log: false, range, title, ticks: linearTicks(...range), labels: true, mirrored: true, ...options };
}

/** Where a number of an axis lies on the page, mm. */
export function placeX({ box, x }: Pick<Panel, "box" | "x">, value: number): number {
  return box.left + share(x, value) * (box.right - box.left);
}

export function placeY({ box, y }: Pick<Panel, "box" | "y">, value: number): number {
  return box.bottom + share(y, value) * (box.top - box.bottom);
}

function share({ log, range: [low, high] }: PanelAxis, value: number): number {
  return log ? Math.log(value / low) / Math.log(high / low) : (value - low) / (high - low);
}

export function joinDecor(...parts: readonly Partial<Decor>[]): Decor {
  return {
    traces: parts.flatMap((part) => part.traces ?? []),
    shapes: parts.flatMap((part) => part.shapes ?? []),
    notes: parts.flatMap((part) => part.notes ?? []),
    belowMm: Math.max(...parts.map((part) => part.belowMm ?? 0), 0),
  };
}
