import {
  foldedSpectrum,
  gaussianCoefficients,
  interpolatedSpectrum,
  signalPair,
} from "../../../../sample-data/maker/gaussianSignal.mjs";
import { solvedModelSpectrum } from "../../../../sample-data/maker/modelSpectrum.mjs";
import {
  integralScale,
  moment,
  oneDimensionalSpectra,
} from "../../../../sample-data/maker/oneDimensionalSpectra.mjs";
import { seededRandom } from "../../../../src/core/signal/seededRandom.ts";
import type { LineDirection, LineGrid, LinePart } from "../../../../src/core/station/lines/linePart.ts";
import { startLines } from "../../../../src/core/station/lines/startLines.ts";
import type { ReduceSettings } from "../../../../src/core/stationResult.ts";

/** Isotropic turbulence of Pope's model spectrum (Pope 2000, eqs. 6.246-6.248), SI, and what is true of it. */
export const viscosity = 1.5e-5;
export const speed = 5;
const energy = 0.06;
const epsilon = 0.5;
const model = solvedModelSpectrum({ k: energy, epsilon, viscosity });
const spectra = oneDimensionalSpectra(model.energy, model.range);
const uu = moment(spectra.k1, spectra.E11, 0);
const gradient = moment(spectra.k1, spectra.E11, 2);
export const truth = {
  U: speed,
  uu,
  vv: uu,
  ww: uu,
  k: energy,
  gradient,
  epsilon,
  L11: integralScale(spectra.k1, spectra.E11),
  lambda: Math.sqrt(uu / gradient),
  Re_lambda: uu / Math.sqrt(gradient) / viscosity,
};
export const eta = model.eta;
export const modelSpectra = spectra;

export const lineSettings: ReduceSettings = {
  kinematicViscosity: viscosity,
  referenceSpeed: null,
  kind: "dns",
  simultaneous: "auto",
  periodic: "auto",
  sensorLength: null,
  integralScale: "zero-crossing",
  correlation: "biased",
  detrend: "mean",
  segment: null,
  taylorCorrection: true,
  dissipation: "auto",
};

export interface LineWish {
  readonly along: Exclude<LineDirection, "x">;
  /** A power of two: the lines are periodic over so many points. */
  readonly size: number;
  readonly spacing: number;
  /** Points kept of each; fewer than `size` make a line that does not close. */
  readonly kept?: number;
  readonly snapshots: number;
  readonly lines?: number;
  readonly seed: number;
}

/** Values of one snapshot: u, v, w, line after line. */
export type Snapshot = readonly [Float64Array, Float64Array, Float64Array];

/** Independent snapshots of lines, the component along them with E11 and those across with E22. */
export function madeSnapshots({ along, size, spacing, kept = size, snapshots, lines = 1, seed }: LineWish) {
  const { gaussian } = seededRandom(seed);
  const form = { size, spacing, gaussian };
  const folded = (E: Float64Array) => foldedSpectrum(interpolatedSpectrum(spectra.k1, E), Math.PI / spacing);
  const [longitudinal, transverse] = [folded(spectra.E11), folded(spectra.E22)];
  return Array.from({ length: snapshots }, (): Snapshot => {
    const all = [0, 1, 2].map(() => new Float64Array(lines * kept));
    for (let l = 0; l < lines; l++) {
      const [a, b] = signalPair(
        gaussianCoefficients(longitudinal, form),
        gaussianCoefficients(transverse, form),
      );
      const [c] = signalPair(gaussianCoefficients(transverse, form), new Float64Array(2 * size));
      const order = along === "y" ? [b, a, c] : [b, c, a];
      order.forEach((values, i) => {
        for (let j = 0; j < kept; j++) all[i][l * kept + j] = values[j] + (i === 0 ? speed : 0);
      });
    }
    return [all[0], all[1], all[2]];
  });
}

export function lineGrid({ along, size, spacing, kept = size, lines = 1 }: LineWish): LineGrid {
  return {
    file: "lines.csv",
    position: "column",
    along,
    components: ["u", "v", "w"],
    stations: [0.4],
    points: Float64Array.from({ length: kept }, (_, i) => i * spacing),
    across: Array.from({ length: lines }, (_, l) =>
      along === "y" ? { y: null, z: 10 * l } : { y: 10 * l, z: null },
    ),
  };
}

/** The lines of a wish reduced to the part of one file. */
export function partOf(wish: LineWish, snapshots = madeSnapshots(wish)): LinePart {
  const reducer = startLines(lineGrid(wish));
  snapshots.forEach((snapshot, i) => {
    reducer.add(i, snapshot);
  });
  return reducer.finish()[0];
}
