import type { Flag } from "../flag.ts";
import type { RecordOrigin } from "../records.ts";
import type { BlockTable, StationResult } from "../stationResult.ts";
import type { CutList } from "./cutList.ts";
import type { LinePart } from "./lines/linePart.ts";
import type { RecordPlan } from "./recordPlan.ts";

export type Component = "u" | "v" | "w";

/** One probe's record reduced: everything that its station needs, and nothing that grows with its length. */
export interface StationPart {
  readonly origin: RecordOrigin;
  /** Measured components, in the order of every list below. */
  readonly components: readonly Component[];
  /** Samples kept: those of the start-up are not among them. */
  readonly samples: number;
  readonly step: number;
  /** Time of the first sample kept. */
  readonly start: number;
  readonly duration: number;
  /** The lowest u found: Taylor's hypothesis needs it above zero. */
  readonly lowestSpeed: number;
  readonly plan: RecordPlan;
  /** A row a block: weight, means and centred sums; see blockFields. */
  readonly blocks: BlockTable;
  /** Null where the record holds no pair of samples, and with it the next two. */
  readonly lags: LagTable | null;
  readonly spectrum: SpectrumSums | null;
  readonly bands: BandTable | null;
  /** Increments of u; left out of parts that were made without. */
  readonly increments?: IncrementTable | null;
  /** Mean of all records of the same probe less the plan's reference, a number a component; absent: the record's own. */
  readonly commonRest?: readonly number[];
  /** A record that repeats itself: the time after which u comes back, and how much alike. */
  readonly replay?: RecordReplay | null;
  readonly flags: readonly Flag[];
  /** Where it was cut; left out where nowhere. */
  readonly cuts?: CutList;
}

/** How a record comes back. */
export interface RecordReplay {
  /** s. */
  readonly period: number;
  /** Correlation with itself one period later. */
  readonly peak: number;
  /** Correlation around the period, from the lag `from` on at equal steps; left out of parts that were made without. */
  readonly revival?: { readonly from: number; readonly step: number; readonly rho: Float64Array };
}

/** Lag products about the plan's reference, a list a component. */
export interface LagTable {
  /** Kept lags: 0, stride, 2 stride …, `count` of them. */
  readonly count: number;
  readonly stride: number;
  /** Per component, blocks × count: Σ u_i u_(i-l), i running over the block. */
  readonly products: readonly Float64Array[];
  /** Per component: sums of the first l and of the last l samples, for the exact change of the mean. */
  readonly heads: readonly Float64Array[];
  readonly tails: readonly Float64Array[];
  /** Pairs of samples at each kept lag, where a record is in pieces or was put onto equal steps; else N - l. */
  readonly pairs?: Float64Array;
  /** Σ u per component over the samples that were put onto equal steps; absent: those of the moments. */
  readonly totals?: readonly number[];
}

/** Welch sums of the whole record about the plan's reference, a list a component. */
export interface SpectrumSums {
  /** Samples a segment. */
  readonly size: number;
  readonly segments: number;
  /** Per component: Σ |X_f|² over the segments, f = 0 … size/2. */
  readonly power: readonly Float64Array[];
  /** Σ Re(X_f conj Y_f) of u and v; null without v, left out of parts that were made without. */
  readonly cross?: Float64Array | null;
  /** Per component: Σ Re X_0 and Σ Re X_1, all that a change of the mean alters. */
  readonly edges: readonly Float64Array[];
}

/** ∫ω²E dω of short segments in bands of a twentieth of a decade, counted down from Nyquist. */
export interface BandTable {
  /** Samples a segment. */
  readonly size: number;
  readonly count: number;
  /** Segments whose middle lies in the block, a number a block. */
  readonly segments: Float64Array;
  /** Per component, blocks × count. */
  readonly sums: readonly Float64Array[];
}

/** Increments u(t) - u(t - lag) by block. */
export interface IncrementTable {
  /** In samples, ascending. */
  readonly lags: readonly number[];
  /** Blocks × lags × 3: number, Σ d² and Σ d³. */
  readonly sums: Float64Array;
}

/** Every buffer of a part or a result, so that it crosses to another thread without being copied. */
export function transferables(value: StationPart | LinePart | StationResult): ArrayBuffer[] {
  const found = new Set<ArrayBuffer>();
  collect(value, found);
  return [...found];
}

function collect(value: unknown, found: Set<ArrayBuffer>): void {
  if (value === null || typeof value !== "object") return;
  if (ArrayBuffer.isView(value)) {
    if (value.buffer instanceof ArrayBuffer) found.add(value.buffer);
    return;
  }
  for (const inner of Object.values(value)) collect(inner, found);
}
