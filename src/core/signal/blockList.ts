/** One kind of sum kept per block: a row of `width` numbers a block. */
export interface BlockSeries {
  readonly width: number;
  readonly data: Float64Array;
  /** Adds row `from` to row `into`. */
  merge(into: Float64Array, from: Float64Array): void;
}

/** A record's blocks, counted from its start. */
export interface BlockList {
  /** Samples in a whole block: the first size times a power of two. */
  readonly size: number;
  /** Blocks begun. */
  readonly rows: number;
  /** The block that the next chunk belongs to. */
  readonly current: number;
  /** Says that a chunk of `count` samples begins; a chunk never crosses a border of the first size. */
  begin(count: number): void;
}

/** Most blocks a record has: 127 of them leave 64 after pairing, the last half filled. */
export const mostBlocks = 127;

/** An empty series that merges by plain addition. */
export function additiveSeries(width: number): BlockSeries {
  return {
    width,
    data: new Float64Array(width * mostBlocks),
    merge: (into, from) => {
      for (let i = 0; i < width; i++) into[i] += from[i];
    },
  };
}

/** The row of one block. */
export function blockRow(series: BlockSeries, block: number): Float64Array {
  return series.data.subarray(block * series.width, (block + 1) * series.width);
}

/** The rows of the blocks begun, in an array of their own. */
export function trimmed(series: BlockSeries, rows: number): Float64Array {
  return series.data.slice(0, rows * series.width);
}

/**
 * Up to 127 blocks; when a 128th would begin, pairs are merged and the size doubles. Borders depend on nothing
 * but the count of samples, so that any way of handing the samples in gives the same blocks.
 * @param first   samples in a block at the start
 * @param series  all that is kept per block; merged together
 */
export function startBlocks(first: number, series: readonly BlockSeries[]): BlockList {
  let size = first;
  let current = 0;
  let filled = 0;

  function pair(): void {
    for (const one of series) {
      for (let block = 0; block < mostBlocks; block += 2) {
        const target = block / 2;
        if (target !== block)
          one.data.copyWithin(target * one.width, block * one.width, (block + 1) * one.width);
        if (block + 1 < mostBlocks) one.merge(blockRow(one, target), blockRow(one, block + 1));
      }
      one.data.fill(0, ((mostBlocks + 1) / 2) * one.width);
    }
    current = (mostBlocks - 1) / 2;
    filled = size;
    size *= 2;
  }

  return {
    get size() {
      return size;
    },
    get rows() {
      return current + (filled > 0 ? 1 : 0);
    },
    get current() {
      return current;
    },
    begin(count) {
      if (filled >= size) {
        current++;
        filled = 0;
        if (current === mostBlocks) pair();
      }
      filled += count;
    },
  };
}
