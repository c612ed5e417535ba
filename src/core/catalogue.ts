import { argumentLabels } from "./argumentLabels.ts";
import { bodyLabels } from "./bodyLabels.ts";
import { compareLabels } from "./compareLabels.ts";
import { decayLabels } from "./decayLabels.ts";
import { factLabels } from "./factLabels.ts";
import { assert } from "./failure.ts";
import { figureLabels } from "./figureLabels.ts";
import { lineLabels } from "./lineLabels.ts";
import { routeLabels } from "./routeLabels.ts";
import { stationLabels } from "./stationLabels.ts";

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
  /** Shown in thousandths of the SI unit (mm, ms) where the case is in SI. */
  readonly milli?: true;
  /** Significant digits where no interval sets them. */
  readonly digits: number;
  /** Definition in one line: formula in words and symbols. */
  readonly definition: string;
  readonly source: string;
}

/** Every label by its key: the keys of the results file, then the axes of the figures. */
export const catalogue: Readonly<Record<string, Label>> = Object.fromEntries(
  [
    ...stationLabels,
    ...routeLabels,
    ...factLabels,
    ...lineLabels,
    ...decayLabels,
    ...argumentLabels,
    ...compareLabels,
    ...bodyLabels,
    ...figureLabels,
  ].map((label) => [label.key, label]),
);

/** The label of a key that the program itself names. */
export function labelOf(key: string): Label {
  assert(Object.hasOwn(catalogue, key), `no label for ${key}`);
  return catalogue[key];
}
