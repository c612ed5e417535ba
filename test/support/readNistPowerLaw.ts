import { readFileSync } from "node:fs";

/** A nonlinear regression data set of the NIST Statistical Reference Datasets, parsed from NIST's own file. */
export interface NistRegression {
  readonly x: number[];
  readonly y: number[];
  /** The two starting points, each in the order of the parameters. */
  readonly starts: [number[], number[]];
  readonly certified: { value: number; standardDeviation: number }[];
  readonly residualSum: number;
}

/** The data stand after the second line that begins with "Data:"; the first one describes them. */
export function readNistPowerLaw(name: string): NistRegression {
  const text = readFileSync(new URL(`../reference/nist/${name}.dat`, import.meta.url), "utf8");
  const lines = text.split(/\r?\n/);
  const dataLines = lines.slice(lines.findLastIndex((line) => line.startsWith("Data:")) + 1);
  const rows = dataLines
    .filter((line) => line.trim() !== "")
    .map((line) => line.trim().split(/\s+/).map(Number));
  const parameters = lines
    .map((line) => /^\s*b\d+ =\s+(.+)$/.exec(line)?.[1])
    .filter((found) => found !== undefined)
    .map((found) => found.trim().split(/\s+/).map(Number));
  return {
    x: rows.map(([, x]) => x),
    y: rows.map(([y]) => y),
    starts: [parameters.map((row) => row[0]), parameters.map((row) => row[1])],
    certified: parameters.map((row) => ({ value: row[2], standardDeviation: row[3] })),
    residualSum: Number(/Residual Sum of Squares:\s+(\S+)/.exec(text)?.[1]),
  };
}
