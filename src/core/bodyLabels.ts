import type { Label } from "./catalogue.ts";
import { label } from "./label.ts";

const common = "common practice, no source";
const corrsin = "Comte-Bellot and Corrsin (1966)";

/** What a body meets, where a flow has developed, and what one more measurement would do. */
export const bodyLabels: readonly Label[] = [
  label("chord", "c", "chord of the body", "L", "streamwise length of the body", {}, common),
  label(
    "L11_chord",
    "L_{11}/c",
    "integral scale over chord",
    "1",
    "L₁₁ where the body stands, over its chord",
    {},
    common,
  ),
  label(
    "chord_change",
    "q(x + c)/q(x)",
    "change over the chord",
    "1",
    "the quantity at the end of the chord over the same at its beginning, in the empty stream",
    {},
    common,
  ),
  label(
    "target_place",
    "x",
    "place that meets a target",
    "L",
    "where the quantity passes its target: Tu by the law inside the window and between stations outside, L₁₁ by the line of its growth",
    {},
    common,
  ),
  label(
    "target_time",
    "t",
    "time at which a target is met",
    "T",
    "when the quantity passes its target: Tu by the law inside the window and between stations outside",
    {},
    common,
  ),
  label(
    "least_miss",
    "x",
    "smallest miss of both targets",
    "L",
    "the place at which the larger of both misses, counted as factors, is least",
    {},
    common,
  ),
  label(
    "Tu_inflow",
    'Tu_{"in"}',
    "intensity needed at the first station",
    "1",
    "Tu at the first station on a law with the same n and x0 that gives the target at the body: carried beyond what was measured",
    { percent: true },
    corrsin,
  ),
  label(
    "development",
    'x_{"d"}',
    "development length",
    "L",
    "first x from which a criterion holds for good at every station that carries it",
    {},
    "Wu (2017)",
  ),
  label(
    "development_time",
    't_{"d"}',
    "development time",
    "T",
    "first t from which a criterion holds for good at every time that carries it",
    {},
    "Wu (2017)",
  ),
  label(
    "narrowing",
    'w/w_{"now"}',
    "width of the interval, after over before",
    "1",
    "the law’s covariance formed anew with the measurement added, the law as found",
    { digits: 2 },
    "Fedorov (1972)",
  ),
];
