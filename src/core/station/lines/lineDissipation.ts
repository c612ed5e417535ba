import { bare, missing, type Quantity } from "../../quantity.ts";
import { bandBorders } from "../bandBorders.ts";
import type { InertialDissipation } from "../inertialDissipation.ts";
import { bandAt, inertialLeaves } from "../inertialLeaves.ts";
import { type InertialRange, inertialRange } from "../inertialRange.ts";
import { leftOutQuantity } from "../stationErrors.ts";
import { bandSize, incrementLags, lineComponents } from "./lineFields.ts";
import type { LineMaterial } from "./lineMaterial.ts";

/** Constant of the second-order longitudinal structure function in an inertial range. */
const constant = 2.0;

/**
 * Dissipation by the routes that are no function of the blocks' sums,
 *     inertial range  E11 = 0.49 epsilon^(2/3) k1^(-5/3)
 *     second order    max over r of (D_LL/2.0)^(3/2)/r,  r from lambda to L11
 *     third order     max over r of -(5/4) D_LLL/r
 * the last two lower bounds; increments are taken along the line.
 * @see   Pope (2000) §§6.2, 6.5
 */
export function lineDissipation(material: LineMaterial) {
  const { lines, spectra, all, scales } = material;
  const c = lines.components.indexOf(lineComponents(lines.along)[0]);
  const none = missing("no spectrum along the line is to be had");
  if (spectra === null || c < 0)
    return { inertial: { quantity: none, leaves: null }, second: none, third: none };
  const unit = (2 * Math.PI) / spectra.length;
  const E11 = spectra.density[c].subarray(1).map((value) => value / (2 * Math.PI));
  const k1 = E11.map((_, i) => (i + 1) * unit);
  const found = inertialRange(k1, E11, all.whole.Re_lambda);
  const structure = increments(material);
  const lambda = all.whole.lambda;
  const between = structure.filter(({ r }) => r >= lambda && r <= (scales.scale ?? 0));
  return {
    inertial:
      typeof found === "string"
        ? { quantity: missing(found), leaves: null }
        : withLeaves(found, unit, material),
    second: bound(
      between.map(({ r, square }) => (square / constant) ** 1.5 / r),
      "no separation lies between the Taylor and the integral scale",
    ),
    third: bound(
      structure.map(({ r, cube }) => (-1.25 * cube) / r),
      "the third-order structure function is nowhere negative",
    ),
  };
}

/** Its level without each group of snapshots, and the error by the choice of the range. */
function withLeaves(
  range: InertialRange,
  unit: number,
  { rows, fields, lines, periodic, sampling, all }: LineMaterial,
): InertialDissipation {
  const [longitudinal] = lineComponents(lines.along);
  const size = bandSize(lines.points.length);
  const from = fields.indexOf(`${periodic ? "plain" : "hann"}_${longitudinal}_0`);
  const counted = fields.indexOf("lines");
  const count = bandBorders(size).length;
  const blocks = rows.map((row) => ({
    segments: row[counted],
    powers: row.subarray(from, from + count),
  }));
  const bands = range.spectrum.x.map((x) => bandAt(size, Math.exp(x) / unit));
  const told = sampling.groups === null ? null : inertialLeaves(range, bands, blocks, sampling.groups);
  const leaves = { value: range.epsilon, without: told?.without ?? [], further: told?.choice ?? 0 };
  return { quantity: leftOutQuantity(leaves, { ...all, repeats: 1 }, "log"), leaves };
}

function bound(values: readonly number[], absent: string): Quantity {
  const most = Math.max(0, ...values);
  return most > 0 ? bare(most, "a lower bound of the dissipation") : missing(absent);
}

function increments({ rows, fields, lines }: LineMaterial): { r: number; square: number; cube: number }[] {
  const total = (name: string) => {
    const at = fields.indexOf(name);
    return rows.reduce((sum, row) => sum + row[at], 0);
  };
  return incrementLags(lines.points.length).map((lag) => {
    const n = total(`n_${lag}`);
    return {
      r: lag * (lines.spacing ?? 0),
      square: total(`square_${lag}`) / n,
      cube: total(`cube_${lag}`) / n,
    };
  });
}
