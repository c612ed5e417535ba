import type { Flag } from "../flag.ts";
import type { RecordOrigin } from "../records.ts";
import { additiveSeries, type BlockSeries, blockRow, startBlocks } from "../signal/blockList.ts";
import { startEdges } from "../signal/edgeSums.ts";
import { fillJoint, jointLayout } from "../signal/jointMoments.ts";
import { startLagProducts } from "../signal/lagProducts.ts";
import { mergeJoint } from "../signal/mergeJoint.ts";
import { startWelch, type WelchSums } from "../signal/welch.ts";
import { startBandSums } from "./bandSums.ts";
import { blockFields, differenceFields } from "./blockFields.ts";
import { addDifferences } from "./differenceSums.ts";
import { notFinite } from "./planRecord.ts";
import type { RecordPlan } from "./recordPlan.ts";
import type { Component, StationPart } from "./stationPart.ts";

/** All sums of one record; samples come in chunks whose borders follow from the sample's index alone. */
export interface RecordSums {
  /**
   * Takes `count` samples, already about the plan's reference, held from index `history` on in every column.
   * @param columns  each with `history` samples before the chunk's first
   * @param weights  placed alike; null: all weigh 1
   */
  take(columns: readonly Float64Array[], count: number, weights: Float64Array | null): void;
  part(facts: PartFacts): StationPart;
}

export interface PartFacts {
  readonly start: number;
  readonly duration: number;
  readonly lowestSpeed: number;
  readonly flags: readonly Flag[];
}

/** Samples before a chunk that its differences reach back to. */
export function historyOf(plan: RecordPlan): number {
  return Math.max(4, 2 * plan.derivativeStep);
}

export function startRecordSums(
  plan: RecordPlan,
  origin: RecordOrigin,
  components: readonly Component[],
): RecordSums {
  const layout = jointLayout(components.length);
  const history = historyOf(plan);
  const chunkRow = new Float64Array(layout.length);
  const moments = momentSeries(components.length);
  const spectral = plan.weighted ? null : startSpectral(plan, components.length);
  const blocks = startBlocks(plan.blockSamples, [moments, ...(spectral?.series ?? [])]);
  const short = spectral?.bands.open(blocks) ?? null;
  // where one length serves both, a segment is transformed once
  const welch = spectral?.long ?? short ?? [];
  let samples = 0;

  function take(columns: readonly Float64Array[], count: number, weights: Float64Array | null): void {
    const to = history + count;
    blocks.begin(count);
    fillJoint(chunkRow, layout, columns, history, to, weights);
    if (!chunkRow.every(Number.isFinite)) throw notFinite(origin);
    const row = blockRow(moments, blocks.current);
    mergeJoint(row, chunkRow, layout);
    if (!spectral) {
      samples += count;
      return;
    }
    const known = Math.min(samples, history);
    addDifferences(
      row.subarray(layout.length),
      columns[0],
      history,
      to,
      known,
      plan.derivativeStep,
      plan.step,
    );
    for (let c = 0; c < components.length; c++) {
      spectral.lags[c].add(columns[c], history, to);
      spectral.lags[c].flush(blockRow(spectral.products[c], blocks.current));
      spectral.edges[c].add(columns[c], history, to);
      welch[c].add(columns[c], history, to);
      if (short && welch !== short) short[c].add(columns[c], history, to);
    }
    samples += count;
  }

  function part(facts: PartFacts): StationPart {
    const rows = blocks.rows;
    const common = {
      origin,
      components,
      samples,
      step: plan.step,
      ...facts,
      plan,
      blocks: {
        fields: blockFields(components),
        rows,
        data: trimmed(moments, rows),
        blockSamples: blocks.size,
        step: plan.step,
        start: facts.start,
      },
    };
    if (!spectral) return { ...common, lags: null, spectrum: null, bands: null };
    return { ...common, ...spectral.tables(rows, welch) };
  }
  return { take, part };
}

/** Joint moments, and the sums of differences behind them in the same row. */
function momentSeries(components: number): BlockSeries {
  const layout = jointLayout(components);
  const series = additiveSeries(layout.length + differenceFields.length);
  return {
    ...series,
    merge: (into, from) => {
      mergeJoint(into, from, layout);
      for (let i = layout.length; i < series.width; i++) into[i] += from[i];
    },
  };
}

function startSpectral(plan: RecordPlan, components: number) {
  const each = <T>(make: () => T): T[] => Array.from({ length: components }, make);
  const count = plan.lagLimit / plan.lagStride;
  const lags = each(() => startLagProducts(plan.lagLimit, plan.blockSamples, plan.lagStride));
  const products = each(() => additiveSeries(count));
  const edges = each(() => startEdges(plan.lagLimit, plan.lagStride));
  const bands = startBandSums(plan.bandSegment, components);
  const long = bands.size === plan.segment ? null : each(() => startWelch(plan.segment));
  const series = [...products, bands.counts, ...bands.sums];
  const tables = (
    rows: number,
    welch: readonly WelchSums[],
  ): Pick<StationPart, "lags" | "spectrum" | "bands"> => ({
    lags: {
      count,
      stride: plan.lagStride,
      products: products.map((one) => trimmed(one, rows)),
      heads: edges.map((one) => one.heads()),
      tails: edges.map((one) => one.tails()),
    },
    spectrum: {
      size: plan.segment,
      segments: welch[0].segments,
      power: welch.map((one) => one.power),
      edges: welch.map((one) => one.edges),
    },
    bands: {
      size: bands.size,
      count: bands.sums[0].width,
      segments: trimmed(bands.counts, rows),
      sums: bands.sums.map((one) => trimmed(one, rows)),
    },
  });
  return { lags, products, edges, bands, long, series, tables };
}

function trimmed(series: BlockSeries, rows: number): Float64Array {
  return series.data.slice(0, rows * series.width);
}
