import type { Flag } from "../flag.ts";
import type { Quantity } from "../quantity.ts";
import { probeFlags } from "./probeFlags.ts";
import { shortestRecord } from "./sampling.ts";
import type { StationMaterial } from "./stationQuantities.ts";
import { unsteadyFlags } from "./unsteadyFlags.ts";

/** Correction of Taylor's hypothesis above which it is doubtful. */
const doubtfulCorrection = 0.1;
const resolved = 0.9;
const longSensor = 4;

/** What is formed from all three components, and with one or two of them rests on how the others are taken. */
const restOnOthers = [
  "k",
  "Tu",
  "epsilon",
  "epsilon_gradient",
  "epsilon_decay",
  "epsilon_inertial",
  "eta",
  "C_epsilon",
  "balance",
  "lambda",
  "Re_lambda",
  "gradient",
] as const;

/** Facts that the flags are drawn from, beside the material itself. */
export interface FlagFacts {
  readonly taylorFactor: number;
  readonly k1max_eta: number | null;
  readonly eta: Quantity;
}

/** All doubts about one station, one a code. */
export function stationFlags(material: StationMaterial, facts: FlagFacts): Flag[] {
  const flags = [
    ...material.record.parts.flatMap((part) => part.flags),
    ...lengthFlags(material),
    ...componentFlags(material),
    ...taylorFlags(material, facts),
    ...spectrumFlags(material, facts),
    ...replayFlags(material),
    ...unsteadyFlags(material.record),
    ...probeFlags(material),
  ];
  return flags.filter((flag, i) => flags.findIndex((other) => other.code === flag.code) === i);
}

function lengthFlags({ sampling, times, correlation, record }: StationMaterial): Flag[] {
  const flags: Flag[] = [];
  if (sampling.integralTimes !== null && sampling.integralTimes < shortestRecord) {
    const length = sampling.integralTimes;
    const text = `The record is ${length.toFixed(0)} integral times long: an interval needs ${shortestRecord}.`;
    flags.push({ code: "short-record", text, value: length });
  }
  if (correlation !== null && times.tauStar === null) {
    const text =
      "The correlation of u does not fall to zero within the lags formed: only a lower bound of the integral time is known.";
    flags.push({ code: "no-zero-crossing", text });
  }
  if (times.scale !== null && times.scale < record.step) {
    const text =
      "Successive samples are not correlated: the signal is noise, or sampled too seldom for any scale.";
    flags.push({ code: "resolution", text, value: times.scale / record.step });
  }
  return flags;
}

function componentFlags({ record, settings }: StationMaterial): Flag[] {
  const flags: Flag[] = [];
  if (record.components.length === 1) {
    const text = "u alone was measured: isotropy is assumed, not tested.";
    flags.push({ code: "isotropy-assumed", text, concerns: restOnOthers });
  }
  if (record.components.length === 2) {
    const [, known] = record.components;
    const other = known === "v" ? "w" : "v";
    flags.push({
      code: "axisymmetry-assumed",
      text: `${other} was not measured and is taken like ${known}.`,
      concerns: restOnOthers,
    });
  }
  if (settings.kinematicViscosity === null) {
    const text =
      "No kinematic viscosity is given: dissipation, Kolmogorov scales and Reynolds numbers are missing.";
    flags.push({ code: "no-viscosity", text });
  }
  if (settings.kind === "les") {
    const text = "Large-eddy simulation: scales from gradients are those of the resolved motion.";
    flags.push({ code: "resolved-scales", text });
  }
  return flags;
}

function taylorFlags({ record, settings }: StationMaterial, { taylorFactor }: FlagFacts): Flag[] {
  const flags: Flag[] = [];
  if (settings.taylorCorrection && taylorFactor - 1 > doubtfulCorrection) {
    const percent = (100 * (taylorFactor - 1)).toFixed(0);
    const text = `Taylor's hypothesis makes the gradient too large by ${percent} %: corrected, but doubtful at this intensity.`;
    flags.push({ code: "taylor-doubtful", text, value: taylorFactor });
  }
  const lowest = Math.min(...record.parts.map((part) => part.lowestSpeed));
  if (lowest <= 0) {
    const text =
      "The flow reverses at times: Taylor's hypothesis does not hold, and lengths along x are doubtful.";
    flags.push({ code: "reversed-flow", text, value: lowest });
  }
  return flags;
}

function spectrumFlags({ gradients, spectra, settings }: StationMaterial, facts: FlagFacts): Flag[] {
  const flags: Flag[] = [];
  const cut = gradients.find(({ rule }) => rule.cut > 0);
  if (cut !== undefined) {
    const percent = (100 * cut.rule.shareBeyond).toPrecision(2);
    const text = `The spectrum of ${cut.name} ends in noise: it is cut there, and some ${percent} % of the gradient, added from an exponential, lie beyond.`;
    flags.push({ code: "noise-floor", text, value: cut.rule.shareBeyond });
  }
  const rising = gradients.find(({ rule }) => spectra !== null && rule.slope > risingSlope(spectra));
  if (rising !== undefined) {
    const text = `The spectrum of ${rising.name} rises towards the highest frequency: energy from beyond it may be folded in.`;
    flags.push({ code: "aliasing", text, value: rising.rule.slope });
  }
  if (facts.k1max_eta !== null && facts.k1max_eta < resolved) {
    const highest = facts.k1max_eta.toPrecision(2);
    const extrapolated = gradients.some(({ name, rule }) => name === "u" && rule.tail !== null);
    const text = extrapolated
      ? `The spectrum stands out of its noise up to a wavenumber times eta of ${highest} only: lambda, eta and the dissipation rest on what is extrapolated beyond.`
      : `The highest usable wavenumber times eta is ${highest}: lambda and eta from gradients are upper bounds, the dissipation from them is a lower one.`;
    flags.push({ code: "resolution", text, value: facts.k1max_eta });
  }
  const sensor = settings.sensorLength;
  if (sensor !== null && facts.eta.value !== null && sensor > longSensor * facts.eta.value) {
    const ratio = sensor / facts.eta.value;
    const text = `The sensor is ${ratio.toPrecision(2)} eta long and averages over the smallest scales.`;
    flags.push({ code: "sensor-length", text, value: ratio });
  }
  return flags;
}

/** A slope beyond which a flat end is not to be had by chance: 0.1 and three standard errors. */
function risingSlope({ size, segments }: { size: number; segments: number }): number {
  const bins = size / 6;
  const spread = 0.117;
  return 0.1 + (3 * Math.sqrt(38 / (36 * segments * bins))) / spread;
}

function replayFlags({ record, times }: StationMaterial): Flag[] {
  const found = record.parts.flatMap(({ replay }) => replay ?? []);
  if (found.length === 0) return [];
  const [{ period, peak }] = found;
  const scales = times.scale === null ? "" : `, ${(period / times.scale).toFixed(0)} integral times`;
  const text = `u comes back after ${period.toPrecision(4)} of time${scales}, with a correlation of ${peak.toFixed(2)}: the inflow is replayed, and the record counts as one period.`;
  return [{ code: "replayed-inflow", text, value: period }];
}
