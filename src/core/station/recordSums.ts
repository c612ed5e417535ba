import type { Flag } from "../flag.ts";
import type { RecordOrigin } from "../records.ts";
import {
  additiveSeries,
  type BlockList,
  type BlockSeries,
  blockRow,
  startBlocks,
  trimmed,
} from "../signal/blockList.ts";
import { fillJoint, type JointLayout, jointLayout } from "../signal/jointMoments.ts";
import { mergeJoint } from "../signal/mergeJoint.ts";
import { blockFields, differenceFields } from "./blockFields.ts";
import { addDifferences } from "./differenceSums.ts";
import { notFinite } from "./recordFailures.ts";
import type { RecordPlan } from "./recordPlan.ts";
import { SpectralSums } from "./spectralSums.ts";
import type { Component, StationPart } from "./stationPart.ts";

export interface PartFacts {
  readonly start: number;
  readonly duration: number;
  readonly lowestSpeed: number;
  readonly flags: readonly Flag[];
}

/** Samples before a chunk that its differences reach back to. */
export function historyOf(plan: RecordPlan): number {
  return Math.max(4, 2 * plan.derivativeStep);
}

/** All sums of one record; samples come in chunks whose borders follow from the sample's index alone. */
export class RecordSums {
  private readonly plan: RecordPlan;
  private readonly origin: RecordOrigin;
  private readonly components: readonly Component[];
  private readonly layout: JointLayout;
  private readonly history: number;
  private readonly chunkRow: Float64Array;
  private readonly moments: BlockSeries;
  private readonly blocks: BlockList;
  /** Null where the steps are unequal. */
  private readonly spectral: SpectralSums | null;
  private samples = 0;

  constructor(plan: RecordPlan, origin: RecordOrigin, components: readonly Component[]) {
    this.plan = plan;
    this.origin = origin;
    this.components = components;
    this.layout = jointLayout(components.length);
    this.history = historyOf(plan);
    this.chunkRow = new Float64Array(this.layout.length);
    this.moments = momentSeries(components.length);
    this.spectral = plan.weighted ? null : new SpectralSums(plan, components.length);
    this.blocks = startBlocks(plan.blockSamples, [this.moments, ...(this.spectral?.series ?? [])]);
    this.spectral?.open(this.blocks);
  }

  /**
   * Takes `count` samples, already about the plan's reference, held from index `history` on in every column.
   * @param columns  each with `history` samples before the chunk's first
   * @param weights  placed alike; null: all weigh 1
   * @throws not-a-number
   */
  take(columns: readonly Float64Array[], count: number, weights: Float64Array | null): void {
    const { layout, history, chunkRow, plan } = this;
    const to = history + count;
    this.blocks.begin(count);
    fillJoint(chunkRow, layout, columns, history, to, weights);
    if (!chunkRow.every(Number.isFinite)) throw notFinite(this.origin);
    const row = blockRow(this.moments, this.blocks.current);
    mergeJoint(row, chunkRow, layout);
    if (this.spectral !== null) {
      const known = Math.min(this.samples, history);
      const differences = row.subarray(layout.length);
      addDifferences(differences, columns[0], history, to, known, plan.derivativeStep, plan.step);
      this.spectral.take(columns, history, to, this.blocks.current);
    }
    this.samples += count;
  }

  part(facts: PartFacts): StationPart {
    const { plan, components, samples, blocks } = this;
    const { rows } = blocks;
    const table = {
      fields: blockFields(components),
      rows,
      data: trimmed(this.moments, rows),
      blockSamples: blocks.size,
      step: plan.step,
      start: facts.start,
    };
    const tables = this.spectral?.tables(rows) ?? {
      lags: null,
      spectrum: null,
      bands: null,
      increments: null,
    };
    return {
      origin: this.origin,
      components,
      samples,
      step: plan.step,
      ...facts,
      plan,
      blocks: table,
      ...tables,
    };
  }
}

/** Joint moments, and the sums of differences behind them in the same row. */
function momentSeries(components: number): BlockSeries {
  const layout = jointLayout(components);
  const series = additiveSeries(layout.length + differenceFields.length);
  return {
    ...series,
    merge: (into, from) => {
      mergeJoint(into, from, layout);
      for (let i = layout.length; i < series.width; i++) into[i] += from[i];
    },
  };
}
