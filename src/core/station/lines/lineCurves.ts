import { logBins } from "../../signal/logBins.ts";
import type { StationCurves } from "../../stationResult.ts";
import type { JoinedLines } from "./joinLines.ts";
import { lineComponents } from "./lineFields.ts";
import type { LineSpectra } from "./lineSpectra.ts";

const perDecade = 100;

/**
 * Curves of a station on lateral lines: the component along the line stands for u, those across for v and w.
 * Separations are told as times, r/U, so that they stand beside those of records in time; where U is not positive
 * as they are.
 * @param lineCount  independent lines in all snapshots together
 */
export function lineCurves(
  lines: JoinedLines,
  spectra: LineSpectra | null,
  U: number,
  lineCount: number,
): StationCurves | null {
  const order = lineComponents(lines.along).map((name) => lines.components.indexOf(name));
  if (spectra === null || order[0] < 0) return null;
  const { density, covariance, length, step, periodic } = spectra;
  const borders = logBins(1, density[0].length, perDecade);
  const E = (c: number) => (c < 0 ? null : average(density[c], borders));
  const rho = (c: number) => (c < 0 ? null : covariance[c].map((value) => value / (covariance[c][0] || 1)));
  const unit = (2 * Math.PI) / length;
  const widths = Float64Array.from({ length: borders.length - 1 }, (_, b) => borders[b + 1] - borders[b]);
  // neighbouring bins of a Hann window share a third of their information
  const each = 2 * lineCount * (periodic ? 1 : 2 / 3);
  return {
    k1: widths.map((width, b) => (borders[b] + (width - 1) / 2) * unit),
    E11: average(density[order[0]], borders),
    E22: E(order[1]),
    E33: E(order[2]),
    freedom: 2 * lineCount,
    freedoms: widths.map((width) => Math.max(2 * lineCount, each * width)),
    lag: Float64Array.from(covariance[0], (_, l) => (l * step) / (U > 0 ? U : 1)),
    rho_u: rho(order[0]) ?? new Float64Array(0),
    rho_v: rho(order[1]),
    rho_w: rho(order[2]),
  };
}

/** Density in k from that in 1/length. */
function average(density: Float64Array, borders: readonly number[]): Float64Array {
  return Float64Array.from({ length: borders.length - 1 }, (_, b) => {
    let sum = 0;
    for (let f = borders[b]; f < borders[b + 1]; f++) sum += density[f];
    return sum / (borders[b + 1] - borders[b]) / (2 * Math.PI);
  });
}
