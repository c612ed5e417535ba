import { bandBorders } from "../bandBorders.ts";
import { meanSquareRate, windowShare } from "../meanSquareRate.ts";
import { type NoiseRule, noiseFloor, scaleBin } from "../noiseFloor.ts";
import type { Component } from "../stationPart.ts";
import type { JoinedLines } from "./joinLines.ts";
import { bandSize } from "./lineFields.ts";
import type { LineSpectra } from "./lineSpectra.ts";

/** Mean-square gradient along the line of one component: the station's, and how it varies from block to block. */
export interface LineGradient {
  readonly name: Component;
  /** How the spectrum ends; null where the gradient comes from differences. */
  readonly rule: NoiseRule | null;
  readonly rate: number;
  /** A number a row: weight × the mean square. */
  readonly rows: Float64Array;
}

/**
 * Mean-square gradients along lateral lines, ∫k²E dk below the noise, less what a Hann window adds.
 * @param L11  integral scale; null: not known
 * @returns    an entry a component; none where its spectrum shows nothing but noise
 */
export function lateralGradients(
  lines: JoinedLines,
  spectra: LineSpectra | null,
  L11: number | null,
): LineGradient[] {
  if (spectra === null) return [];
  const { step, density, periodic } = spectra;
  const size = lines.points.length;
  const scale = (L11 ?? size * step) / step;
  // neighbours that are not correlated show noise up to the last wavenumber
  if (L11 !== null && scale < 1) return [];
  return lines.components.flatMap((name, c) => {
    const rule = noiseFloor(density[c], bandSize(size), scaleBin(size, scale));
    const window = periodic ? 0 : windowShare(1, size, step);
    const rate = meanSquareRate(density[c], size, step, rule) - window * meanOf(lines, name + name);
    if (!(rate > 0)) return [];
    return [{ name, rule, rate, rows: blockRates(lines, spectra, name, rule, rate) }];
  });
}

function meanOf({ rows, fields }: JoinedLines, field: string): number {
  const at = fields.indexOf(field);
  const [sum, weight] = rows.reduce(([s, w], row) => [s + row[at], w + row[0]], [0, 0]);
  return sum / weight;
}

/** The same by blocks, the floor and the cut held, and scaled so that their mean is the station's. */
function blockRates(
  lines: JoinedLines,
  { step, periodic }: LineSpectra,
  name: Component,
  rule: NoiseRule,
  rate: number,
): Float64Array {
  const { rows, fields } = lines;
  const size = lines.points.length;
  const borders = bandBorders(bandSize(size));
  const from = fields.indexOf(`${periodic ? "plain" : "hann"}_${name}_0`);
  const square = fields.indexOf(name + name);
  const count = fields.indexOf("lines");
  let floor = 0;
  const cutBin = Math.min(rule.cutBin, bandSize(size) / 2 + 1);
  for (let f = 1; f < cutBin && rule.floor > 0; f++) floor += f * f * rule.floor;
  const unit = (2 * Math.PI) ** 2 / (size * step) ** 3;
  const rates = rows.map((row) => {
    let power = 0;
    for (let band = rule.cut; band < borders.length; band++) power += row[from + band];
    const scale = (2 * step) / (row[count] * size * (periodic ? 1 : 0.375));
    const added = periodic ? 0 : (windowShare(1, size, step) * row[square]) / row[0];
    return unit * (scale * power - floor) - added;
  });
  const [sum, weight] = rates.reduce(([s, w], one, i) => [s + rows[i][0] * one, w + rows[i][0]], [0, 0]);
  return Float64Array.from(rates, (one, i) => (sum > 0 ? (rows[i][0] * one * rate * weight) / sum : 0));
}

/** Mean-square gradients at a point of lines along x: differences of the fourth order, else of the second. */
export function streamwiseGradients(lines: JoinedLines): LineGradient[] {
  const { rows, fields, components } = lines;
  const total = (name: string) => rows.reduce((sum, row) => sum + row[fields.indexOf(name)], 0);
  const order = total("n_fourth") > 0 ? "fourth" : "second";
  const n = total(`n_${order}`);
  if (!(n > 0)) return [];
  return components.flatMap((name) => {
    const mean = total(`${order}_${name}`) / n;
    const at = { n: fields.indexOf(`n_${order}`), first: fields.indexOf(`${order}_${name}`) };
    const squares = Float64Array.from(rows, (row) => {
      const centred = row[at.first + 1] - 2 * mean * row[at.first] + row[at.n] * mean * mean;
      return row[at.n] > 0 ? (row[0] * centred) / row[at.n] : 0;
    });
    const rate = squares.reduce((sum, value) => sum + value, 0) / total("weight");
    return rate > 0 ? [{ name, rule: null, rate, rows: squares }] : [];
  });
}
