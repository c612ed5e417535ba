import type { ReduceSettings } from "../../stationResult.ts";
import { isPeriodic } from "./isPeriodic.ts";
import { type JoinedLines, joinLines } from "./joinLines.ts";
import { incrementLags, lineComponents } from "./lineFields.ts";
import { type LineGradient, lateralGradients, streamwiseGradients } from "./lineGradients.ts";
import type { LinePart } from "./linePart.ts";
import { type LineReplicates, lineReplicates } from "./lineReplicates.ts";
import { type LineSampling, lineSampling } from "./lineSampling.ts";
import { type LineScales, lateralScales, streamwiseScales } from "./lineScaleRoutes.ts";
import { type LineSpectra, lineSpectra } from "./lineSpectra.ts";

/** What the quantities of a station on lines are made from. */
export interface LineMaterial {
  readonly lines: JoinedLines;
  readonly spectra: LineSpectra | null;
  readonly periodic: boolean;
  /** Integral lengths of the component along the line. */
  readonly scales: LineScales;
  readonly gradients: readonly LineGradient[];
  readonly sampling: LineSampling;
  readonly rows: readonly Float64Array[];
  readonly fields: readonly string[];
  readonly all: LineReplicates;
  /** Separation behind the derivative skewness, in steps. */
  readonly derivativeLag: number;
  readonly settings: ReduceSettings;
}

export function lineMaterial(parts: readonly LinePart[], settings: ReduceSettings): LineMaterial {
  const lines = joinLines(parts);
  const streamwise = lines.along === "x";
  const periodic = isPeriodic(lines, settings);
  const spectra = lineSpectra(lines, periodic);
  const scales = streamwise
    ? streamwiseScales(lines, settings.integralScale)
    : lateralScales(lines, spectra, settings.integralScale);
  const gradients = streamwise ? streamwiseGradients(lines) : lateralGradients(lines, spectra, scales.scale);
  const sampling = lineSampling(lines, lineLength(lines, spectra), scales.scale, scales.tauStar, periodic);
  const fields = [...lines.fields, ...gradients.map(({ name }) => `rate_${name}`)];
  const rows = lines.rows.map((row, block) => {
    const full = new Float64Array(fields.length);
    full.set(row);
    for (const [i, gradient] of gradients.entries()) full[row.length + i] = gradient.rows[block];
    return full;
  });
  const derivativeLag = nearestLag(lines, gradients, settings);
  const all = lineReplicates(rows, sampling, {
    along: lines.along,
    components: lines.components,
    column: Object.fromEntries(fields.map((name, i) => [name, i])),
    means: lines.means,
    spacing: lines.spacing ?? 1,
    derivativeLag,
    viscosity: settings.kinematicViscosity,
    referenceSpeed: settings.referenceSpeed,
  });
  return {
    lines,
    spectra,
    periodic,
    scales,
    gradients,
    sampling,
    rows,
    fields,
    all,
    derivativeLag,
    settings,
  };
}

/** Length of lateral lines; null along x. */
export function lineLength({ along, points }: JoinedLines, spectra: LineSpectra | null): number | null {
  if (along === "x") return null;
  return spectra?.length ?? points[points.length - 1] - points[0];
}

/** An increment over m steps is a central difference of step m/2: the one nearest eta is taken. */
function nearestLag(
  { along, spacing, points }: JoinedLines,
  gradients: readonly LineGradient[],
  { kinematicViscosity: nu }: ReduceSettings,
): number {
  const own = gradients.find(({ name }) => name === lineComponents(along)[0]);
  if (nu === null || own === undefined || spacing === null) return 2;
  const eta = (nu ** 2 / (15 * own.rate)) ** 0.25;
  const distance = (lag: number) => Math.abs(Math.log((lag * spacing) / (2 * eta)));
  return incrementLags(points.length).reduce((best, lag) => (distance(lag) < distance(best) ? lag : best), 2);
}
