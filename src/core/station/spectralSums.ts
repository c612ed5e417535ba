import { additiveSeries, type BlockList, type BlockSeries, blockRow, trimmed } from "../signal/blockList.ts";
import { type EdgeSums, startEdges } from "../signal/edgeSums.ts";
import { type LagProducts, startLagProducts } from "../signal/lagProducts.ts";
import { startWelch, type WelchSums } from "../signal/welch.ts";
import { type BandSums, startBandSums } from "./bandSums.ts";
import type { RecordPlan } from "./recordPlan.ts";
import type { StationPart } from "./stationPart.ts";

/** Of a record with equal steps: lag products and gradients per block, and the Welch spectrum of the whole. */
export class SpectralSums {
  /** All that is kept per block, to be merged with the blocks. */
  readonly series: readonly BlockSeries[];
  private readonly plan: RecordPlan;
  private readonly lags: readonly LagProducts[];
  private readonly products: readonly BlockSeries[];
  private readonly edges: readonly EdgeSums[];
  private readonly bands: BandSums;
  private long: readonly WelchSums[] = [];
  private short: readonly WelchSums[] = [];

  constructor(plan: RecordPlan, components: number) {
    const each = <T>(make: () => T): T[] => Array.from({ length: components }, make);
    this.plan = plan;
    this.lags = each(() => startLagProducts(plan.lagLimit, plan.blockSamples, plan.lagStride));
    this.products = each(() => additiveSeries(plan.lagLimit / plan.lagStride));
    this.edges = each(() => startEdges(plan.lagLimit, plan.lagStride));
    this.bands = startBandSums(plan.bandSegment, components);
    this.series = [...this.products, this.bands.counts, ...this.bands.sums];
  }

  /** Short segments belong to the block of their middle; where one length serves both, a segment is transformed once. */
  open(blocks: BlockList): void {
    const { segment, bandSegment } = this.plan;
    this.short = this.bands.open(blocks);
    this.long = bandSegment === segment ? this.short : this.lags.map(() => startWelch(segment));
  }

  take(columns: readonly Float64Array[], from: number, to: number, block: number): void {
    for (let c = 0; c < columns.length; c++) {
      this.lags[c].add(columns[c], from, to);
      this.lags[c].flush(blockRow(this.products[c], block));
      this.edges[c].add(columns[c], from, to);
      this.long[c].add(columns[c], from, to);
      if (this.short !== this.long) this.short[c].add(columns[c], from, to);
    }
  }

  tables(rows: number): Pick<StationPart, "lags" | "spectrum" | "bands"> {
    const { plan, bands, long } = this;
    return {
      lags: {
        count: plan.lagLimit / plan.lagStride,
        stride: plan.lagStride,
        products: this.products.map((one) => trimmed(one, rows)),
        heads: this.edges.map((one) => one.heads()),
        tails: this.edges.map((one) => one.tails()),
      },
      spectrum: {
        size: plan.segment,
        segments: long[0].segments,
        power: long.map((one) => one.power),
        edges: long.map((one) => one.edges),
      },
      bands: {
        size: bands.size,
        count: bands.sums[0].width,
        segments: trimmed(bands.counts, rows),
        sums: bands.sums.map((one) => trimmed(one, rows)),
      },
    };
  }
}
