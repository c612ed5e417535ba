import { assert } from "../failure.ts";
import type { RecordOrigin, VelocityBlock } from "../records.ts";
import { backwardTime, halfStep } from "./examineSteps.ts";
import type { PilotFacts } from "./pilotBuffer.ts";
import type { RecordPlan } from "./recordPlan.ts";
import { historyOf, RecordSums } from "./recordSums.ts";
import { isEqualStep } from "./stepRule.ts";

/** What a record turned out to be, once its last sample was taken. */
export interface ClosedRecord {
  readonly sums: RecordSums;
  readonly samples: number;
  readonly duration: number;
  readonly lowestSpeed: number;
  /** Steps that are not the plan's. */
  readonly unequal: number;
}

/**
 * A record past its pilot: samples are gathered, about the plan's reference, into chunks of the smallest block's
 * size, counted from the record's start, and summed chunk by chunk. A chunk goes when the next sample is there:
 * its last sample's weight needs the step that follows it.
 */
export class RecordChunks {
  readonly plan: RecordPlan;
  readonly facts: PilotFacts;
  private readonly origin: RecordOrigin;
  private readonly sums: RecordSums;
  private readonly size: number;
  private readonly history: number;
  private readonly columns: Float64Array[];
  /** Placed as the samples are, behind the history. */
  private readonly weights: Float64Array;
  private filled = 0;
  private samples = 0;
  private lowest = Infinity;
  private unequal = 0;
  private last: number | null = null;

  constructor(plan: RecordPlan, origin: RecordOrigin, facts: PilotFacts) {
    this.plan = plan;
    this.origin = origin;
    this.facts = facts;
    this.size = plan.blockSamples;
    this.history = historyOf(plan);
    this.sums = new RecordSums(plan, origin, facts.components);
    this.columns = facts.components.map(() => new Float64Array(this.history + this.size));
    this.weights = new Float64Array(this.history + this.size);
  }

  /** @throws backward-time, not-a-number */
  add(block: VelocityBlock, from: number): void {
    for (let i = from; i < block.count; ) {
      if (this.filled === this.size) {
        if (block.t !== null) this.weights[this.history + this.size - 1] += this.half(block.t[i]);
        this.flush();
      }
      const run = Math.min(this.size - this.filled, block.count - i);
      if (block.t !== null) this.watch(block.t, i, run);
      this.copy(block, i, run);
      this.filled += run;
      this.samples += run;
      i += run;
    }
  }

  close(): ClosedRecord {
    this.flush();
    const { plan, last, facts, samples } = this;
    const duration = plan.weighted && last !== null ? last - facts.start : samples * plan.step;
    return { sums: this.sums, samples, duration, lowestSpeed: this.lowest, unequal: this.unequal };
  }

  private flush(): void {
    if (this.filled === 0) return;
    this.sums.take(this.columns, this.filled, this.plan.weighted ? this.weights : null);
    for (const column of this.columns) column.copyWithin(0, this.filled, this.filled + this.history);
    this.filled = 0;
  }

  /** Half of the step from the last sample to this time, in steps of the record. */
  private half(time: number): number {
    return this.last === null ? 0 : halfStep(time - this.last, this.plan.step) / this.plan.step;
  }

  /** Checks the steps of a run and shares each between the two samples it joins. */
  private watch(t: Float64Array, from: number, run: number): void {
    for (let k = 0; k < run; k++) {
      const time = t[from + k];
      const { last } = this;
      if (last !== null) {
        if (time < last) throw backwardTime(this.samples + k, last, time, this.origin);
        if (!isEqualStep(time - last, this.plan)) this.unequal++;
      }
      const at = this.history + this.filled + k;
      const half = this.half(time);
      this.weights[at] = half;
      // a chunk's last sample was given its second half before the chunk went
      if (at > this.history) this.weights[at - 1] += half;
      this.last = time;
    }
  }

  private copy(block: VelocityBlock, from: number, run: number): void {
    const { plan, facts, columns, history, filled } = this;
    for (let c = 0; c < columns.length; c++) {
      const source = block[facts.components[c]];
      assert(source !== null, "all blocks of a record have the same columns");
      const target = columns[c];
      const at = history + filled;
      const level = plan.reference[c];
      for (let k = 0; k < run; k++) target[at + k] = source[from + k] - level;
      if (plan.slope[c] === 0) continue;
      for (let k = 0; k < run; k++) {
        const time = block.t === null ? (this.samples + k) * plan.step : block.t[from + k];
        target[at + k] -= plan.slope[c] * (time - plan.centre);
      }
    }
    for (let k = 0; k < run; k++) if (block.u[from + k] < this.lowest) this.lowest = block.u[from + k];
  }
}
