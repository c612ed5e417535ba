import { isEstimate, type Quantity } from "../../../../src/core/quantity.ts";
import { seededRandom } from "../../../../src/core/signal/seededRandom.ts";
import type { LineGrid, LinePart } from "../../../../src/core/station/lines/linePart.ts";
import { reduceLines } from "../../../../src/core/station/lines/reduceLines.ts";
import { startLines } from "../../../../src/core/station/lines/startLines.ts";
import type { ReduceSettings, StationResult } from "../../../../src/core/stationResult.ts";
import { lineSettings } from "./madeLines.ts";

export const exact = { relative: 1e-9, absolute: 1e-13, because: "a closed form" };
export const nu = 3e-3;
export const settings: ReduceSettings = { ...lineSettings, kinematicViscosity: nu };
export const [size, spacing] = [32, 0.05];
export const length = size * spacing;

/** A periodic line of harmonics m = 1 … 9 of amplitude e^(-m rate), their phases new in every snapshot. */
export const rates = { u: 0.9, v: 0.7, w: 0.8 } as const;
export const names = ["u", "v", "w"] as const;
export function harmonics(count: number, seed: number, level = 4): Float64Array[][] {
  const { uniform } = seededRandom(seed);
  return Array.from({ length: count }, () =>
    names.map((name) => {
      const phases = Array.from({ length: 9 }, () => 2 * Math.PI * uniform());
      return Float64Array.from({ length: size }, (_, i) =>
        phases.reduce(
          (sum, phase, m) =>
            sum + Math.exp(-(m + 1) * rates[name]) * Math.cos((2 * Math.PI * (m + 1) * i) / size + phase),
          name === "u" ? level : 0,
        ),
      );
    }),
  );
}
export const sumOver = (rate: number, of: (m: number) => number) => {
  let sum = 0;
  for (let m = 1; m <= 9; m++) sum += (Math.exp(-2 * m * rate) / 2) * of(m);
  return sum;
};
export const variance = (name: (typeof names)[number]) => sumOver(rates[name], () => 1);
export const gradient = (name: (typeof names)[number]) =>
  sumOver(rates[name], (m) => ((2 * Math.PI * m) / length) ** 2);

export const grid: LineGrid = {
  file: "line.csv",
  position: "column",
  along: "y",
  components: names,
  stations: [1.5],
  points: Float64Array.from({ length: size }, (_, i) => i * spacing),
  across: [{ y: null, z: null }],
};
export function partOf(snapshots: readonly Float64Array[][], of: LineGrid = grid): LinePart {
  const reducer = startLines(of);
  snapshots.forEach((snapshot, i) => {
    reducer.add(10 * i, snapshot);
  });
  return reducer.finish()[0];
}
export const snapshots = harmonics(24, 6);
export const part = partOf(snapshots);
export const periodic = { ...settings, periodic: true } as const;
export const station = reduceLines([part], periodic);
export const valueOfKey = (of: StationResult, name: string) =>
  ((of as unknown as Record<string, Quantity>)[name] ?? of.routes[name]).value;
export const whyOf = (quantity: Quantity) => (isEstimate(quantity) ? "" : quantity.why);
export const codes = ({ flags }: StationResult) => flags.map(({ code }) => code);
