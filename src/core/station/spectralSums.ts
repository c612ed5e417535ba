import { additiveSeries, type BlockList, type BlockSeries, blockRow, trimmed } from "../signal/blockList.ts";
import { type CrossPower, startCrossPower } from "../signal/crossPower.ts";
import { type EdgeSums, startEdges } from "../signal/edgeSums.ts";
import { type IncrementSums, incrementLags, startIncrements } from "../signal/incrementSums.ts";
import { type LagProducts, startLagProducts } from "../signal/lagProducts.ts";
import { startWelch, type WelchSums } from "../signal/welch.ts";
import { type BandSums, startBandSums } from "./bandSums.ts";
import type { RecordPlan } from "./recordPlan.ts";
import type { StationPart } from "./stationPart.ts";

/** Of equally spaced samples: lag products and gradients per block, and the Welch spectrum of the whole. */
export class SpectralSums {
  /** All that is kept per block, to be merged with the blocks. */
  readonly series: readonly BlockSeries[];
  private readonly plan: RecordPlan;
  private readonly lags: readonly LagProducts[];
  private readonly products: readonly BlockSeries[];
  private readonly edges: readonly EdgeSums[];
  private readonly bands: BandSums;
  private readonly increments: IncrementSums;
  private readonly incrementRows: BlockSeries;
  /** Of u and v; null without v. */
  private readonly cross: CrossPower | null;
  private long: readonly WelchSums[] = [];
  private short: readonly WelchSums[] = [];
  private pieces = 0;

  constructor(plan: RecordPlan, components: number) {
    const each = <T>(make: () => T): T[] => Array.from({ length: components }, make);
    this.plan = plan;
    this.lags = each(() => startLagProducts(plan.lagLimit, plan.blockSamples, plan.lagStride));
    this.products = each(() => additiveSeries(plan.lagLimit / plan.lagStride));
    this.edges = each(() => startEdges(plan.lagLimit, plan.lagStride));
    this.bands = startBandSums(plan.bandSegment, components);
    this.increments = startIncrements(structureLags(plan));
    this.incrementRows = additiveSeries(3 * this.increments.lags.length);
    this.cross = components > 1 ? startCrossPower(plan.segment) : null;
    this.series = [...this.products, this.bands.counts, ...this.bands.sums, this.incrementRows];
  }

  /** Short segments belong to the block of their middle; where one length serves both, a segment is transformed once. */
  open(blocks: BlockList): void {
    const { segment, bandSegment } = this.plan;
    const shared = bandSegment === segment;
    this.short = this.bands.open(blocks, shared ? this.pair : () => {});
    this.long = shared
      ? this.short
      : this.lags.map((_, c) => startWelch(segment, (_middle, transform) => this.pair(c, transform)));
  }

  /** @param place  where in its chunk the first sample stands */
  take(columns: readonly Float64Array[], from: number, to: number, block: number, place: number): void {
    for (let c = 0; c < columns.length; c++) {
      this.lags[c].add(columns[c], from, to, place);
      this.lags[c].flush(blockRow(this.products[c], block));
      this.edges[c].add(columns[c], from, to);
      this.long[c].add(columns[c], from, to);
      if (this.short !== this.long) this.short[c].add(columns[c], from, to);
    }
    this.increments.add(blockRow(this.incrementRows, block), columns[0], from, to);
  }

  /** The transforms of u wait for those of v: a chunk may hold several segments. */
  private readonly pair = (component: number, transform: Float64Array): void => {
    if (component === 0) this.cross?.first(transform);
    if (component === 1) this.cross?.second(transform);
  };

  /** A piece of the record ends: nothing reaches across. */
  restart(): void {
    this.pieces++;
    for (const kind of [this.lags, this.edges, this.long]) for (const one of kind) one.restart();
    this.increments.restart();
    if (this.short !== this.long) for (const one of this.short) one.restart();
  }

  /** @param totals  sums of the samples, a number a component; null: they follow from the moments */
  tables(
    rows: number,
    totals: readonly number[] | null,
  ): Pick<StationPart, "lags" | "spectrum" | "bands" | "increments"> {
    const { plan, bands, long } = this;
    const own = {
      ...(this.pieces > 0 || totals ? { pairs: this.edges[0].pairs() } : {}),
      ...(totals ? { totals } : {}),
    };
    return {
      lags: {
        count: plan.lagLimit / plan.lagStride,
        stride: plan.lagStride,
        products: this.products.map((one) => trimmed(one, rows)),
        heads: this.edges.map((one) => one.heads()),
        tails: this.edges.map((one) => one.tails()),
        ...own,
      },
      spectrum: {
        size: plan.segment,
        segments: long[0].segments,
        power: long.map((one) => one.power),
        cross: this.cross?.power ?? null,
        edges: long.map((one) => one.edges),
      },
      bands: {
        size: bands.size,
        count: bands.sums[0].width,
        segments: trimmed(bands.counts, rows),
        sums: bands.sums.map((one) => trimmed(one, rows)),
      },
      increments: { lags: this.increments.lags, sums: trimmed(this.incrementRows, rows) },
    };
  }
}

/** Lags of the structure functions: from a fortieth of the integral time, below any Taylor scale, up to it. */
function structureLags({ integralTime, step, lagLimit }: RecordPlan): number[] {
  const scale = integralTime === null ? lagLimit / 8 : integralTime / step;
  return incrementLags(Math.max(1, scale / 40), Math.min(scale, lagLimit));
}
