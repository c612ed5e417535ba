// Makes the sample data: node sample-data/make.mjs [--samples N] [--out DIR]
// The same seeds give the same bytes. --samples makes longer (or shorter) records; --out writes them elsewhere.
import { mkdirSync, writeFileSync } from "node:fs";
import { dirname, join, resolve } from "node:path";
import { parseArgs } from "node:util";
import { caseSheet } from "./maker/caseSheet.mjs";
import { seededRandom } from "./maker/random.mjs";
import { measuredText, profileText, simulatedText } from "./maker/recordText.mjs";
import { mesh, screen, secondInflow, simulation, viscosity } from "./maker/scenario.mjs";
import { stationTruth } from "./maker/stationTruth.mjs";
import { synthesiseRecord } from "./maker/synthesise.mjs";

const { values: options } = parseArgs({ options: { samples: { type: "string" }, out: { type: "string" } } });
const out = resolve(options.out ?? import.meta.dirname);
const samples = options.samples === undefined ? null : Number(options.samples);
if (samples !== null && !(Number.isInteger(samples) && samples >= 1000)) {
  console.error(`--samples: found ${options.samples}, expected a whole number of 1000 or more`);
  process.exit(2);
}

const measured = {
  nameOf: (x) => `x${String(Math.round(x * 1000)).padStart(4, "0")}mm`,
  textOf: measuredText,
};
const simulated = {
  nameOf: (_x, index) => `probe-${String(index + 1).padStart(2, "0")}`,
  textOf: simulatedText,
};
const cases = [
  makeSeries(screen, measured),
  makeSeries(simulation, simulated),
  makeProfile(secondInflow, "statistics"),
];
write("truth.json", json({ unit: "SI", mesh, viscosity, cases }));

/** One file of samples for each station, and the sheet; returns what they were made from. */
function makeSeries(flow, { nameOf, textOf }) {
  const stations = flow.x.map((x, index) => {
    const file = `${flow.name}/${nameOf(x, index)}.csv`;
    const { truth, spectra } = stationTruth(flow, x);
    const step = flow.step(x);
    const count = samples ?? flow.samples;
    const wish = {
      spectra,
      U: truth.U,
      step,
      samples: count,
      seed: flow.seed + index,
      skewness: truth.S_dudx,
    };
    const record = synthesiseRecord(wish);
    addNoise(record, flow.noise, wish.seed + 500);
    write(file, textOf(record, { x, step }));
    return { file, ...truth, step, samples: count, integralTimes: (count * step) / truth.T_int };
  });
  write(`${flow.name}.json`, json(caseSheet(flow, "series", `${flow.name}/*.csv`)));
  return caseTruth(flow, stations);
}

/** White noise of the sensor on every sample. */
function addNoise(record, rms, seed) {
  if (rms === 0) return;
  const { gaussian } = seededRandom(seed);
  for (const signal of [record.u, record.v, record.w]) {
    for (let i = 0; i < signal.length; i++) signal[i] += rms * gaussian();
  }
}

/** One file of statistics, scattered as those of a finite run. */
function makeProfile(flow, name) {
  const { gaussian } = seededRandom(flow.seed);
  const stations = flow.x.map((x) => stationTruth(flow, x).truth);
  const { scatter } = flow;
  const rows = stations.map((truth) => {
    const scattered = (value, relative) => value * Math.exp(relative * gaussian());
    return {
      x: truth.x,
      U: scattered(truth.U, scatter.U),
      uu: scattered(truth.uu, scatter.stress),
      vv: scattered(truth.vv, scatter.stress),
      ww: scattered(truth.ww, scatter.stress),
      L11: scattered(truth.L11, scatter.L11),
      lambda: scattered(truth.lambda, scatter.lambda),
      epsilon: scattered(truth.epsilon, scatter.epsilon),
    };
  });
  const file = `${flow.name}/${name}.csv`;
  write(file, profileText(rows));
  write(`${flow.name}.json`, json(caseSheet(flow, "profile", file)));
  return caseTruth(flow, stations);
}

function caseTruth({ name, kind, law, windowStart }, stations) {
  return { case: name, kind, ...law, windowStart, stations };
}

/** Eight digits: enough to hold any estimate against, and the same on every machine. */
function json(value) {
  const short = (_key, item) => (typeof item === "number" ? Number(item.toPrecision(8)) : item);
  return `${JSON.stringify(value, short, 1)}\n`;
}

function write(path, text) {
  const file = join(out, path);
  mkdirSync(dirname(file), { recursive: true });
  writeFileSync(file, text);
  if (path.endsWith(".csv")) console.log(`${path} ${(text.length / 1e6).toFixed(2)} MB`);
}
