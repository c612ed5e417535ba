import type { RouteKey } from "../../core/decayArgument.ts";
import { type Piece, type Sentence, say } from "./piece.ts";
import { symbolOf } from "./shownValue.ts";

/** Routes to n and x0 as sentences and tables name them; of a decay in time, to t0. */
export function routeWords(key: RouteKey, along: "x" | "t" = "x"): Sentence {
  return wordsAbout(symbolOf(`${along}0`))[key];
}

function wordsAbout(origin: Piece): Readonly<Record<RouteKey, Sentence>> {
  return {
    joint: say`joint fit of ${symbolOf("A")}, ${symbolOf("n")} and ${origin}`,
    "origin-scan": say`scan of ${origin} for the least scatter`,
    "straight-line": say`straight line, ${symbolOf("n")} held`,
    lambda: say`straight line of ${{ kind: "symbol", runs: [{ text: "Λ" }, { text: "2", place: "sup", upright: true }] }}`,
    epsilon: say`fall of ${symbolOf("epsilon")}`,
    "origin-zero": say`${origin} held at zero`,
    "origin-held": say`${origin} held as given`,
    "origin-other": say`${origin} held elsewhere`,
    flight: say`joint fit along the time of flight`,
    "along-x": say`joint fit along ${symbolOf("x")}`,
  };
}
