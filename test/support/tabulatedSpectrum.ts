import { meanSquareRate } from "../../src/core/station/meanSquareRate.ts";
import { noiseFloor } from "../../src/core/station/noiseFloor.ts";

/** A one-sided spectrum against wavenumber, as a table prints it. */
export interface Table {
  readonly k: readonly number[];
  readonly E: readonly number[];
}

/** ln E linear in ln k between the points; `below` gives what stands under the first, nothing stands above the last. */
export function interpolated({ k, E }: Table, below: "flat" | "nothing"): (kappa: number) => number {
  return (kappa) => {
    if (kappa > k[k.length - 1]) return 0;
    const after = k.findIndex((value) => value >= kappa);
    if (after === 0) return below === "flat" || kappa === k[0] ? E[0] : 0;
    const slope = Math.log(E[after] / E[after - 1]) / Math.log(k[after] / k[after - 1]);
    return E[after] * (kappa / k[after]) ** slope;
  };
}

/**
 * The same on the equally spaced bins of a record that passes at speed 1, as the reduction has it: k1 = 2π f and
 * E(f) = 2π E11(k1).
 * @param highest  wavenumber of the last bin
 */
export function asDensity(of: (k1: number) => number, highest: number, size: number) {
  const spacing = (2 * highest) / size;
  const density = Float64Array.from({ length: size / 2 + 1 }, (_, f) => 2 * Math.PI * of(f * spacing));
  // the first and the last bin are half as wide
  density[0] /= 2;
  density[size / 2] /= 2;
  return { density, size, step: Math.PI / highest };
}

/** ∫ E df of such a density. */
export function varianceOf({ density, size, step }: ReturnType<typeof asDensity>): number {
  return density.reduce((sum, value) => sum + value, 0) / (size * step);
}

/** Two columns of a published table, without the places that it leaves blank. */
export function columnsOf(rows: readonly Record<string, string>[], k: string, E: string): Table {
  const used = rows.filter((row) => row[E] !== "");
  return { k: used.map((row) => Number(row[k])), E: used.map((row) => Number(row[E])) };
}

/** <(du/dx)²> of such a density, as the reduction forms it: no noise, no tail. */
export function gradientOf({ density, size, step }: ReturnType<typeof asDensity>): number {
  return meanSquareRate(density, size, step, noiseFloor(density, size, Infinity));
}
