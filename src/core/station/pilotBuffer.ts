import { assert } from "../failure.ts";
import type { RecordOrigin, VelocityBlock } from "../records.ts";
import type { ReduceSettings } from "../stationResult.ts";
import { borrowColumn, returnColumn } from "./columnStore.ts";
import { planRecord } from "./planRecord.ts";
import type { RecordPlan } from "./recordPlan.ts";
import type { Component } from "./stationPart.ts";

export interface PilotFacts {
  readonly components: readonly Component[];
  /** Time of the first sample kept; counted from the record's start where it carries no time. */
  readonly start: number;
  /** Samples left out as start-up. */
  readonly skipped: number;
  /** Samples of the pilot. */
  readonly held: number;
}

const smallest = 1 << 14;
const names: readonly Component[] = ["u", "v", "w"];

/** The first samples of a record, held until they have decided how the rest is treated. */
export class PilotBuffer {
  private readonly origin: RecordOrigin;
  private readonly startup: number;
  /** Measured components, then t where there is one. */
  private columns: Float64Array[] = [];
  private components: readonly Component[] = ["u"];
  private timed = false;
  private count = 0;
  private seen = 0;
  private firstTime = 0;

  /** @param startup  time left out at the start, s */
  constructor(origin: RecordOrigin, startup: number) {
    this.origin = origin;
    this.startup = startup;
  }

  /** Takes samples until it holds `limit`; returns the index in the block of the first it left. */
  add(block: VelocityBlock, limit: number): number {
    const from = this.skip(block);
    if (from >= block.count) return from;
    if (this.count === 0) this.open(block);
    const to = Math.min(block.count, from + limit - this.count);
    this.grow(this.count + to - from);
    this.sources(block).forEach((source, c) => {
      this.columns[c].set(source.subarray(from, to), this.count);
    });
    this.count += to - from;
    this.seen += to - from;
    return to;
  }

  holds(limit: number): boolean {
    return this.count >= limit;
  }

  /** @throws too-few-samples, constant-signal, no-time, backward-time, not-a-number */
  plan(settings: ReduceSettings): RecordPlan {
    const columns = this.columns.slice(0, this.components.length);
    return planRecord({ count: this.count, t: this.times(), columns }, this.origin, settings);
  }

  block(): VelocityBlock {
    const column = (name: Component) => this.columns[this.components.indexOf(name)] ?? null;
    return {
      count: this.count,
      t: this.times(),
      u: column("u") ?? new Float64Array(0),
      v: column("v"),
      w: column("w"),
    };
  }

  facts(): PilotFacts {
    const skipped = this.seen - this.count;
    const t = this.times();
    const start = t !== null && this.count > 0 ? t[0] : skipped * (this.origin.step ?? 0);
    return { components: this.components, start, skipped, held: this.count };
  }

  release(): void {
    for (const column of this.columns) returnColumn(column);
    this.columns = [];
  }

  /** Index of the first sample of the block that is not start-up. */
  private skip(block: VelocityBlock): number {
    if (this.seen === 0 && block.count > 0) this.firstTime = block.t === null ? 0 : block.t[0];
    if (this.count > 0 || !(this.startup > 0)) return 0;
    const step = this.origin.step ?? 0;
    const end = this.firstTime + this.startup;
    let i = 0;
    while (i < block.count && (block.t === null ? (this.seen + i) * step : block.t[i]) < end) i++;
    this.seen += i;
    return i;
  }

  private open(block: VelocityBlock): void {
    this.timed = block.t !== null;
    this.components = names.filter((name) => block[name] !== null);
    const columns = this.components.length + (this.timed ? 1 : 0);
    this.columns = Array.from({ length: columns }, () => borrowColumn(smallest));
  }

  private grow(needed: number): void {
    if (needed <= this.columns[0].length) return;
    this.columns = this.columns.map((column) => {
      const larger = borrowColumn(Math.max(needed, 2 * column.length));
      larger.set(column.subarray(0, this.count));
      returnColumn(column);
      return larger;
    });
  }

  private times(): Float64Array | null {
    return this.timed ? this.columns[this.components.length] : null;
  }

  /** The block's arrays in the order of the columns. */
  private sources(block: VelocityBlock): Float64Array[] {
    const arrays = [...this.components.map((name) => block[name]), ...(this.timed ? [block.t] : [])];
    return arrays.map((array) => {
      assert(array !== null, "all blocks of a record have the same columns");
      return array;
    });
  }
}
