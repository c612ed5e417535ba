import type { RecordOrigin, Role } from "../core/records.ts";
import type { BlockSink, RecordPlace, RecordSink } from "./readRecords.ts";
import type { TakenColumn } from "./takeColumns.ts";

/** Samples in a block, and in all blocks of a file together, more or less: many probes get small ones. */
const largestBlock = 2 ** 14;
const smallestBlock = 2 ** 6;
const allBlocks = 2 ** 18;

/** Collects the samples of one probe and hands them on when full. Its arrays are made once and used again. */
export class ProbeBuffer {
  private readonly from: readonly { values: Float64Array; at: number }[];
  private readonly timeValues: Float64Array | null;
  private readonly block: {
    t: Float64Array | null;
    u: Float64Array;
    v: Float64Array | null;
    w: Float64Array | null;
  };
  private readonly capacity: number;
  private readonly timeAt: number;
  private count = 0;
  private samples = 0;
  private start = Number.NaN;
  private running: boolean;
  private sink: BlockSink | null = null;
  private lastTime = Number.NEGATIVE_INFINITY;
  private firstLine = 0;
  private lastLine = 0;
  private backwardLine: number | null = null;

  /** @param before probes of this file that have a buffer already */
  constructor(
    private readonly columns: readonly TakenColumn[],
    private readonly startup: number,
    private readonly origin: RecordOrigin,
    private readonly records: RecordSink,
    before: number,
  ) {
    this.capacity = Math.max(smallestBlock, Math.min(largestBlock, Math.floor(allBlocks / (before + 1))));
    const find = (role: Role) => columns.findIndex((column) => column.role === role);
    const column = (role: Role) => (find(role) < 0 ? null : new Float64Array(this.capacity));
    this.block = { t: column("t"), u: new Float64Array(this.capacity), v: column("v"), w: column("w") };
    this.from = (["t", "u", "v", "w"] as const).flatMap((role) => {
      const values = this.block[role];
      return values ? [{ values, at: find(role) }] : [];
    });
    this.timeAt = find("t");
    this.timeValues = this.block.t;
    this.running = !(startup > 0);
  }

  add(row: Float64Array, line: number): void {
    if (!this.running && !this.hasStarted(row)) return;
    // a restart may go back into the start-up
    if (this.startup > 0 && this.timeAt >= 0 && this.isBefore(row[this.timeAt])) return;
    const { from, count } = this;
    for (let i = 0; i < from.length; i++) from[i].values[count] = row[from[i].at];
    if (this.firstLine === 0) this.firstLine = line;
    this.lastLine = line;
    if (this.timeValues !== null) this.watchTime(this.timeValues[count], line);
    this.count = count + 1;
    if (this.count === this.capacity) this.flush();
  }

  flush(): void {
    if (this.count === 0) return;
    this.sink ??= this.records.record(this.origin);
    this.sink.add({ count: this.count, ...this.block });
    this.count = 0;
  }

  /** Where in the file its samples stand, for what goes wrong later. */
  get place(): RecordPlace {
    const { columns, origin, firstLine, lastLine, backwardLine } = this;
    const column = (role: Role) => {
      const at = columns.find((each) => each.role === role);
      return at === undefined ? null : at.index + 1;
    };
    return { origin, firstLine, lastLine, backwardLine, timeColumn: column("t"), uColumn: column("u") };
  }

  private watchTime(time: number, line: number): void {
    if (time < this.lastTime) this.backwardLine ??= line;
    this.lastTime = time;
  }

  /** False where the record ended before its start-up did. */
  get handedOn(): boolean {
    return this.sink !== null;
  }

  /** True from the first sample on that lies `startup` after the record's first. */
  private hasStarted(row: Float64Array): boolean {
    const time = this.timeAt < 0 ? this.samples * (this.origin.step ?? 0) : row[this.timeAt];
    if (this.samples === 0) this.start = time;
    this.samples++;
    this.running = !this.isBefore(time);
    return this.running;
  }

  private isBefore(time: number): boolean {
    // half a rounding: times such as 0.1 + 0.2 are not to fall short by their last digit
    return time - this.start < this.startup * (1 - 1e-12);
  }
}
