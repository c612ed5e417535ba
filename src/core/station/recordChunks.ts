import { assert } from "../failure.ts";
import type { RecordOrigin, VelocityBlock } from "../records.ts";
import type { BranchCut } from "./branchCuts.ts";
import { CutKeeper, type CutList } from "./cutList.ts";
import { EvenSteps } from "./evenSteps.ts";
import type { PilotFacts } from "./pilotBuffer.ts";
import type { RecordPlan } from "./recordPlan.ts";
import { historyOf, RecordSums } from "./recordSums.ts";
import { ResamplingResponse } from "./resamplingResponse.ts";
import type { PlaceOf } from "./samplePlaces.ts";
import { gapSteps, isEqualStep } from "./stepRule.ts";
import { WeightedMoments } from "./weightedMoments.ts";

/** Stamps closer than this share of a step are one. */
const sameStamp = 1e-6;

/** What a record turned out to be, once its last sample was taken. */
export interface ClosedRecord {
  readonly sums: RecordSums;
  readonly samples: number;
  /** Samples of the longest piece. */
  readonly longest: number;
  readonly duration: number;
  readonly lowestSpeed: number;
  /** Steps that are not the plan's. */
  readonly unequal: number;
  readonly gaps: number;
  /** Time that the gaps took. */
  readonly lost: number;
  readonly repeated: number;
  /** The gaps and the repeated samples one by one. */
  readonly seamList: CutList;
  /** Restarts past the pilot: what they overtook is among the sums, and the record has to be read once more. */
  readonly cuts: readonly BranchCut[];
  readonly response: ResamplingResponse;
}

/**
 * A record past its pilot: samples are gathered, about the plan's reference, into chunks of the smallest block's
 * size, counted from the record's start, and summed chunk by chunk. Unequal steps are made equal first, and the
 * moments taken from the samples as they were. At a gap or a restart a new piece begins.
 */
export class RecordChunks {
  readonly plan: RecordPlan;
  readonly facts: PilotFacts;
  private readonly sums: RecordSums;
  private readonly size: number;
  private readonly history: number;
  private readonly columns: Float64Array[];
  private readonly response: ResamplingResponse;
  /** Both null where the steps are equal. */
  private readonly even: EvenSteps | null;
  private readonly moments: WeightedMoments | null;
  private readonly sample: number[];
  private readonly cuts: BranchCut[] = [];
  private seams: number[] = [];
  private filled = 0;
  private samples = 0;
  private piece = 0;
  private longest = 0;
  private lowest = Infinity;
  private unequal = 0;
  private gaps = 0;
  private lost = 0;
  private repeated = 0;
  private readonly listed = new CutKeeper();
  private last: number | null = null;

  constructor(plan: RecordPlan, origin: RecordOrigin, facts: PilotFacts) {
    this.plan = plan;
    this.facts = facts;
    this.size = plan.blockSamples;
    this.history = historyOf(plan);
    this.sums = new RecordSums(plan, origin, facts.components);
    this.columns = facts.components.map(() => new Float64Array(this.history + this.size));
    this.sample = facts.components.map(() => 0);
    this.response = new ResamplingResponse(plan.step);
    const count = facts.components.length;
    this.moments = plan.weighted ? new WeightedMoments(plan.step, count) : null;
    this.even = plan.weighted
      ? new EvenSteps(plan.step, count, this.response, (columns, made) => this.gather(columns, 0, made))
      : null;
  }

  /**
   * @param place  of the block's samples in the file
   * @throws not-a-number
   */
  add(block: VelocityBlock, from: number, place: PlaceOf): void {
    for (let i = from; i < block.count; ) {
      if (block.t !== null && this.isRepeated(block.t[i])) {
        this.replace(block, i, place(i));
        i++;
        continue;
      }
      if (block.t !== null) this.step(block.t[i], place(i));
      const to = this.endOfRun(block.t, i, block.count);
      this.take(block, i, to);
      i = to;
    }
  }

  close(): ClosedRecord {
    this.even?.end();
    this.flush();
    const { plan, samples, sums, unequal, gaps, lost, repeated, cuts, response, last, facts } = this;
    const duration = plan.weighted && last !== null ? last - facts.start - lost : samples * plan.step;
    const counted = { samples, longest: this.longest, duration, unequal, gaps, lost, repeated };
    return { sums, ...counted, seamList: this.listed.list(), cuts, lowestSpeed: this.lowest, response };
  }

  private isRepeated(time: number): boolean {
    const { last, plan } = this;
    return last !== null && !plan.rounded && time >= last && time - last <= sameStamp * plan.step;
  }

  /** Whether the step to this time is the record's, a gap, or one back. */
  private step(time: number, place: number): void {
    const { last, plan } = this;
    this.last = time;
    if (last === null) return;
    if (time < last) {
      this.cuts.push({ sample: place, time, from: last, dropped: 0 });
      this.seam();
    } else if (time - last > gapSteps * plan.step) {
      const samples = Math.round((time - last) / plan.step) - 1;
      this.listed.add({ at: place + 1, kind: "gap", from: last, to: time, samples });
      this.gaps++;
      this.lost += time - last;
      this.seam();
    } else if (!isEqualStep(time - last, plan)) this.unequal++;
  }

  /** Index after the last sample that follows by the record's own step. */
  private endOfRun(t: Float64Array | null, from: number, count: number): number {
    if (t === null) return count;
    const { plan } = this;
    let to = from + 1;
    // one comparison a sample in a record without blemish
    while (to < count && (t[to] > t[to - 1] || plan.rounded) && isEqualStep(t[to] - t[to - 1], plan)) to++;
    this.last = t[to - 1];
    return to;
  }

  private seam(): void {
    this.piece = 0;
    if (this.even !== null) {
      this.even.end();
      this.moments?.end();
    }
    if (this.filled === this.size) this.flush();
    this.seams.push(this.filled);
  }

  private take(block: VelocityBlock, from: number, to: number): void {
    for (let i = from; i < to; i++) if (block.u[i] < this.lowest) this.lowest = block.u[i];
    if (this.even === null) this.gather(this.arrays(block), from, to, block.t);
    else if (block.t !== null) {
      const sources = this.arrays(block);
      for (let i = from; i < to; i++) {
        this.read(sources, block.t, i);
        this.even.add(block.t[i], this.sample);
        this.moments?.add(block.t[i], this.sample);
      }
    }
    this.samples += to - from;
    this.piece += to - from;
    this.longest = Math.max(this.longest, this.piece);
  }

  /** The newer of two samples under one time stands for both. */
  private replace(block: VelocityBlock, i: number, place: number): void {
    this.repeated++;
    const time = block.t?.[i] ?? 0;
    this.listed.add({ at: place + 1, kind: "repeated", from: time, to: time, samples: 1 });
    this.read(this.arrays(block), block.t, i);
    if (block.u[i] < this.lowest) this.lowest = block.u[i];
    this.even?.replace(this.sample);
    this.moments?.replace(this.sample);
    if (this.even !== null) return;
    // a chunk goes when the next sample is there, so that the last one is always at hand
    this.columns.forEach((column, c) => {
      column[this.history + this.filled - 1] = this.sample[c];
    });
  }

  /** One sample about the reference and the trend. */
  private read(sources: readonly Float64Array[], t: Float64Array | null, i: number): void {
    const { plan, sample } = this;
    const time = t === null ? 0 : t[i] - plan.centre;
    for (let c = 0; c < sample.length; c++) {
      sample[c] = sources[c][i] - plan.reference[c] - plan.slope[c] * time;
    }
  }

  private arrays(block: VelocityBlock): Float64Array[] {
    return this.facts.components.map((name) => {
      const source = block[name];
      assert(source !== null, "all blocks of a record have the same columns");
      return source;
    });
  }

  /** Equally spaced samples into chunks; those made from unequal steps are about the reference already. */
  private gather(
    sources: readonly Float64Array[],
    from: number,
    to: number,
    t: Float64Array | null = null,
  ): void {
    const { columns, history, plan } = this;
    for (let i = from; i < to; ) {
      if (this.filled === this.size) this.flush();
      const run = Math.min(this.size - this.filled, to - i);
      const at = history + this.filled;
      for (let c = 0; c < columns.length; c++) {
        const [source, target] = [sources[c], columns[c]];
        const level = this.even === null ? plan.reference[c] : 0;
        for (let k = 0; k < run; k++) target[at + k] = source[i + k] - level;
        if (plan.slope[c] === 0 || this.even !== null) continue;
        for (let k = 0; k < run; k++) {
          const time = t === null ? (this.samples + i - from + k) * plan.step : t[i + k];
          target[at + k] -= plan.slope[c] * (time - plan.centre);
        }
      }
      this.filled += run;
      i += run;
    }
  }

  private flush(): void {
    if (this.filled === 0) return;
    const { columns, filled, seams } = this;
    const moments = this.moments?.upTo(filled) ?? null;
    this.sums.take({ columns, count: filled, seams, moments });
    for (const column of columns) column.copyWithin(0, filled, filled + this.history);
    this.filled = 0;
    this.seams = [];
  }
}
