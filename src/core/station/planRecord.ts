import type { RecordOrigin, RoundedTimes } from "../records.ts";
import { mostBlocks } from "../signal/blockList.ts";
import { startLagProducts } from "../signal/lagProducts.ts";
import { startWelch } from "../signal/welch.ts";
import { welchDensity } from "../signal/welchDensity.ts";
import type { ReduceSettings } from "../stationResult.ts";
import { examineSteps } from "./examineSteps.ts";
import { meanSquareRate, windowShare } from "./meanSquareRate.ts";
import { noiseFloor, scaleBin } from "./noiseFloor.ts";
import { constantSignal, notFinite, tooFew } from "./recordFailures.ts";
import type { RecordPlan } from "./recordPlan.ts";
import { zeroCrossing } from "./zeroCrossing.ts";

/** The pilot: a record's first samples, or all of them. */
export interface Pilot {
  readonly count: number;
  readonly t: Float64Array | null;
  /** u, and v and w where they are measured. */
  readonly columns: readonly Float64Array[];
}

/** Fewest samples from which anything is reduced. */
const fewestSamples = 64;
/** Most lags kept per block and component: what bounds the memory of a record. */
const mostLags = 8192;
const chunk = 4096;
const firstLook = 1 << 17;
/** Segments in a record of which some hundred are a group: 50 groups, a leak of a twentieth. */
const longRecord = 200;
/** Integral times in a short segment. */
const shortSegment = 2;

/**
 * What a record's pilot decides for all of it: step, lags, segments, blocks.
 * @throws too-few-samples, constant-signal, no-time
 */
export function planRecord(
  pilot: Pilot,
  origin: RecordOrigin,
  settings: ReduceSettings,
  rounded: RoundedTimes = "even",
): RecordPlan {
  if (pilot.count < fewestSamples) throw tooFew(pilot.count, fewestSamples, origin);
  const u = pilot.columns[0];
  const facts = examineSteps(pilot.t, pilot.count, origin, rounded);
  const weighted = facts.unequal > 0;
  const [from, to] = facts.longest;
  const reference = pilot.columns.map((column) => mean(column, pilot.count));
  if (!reference.every(Number.isFinite)) throw notFinite(origin);
  if (isConstant(u, pilot.count)) throw constantSignal(u[0], origin);
  const slope = pilot.columns.map((column, c) =>
    settings.detrend === "linear" ? trend(column, pilot, reference[c], facts.step) : 0,
  );
  const centre = centreOf(pilot, facts.step);
  const centred = new Float64Array(pilot.count);
  for (let i = 0; i < pilot.count; i++) {
    const time = slope[0] === 0 ? 0 : (pilot.t === null ? i * facts.step : pilot.t[i]) - centre;
    centred[i] = u[i] - reference[0] - slope[0] * time;
  }
  // over unequal steps these are guesses, which the whole record is held against
  const unbroken = centred.subarray(from, to);
  const lags = findLags(unbroken);
  const segment = segmentSize(settings.segment, unbroken.length, lags.area);
  const times = { step: facts.step, weighted, quantum: facts.quantum, rounded: facts.rounded };
  return {
    ...times,
    ...(facts.rounded && rounded === "ask" ? { unconfirmed: true } : {}),
    reference,
    slope,
    centre,
    integralTime: lags.crossing === null ? null : lags.area * facts.step,
    lagLimit: lags.limit,
    lagStride: Math.max(1, lags.limit / mostLags),
    segment,
    bandSegment: bandSize(segment, pilot.count, lags.area),
    blockSamples: blockSize(pilot.count),
    derivativeStep: derivativeStep(unbroken, reference[0], facts.step, segment, lags.area, settings),
  };
}

/** A plan for the same record with another integral time, as the whole record showed it. */
export function replan(
  plan: RecordPlan,
  samples: number,
  integralTime: number,
  settings: ReduceSettings,
): RecordPlan {
  const steps = integralTime / plan.step;
  const limit = Math.min(powerAbove(8 * steps), powerBelow(samples / 2));
  const segment = segmentSize(settings.segment, samples, steps);
  return {
    ...plan,
    integralTime,
    lagLimit: limit,
    lagStride: Math.max(1, limit / mostLags),
    segment,
    bandSegment: bandSize(segment, samples, steps),
  };
}

/** The smallest block of 64 · 2^m samples of which at most 127 hold the pilot. */
function blockSize(count: number): number {
  let size = 64;
  while (size * mostBlocks < count) size *= 2;
  return size;
}

/**
 * Lags doubled until the zero crossing lies well inside: at two fifths of them or before. A first part of the
 * pilot tells where to begin, so that all of it is seldom transformed more than once.
 */
function findLags(u: Float64Array): { limit: number; crossing: number | null; area: number } {
  const most = powerBelow(u.length / 2);
  let limit = Math.min(256, most);
  if (u.length > firstLook)
    limit = doubleLags(u.subarray(0, firstLook), limit, powerBelow(firstLook / 4)).limit;
  return doubleLags(u, limit, most);
}

function doubleLags(u: Float64Array, limit: number, most: number) {
  for (; ; limit *= 2) {
    const products = startLagProducts(limit, chunk, 1);
    const row = new Float64Array(limit);
    products.add(u, 0, u.length);
    products.flush(row);
    const { at, area } = zeroCrossing(row);
    const inside = at !== null && (at + 2) * 2.5 <= limit;
    if (inside || limit >= most) return { limit, crossing: at, area: area / row[0] };
  }
}

/**
 * Samples a segment: the power of two from 50 integral times on, short enough for seven segments in the record.
 * @param wanted  the user's choice; taken where the record holds one such segment
 */
function segmentSize(wanted: number | null, count: number, integralSteps: number): number {
  if (wanted !== null) return Math.min(powerAbove(wanted), powerBelow(count));
  return Math.min(Math.max(powerAbove(50 * integralSteps), 256), powerBelow(count / 4));
}

/**
 * Samples a short segment. It must be short against a group of the jackknife, or one group's gradient leaks into
 * the next and the error comes out too small; where the long segments are that, they serve.
 */
function bandSize(segment: number, count: number, integralSteps: number): number {
  if (count >= longRecord * segment) return segment;
  return Math.min(segment, Math.max(64, powerAbove(shortSegment * integralSteps)));
}

/** Half the base of the difference behind the derivative skewness, in samples: nearest the Kolmogorov length. */
function derivativeStep(
  u: Float64Array,
  speed: number,
  step: number,
  segment: number,
  integralSteps: number,
  settings: ReduceSettings,
): number {
  const viscosity = settings.kinematicViscosity;
  if (viscosity === null || !(speed > 0)) return 1;
  // eta goes with the fourth root of the gradient: the first segments give it well enough
  const count = Math.min(u.length, Math.max(1 << 17, 8 * segment));
  const welch = startWelch(segment);
  welch.add(u, 0, count);
  const totals = { size: segment, segments: welch.segments, power: welch.power, edges: welch.edges };
  const density = welchDensity(totals, step, 0);
  const rule = noiseFloor(density, segment, scaleBin(segment, integralSteps));
  let variance = 0;
  for (let i = 0; i < count; i++) variance += u[i] * u[i];
  const rate = meanSquareRate(density, segment, step, rule) - windowShare(variance / count, segment, step);
  if (!(rate > 0)) return 1;
  const eta = ((viscosity ** 2 * speed ** 2) / (15 * rate)) ** 0.25;
  return Math.min(Math.max(1, Math.round(eta / (speed * step))), blockSize(u.length) / 2);
}

function isConstant(x: Float64Array, count: number): boolean {
  for (let i = 1; i < count; i++) if (x[i] !== x[0]) return false;
  return true;
}

function mean(x: Float64Array, count: number): number {
  let sum = 0;
  for (let i = 0; i < count; i++) sum += x[i];
  const rough = sum / count;
  let rest = 0;
  for (let i = 0; i < count; i++) rest += x[i] - rough;
  return rough + rest / count;
}

function centreOf(pilot: Pilot, step: number): number {
  if (pilot.t === null) return ((pilot.count - 1) / 2) * step;
  return (pilot.t[0] + pilot.t[pilot.count - 1]) / 2;
}

/** Slope of a least-squares line in time. */
function trend(x: Float64Array, pilot: Pilot, level: number, step: number): number {
  const centre = centreOf(pilot, step);
  let product = 0;
  let square = 0;
  for (let i = 0; i < pilot.count; i++) {
    const time = (pilot.t === null ? i * step : pilot.t[i]) - centre;
    product += time * (x[i] - level);
    square += time * time;
  }
  return product / square;
}

function powerAbove(value: number): number {
  return 2 ** Math.max(1, Math.ceil(Math.log2(Math.max(value, 2)) - 1e-12));
}

function powerBelow(value: number): number {
  return 2 ** Math.max(1, Math.floor(Math.log2(Math.max(value, 2)) + 1e-12));
}
