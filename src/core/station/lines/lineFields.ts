import { bandBorders } from "../bandBorders.ts";
import type { Component } from "../stationPart.ts";
import type { LineDirection } from "./linePart.ts";

/** The component along the line and the two across, in the places of u, v and w. */
export function lineComponents(along: LineDirection): readonly [Component, Component, Component] {
  if (along === "y") return ["v", "u", "w"];
  return along === "z" ? ["w", "v", "u"] : ["u", "v", "w"];
}

/** Separations, in steps, whose increments are summed: 1, 2, 3, 4, 6, 8, 12 … up to half the line. */
export function incrementLags(points: number): number[] {
  const lags: number[] = [];
  for (let lag = 1; lag <= Math.max(2, points / 2); lag *= 2) {
    lags.push(lag);
    if (lag >= 2 && 1.5 * lag <= points / 2) lags.push(1.5 * lag);
  }
  return lags.filter((lag) => lag < points);
}

/** Points of a line as the bands of its spectrum count them. */
export function bandSize(points: number): number {
  return 2 * Math.floor(points / 2);
}

/**
 * Sums of one block of lateral lines, in this order: lines; for each separation how many increments of the
 * longitudinal component, Σ d² and Σ d³; the fourth-order difference likewise; for each component Σ of the squared
 * step between neighbours and across the ends; for each component f² |X_f|² by bands, plain and under the window.
 */
export function lateralFields(components: readonly Component[], points: number): string[] {
  const bands = bandBorders(bandSize(points)).map((_, band) => band);
  return [
    "lines",
    ...incrementLags(points).flatMap((lag) => [`n_${lag}`, `square_${lag}`, `cube_${lag}`]),
    ...["fourths", "fourth_square"],
    ...components.flatMap((name) => [`near_${name}`, `ends_${name}`]),
    ...components.flatMap((name) => bands.map((band) => `plain_${name}_${band}`)),
    ...components.flatMap((name) => bands.map((band) => `hann_${name}_${band}`)),
  ];
}

/** Sums of one block of a station on lines along x: central differences of each order, their first powers. */
export function streamwiseFields(components: readonly Component[]): string[] {
  return ["second", "fourth"].flatMap((order) => [
    `n_${order}`,
    ...components.flatMap((name) => [`${order}_${name}`, `${order}_${name}${name}`]),
    `${order}_cube`,
  ]);
}
