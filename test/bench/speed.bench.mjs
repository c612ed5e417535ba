// Reading and reducing 20 probes of 250 000 samples and three components, beside a plain script (peer.py).
import { existsSync, statSync } from "node:fs";
import { cpus } from "node:os";
import { join } from "node:path";
import { makeProbes, probes, samples } from "./makeProbes.mjs";

export const title = `Reading and reducing: ${probes} probes of ${samples} samples of t, u, v, w`;
export const byDefault = true;

/** Keeps the allocator from giving memory back and faulting it in again: the script at its best. */
const fair = {
  MALLOC_MMAP_THRESHOLD_: "4000000000",
  MALLOC_TRIM_THRESHOLD_: "30000000000",
  MALLOC_TOP_PAD_: "67108864",
};

export async function run(tools) {
  const folder = join(tools.generated, "probes");
  const files = makeProbes(folder);
  const megabytes = files.reduce((sum, file) => sum + statSync(file).size, 0) / 1e6;
  console.log(
    `${megabytes.toFixed(0)} MB; ${cpus()[0].model}, ${cpus().length} cores, Node ${process.versions.node}`,
  );

  const bundle = await tools.bundle("reduceFolder");
  const reading = await own(tools, [bundle, folder, "read"]);
  const all = await own(tools, [bundle, folder, "all"]);
  const ours = { reading: reading.seconds, all: all.seconds, peakMB: all.peakMB };
  const peers = [
    ["script as it comes", await peer(tools, folder, {})],
    ["script, fair allocator", await peer(tools, folder, fair)],
  ];
  const rows = [row("Waneline, one thread", ours, megabytes)];
  for (const [name, result] of peers) if (result) rows.push(row(name, result, megabytes));
  const batch = await throughBatch(tools, folder, files);
  if (batch)
    rows.push(["Waneline, batch command, 1 job", "", "", "", "", batch.seconds.toFixed(1), mb(batch.peakMB)]);
  tools.table(["", "reading s", "MB/s", "reducing s", "1e6 samples/s", "all s", "peak MB"], rows);
  for (const [name, result] of peers) if (result) printRatios(name, ours, result, all.means);
}

async function own(tools, args) {
  const { code, out, errors } = await tools.measured(process.execPath, args);
  if (code !== 0) throw new Error(`the bundle failed: ${errors}`);
  return JSON.parse(out);
}

async function peer(tools, folder, environment) {
  const script = join(import.meta.dirname, "peer.py");
  const { code, out, errors } = await tools.measured("python3", [script, folder], { environment });
  if (code !== 0) {
    console.log(`The script cannot run here: ${errors.trim().split("\n").at(-1)}`);
    return null;
  }
  const result = JSON.parse(out);
  return { ...result, all: result.reading + result.reducing };
}

/** The command a user would give, start and results file included. */
async function throughBatch(tools, folder, files) {
  const program = join(tools.top, "dist-batch/main.js");
  if (!existsSync(program)) {
    console.log("The batch command is not built: npm run prepare");
    return null;
  }
  const sheet = join(folder, "bench.json");
  const out = join(tools.generated, "batch-results");
  const done = await tools.measured(process.execPath, [program, sheet, "--out", out, "--jobs", "1"]);
  if (done.code === 0) return done;
  console.log(
    `The batch command ended with ${done.code} on ${files.length} files: ${done.errors.trim().split("\n").at(-1)}`,
  );
  return null;
}

function row(name, { reading, all, peakMB }, megabytes) {
  const reducing = all - reading;
  const rate = (probes * samples) / 1e6 / reducing;
  return [
    name,
    reading.toFixed(1),
    (megabytes / reading).toFixed(1),
    reducing.toFixed(1),
    rate.toFixed(2),
    all.toFixed(1),
    mb(peakMB),
  ];
}

const mb = (value) => (value === null ? "unknown" : value.toFixed(0));

function printRatios(name, ours, peer, means) {
  const ratio = (a, b) => (a / b).toFixed(2);
  const own = ours.all - ours.reading;
  console.log(
    `Waneline over ${name} (${peer.tools}): reading ${ratio(ours.reading, peer.reading)}, ` +
      `reducing ${ratio(own, peer.reducing)}, all ${ratio(ours.all, peer.all)}, memory ${ratio(ours.peakMB, peer.peakMB)}`,
  );
  const agreement = Object.keys(means).map((key) => `${key} ${(means[key] / peer.means[key]).toFixed(4)}`);
  console.log(`  means of the results, Waneline over script: ${agreement.join(", ")}`);
}
