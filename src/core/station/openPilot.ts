import { assert } from "../failure.ts";
import type { RecordOrigin, VelocityBlock } from "../records.ts";
import type { ReduceSettings } from "../stationResult.ts";
import { borrowColumn, returnColumn } from "./columnStore.ts";
import { planRecord } from "./planRecord.ts";
import type { RecordPlan } from "./recordPlan.ts";
import type { Component } from "./stationPart.ts";

/** The first samples of a record, held until they have decided how the rest is treated. */
export interface OpenPilot {
  /** Takes samples until it holds `limit`; returns the index in the block of the first it left. */
  add(block: VelocityBlock, limit: number): number;
  readonly full: boolean;
  plan(settings: ReduceSettings): RecordPlan;
  block(): VelocityBlock;
  facts(): PilotFacts;
  release(): void;
}

export interface PilotFacts {
  readonly components: readonly Component[];
  /** Time of the first sample kept; 0 where the record carries no time. */
  readonly start: number;
  /** Samples left out as start-up. */
  readonly skipped: number;
}

const smallest = 1 << 14;
const names: readonly Component[] = ["u", "v", "w"];

/** @param startup  time left out at the start, s */
export function openPilot(origin: RecordOrigin, startup: number): OpenPilot {
  let columns: Float64Array[] = [];
  let timed = false;
  let present: Component[] = ["u"];
  let count = 0;
  let seen = 0;
  let firstTime = 0;
  let full = false;

  /** Index of the first sample of the block that is not start-up. */
  function skip(block: VelocityBlock): number {
    if (seen === 0 && block.count > 0) firstTime = block.t === null ? 0 : block.t[0];
    let i = 0;
    if (count === 0 && startup > 0) {
      const time = (at: number) => (block.t === null ? (seen + at) * (origin.step ?? 0) : block.t[at]);
      while (i < block.count && time(i) < firstTime + startup) i++;
    }
    seen += i;
    return i;
  }

  function open(block: VelocityBlock): void {
    timed = block.t !== null;
    present = names.filter((name) => block[name] !== null);
    columns = Array.from({ length: present.length + (timed ? 1 : 0) }, () => borrowColumn(smallest));
  }

  function grow(needed: number): void {
    if (needed <= columns[0].length) return;
    columns = columns.map((column) => {
      const larger = borrowColumn(Math.max(needed, 2 * column.length));
      larger.set(column.subarray(0, count));
      returnColumn(column);
      return larger;
    });
  }

  return {
    get full() {
      return full;
    },
    add(block, limit) {
      const from = skip(block);
      if (from >= block.count) return from;
      if (count === 0) open(block);
      const to = Math.min(block.count, from + limit - count);
      grow(count + to - from);
      sources(block, present, timed).forEach((source, c) => {
        columns[c].set(source.subarray(from, to), count);
      });
      count += to - from;
      seen += to - from;
      full = count >= limit;
      return to;
    },
    plan: (settings) =>
      planRecord(
        { count, t: timed ? columns[present.length] : null, columns: columns.slice(0, present.length) },
        origin,
        settings,
      ),
    block() {
      const column = (name: Component) => columns[present.indexOf(name)] ?? null;
      return {
        count,
        t: timed ? columns[present.length] : null,
        u: columns[0] ?? new Float64Array(0),
        v: column("v"),
        w: column("w"),
      };
    },
    facts() {
      const skipped = seen - count;
      const untimed = skipped * (origin.step ?? 0);
      return {
        components: present,
        start: timed && count > 0 ? columns[present.length][0] : untimed,
        skipped,
      };
    },
    release() {
      for (const column of columns) returnColumn(column);
      columns = [];
    },
  };
}

/** The block's arrays in the order of the pilot's columns. */
function sources(block: VelocityBlock, present: readonly Component[], timed: boolean): Float64Array[] {
  const arrays = [...present.map((name) => block[name]), ...(timed ? [block.t] : [])];
  return arrays.map((array) => {
    assert(array !== null, "all blocks of a record have the same columns");
    return array;
  });
}
