import type { BlockList, BlockSeries } from "../signal/blockList.ts";
import { additiveSeries } from "../signal/blockList.ts";
import { startWelch, type WelchSums } from "../signal/welch.ts";
import { bandBorders } from "./bandBorders.ts";

/** Σ f² |X_f|² of short segments, per block and band: the gradient's sums, from which blocks are cut alike. */
export interface BandSums {
  readonly size: number;
  readonly counts: BlockSeries;
  readonly sums: readonly BlockSeries[];
  /** A Welch accumulator a component; each tells the block that holds its segment's middle. */
  open(blocks: BlockList, listen: SegmentListener): WelchSums[];
}

/** Told of every segment's transform, component by component. */
export type SegmentListener = (component: number, transform: Float64Array) => void;

/**
 * @param size        samples a segment, a power of two
 * @param components  how many
 */
export function startBandSums(size: number, components: number): BandSums {
  const borders = bandBorders(size);
  const counts = additiveSeries(1);
  const sums = Array.from({ length: components }, () => additiveSeries(borders.length));

  function take(c: number, block: number, transform: Float64Array): void {
    if (c === 0) counts.data[block] += 1;
    const offset = block * borders.length;
    let end = size / 2 + 1;
    for (let band = 0; band < borders.length; band++) {
      let sum = 0;
      for (let f = borders[band]; f < end; f++) {
        const re = transform[2 * f];
        const im = transform[2 * f + 1];
        sum += f * f * (re * re + im * im);
      }
      sums[c].data[offset + band] += sum;
      end = borders[band];
    }
  }
  return {
    size,
    counts,
    sums,
    open: (blocks, listen) =>
      sums.map((_, c) =>
        startWelch(size, (middle, transform) => {
          take(c, Math.floor(middle / blocks.size), transform);
          listen(c, transform);
        }),
      ),
  };
}
