import { assert } from "../failure.ts";
import type { RecordOrigin, VelocityBlock } from "../records.ts";
import { backwardTime, halfStep } from "./examineSteps.ts";
import type { PilotFacts } from "./openPilot.ts";
import type { RecordPlan } from "./recordPlan.ts";
import { historyOf, type RecordSums, startRecordSums } from "./recordSums.ts";
import { isEqualStep } from "./stepRule.ts";

/** A record past its pilot: samples are cut into chunks and summed. */
export interface OpenRecord {
  readonly plan: RecordPlan;
  readonly facts: PilotFacts;
  add(block: VelocityBlock, from: number): void;
  close(): ClosedRecord;
}

export interface ClosedRecord {
  readonly sums: RecordSums;
  readonly samples: number;
  readonly duration: number;
  readonly lowestSpeed: number;
  /** Steps that are not the plan's. */
  readonly unequal: number;
}

export function openRecord(plan: RecordPlan, origin: RecordOrigin, facts: PilotFacts): OpenRecord {
  const { components } = facts;
  const size = plan.blockSamples;
  const history = historyOf(plan);
  const sums = startRecordSums(plan, origin, components);
  const columns = components.map(() => new Float64Array(history + size));
  // placed as the samples are, behind the history
  const weights = new Float64Array(history + size);
  let filled = 0;
  let samples = 0;
  let lowest = Infinity;
  let unequal = 0;
  let last: number | null = null;

  function flush(): void {
    if (filled === 0) return;
    sums.take(columns, filled, plan.weighted ? weights : null);
    for (const column of columns) column.copyWithin(0, filled, filled + history);
    filled = 0;
  }

  /** Checks the steps of a run and shares each between the two samples it joins. */
  function watch(t: Float64Array, from: number, run: number): void {
    for (let k = 0; k < run; k++) {
      const step: number = last === null ? 0 : t[from + k] - last;
      if (step < 0) throw backwardTime(samples + k, last ?? 0, t[from + k], origin);
      if (last !== null && !isEqualStep(step, plan)) unequal++;
      const half = halfStep(step, plan.step) / plan.step;
      const at = history + filled + k;
      weights[at] = half;
      // a chunk's last sample was given its second half before the chunk went
      if (at > history) weights[at - 1] += half;
      last = t[from + k];
    }
  }

  function copy(block: VelocityBlock, from: number, run: number): void {
    for (let c = 0; c < components.length; c++) {
      const source = block[components[c]];
      assert(source !== null, "all blocks of a record have the same columns");
      const target = columns[c];
      const at = history + filled;
      const level = plan.reference[c];
      for (let k = 0; k < run; k++) target[at + k] = source[from + k] - level;
      if (plan.slope[c] === 0) continue;
      for (let k = 0; k < run; k++) {
        const time = block.t === null ? (samples + k) * plan.step : block.t[from + k];
        target[at + k] -= plan.slope[c] * (time - plan.centre);
      }
    }
    for (let k = 0; k < run; k++) if (block.u[from + k] < lowest) lowest = block.u[from + k];
  }

  return {
    plan,
    facts,
    add(block, from) {
      for (let i = from; i < block.count; ) {
        if (filled === size) {
          if (block.t !== null && last !== null)
            weights[history + size - 1] += halfStep(block.t[i] - last, plan.step) / plan.step;
          flush();
        }
        const run = Math.min(size - filled, block.count - i);
        if (block.t !== null) watch(block.t, i, run);
        copy(block, i, run);
        filled += run;
        samples += run;
        i += run;
      }
    },
    close() {
      flush();
      const duration = plan.weighted && last !== null ? last - facts.start : samples * plan.step;
      return { sums, samples, duration, lowestSpeed: lowest, unequal };
    },
  };
}
