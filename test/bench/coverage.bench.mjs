// How often the 95 % intervals of one station hold the truth, over synthetic records of known spectrum.
import { availableParallelism } from "node:os";

const records = 500;
const lengths = [200, 1000];
/** Stations on lines, and how many snapshots of a line of twelve integral scales each has. */
const lineStations = 300;
const snapshots = [20, 100];
export const title = `Coverage of the 95 % intervals over ${records} records of ${lengths.join(" and ")} integral times, and ${lineStations} stations on lines`;

/** Least and largest share that is right; Re_L and C_epsilon are printed without. */
const bars = { 200: [0.88, 0.98], 1000: [0.92, 0.98] };
const integralScaleBar = [0.9, 0.99];
const withoutBar = ["Re_L", "C_epsilon"];

export async function run(tools) {
  const bundle = await tools.bundle("coverRecords");
  for (const length of lengths) {
    const tallies = await tallied(tools, bundle, length, records);
    console.log(
      `\n${length} integral times (bias and spread in % of the truth; of u' for U; absolute, times 100, for S)`,
    );
    const rows = Object.entries(tallies).map(([key, tally]) => row(key, tally, records, barOf(key, length)));
    tools.table(head, rows);
  }
  const lines = await tools.bundle("coverLines");
  for (const count of snapshots) {
    const tallies = await tallied(tools, lines, count, lineStations);
    console.log(`\nlines of twelve integral scales, ${count} snapshots (bias and spread as above)`);
    // no bar is set for lines: records of as many samples have theirs
    const rows = Object.entries(tallies).map(([key, tally]) => row(key, tally, lineStations, null));
    tools.table(head, rows);
  }
}

const head = ["", "coverage %", "bar", "", "bias", "spread", "no interval"];

function barOf(key, length) {
  if (withoutBar.includes(key)) return null;
  return key === "L11" ? integralScaleBar : bars[length];
}

/** The trials shared over the cores by seed; the tallies joined in order of seed. */
async function tallied(tools, bundle, length, trials) {
  const parts = availableParallelism();
  const share = Math.ceil(trials / parts);
  const runs = await Promise.all(
    Array.from({ length: parts }, (_, part) => {
      const count = Math.min(share, trials - part * share);
      return tools.measured(process.execPath, [bundle, `${length}`, `${count}`, `${1 + part * share}`]);
    }),
  );
  const joined = {};
  for (const { code, out, errors } of runs) {
    if (code !== 0) throw new Error(`the bundle failed: ${errors}`);
    for (const [key, { given, held, departures }] of Object.entries(JSON.parse(out))) {
      joined[key] ??= { given: 0, held: 0, departures: [] };
      joined[key].given += given;
      joined[key].held += held;
      joined[key].departures.push(...departures);
    }
  }
  return joined;
}

function row(key, { given, held, departures }, trials, bar) {
  const bias = departures.reduce((sum, value) => sum + value, 0) / departures.length;
  const spread = Math.sqrt(
    departures.reduce((sum, value) => sum + (value - bias) ** 2, 0) / departures.length,
  );
  const coverage = held / given;
  const inside = bar === null || (coverage >= bar[0] && coverage <= bar[1]);
  return [
    key,
    given > 0 ? (100 * coverage).toFixed(1) : "none",
    bar === null ? "" : `${100 * bar[0]} to ${100 * bar[1]}`,
    inside ? "" : "OUTSIDE",
    (100 * bias).toFixed(2),
    (100 * spread).toFixed(2),
    String(trials - given),
  ];
}
