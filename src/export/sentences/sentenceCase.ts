import type { Units } from "../../core/unitText.ts";
import type { FigureCase } from "../../figures/figureSpec.ts";

/** One case as a sentence sees it. */
export interface SentenceCase extends FigureCase {
  readonly units: Units;
  /** "t" for a flow that decays in time. */
  readonly along?: "x" | "t";
}
