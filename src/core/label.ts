import type { Dimension, Label } from "./catalogue.ts";
import { sourceOf } from "./labelSources.ts";
import { symbolRuns } from "./symbolRuns.ts";

/** What a label may say beyond the usual. */
interface Manner {
  readonly percent?: true;
  readonly milli?: true;
  readonly digits?: number;
}

/** One entry of the catalogue; three significant digits and the source of labelSources.ts unless said otherwise. */
export function label(
  key: string,
  symbol: string,
  name: string,
  dimension: Dimension,
  definition: string,
  manner: Manner = {},
  source = sourceOf(key),
): Label {
  return { key, symbol: symbolRuns(symbol), name, dimension, digits: 3, ...manner, definition, source };
}
