/** Points kept at most; beyond, pairs of them are averaged. */
const mostPoints = 1 << 18;

/** A signal averaged over equal stretches, of which so few are kept that they may be transformed at once. */
export class CoarseSignal {
  private points = new Float64Array(1 << 10);
  private count = 0;
  private length: number;
  private sum = 0;
  private taken = 0;

  /** @param length  samples averaged into a point, at first */
  constructor(length: number) {
    this.length = length;
  }

  add(x: Float64Array, from: number, to: number): void {
    for (let i = from; i < to; ) {
      const run = Math.min(this.length - this.taken, to - i);
      for (let k = 0; k < run; k++) this.sum += x[i + k];
      this.taken += run;
      i += run;
      if (this.taken === this.length) this.push();
    }
  }

  /** The points, and how many samples stand in each; a last, unfinished one is left out. */
  finish(): { points: Float64Array; length: number } {
    return { points: this.points.subarray(0, this.count), length: this.length };
  }

  private push(): void {
    if (this.count === mostPoints) this.pair();
    if (this.count === this.points.length) {
      const larger = new Float64Array(2 * this.count);
      larger.set(this.points);
      this.points = larger;
    }
    if (this.taken < this.length) return;
    this.points[this.count++] = this.sum / this.length;
    this.sum = 0;
    this.taken = 0;
  }

  /** Halves the points; what was just filled is then half of one. */
  private pair(): void {
    for (let i = 0; i < this.count; i += 2) this.points[i / 2] = (this.points[i] + this.points[i + 1]) / 2;
    this.count /= 2;
    this.length *= 2;
  }
}
