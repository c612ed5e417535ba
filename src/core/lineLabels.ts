import type { Label } from "./catalogue.ts";
import { label } from "./label.ts";

const milli = { milli: true } as const;
const whole = { digits: 12 } as const;
const common = "common practice, no source";
const lenschow = "Lenschow, Mann and Kristensen (1994)";

/** How lines of points were sampled. */
export const lineLabels: readonly Label[] = [
  label(
    "points",
    'N_{"points"}',
    "points of a line",
    "1",
    "points along the line, in every snapshot the same",
    whole,
    common,
  ),
  label(
    "spacing",
    "Δr",
    "spacing of the points",
    "L",
    "distance of neighbouring points along the line",
    milli,
    common,
  ),
  label(
    "lineLength",
    'ℓ_{"line"}',
    "length of the line",
    "L",
    "distance covered by the line, with the step that closes it where it is periodic",
    {},
    common,
  ),
  label(
    "parallel",
    'N_{"lines"}',
    "parallel lines",
    "1",
    "lines of one snapshot at this position",
    whole,
    common,
  ),
  label(
    "snapshots",
    'N_{"snapshots"}',
    "snapshots",
    "1",
    "instants at which the lines were taken",
    whole,
    common,
  ),
  label(
    "independentSnapshots",
    'N_{"ind"}',
    "independent snapshots",
    "1",
    "snapshots, or the time they span over 2 T_int where that is less",
    {},
    lenschow,
  ),
  label(
    "independentSamples",
    'N_{"samples, ind"}',
    "independent samples",
    "1",
    "independent snapshots times the length of the line over 2 L₁₁, and parallel lines that lie more than L₁₁ apart",
    {},
    lenschow,
  ),
];
