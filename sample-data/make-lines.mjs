// The simulation of the sample data once more, as lines across the duct: node sample-data/make-lines.mjs [--seed N] [--out DIR]
// The same seeds give the same bytes.
import { mkdirSync, writeFileSync } from "node:fs";
import { dirname, join, resolve } from "node:path";
import { parseArgs } from "node:util";
import {
  foldedSpectrum,
  gaussianCoefficients,
  interpolatedSpectrum,
  signalPair,
} from "./maker/gaussianSignal.mjs";
import { moment } from "./maker/oneDimensionalSpectra.mjs";
import { seededRandom } from "./maker/random.mjs";
import { body, mesh, simulation, viscosity } from "./maker/scenario.mjs";
import { stationTruth } from "./maker/stationTruth.mjs";

const { values: options } = parseArgs({ options: { out: { type: "string" }, seed: { type: "string" } } });
const out = resolve(options.out ?? import.meta.dirname);

const name = "simulation-lines";
const places = [0.2, 0.35, 0.57, 0.9, 1.45];
const points = 128;
/** The grid of the simulation, m. */
const spacing = simulation.filterWidth;
const snapshots = 48;
/** Time between snapshots, s: the flow has gone some ten integral scales on, so they are independent. */
const interval = 0.02;
const seed = Number(options.seed ?? 7800);

const stations = places.map((x, index) => {
  const { truth, spectra } = lineTruth(x);
  const file = `${name}/line-${index + 1}.csv`;
  write(file, lineText(x, truth.U, spectra, seededRandom(seed + index).gaussian));
  return { file, ...truth, samples: points * snapshots };
});
const { law, windowStart } = simulation;
const kept = {
  case: name,
  kind: "les",
  ...law,
  windowStart,
  along: "y",
  points,
  spacing,
  snapshots,
  stations,
};
write("truth-lines.json", json({ unit: "SI", mesh, viscosity, cases: [kept] }));
write(
  `${name}.json`,
  json({
    case: name,
    kind: "les",
    kinematicViscosity: viscosity,
    units: "SI",
    reference: { length: mesh, symbol: "M", speed: null },
    layout: "lines",
    files: [{ path: `${name}/*.csv` }],
    body,
  }),
);

/** Along y it is v that has the longitudinal spectrum, and u and w have transverse ones; each keeps its variance. */
function lineTruth(x) {
  const { truth, spectra } = stationTruth(simulation, x);
  const { uu, vv } = truth;
  const own = {
    k1: spectra.k1,
    u: spectra.E22.map((E) => (E * uu) / vv),
    v: spectra.E11.map((E) => (E * vv) / uu),
    w: spectra.E33,
  };
  const [u, v, w] = [own.u, own.v, own.w].map((E) => moment(own.k1, E, 2));
  const lambda = Math.sqrt((15 * viscosity * vv) / truth.epsilon);
  const { T_int: _time, S_dudx: _skewness, ...rest } = truth;
  const changed = {
    gradient: v,
    epsilon_gradient: 3 * viscosity * (u + v + w),
    lambda,
    Re_lambda: (Math.sqrt(vv) * lambda) / viscosity,
  };
  return { truth: { ...rest, ...changed }, spectra: own };
}

/** Periodic lines at one x, snapshot by snapshot: y in mm, t in ms, velocities in whole mm/s. */
function lineText(x, U, spectra, gaussian) {
  const form = { size: points, spacing, gaussian };
  const folded = (E) => foldedSpectrum(interpolatedSpectrum(spectra.k1, E), Math.PI / spacing);
  const [Eu, Ev, Ew] = [spectra.u, spectra.v, spectra.w].map(folded);
  const lines = [`# x = ${x} m`, "y [mm],t [ms],u [mm/s],v [mm/s],w [mm/s]"];
  for (let s = 0; s < snapshots; s++) {
    const [u, v] = signalPair(gaussianCoefficients(Eu, form), gaussianCoefficients(Ev, form));
    const [w] = signalPair(gaussianCoefficients(Ew, form), new Float64Array(2 * points));
    for (let i = 0; i < points; i++) {
      const place = [Math.round(i * spacing * 1e4) / 10, Math.round(s * interval * 1000)];
      lines.push(
        [...place, ...[u[i] + U, v[i], w[i]].map((speed) => Math.round(speed * 1000) + 0)].join(","),
      );
    }
  }
  return `${lines.join("\n")}\n`;
}

function json(value) {
  const short = (_key, item) => (typeof item === "number" ? Number(item.toPrecision(8)) : item);
  return `${JSON.stringify(value, short, 1)}\n`;
}

function write(path, text) {
  const file = join(out, path);
  mkdirSync(dirname(file), { recursive: true });
  writeFileSync(file, text);
  console.log(`${path} ${(text.length / 1e6).toFixed(2)} MB`);
}
