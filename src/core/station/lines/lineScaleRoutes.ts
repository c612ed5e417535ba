import type { ReduceSettings } from "../../stationResult.ts";
import { type IntegralTimes, integralTimes } from "../integralTimes.ts";
import { areaUpTo } from "../zeroCrossing.ts";
import type { JoinedLines } from "./joinLines.ts";
import { lineComponents } from "./lineFields.ts";
import type { StreamwisePairs } from "./linePart.ts";
import type { LineSpectra } from "./lineSpectra.ts";

/** Integral length of the component along the line by each route, as integralTimes tells times. */
export interface LineScales extends IntegralTimes {
  /** The correlation did not cross zero and was integrated up to half the length of the line. */
  readonly toHalf?: boolean;
  /** Lower bound of a scale that the line is too short for. */
  readonly least?: number;
}

/** Lateral lines: from the correlation along the line and its spectrum. */
export function lateralScales(
  lines: JoinedLines,
  spectra: LineSpectra | null,
  adopted: ReduceSettings["integralScale"],
): LineScales {
  const [name] = lineComponents(lines.along);
  const c = lines.components.indexOf(name);
  if (c < 0) return noScale(`${name}, the component along the line, was not measured`);
  if (spectra === null) return noScale("the points are not equally spaced, so there is no correlation");
  const { step, covariance, density, lines: segments } = spectra;
  const correlation = { step, stride: 1, covariance: [covariance[c]] };
  if (!(covariance[c][0] > 0)) return noScale("the fluctuation is zero");
  const size = lines.points.length;
  const found = inSpace(integralTimes(correlation, { step, size, segments, density: [density[c]] }, adopted));
  return found.tauStar === null ? toHalfLine(found, covariance[c], spectra, adopted) : found;
}

/** Correlation at half the length of a line below which the rest of the integral is little. */
const fallen = 0.1;

/**
 * A periodic line has no separation beyond half its length, another only poor ones: a correlation that is next to
 * nothing there, or not above its own scatter of √(2 L/total length) by twice as much, and has not crossed zero, is
 * integrated up to it.
 */
function toHalfLine(
  found: LineScales,
  covariance: Float64Array,
  { step, lines, length }: LineSpectra,
  adopted: ReduceSettings["integralScale"],
): LineScales {
  const half = covariance.length - 1;
  const area = (areaUpTo(covariance, half) / covariance[0]) * step;
  const scatter = Math.sqrt((2 * area) / (lines * length));
  if (!(covariance[half] < (fallen + 2 * scatter) * covariance[0])) return { ...found, least: area };
  const routes = { ...found.routes, "zero-crossing": area };
  const chosen = routes[adopted];
  return { routes, tauStar: half * step, scale: typeof chosen === "number" ? chosen : area, toHalf: true };
}

/** Lines along x: from the correlation of points up- and downstream of the station, as far as the line goes. */
export function streamwiseScales(lines: JoinedLines, adopted: ReduceSettings["integralScale"]): LineScales {
  const { spacing, parts } = lines;
  const pairs = parts.flatMap((part) => (part.pairs ? [part.pairs] : []));
  if (spacing === null || pairs.length < parts.length)
    return noScale("the points are not equally spaced, so there is no correlation");
  const rho = pairs[0].counts.map((_, m) => correlationAt(pairs, m));
  if (rho.length < 3 || !(rho[0] > 0)) return noScale("the station is too near the end of its line");
  const correlation = { step: 2 * spacing, stride: 1, covariance: [rho] };
  return inSpace(integralTimes(correlation, null, adopted));
}

/** Correlation of u m steps down- and upstream over the pairs of all files, put about the first one's references. */
function correlationAt(pairs: readonly StreamwisePairs[], m: number): number {
  const [first] = pairs;
  let [n, a, b, aa, bb, ab] = [0, 0, 0, 0, 0, 0];
  for (const one of pairs) {
    const count = one.counts[m];
    const da = one.afterReference[m] - first.afterReference[m];
    const db = one.beforeReference[m] - first.beforeReference[m];
    n += count;
    a += one.after[m] + count * da;
    b += one.before[m] + count * db;
    aa += one.afterSquared[m] + 2 * da * one.after[m] + count * da * da;
    bb += one.beforeSquared[m] + 2 * db * one.before[m] + count * db * db;
    ab += one.product[m] + da * one.before[m] + db * one.after[m] + count * da * db;
  }
  const variances = (aa / n - (a / n) ** 2) * (bb / n - (b / n) ** 2);
  return variances > 0 ? (ab / n - (a / n) * (b / n)) / Math.sqrt(variances) : 0;
}

function noScale(why: string): LineScales {
  const routes = {
    "zero-crossing": why,
    "one-over-e": why,
    exponential: why,
    "low-frequency": why,
    model: why,
  };
  return { routes, tauStar: null, scale: null };
}

/** Reasons in the words of a line. */
function inSpace({ routes, ...rest }: IntegralTimes): LineScales {
  const told = Object.entries(routes).map(([name, value]) => [
    name,
    typeof value === "string"
      ? value
          .replace(/integral time/g, "integral length")
          .replace(/of lag\b/g, "of separation")
          .replace("the record is shorter than a segment of the spectrum", "a point has no spectrum along x")
      : value,
  ]);
  return { ...rest, routes: Object.fromEntries(told) };
}
