import type { DecayArgument } from "../core/decayArgument.ts";
import type { DecayResult } from "../core/decayResult.ts";
import type { FigureCase } from "./figureSpec.ts";

/** A fit with what was argued about it. */
export interface ArguedDecay {
  readonly decay: DecayResult;
  readonly argument: DecayArgument;
  /** True where the case has been fitted anew since. */
  readonly stale: boolean;
}

/** The newest fit of a case that was argued, with its own numbers; null where there is none. */
export function arguedOf({ decay, argued = null }: Pick<FigureCase, "decay" | "argued">): ArguedDecay | null {
  const found = decay?.argument === undefined ? argued : decay;
  return found?.argument === undefined
    ? null
    : { decay: found, argument: found.argument, stale: found !== decay };
}
