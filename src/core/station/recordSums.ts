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
import { CoarseSignal } from "./coarseSignal.ts";
import { addDifferences } from "./differenceSums.ts";
import { notFinite } from "./recordFailures.ts";
import type { RecordPlan } from "./recordPlan.ts";
import { replayPeriod } from "./replayPeriod.ts";
import { SpectralSums } from "./spectralSums.ts";
import type { Component, StationPart } from "./stationPart.ts";

export interface PartFacts {
  /** Samples of the record: with unequal steps another count than that of the equal ones made from them. */
  readonly samples: number;
  readonly start: number;
  readonly duration: number;
  readonly lowestSpeed: number;
  readonly flags: readonly Flag[];
}

/** A chunk of equally spaced samples about the plan's reference. */
export interface Chunk {
  /** A column a component, the first sample at index `history`, those before it in front. */
  readonly columns: readonly Float64Array[];
  readonly count: number;
  /** Where in the chunk pieces begin that have nothing to do with what came before. */
  readonly seams: readonly number[];
  /** Joint moments, where they are not those of the chunk's own samples. */
  readonly moments: Float64Array | null;
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
  private readonly spectral: SpectralSums;
  /** Samples since the last seam, as far as differences care. */
  private known = 0;
  /** Σ of the equally spaced samples. */
  private readonly totals: number[];
  private readonly coarse: CoarseSignal;

  constructor(plan: RecordPlan, origin: RecordOrigin, components: readonly Component[]) {
    this.plan = plan;
    this.origin = origin;
    this.components = components;
    this.layout = jointLayout(components.length);
    this.history = historyOf(plan);
    this.chunkRow = new Float64Array(this.layout.length);
    this.moments = momentSeries(components.length);
    this.totals = components.map(() => 0);
    this.spectral = new SpectralSums(plan, components.length);
    this.blocks = startBlocks(plan.blockSamples, [this.moments, ...this.spectral.series]);
    this.spectral.open(this.blocks);
    this.coarse = new CoarseSignal(coarseLength(plan));
  }

  /** @throws not-a-number */
  take(chunk: Chunk): void {
    const { layout, history, chunkRow } = this;
    const { columns, count, moments } = chunk;
    this.blocks.begin(count);
    if (moments === null) fillJoint(chunkRow, layout, columns, history, history + count, null);
    else chunkRow.set(moments);
    if (!chunkRow.every(Number.isFinite)) throw notFinite(this.origin);
    const row = blockRow(this.moments, this.blocks.current);
    mergeJoint(row, chunkRow, layout);
    if (moments !== null) this.addTotals(columns, count);
    this.coarse.add(columns[0], history, history + count);
    let from = 0;
    for (const seam of [...chunk.seams, count]) {
      if (seam > from) this.takeRun(columns, from, seam, row);
      if (seam < count || chunk.seams.includes(seam)) this.restart();
      from = seam;
    }
  }

  /** Samples from one seam to the next. */
  private takeRun(columns: readonly Float64Array[], from: number, to: number, row: Float64Array): void {
    const { history, plan, layout } = this;
    const differences = row.subarray(layout.length);
    const [first, end] = [history + from, history + to];
    addDifferences(differences, columns[0], first, end, this.known, plan.derivativeStep, plan.step);
    this.spectral.take(columns, first, end, this.blocks.current, from);
    this.known = Math.min(this.known + to - from, history);
  }

  private restart(): void {
    this.known = 0;
    this.spectral.restart();
  }

  private addTotals(columns: readonly Float64Array[], count: number): void {
    columns.forEach((column, c) => {
      let sum = 0;
      for (let i = this.history; i < this.history + count; i++) sum += column[i];
      this.totals[c] += sum;
    });
  }

  /** Whether the record comes back, and after which time. */
  private replay(): Required<StationPart>["replay"] {
    const { points, length } = this.coarse.finish();
    const found = replayPeriod(points);
    const step = length * this.plan.step;
    return (
      found && {
        period: found.period * step,
        peak: found.peak,
        revival: { from: found.from * step, step, rho: found.rho },
      }
    );
  }

  part(facts: PartFacts): StationPart {
    const { plan, components, blocks } = this;
    const { rows } = blocks;
    const table = {
      fields: blockFields(components),
      rows,
      data: trimmed(this.moments, rows),
      blockSamples: blocks.size,
      step: plan.step,
      start: facts.start,
    };
    const tables = this.spectral.tables(rows, plan.weighted ? this.totals : null);
    return {
      origin: this.origin,
      components,
      step: plan.step,
      ...facts,
      plan,
      blocks: table,
      replay: this.replay(),
      ...tables,
    };
  }
}

/** Samples in a point of the coarse signal: a third of the integral time or less. */
function coarseLength({ integralTime, lagLimit, step }: RecordPlan): number {
  const time = integralTime === null ? lagLimit / 16 : integralTime / step;
  return Math.max(1, Math.floor(time / 3));
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
