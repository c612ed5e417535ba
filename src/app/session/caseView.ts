import type { DecayResult } from "../../core/decayResult.ts";
import type { StationResult } from "../../core/stationResult.ts";
import type { SentenceCase } from "../../export/sentences/sentenceCase.ts";
import type { WorkspaceCase } from "../../sheet/workspace.ts";
import type { Reduced, Work } from "./session.ts";

/** One case as every part of the page sees it; it keeps its identity while nothing in it changes. */
export interface CaseView extends SentenceCase {
  readonly id: string;
  readonly of: WorkspaceCase;
  readonly reduced: Reduced | null;
  /** With what the decay decides filled in, as soon as there is a fit. */
  readonly stations: readonly StationResult[];
  readonly decay: DecayResult | null;
  /** True while the numbers belong to settings that have since changed. */
  readonly stale: boolean;
  readonly work: Work | null;
}
