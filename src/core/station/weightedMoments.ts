import { fillJoint, jointLayout } from "../signal/jointMoments.ts";
import { mergeJoint } from "../signal/mergeJoint.ts";

/** Samples summed at once; borders are counted from each chunk's first sample. */
const batch = 1024;

/**
 * Moments of samples at unequal steps by the trapezoid rule: a sample weighs half of the steps on its two sides,
 * in steps of the record, and nothing on the side of a gap. They are handed out chunk by chunk of the equally
 * spaced samples made from them, each sample with the chunk in which its time lies.
 */
export class WeightedMoments {
  private readonly step: number;
  private readonly layout;
  private readonly row: Float64Array;
  private readonly part: Float64Array;
  /** Values, then weights, then the count of equally spaced samples up to each sample's time. */
  private columns: Float64Array[];
  private held = 0;
  private begin: number | null = null;
  private last = 0;
  /** Equally spaced samples of the pieces before this one, and of the chunks handed out. */
  private before = 0;
  private done = 0;

  constructor(step: number, components: number) {
    this.step = step;
    this.layout = jointLayout(components);
    this.row = new Float64Array(this.layout.length);
    this.part = new Float64Array(this.layout.length);
    this.columns = Array.from({ length: components + 2 }, () => new Float64Array(4 * batch));
  }

  add(time: number, sample: readonly number[]): void {
    const { step, held } = this;
    if (held === this.columns[0].length) this.grow();
    const first = this.begin === null;
    if (this.begin === null) this.begin = time;
    const half = first ? 0 : (time - this.last) / (2 * step);
    const [weights, places] = this.columns.slice(-2);
    weights[held] = half;
    if (!first) weights[held - 1] += half;
    places[held] = this.before + Math.floor((time - this.begin) / step + 1e-6);
    for (let c = 0; c < sample.length; c++) this.columns[c][held] = sample[c];
    this.last = time;
    this.held++;
  }

  replace(sample: readonly number[]): void {
    for (let c = 0; c < sample.length; c++) this.columns[c][this.held - 1] = sample[c];
  }

  /** The piece ends. */
  end(): void {
    if (this.begin !== null) this.before += Math.floor((this.last - this.begin) / this.step + 1e-6) + 1;
    this.begin = null;
  }

  /** Joint moments of the samples that lie in the next `count` equally spaced ones; used again. */
  upTo(count: number): Float64Array {
    const { layout, row, part, columns, held } = this;
    const places = columns[columns.length - 1];
    this.done += count;
    row.fill(0);
    let to = 0;
    for (let from = 0; ; from = to) {
      while (to < held && to - from < batch && places[to] < this.done) to++;
      if (to === from) break;
      fillJoint(part, layout, columns, from, to, columns[columns.length - 2]);
      mergeJoint(row, part, layout);
    }
    for (const column of columns) column.copyWithin(0, to, held);
    this.held -= to;
    return row;
  }

  private grow(): void {
    this.columns = this.columns.map((column) => {
      const larger = new Float64Array(2 * column.length);
      larger.set(column);
      return larger;
    });
  }
}
