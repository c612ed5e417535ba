/**
 * Symbol, name, dimension and digits of everything that is shown. One list for page, figures, tables and batch.
 * A symbol is written as runs, so that each door sets italics and subscripts in its own way.
 */
export type Dimension = "1" | "L" | "T" | "L/T" | "L²/T²" | "L²/T³" | "1/T²" | "1/L" | "L³/T²" | "L²/T";

/** A run of a symbol: italic unless upright, on the line unless raised or lowered. */
export interface Run {
  readonly text: string;
  readonly upright?: true;
  readonly place?: "sub" | "sup";
}

export interface Label {
  readonly key: string;
  readonly symbol: readonly Run[];
  readonly name: string;
  readonly dimension: Dimension;
  /** Shown times 100 with the unit % . */
  readonly percent?: true;
  /** Significant digits where no interval sets them. */
  readonly digits: number;
  /** Definition in one line: formula in words and symbols. */
  readonly definition: string;
  readonly source: string;
}
