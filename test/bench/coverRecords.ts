// How often 95 % intervals hold the truth: node bundle.mjs INTEGRAL_TIMES RECORDS FIRST_SEED
// Prints one line of JSON, for each quantity: records with an interval, those that hold the truth, and the
// departures from the truth.
import { isotropicRecord } from "../../sample-data/maker/synthesise.mjs";
import { reduceStation } from "../../src/core/station/reduceStation.ts";
import { startRecord } from "../../src/core/station/startRecord.ts";
import type { ReduceSettings } from "../../src/core/stationResult.ts";
import { readCaseSheet } from "../../src/sheet/readCaseSheet.ts";
import { reduceSettings } from "../../src/sheet/reduceSettings.ts";

/** Re_lambda about 57; samples 1.5 eta apart, some 40 an integral time. */
const flow = { k: 0.06, epsilon: 0.55, viscosity: 1.51e-5, U: 6, step: 7e-5 };

const sheet = {
  case: "coverage",
  layout: "series",
  files: [{ path: "*" }],
  reduce: { taylorCorrection: false },
};
const settings: ReduceSettings = reduceSettings(
  readCaseSheet(JSON.stringify({ ...sheet, kinematicViscosity: flow.viscosity }), "coverage").sheet,
);

const origin = { file: "made", x: 1, y: null, z: null, position: "hand", step: flow.step } as const;

function reduced(samples: number, seed: number) {
  const { u, v, w, truth } = isotropicRecord({ ...flow, samples, seed });
  const reducer = startRecord(origin, settings);
  reducer.add({ count: samples, t: null, u, v, w });
  const end = reducer.finish();
  if (!("part" in end)) throw new Error("a record shorter than the pilot was to be read twice");
  return { station: reduceStation([end.part], settings), truth };
}

interface Tally {
  /** Records with an interval. */
  given: number;
  held: number;
  /** value/truth - 1; for U in units of u'. */
  departures: number[];
}

const [integralTimes, records, firstSeed] = process.argv.slice(2).map(Number);
const { truth: flowTruth } = isotropicRecord({ ...flow, samples: 64, seed: 1 });
const samples = Math.round((integralTimes * flowTruth.T_int) / flow.step);
const tallies: Record<string, Tally> = {};
for (let seed = firstSeed; seed < firstSeed + records; seed++) {
  const { station, truth } = reduced(samples, seed);
  const rms = Math.sqrt(truth.uu);
  const expected = {
    U: truth.U,
    uu: truth.uu,
    k: truth.k,
    Tu: rms / truth.U,
    L11: truth.L11,
    lambda: truth.lambda,
    epsilon: truth.epsilon,
    eta: truth.eta,
    Re_lambda: truth.Re_lambda,
    isotropy_uv: 1,
    S_dudx: 0,
    Re_L: (rms * truth.L11) / flow.viscosity,
    C_epsilon: (truth.epsilon * truth.L11) / rms ** 3,
  };
  for (const [key, wanted] of Object.entries(expected)) {
    tallies[key] ??= { given: 0, held: 0, departures: [] };
    const tally = tallies[key];
    const { value, ...rest } = station[key as keyof typeof expected];
    if (value === null) continue;
    const scale = key === "U" ? rms : key === "S_dudx" ? 1 : wanted;
    tally.departures.push((value - wanted) / scale);
    if (!("low" in rest) || rest.low === null || rest.high === null) continue;
    tally.given++;
    if (rest.low <= wanted && wanted <= rest.high) tally.held++;
  }
}
console.log(JSON.stringify(tallies));
