import { assert, ReductionFailure } from "../failure.ts";
import type { RecordOrigin, RoundedTimes, VelocityBlock } from "../records.ts";
import type { ReduceSettings } from "../stationResult.ts";
import { type BranchCut, cutTolerance } from "./branchCuts.ts";
import { borrowColumn, returnColumn } from "./columnStore.ts";
import { CutKeeper, type CutList } from "./cutList.ts";
import { examineSteps } from "./examineSteps.ts";
import { planRecord } from "./planRecord.ts";
import { recentStep } from "./recentStep.ts";
import { backwardTime, tooFew } from "./recordFailures.ts";
import type { RecordPlan } from "./recordPlan.ts";
import { type PlaceOf, SamplePlaces } from "./samplePlaces.ts";
import type { Component } from "./stationPart.ts";

export interface PilotFacts {
  readonly components: readonly Component[];
  /** Time of the first sample kept; counted from the record's start where it carries no time. */
  readonly start: number;
  /** Samples left out as start-up. */
  readonly skipped: number;
  /** Samples of the pilot. */
  readonly held: number;
  readonly cuts: readonly BranchCut[];
  /** Samples that were sent once more under the same time, all and one by one. */
  readonly repeated: number;
  readonly twice: CutList;
  /** Index in the file of a sample of the pilot. */
  readonly place: PlaceOf;
}

const smallest = 1 << 14;
const names: readonly Component[] = ["u", "v", "w"];

/**
 * The first samples of a record, held until they have decided how the rest is treated. Where time runs backward,
 * the samples that the newer run overtakes are dropped at once.
 */
export class PilotBuffer {
  private readonly origin: RecordOrigin;
  private readonly startup: number;
  private readonly rounded: RoundedTimes;
  /** Measured components, then t where there is one. */
  private columns: Float64Array[] = [];
  private components: readonly Component[] = ["u"];
  private timed = false;
  private count = 0;
  /** Samples taken from the file. */
  private seen = 0;
  private skipped = 0;
  private firstTime = 0;
  private readonly cuts: BranchCut[] = [];
  private repeated = 0;
  private readonly twice = new CutKeeper();
  private places = new SamplePlaces();
  /** Stamps alike are one sample sent twice; null: not known yet, for they may be rounded. */
  private oneSample: boolean | null = null;

  /**
   * @param startup  time left out at the start, s
   * @param rounded  what time stamps with too few digits are taken for
   */
  constructor(origin: RecordOrigin, startup: number, rounded: RoundedTimes) {
    this.rounded = rounded;
    this.origin = origin;
    this.startup = startup;
  }

  /**
   * Takes samples until it holds `limit`; returns the index in the block of the first it left.
   * @param place  of the block's samples in the file
   */
  add(block: VelocityBlock, from: number, limit: number, place: PlaceOf): number {
    let i = this.skip(block, from);
    if (i >= block.count) return i;
    if (this.columns.length === 0) this.open(block);
    while (i < block.count && this.count < limit) {
      const to = this.endOfRun(block.t, i, Math.min(block.count, i + limit - this.count), place(i));
      this.places.follow(this.count, place(i));
      this.copy(block, i, to);
      this.seen += to - i;
      i = to;
    }
    return i;
  }

  holds(limit: number): boolean {
    return this.count >= limit;
  }

  /** Stamps alike are looked at: rounded ones stay, of samples that were sent twice the newer does. */
  settle(): void {
    const t = this.times();
    if (t === null || this.oneSample !== null || !hasEqual(t, this.count)) return;
    // one time in all of them is no time at all, which the plan refuses
    if (!(t[this.count - 1] > t[0])) return;
    this.oneSample = !examineSteps(t, this.count, this.origin, this.rounded).rounded;
    if (!this.oneSample) return;
    const { of: placeOf } = this.places;
    this.places = new SamplePlaces();
    let kept = 0;
    for (let i = 0; i < this.count; i++) {
      if (i + 1 < this.count && t[i + 1] === t[i]) {
        this.twice.add({ at: placeOf(i + 1) + 1, kind: "repeated", from: t[i], to: t[i], samples: 1 });
        continue;
      }
      this.places.follow(kept, placeOf(i));
      for (const column of this.columns) column[kept] = column[i];
      kept++;
    }
    this.repeated += this.count - kept;
    this.count = kept;
  }

  /** @throws too-few-samples, constant-signal, no-time, backward-time, not-a-number */
  plan(settings: ReduceSettings): RecordPlan {
    const columns = this.columns.slice(0, this.components.length);
    try {
      return planRecord({ count: this.count, t: this.times(), columns }, this.origin, settings, this.rounded);
    } catch (error) {
      const [first] = this.cuts;
      const short = error instanceof ReductionFailure && error.code === "too-few-samples";
      if (!short || first === undefined) throw error;
      throw backwardTime(first, this.count, this.origin);
    }
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
    const t = this.times();
    const { components, skipped, count, cuts, repeated, twice, places } = this;
    if (count === 0) throw tooFew(0, 1, this.origin);
    return {
      components,
      start: t === null ? skipped * (this.origin.step ?? 0) : t[0],
      skipped,
      held: count,
      cuts,
      repeated,
      twice: twice.list(),
      place: places.of,
    };
  }

  release(): void {
    for (const column of this.columns) returnColumn(column);
    this.columns = [];
  }

  /** Index of the first sample of the block that is not start-up. */
  private skip(block: VelocityBlock, from: number): number {
    if (this.seen === 0 && block.count > 0) this.firstTime = block.t === null ? 0 : block.t[0];
    if (this.count > 0 || !(this.startup > 0)) return from;
    const step = this.origin.step ?? 0;
    const end = this.firstTime + this.startup;
    let i = from;
    while (i < block.count && (block.t === null ? this.seen * step : block.t[i]) < end) {
      i++;
      this.seen++;
      this.skipped++;
    }
    return i;
  }

  /** Samples in order of time from `from` on, after those held; where it goes back, the older run is cut. */
  private endOfRun(t: Float64Array | null, from: number, most: number, place: number): number {
    const held = this.times();
    if (t === null || held === null) return most;
    if (this.count > 0) {
      const last = held[this.count - 1];
      if (t[from] < last) this.cut(held, t[from], place);
      else if (t[from] === last && this.oneSample) this.drop(t[from], place);
    }
    let to = from + 1;
    while (to < most && (t[to] > t[to - 1] || (t[to] === t[to - 1] && !this.oneSample))) to++;
    return to;
  }

  private cut(held: Float64Array, time: number, place: number): void {
    const bound = time - cutTolerance * recentStep(held, this.count);
    const before = this.count;
    const from = held[before - 1];
    while (this.count > 0 && held[this.count - 1] > bound) this.count--;
    this.cuts.push({ sample: place, time, from, dropped: before - this.count });
  }

  /** The newer of two samples under one time stands for both. */
  private drop(time: number, place: number): void {
    this.count--;
    this.repeated++;
    this.twice.add({ at: place + 1, kind: "repeated", from: time, to: time, samples: 1 });
  }

  private copy(block: VelocityBlock, from: number, to: number): void {
    this.grow(this.count + to - from);
    this.sources(block).forEach((source, c) => {
      this.columns[c].set(source.subarray(from, to), this.count);
    });
    this.count += to - from;
  }

  private open(block: VelocityBlock): void {
    this.timed = block.t !== null;
    this.components = names.filter((name) => block[name] !== null);
    const columns = this.components.length + (this.timed ? 1 : 0);
    this.columns = Array.from({ length: columns }, () => borrowColumn(smallest));
  }

  private grow(needed: number): void {
    // lent arrays differ in length: each is looked at
    this.columns = this.columns.map((column) => {
      if (needed <= column.length) return column;
      const larger = borrowColumn(Math.max(needed, 2 * column.length));
      larger.set(column.subarray(0, this.count));
      returnColumn(column);
      return larger;
    });
  }

  private times(): Float64Array | null {
    return this.timed ? (this.columns[this.components.length] ?? null) : null;
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

function hasEqual(t: Float64Array, count: number): boolean {
  for (let i = 1; i < count; i++) if (t[i] === t[i - 1]) return true;
  return false;
}
