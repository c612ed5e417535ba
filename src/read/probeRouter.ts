import { ReductionFailure } from "../core/failure.ts";
import type { ReadSettings, RecordOrigin, Role } from "../core/records.ts";
import { ProbeBuffer } from "./probeBuffer.ts";
import type { RecordPlace, RecordSink } from "./readRecords.ts";
import { tidyLength } from "./recognisePosition.ts";
import type { TakenColumn } from "./takeColumns.ts";

/** One probe of a file: its position as the columns have it, and which probe's row came after its last one. */
interface Probe {
  readonly x: number;
  readonly y: number;
  readonly z: number;
  readonly buffer: ProbeBuffer;
  next: Probe | null;
}

/**
 * Sends each row to the probe of its position. The next row is most often the same probe's (probe by probe) or
 * that of the probe which followed last time (time by time), so both are tried before positions are looked up.
 */
export class ProbeRouter {
  private readonly probes = new Map<string, Probe>();
  private readonly at: Readonly<Record<"x" | "y" | "z", number>>;
  private current: Probe | null = null;

  constructor(
    private readonly columns: readonly TakenColumn[],
    private readonly origin: RecordOrigin,
    private readonly settings: Pick<ReadSettings, "zero" | "startup">,
    private readonly sink: RecordSink,
  ) {
    const find = (role: Role) => columns.findIndex((column) => column.role === role);
    this.at = { x: find("x"), y: find("y"), z: find("z") };
  }

  route(values: Float64Array, line: number): void {
    const { at } = this;
    const x = at.x < 0 ? 0 : values[at.x];
    const y = at.y < 0 ? 0 : values[at.y];
    const z = at.z < 0 ? 0 : values[at.z];
    const last = this.current;
    if (last === null || !same(last, x, y, z)) {
      const next = last?.next;
      this.current = next && same(next, x, y, z) ? next : this.lookUp(x, y, z, line);
      if (last) last.next = this.current;
    }
    this.current?.buffer.add(values, line);
  }

  /**
   * Hands on what is still in the buffers.
   * @throws too-few-samples a record that ends before the time left out at its start does
   */
  finish(): void {
    for (const { buffer, x } of this.probes.values()) {
      buffer.flush();
      if (!buffer.handedOn) throw this.endsInStartup(this.placeOf(x));
    }
  }

  private endsInStartup(x: number): ReductionFailure {
    return new ReductionFailure(
      "too-few-samples",
      {
        message: `The record at x = ${x} ends before the time left out at its start does`,
        expected: `a record longer than ${this.settings.startup}`,
        remedy: "Shorten startup in the sheet, or leave the file out.",
      },
      { file: this.origin.file },
    );
  }

  places(): RecordPlace[] {
    return [...this.probes.values()].map(({ buffer }) => buffer.place);
  }

  /** The positions that were met, in order of x. */
  positions(): number[] {
    const found = new Set([...this.probes.values()].map((probe) => this.placeOf(probe.x)));
    return [...found].sort((a, b) => a - b);
  }

  private placeOf(x: number): number {
    return this.origin.position === "column" ? tidyLength(tidyLength(x) - this.settings.zero) : this.origin.x;
  }

  private lookUp(x: number, y: number, z: number, line: number): Probe {
    const key = `${x},${y},${z}`;
    const known = this.probes.get(key);
    if (known) return known;
    if (this.origin.position !== "column") this.refuseSecondX(x, line);
    const origin: RecordOrigin = {
      ...this.origin,
      x: this.placeOf(x),
      y: this.at.y < 0 ? this.origin.y : tidyLength(y),
      z: this.at.z < 0 ? this.origin.z : tidyLength(z),
    };
    const buffer = new ProbeBuffer(this.columns, this.settings.startup, origin, this.sink, this.probes.size);
    const probe: Probe = { x, y, z, buffer, next: null };
    this.probes.set(key, probe);
    return probe;
  }

  /** One x from the sheet cannot stand for several in the file. */
  private refuseSecondX(x: number, line: number): void {
    const [first] = this.probes.values();
    if (first === undefined || first.x === x) return;
    throw new ReductionFailure(
      "ambiguous-columns",
      {
        message: "One position is given for a file that holds several",
        found: `x = ${first.x} and x = ${x}`,
        expected: "one x in the column",
        remedy: "Leave x of this file out of the sheet: its column has it.",
      },
      { file: this.origin.file, line, column: this.columns[this.at.x].index + 1 },
    );
  }
}

function same(probe: Probe, x: number, y: number, z: number): boolean {
  return probe.x === x && probe.y === y && probe.z === z;
}
