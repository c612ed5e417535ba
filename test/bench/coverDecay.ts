// How often the 95 % intervals of a decay law hold the truth, over synthetic profiles: node bundle.mjs ASK
// ASK is JSON: {"kind": "cells", "profiles", "seeds", "cells"}, {"kind": "windows", "profiles", "fields"}, {"kind": "together",
// "profiles", "rhos"}, {"kind": "refits", "profiles", "rounds"} or {"kind": "profiles", "profiles"}. Prints one line of JSON.
import { everyStart } from "../../src/core/decay/everyStart.ts";
import { fitDecay } from "../../src/core/decay/fitDecay.ts";
import { fitPowerLaw } from "../../src/core/decay/fitPowerLaw.ts";
import { fitWindow, windowQuantity } from "../../src/core/decay/fitWindow.ts";
import { isEstimate, type Quantity } from "../../src/core/quantity.ts";
import { seededRandom } from "../../src/core/signal/seededRandom.ts";
import { known, plainSettings, spacedFrom, stationAt } from "../support/lawStations.ts";
import { sharedRecords } from "../support/sharedRecords.ts";

/** One cell of the table: scatter of ln q, (x_last - x0)/(x_first - x0), stations, and whether the fit knows the scatter. */
interface Cell {
  scatter: number;
  span: number;
  stations: number;
  known: boolean;
}

interface Tally {
  profiles: number;
  refused: number;
  n: number;
  x0: number;
  /** Profiles in which a side of either interval is open. */
  open: number;
}

const truth = { n: 1.25, x0: 3, A: 0.06 };
const law = (x: number) => truth.A * (x - truth.x0) ** -truth.n;

function holds(quantity: Quantity, value: number): boolean {
  if (!isEstimate(quantity)) return false;
  const { low, high } = quantity;
  return (low ?? Number.NEGATIVE_INFINITY) <= value && value <= (high ?? Number.POSITIVE_INFINITY);
}

const isOpen = (quantity: Quantity) =>
  isEstimate(quantity) && (quantity.low === null || quantity.high === null);

function add(tally: Tally, n: Quantity, x0: Quantity): void {
  if (holds(n, truth.n)) tally.n++;
  if (holds(x0, truth.x0)) tally.x0++;
  if (isOpen(n) || isOpen(x0)) tally.open++;
}

const startTally = (profiles: number): Tally => ({ profiles, refused: 0, n: 0, x0: 0, open: 0 });

/** A profile whose stations fall like an exponential has no law, and then no interval that could hold anything. */
function coverCell({ scatter, span, stations, known: told }: Cell, profiles: number, seed: number): Tally {
  const random = seededRandom(seed);
  const xs = spacedFrom(truth.x0, truth.x0 + 10, truth.x0 + 10 * span, stations);
  const tally = startTally(profiles);
  for (let profile = 0; profile < profiles; profile++) {
    const points = xs.map((x) => {
      const q = law(x) * Math.exp(scatter * random.gaussian());
      return { x, q, smoothedError: told ? scatter : null };
    });
    const fitted = fitWindow(points, plainSettings);
    if ("refused" in fitted) tally.refused++;
    else add(tally, windowQuantity(fitted, "n"), windowQuantity(fitted, "x0"));
  }
  return tally;
}

/** A near field of so much at x = 6: dying out like an exponential of length 6 or 15, or like a power of x. */
interface NearFieldCase {
  form: "exp(-(x - 6)/6)" | "exp(-(x - 6)/15)" | "(x/6)^-3";
  excess: number;
}

const forms: Record<NearFieldCase["form"], (x: number) => number> = {
  "exp(-(x - 6)/6)": (x) => Math.exp(-(x - 6) / 6),
  "exp(-(x - 6)/15)": (x) => Math.exp(-(x - 6) / 15),
  "(x/6)^-3": (x) => (x / 6) ** -3,
};

/** Automatic windows with a near field before them, and how often the flag tells it. */
function coverWindows({ form, excess }: NearFieldCase, profiles: number, seed: number) {
  const random = seededRandom(seed);
  const xs = spacedFrom(0, 6, 100, 16);
  const error = 0.005;
  const [given, union, every] = [startTally(profiles), startTally(profiles), startTally(profiles)];
  const silent = startTally(0);
  let begins = 0;
  for (let profile = 0; profile < profiles; profile++) {
    const stations = xs.map((x) => {
      const q = law(x) * (1 + excess * forms[form](x)) * Math.exp(error * random.gaussian());
      return stationAt(x, { q: known(q, error) });
    });
    const decay = fitDecay(stations, plainSettings);
    begins += decay.window[0] / profiles;
    add(given, decay.given_window.n, decay.given_window.x0);
    add(union, decay.n, decay.x0);
    const all = everyStart(
      decay.points.filter((point) => point.used),
      plainSettings,
    );
    add(every, all?.n ?? decay.n, all?.x0 ?? decay.x0);
    if (decay.flags.some(({ code }) => code === "near-field")) continue;
    silent.profiles++;
    add(silent, decay.n, decay.x0);
  }
  return { form, excess, begins, given, union, every, silent };
}

/** Stations sampled together, their neighbours correlated by rho; taken as such, as each for itself, or told by the data. */
function coverTogether(rho: number, simultaneous: boolean | "auto", profiles: number): Tally {
  const random = seededRandom(3);
  const stream = { ...truth, U: 1 };
  const xs = spacedFrom(truth.x0, truth.x0 + 16, truth.x0 + 76, 12);
  const settings = { ...plainSettings, window: [0, 100] as const, quantity: "uu" as const, simultaneous };
  const tally = startTally(profiles);
  for (let profile = 0; profile < profiles; profile++) {
    const decay = fitDecay(sharedRecords(stream, xs, rho, random), settings);
    if (decay.law === null) tally.refused++;
    else add(tally, decay.n, decay.x0);
  }
  return tally;
}

/** Profiles for the timing, the same that the script beside reads; both start every refit from the first one's law. */
function timedProfiles(profiles: number) {
  const random = seededRandom(30);
  const x = spacedFrom(truth.x0, truth.x0 + 10, truth.x0 + 100, 30);
  const qs = Array.from({ length: profiles }, () =>
    x.map((at) => law(at) * Math.exp(0.02 * random.gaussian())),
  );
  const { A, n, x0 } = fitPowerLaw({ x, q: qs[0], error: x.map(() => 0.02) });
  return { x, qs, error: 0.02, start: { A, n, x0 } };
}

/** CPU milliseconds that all refits took in each round, and the mean n and x0 they gave. */
function timeRefits(profiles: number, rounds: number) {
  const { x, qs, error, start: law } = timedProfiles(profiles);
  const errors = x.map(() => error);
  const times: number[] = [];
  let mean = { n: 0, x0: 0 };
  for (let round = 0; round < rounds; round++) {
    const start = process.cpuUsage();
    const fits = qs.map((q) => {
      const { n, x0 } = fitPowerLaw({ x, q, error: errors }, { start: law });
      return { n, x0 };
    });
    const { user, system } = process.cpuUsage(start);
    times.push((user + system) / 1000);
    const meanOf = (key: "n" | "x0") => fits.reduce((sum, fit) => sum + fit[key] / profiles, 0);
    mean = { n: meanOf("n"), x0: meanOf("x0") };
  }
  return { times, mean };
}

type Request =
  | { kind: "cells"; profiles: number; cells: Cell[]; seeds: number[] }
  | { kind: "windows"; profiles: number; fields: NearFieldCase[] }
  | { kind: "together"; profiles: number; rhos: number[] }
  | { kind: "profiles"; profiles: number }
  | { kind: "refits"; profiles: number; rounds: number };

function answer(ask: Request): unknown {
  if (ask.kind === "cells") return ask.cells.map((cell, i) => coverCell(cell, ask.profiles, ask.seeds[i]));
  if (ask.kind === "windows") return ask.fields.map((field, i) => coverWindows(field, ask.profiles, 7 + i));
  if (ask.kind === "together")
    return ask.rhos.map((rho) => ({
      rho,
      blocks: coverTogether(rho, true, ask.profiles),
      auto: coverTogether(rho, "auto", ask.profiles),
      alone: coverTogether(rho, false, ask.profiles),
    }));
  return ask.kind === "profiles" ? timedProfiles(ask.profiles) : timeRefits(ask.profiles, ask.rounds);
}

console.log(JSON.stringify(answer(JSON.parse(process.argv[2]))));
