/** Rows of a table of lines held in memory, a column an array, in the order in which they came. */
export class LineRows {
  count = 0;
  t = new Float64Array(1024);
  x = new Float64Array(1024);
  y = new Float64Array(1024);
  z = new Float64Array(1024);
  /** u, v, w as far as they are there. */
  values: Float64Array[];
  /** 1-based line of the file. */
  line = new Uint32Array(1024);

  constructor(components: number) {
    this.values = Array.from({ length: components }, () => new Float64Array(1024));
  }

  add(
    t: number,
    x: number,
    y: number,
    z: number,
    row: Float64Array,
    at: readonly number[],
    line: number,
  ): void {
    const i = this.count++;
    if (i === this.t.length) this.grow();
    this.t[i] = t;
    this.x[i] = x;
    this.y[i] = y;
    this.z[i] = z;
    this.line[i] = line;
    for (let c = 0; c < at.length; c++) this.values[c][i] = row[at[c]];
  }

  /** Forgets the first rows. */
  drop(rows: number): void {
    for (const column of [this.t, this.x, this.y, this.z, this.line, ...this.values]) {
      column.copyWithin(0, rows, this.count);
    }
    this.count -= rows;
  }

  private grow(): void {
    const wider = (column: Float64Array) => {
      const grown = new Float64Array(2 * column.length);
      grown.set(column);
      return grown;
    };
    [this.t, this.x, this.y, this.z] = [this.t, this.x, this.y, this.z].map(wider);
    this.values = this.values.map(wider);
    const lines = new Uint32Array(2 * this.line.length);
    lines.set(this.line);
    this.line = lines;
  }
}
