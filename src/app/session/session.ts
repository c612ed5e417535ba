import type { Comparison } from "../../core/comparison.ts";
import type { DecayResult } from "../../core/decayResult.ts";
import type { PlainFailure } from "../../core/failure.ts";
import type { Flag } from "../../core/flag.ts";
import type { Preview, SourceNote } from "../../core/records.ts";
import type { StationResult } from "../../core/stationResult.ts";
import type { SourceFile } from "../../engine/protocol.ts";
import type { LeftOut } from "../../sheet/dropPlan.ts";
import type { AddedFiles, Workspace, WorkspaceCase } from "../../sheet/workspace.ts";
import type { History } from "./history.ts";

/**
 * Where the page is. Whatever is loaded stays loaded while more is read: `held` goes along.
 * empty: nothing dropped yet · reading: first look at the files of a drop · reducing: records become stations ·
 * ready: all that can be reduced is · failed: a drop of which nothing could be used, on an empty page.
 */
export type Session =
  | { readonly kind: "empty" }
  | { readonly kind: "reading"; readonly held: Held | null; readonly offer: Offer }
  | { readonly kind: "reducing"; readonly held: Held; readonly work: Readonly<Record<string, Work>> }
  | { readonly kind: "ready"; readonly held: Held }
  | { readonly kind: "failed"; readonly aside: Aside };

export interface Held {
  readonly history: History<Workspace>;
  /** Every file of every drop that belongs to a case. */
  readonly files: readonly SourceFile[];
  readonly previews: readonly Preview[];
  /** Of each case, by its id: what was reduced last, with the key of the settings it was reduced with. */
  readonly reductions: Readonly<Record<string, Reduced>>;
  readonly aside: Aside;
  readonly argued: Argued | null;
}

/** What of the drops is in no case, and what was understood only in part. */
export interface Aside {
  readonly leftOut: readonly LeftOut[];
  readonly failures: readonly PlainFailure[];
  readonly warnings: readonly string[];
}

export interface Reduced {
  readonly key: string;
  readonly stations: readonly StationResult[];
  readonly sources: readonly SourceNote[];
  readonly flags: readonly Flag[];
  readonly failures: readonly PlainFailure[];
  /** False where the work was cancelled and only a part of the files is in. */
  readonly complete: boolean;
}

/** Fits and comparison from the worker, with the keys of what they were made from. */
export interface Argued {
  /** Of the whole: cases, their order, and how they are compared. */
  readonly key: string;
  /** Of each case's fit, by its id. */
  readonly keys: Readonly<Record<string, string>>;
  readonly cases: Readonly<Record<string, ArguedCase>>;
  readonly comparisons: readonly Comparison[];
}

/** One case fitted and derived; curves and blocks are those of the reduction, not copies. */
export interface ArguedCase {
  readonly stations: readonly StationResult[];
  readonly decay: DecayResult;
}

export interface Offer {
  readonly files: number;
  readonly looked: number;
  readonly bytes: number;
}

/** One case being reduced. */
export interface Work {
  readonly key: string;
  readonly files: number;
  readonly filesDone: number;
  /** Names of the files that are done, in the order of their ends. */
  readonly done?: readonly string[];
  readonly bytes: number;
  readonly bytesDone: number;
}

/** What a drop comes to, once it was looked at. */
export interface Plan {
  /** Files that join cases which are here already. */
  readonly additions?: readonly AddedFiles[];
  readonly cases: readonly Omit<WorkspaceCase, "mark">[];
  readonly files: readonly SourceFile[];
  readonly previews: readonly Preview[];
  readonly aside: Aside;
}
