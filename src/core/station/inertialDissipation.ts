import { missing, type Quantity } from "../quantity.ts";
import { bandBorders } from "./bandBorders.ts";
import { bandAt, inertialLeaves, type SpectrumBlock } from "./inertialLeaves.ts";
import { inertialRange } from "./inertialRange.ts";
import type { BlockPlace, JoinedRecord } from "./joinParts.ts";
import { type LeftOut, leftOutQuantity } from "./stationErrors.ts";
import type { StationMaterial } from "./stationQuantities.ts";

/** Dissipation from the inertial range, and what it is without each group of blocks. */
export interface InertialDissipation {
  readonly quantity: Quantity;
  /** Null where it is missing. */
  readonly leaves: LeftOut | null;
}

/**
 * Dissipation of a record from its inertial range. How its level varies from block to block is told by the short
 * segments behind the gradient.
 */
export function inertialDissipation(material: StationMaterial): InertialDissipation {
  const { record, spectra, all } = material;
  const U = record.means[0];
  if (spectra === null || !(U > 0)) {
    const why = record.untimed ?? "no piece of a record holds a whole segment of the spectrum";
    return { quantity: missing(why), leaves: null };
  }
  const unit = (2 * Math.PI) / (U * spectra.size * spectra.step);
  const k1 = Float64Array.from({ length: spectra.size / 2 }, (_, i) => (i + 1) * unit);
  const E11 = spectra.density[0].subarray(1).map((value) => (value * U) / (2 * Math.PI));
  const found = inertialRange(k1, E11, all.whole.Re_lambda);
  if (typeof found === "string") return { quantity: missing(found), leaves: null };
  const { groups } = material.sampling;
  const size = shortSegment(record);
  const bands = found.spectrum.x.map((x) =>
    bandAt(size, (Math.exp(x) * U * size * record.step) / (2 * Math.PI)),
  );
  const told = groups === null ? null : inertialLeaves(found, bands, spectrumBlocks(record, size), groups);
  const leaves = { value: found.epsilon, without: told?.without ?? [], further: told?.choice ?? 0 };
  return { quantity: leftOutQuantity(leaves, all, "log"), leaves };
}

/** Samples of the shortest of the short segments. */
function shortSegment({ blocks }: JoinedRecord): number {
  const sizes = new Set(blocks.flat().map(({ part }) => part.bands?.size ?? Infinity));
  return Math.min(...sizes);
}

/** Segments of u in every row of the record, and their power by band: bands are counted down from Nyquist. */
function spectrumBlocks({ blocks }: JoinedRecord, size: number): SpectrumBlock[] {
  const { length } = bandBorders(size);
  return blocks.map((places) => {
    const powers = new Float64Array(length);
    for (const place of places) addPowers(powers, place);
    return {
      segments: places.reduce((sum, { part, block }) => sum + (part.bands?.segments[block] ?? 0), 0),
      powers,
    };
  });
}

function addPowers(powers: Float64Array, { part, block }: BlockPlace): void {
  const { bands } = part;
  if (bands === null) return;
  const sums = bands.sums[part.components.indexOf("u")];
  // Σ f² |X_f|² in bins: over the fourth power of the size it is one density for segments of any length
  for (let band = 0; band < bands.count; band++)
    powers[Math.min(band, powers.length - 1)] += sums[block * bands.count + band] / bands.size ** 4;
}
