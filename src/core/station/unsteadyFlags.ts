import type { Flag } from "../flag.ts";
import { jointLayout, pairIndex } from "../signal/jointMoments.ts";
import type { JoinedRecord } from "./joinParts.ts";
import { startUpTransient, type Unsteadiness } from "./startUpTransient.ts";

/**
 * Whether the station's records begin in a transient or change all along. Several records that were not taken at
 * once are each looked at, and the one that takes longest to settle is told.
 */
export function unsteadyFlags(record: JoinedRecord): Flag[] {
  const runs = record.together ? [record.rows] : record.perPart;
  const found = runs.flatMap((rows) => unsteadiness(rows, record) ?? []);
  const flags: Flag[] = [];
  const starts = found.filter(({ kind }) => kind === "start-up");
  if (starts.length > 0) flags.push(startFlag(latest(starts), record));
  const trends = found.filter(({ kind }) => kind === "trend");
  if (trends.length > 0) flags.push(trendFlag(trends.reduce((a, b) => (b.departure > a.departure ? b : a))));
  return flags;
}

function latest(found: readonly Unsteadiness[]): Unsteadiness {
  return found.reduce((a, b) => (b.blocks > a.blocks ? b : a));
}

function unsteadiness(rows: readonly Float64Array[], { components }: JoinedRecord): Unsteadiness | null {
  const layout = jointLayout(components.length);
  // a last block that is hardly begun scatters more than the others
  const whole = rows.filter((row) => row[0] >= rows[0][0] / 2);
  const means = whole.map((row) => row[layout.mean] / row[0]);
  const variances = whole.map((row) =>
    components.reduce((sum, _, c) => {
      const square = row[layout.second + pairIndex(components.length, c, c)] / row[0];
      return sum + square - (row[layout.mean + c] / row[0]) ** 2;
    }, 0),
  );
  return startUpTransient(means, variances);
}

function startFlag({ what, blocks, departure }: Unsteadiness, record: JoinedRecord): Flag {
  const time = blocks * record.blockSamples * record.step;
  const [U, x] = [record.means[0], record.parts[0].origin.x];
  // what enters at the inflow clears the stations one after another
  const flight =
    U > 0 && x > 0 ? ` From x = 0 the flow takes ${(x / U).toPrecision(2)} to this station.` : "";
  const text = `The record begins in a transient: the ${nameOf(what)} of its beginning lies ${departure.toFixed(1)} standard errors from that of the rest, which is steady after ${time.toPrecision(3)} of time. Leave so much out as start-up.${flight}`;
  return { code: "start-up", text, value: time };
}

function trendFlag({ what, departure }: Unsteadiness): Flag {
  const text = `The ${nameOf(what)} changes along the record by more than chance, up to ${departure.toFixed(1)} standard errors between its beginning and the rest: the flow or the probe drifts, and averages over it are of no one state.`;
  return { code: "trend", text, value: departure };
}

function nameOf(what: Unsteadiness["what"]): string {
  return what === "mean" ? "mean of u" : "variance";
}
