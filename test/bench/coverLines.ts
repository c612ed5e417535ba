// How often 95 % intervals of line samples hold the truth: node bundle.mjs SNAPSHOTS STATIONS FIRST_SEED
// Prints one line of JSON, for each quantity: stations with an interval, those that hold the truth, and the
// departures from the truth.
import {
  foldedSpectrum,
  gaussianCoefficients,
  interpolatedSpectrum,
  signalPair,
} from "../../sample-data/maker/gaussianSignal.mjs";
import { solvedModelSpectrum } from "../../sample-data/maker/modelSpectrum.mjs";
import {
  integralScale,
  moment,
  oneDimensionalSpectra,
} from "../../sample-data/maker/oneDimensionalSpectra.mjs";
import { seededRandom } from "../../sample-data/maker/random.mjs";
import { reduceLines } from "../../src/core/station/lines/reduceLines.ts";
import { startLines } from "../../src/core/station/lines/startLines.ts";
import { readCaseSheet } from "../../src/sheet/readCaseSheet.ts";
import { reduceSettings } from "../../src/sheet/reduceSettings.ts";

/** Re_lambda about 57; points 2 eta apart. Lines along y that do not close, cut from longer ones. */
const flow = { k: 0.06, epsilon: 0.55, viscosity: 1.51e-5, U: 6 };
const model = solvedModelSpectrum(flow);
const { k1, E11, E22 } = oneDimensionalSpectra(model.energy, model.range);
const spacing = 2 * model.eta;
const uu = moment(k1, E11, 0);
const gradient = moment(k1, E11, 2);
const L11 = integralScale(k1, E11);
const lambda = Math.sqrt(uu / gradient);
const truth = { U: flow.U, uu, k: flow.k, L11, lambda, epsilon: flow.epsilon };

const sheet = {
  case: "coverage",
  layout: "lines",
  kinematicViscosity: flow.viscosity,
  files: [{ path: "*" }],
};
const settings = reduceSettings(readCaseSheet(JSON.stringify(sheet), "coverage").sheet);

/** A power of two, of which a line of some twelve integral scales is a part. */
const size = 2 ** Math.ceil(Math.log2((24 * L11) / spacing));
const kept = Math.round((12 * L11) / spacing);
const folded = (E: Float64Array) => foldedSpectrum(interpolatedSpectrum(k1, E), Math.PI / spacing);
const [longitudinal, transverse] = [folded(E11), folded(E22)];

function reduced(snapshots: number, seed: number) {
  const { gaussian } = seededRandom(seed);
  const form = { size, spacing, gaussian };
  const reducer = startLines({
    file: "made",
    position: "hand",
    along: "y",
    components: ["u", "v", "w"],
    stations: [1],
    points: Float64Array.from({ length: kept }, (_, i) => i * spacing),
    across: [{ y: null, z: 0 }],
  });
  for (let s = 0; s < snapshots; s++) {
    const [v, u] = signalPair(
      gaussianCoefficients(longitudinal, form),
      gaussianCoefficients(transverse, form),
    );
    const [w] = signalPair(gaussianCoefficients(transverse, form), new Float64Array(2 * size));
    const line = (values: Float64Array, mean = 0) => values.slice(0, kept).map((value) => mean + value);
    reducer.add(s, [line(u, flow.U), line(v), line(w)]);
  }
  return reduceLines(reducer.finish(), settings);
}

interface Tally {
  given: number;
  held: number;
  /** value/truth - 1; for U in units of u'. */
  departures: number[];
}

const [snapshots, stations, firstSeed] = process.argv.slice(2).map(Number);
const tallies: Record<string, Tally> = {};
for (let seed = firstSeed; seed < firstSeed + stations; seed++) {
  const station = reduced(snapshots, seed);
  for (const [key, wanted] of Object.entries(truth)) {
    tallies[key] ??= { given: 0, held: 0, departures: [] };
    const tally = tallies[key];
    const { value, ...rest } = station[key as keyof typeof truth];
    if (value === null) continue;
    tally.departures.push((value - wanted) / (key === "U" ? Math.sqrt(uu) : wanted));
    if (!("low" in rest) || rest.low === null || rest.high === null) continue;
    tally.given++;
    if (rest.low <= wanted && wanted <= rest.high) tally.held++;
  }
}
console.log(JSON.stringify(tallies));
