import { isEstimate, type Quantity } from "../../../src/core/quantity.ts";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { exponential, partOf, settings } from "./records.ts";

export const close = { relative: 1e-9, absolute: 1e-12, because: "the definition, summed in another order" };
export const step = 1e-3;
export const count = 3000;
/** Shorter memories than elsewhere, so that three thousand samples are some hundreds of integral times. */
export function quick(samples: number, seed: number): Float64Array {
  let value = 0;
  return exponential(samples, 3, seed).map((one) => {
    value = 0.5 * value + 0.5 * one;
    return value;
  });
}
export const u = quick(count, 1).map((value) => 10 + value);
export const v = quick(count, 2);
export const w = quick(count, 3).map((value, i) => 0.8 * value + 0.3 * v[i]);
export const whole = partOf({ u, v, w }, { settings: { segment: 64 } });
export const station = reduceStation([whole], settings);
export const codes = ({ flags }: StationResult) => flags.map(({ code }) => code);
export const flagOf = ({ flags }: StationResult, code: string) => flags.find((flag) => flag.code === code);
export const whyOf = (quantity: Quantity) => (isEstimate(quantity) ? "" : quantity.why);
export const mean = (x: Float64Array) => x.reduce((sum, value) => sum + value, 0) / x.length;
export const centred = (x: Float64Array) => x.map((value) => value - mean(x));
export const productAt = (x: Float64Array, l: number, y = x) => {
  let sum = 0;
  for (let i = l; i < x.length; i++) sum += x[i] * y[i - l];
  return sum;
};
/** Welch's one-sided density by its definition, of segments of 64. */
export function density(x: Float64Array, f: number, y = x): number {
  let [sum, segments] = [0, 0];
  const part = (of: Float64Array, from: number, turn: (angle: number) => number) => {
    let total = 0;
    for (let i = 0; i < 64; i++)
      total += 0.5 * (1 - Math.cos((2 * Math.PI * i) / 64)) * of[from + i] * turn((2 * Math.PI * f * i) / 64);
    return total;
  };
  for (let from = 0; from + 64 <= x.length; from += 32, segments++)
    sum +=
      part(x, from, Math.cos) * part(y, from, Math.cos) + part(x, from, Math.sin) * part(y, from, Math.sin);
  return (2 * step * sum) / (segments * 0.375 * 64);
}
