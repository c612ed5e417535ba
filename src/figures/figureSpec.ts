import type { Data, Layout } from "plotly.js";
import type { DecayResult } from "../core/decayResult.ts";
import type { StationResult } from "../core/stationResult.ts";
import type { Units } from "../core/unitText.ts";
import type { Tokens } from "./tokens.ts";

/** A figure as plain data: what is drawn on the page is what is exported. */
export interface FigureSpec {
  /** Names the figure in files and tests: "decay", "isotropy". */
  readonly key: string;
  readonly widthMm: number;
  readonly heightMm: number;
  readonly traces: readonly Partial<Data>[];
  readonly layout: Partial<Layout>;
  /** The numbers behind the figure, in full precision, for its CSV. */
  readonly table: FigureTable;
}

export interface FigureTable {
  readonly heading: readonly string[];
  readonly rows: readonly (readonly (number | string | null)[])[];
}

export type FigureAxis = "x" | "x/ell" | "(x-x0)/ell";

export interface FigureOptions {
  /** Of the whole figure, or of each panel where they are stacked. */
  readonly widthMm: number;
  readonly tokens: Tokens;
  readonly axis: FigureAxis;
  readonly units: Units;
  /** px per mm: 5 on paper and on a wide screen. */
  readonly scale: number;
  /** Panels one above the other, each of the full width: a narrow screen. */
  readonly stacked: boolean;
  /** Half-width of the shaded band around one: 0.1 is 10 %. */
  readonly tolerance: number;
  /** "t" for a flow that decays in time. */
  readonly along: "x" | "t";
}

/** One case as a figure sees it. */
export interface FigureCase {
  readonly name: string;
  /** Index of its colour, marker and dash. */
  readonly mark: number;
  readonly stations: readonly StationResult[];
  /** Null until the case has been fitted. */
  readonly decay: DecayResult | null;
  /** The fit as it was argued last, where `decay` is newer and not argued yet; null or left out: none. */
  readonly argued?: DecayResult | null;
  /** The reference length and its letter; null where the case has none. */
  readonly length: number | null;
  readonly symbol: string;
}

/** A station picked on the ruler, with the letter it carries there. */
export interface PickedCurve {
  readonly of: FigureCase;
  readonly station: StationResult;
  readonly letter: string;
}

export const defaultFigureOptions: Omit<FigureOptions, "tokens"> = {
  widthMm: 86,
  axis: "x",
  units: "SI",
  scale: 5,
  stacked: false,
  tolerance: 0.1,
  along: "x",
};
