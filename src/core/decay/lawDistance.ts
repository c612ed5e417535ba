import type { PowerLaw } from "../decayResult.ts";
import { placeAlong, placeBack, rateAlong } from "./flightCourse.ts";

/** As much of a law as places along it need. */
export type LawCourse = Pick<PowerLaw, "x0" | "flight">;

/**
 * How far a place lies beyond the virtual origin, along what the law runs along: x - x0, or s - s0 of the time of
 * flight; below zero upstream of the origin.
 */
export function lawDistance({ x0, flight = null }: LawCourse, x: number): number {
  return placeAlong(flight, x) - placeAlong(flight, x0);
}

/** The x that lies so far beyond the virtual origin. */
export function lawPlace({ x0, flight = null }: LawCourse, distance: number): number {
  return flight === null ? x0 + distance : placeBack(flight, placeAlong(flight, x0) + distance);
}

/** By how much that distance grows with x at a place: 1, or Us/U. */
export function lawRate({ flight = null }: LawCourse, x: number): number {
  return rateAlong(flight, x);
}
