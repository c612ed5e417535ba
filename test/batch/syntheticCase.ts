import { mkdirSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import type { SeededRandom } from "../../src/core/signal/seededRandom.ts";
import { seededRandom } from "../../src/core/signal/seededRandom.ts";

/** A small case on disk: correlated noise whose energy decays as (x - x0)^(-n). */
export interface SyntheticCase {
  readonly name: string;
  readonly stations: readonly number[];
  readonly samples: number;
  readonly n: number;
  readonly x0: number;
  readonly seed: number;
}

/** x in metres as the digits of a file name: 0.2 -> x0200. */
export const fileOf = (x: number) => `x${String(Math.round(x * 1000)).padStart(4, "0")}.csv`;

/** Writes `folder`/<file per station> and returns the sheet as the user would write it. */
export function writeSyntheticCase(folder: string, made: SyntheticCase) {
  mkdirSync(folder, { recursive: true });
  for (const [i, x] of made.stations.entries())
    writeFileSync(join(folder, fileOf(x)), record(made, x, made.seed * 1000 + i));
  return {
    case: made.name,
    kinematicViscosity: 1.5e-5,
    units: "SI",
    reference: { length: 0.025, symbol: "M", speed: null },
    layout: "series",
    files: made.stations.map((x) => ({ path: fileOf(x), x })),
  };
}

const step = 1e-4;
const speed = 6;

function record({ samples, n, x0 }: SyntheticCase, x: number, seed: number): string {
  const random = seededRandom(seed);
  const rms = speed * Math.sqrt(0.04 * ((x - x0) / 0.025) ** -n);
  const keep = Math.exp(-1 / 12); // an integral time of twelve samples
  const [u, v, w] = [1, 0.9, 0.9].map((share) => autoregressive(samples, keep, rms * share, random));
  const lines = ["t [s],u [m/s],v [m/s],w [m/s]"];
  for (let i = 0; i < samples; i++)
    lines.push([i * step, speed + u[i], v[i], w[i]].map((value) => value.toFixed(6)).join(","));
  return `${lines.join("\n")}\n`;
}

function autoregressive(samples: number, keep: number, rms: number, random: SeededRandom): Float64Array {
  const series = new Float64Array(samples);
  let value = 0;
  for (let i = -100; i < samples; i++) {
    value = keep * value + Math.sqrt(1 - keep * keep) * random.gaussian();
    if (i >= 0) series[i] = rms * value;
  }
  return series;
}
