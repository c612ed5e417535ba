import { readFileSync } from "node:fs";

export interface UnivariateNist {
  readonly name: string;
  readonly y: Float64Array;
  readonly mean: number;
  /** Divided by n - 1. */
  readonly deviation: number;
  /** Lag 1, divided by N, about the mean of the record. */
  readonly autocorrelation: number;
}

/** Reads a univariate file of the NIST Statistical Reference Datasets as NIST publishes it. */
export function readUnivariateNist(name: string): UnivariateNist {
  const text = readFileSync(new URL(`nist/${name}.dat`, import.meta.url), "utf8");
  const certified = (label: string) => {
    const line = text.split("\n").find((one) => one.includes(label)) ?? "";
    const value = /:\s*(-?[\d.]+)\s*(?:\(exact\))?\s*$/.exec(line.slice(line.indexOf(label)));
    if (!value) throw new Error(`${name}.dat holds no ${label}`);
    return Number(value[1]);
  };
  const data = text.slice(text.lastIndexOf("Data: Y")).split("\n").slice(2);
  return {
    name,
    y: Float64Array.from(data.filter((line) => line.trim() !== "").map(Number)),
    mean: certified("Sample Mean"),
    deviation: certified("Sample Standard Deviation"),
    autocorrelation: certified("Sample Autocorrelation"),
  };
}
