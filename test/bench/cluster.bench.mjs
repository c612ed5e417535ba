// A job array of shards on one real node: Slurm on the loopback address, one share killed and submitted again.
import { readFileSync, rmSync } from "node:fs";
import { join } from "node:path";
import { setTimeout as pause } from "node:timers/promises";
import { makeProbes } from "./makeProbes.mjs";
import { startSlurm } from "./startSlurm.mjs";

const shares = 4;
const killed = 2;
export const title = `Shards as a job array of ${shares} on one Slurm node, share ${killed} killed and submitted again`;

export async function run(tools) {
  const slurm = await startSlurm(join(tools.generated, "slurm"));
  if (typeof slurm === "string") return void console.log(slurm);
  try {
    await compare(tools, slurm);
  } finally {
    await slurm.stop();
  }
}

async function compare(tools, slurm) {
  const folder = join(tools.generated, "probes");
  makeProbes(folder);
  const sheet = join(folder, "bench.json");
  const [whole, shards, merged] = ["whole", "shards", "merged"].map((name) =>
    join(tools.generated, "cluster", name),
  );
  rmSync(join(tools.generated, "cluster"), { recursive: true, force: true });
  const batch = (...args) =>
    tools.measured("npm", ["run", "--silent", "--prefix", tools.top, "batch", "--", ...args]);

  const alone = await batch(sheet, "--out", whole, "--jobs", "2");
  if (alone.code !== 0) throw new Error(`the run without shards failed: ${alone.errors}`);
  const job = (array) =>
    slurm.submit(
      array,
      [
        `npm run --silent --prefix '${tools.top}' batch -- '${sheet}' --out '${shards}'`,
        `--shard $SLURM_ARRAY_TASK_ID/${shares} --jobs 1`,
      ].join(" "),
    );

  const begin = performance.now();
  const first = await job(`1-${shares}`);
  while ((await slurm.state(`${first}_${killed}`)) === "PENDING") await pause(100);
  await pause(1500); // into its work
  await slurm.cancel(`${first}_${killed}`);
  await slurm.ended(first);
  const gap = await batch("--merge", shards, "--out", merged);
  console.log(`killed: ${gap.errors.trim().split("\n").at(-1)} (exit ${gap.code})`);
  await slurm.ended(await job(String(killed)));
  const seconds = (performance.now() - begin) / 1000;

  const joined = await batch("--merge", shards, "--out", merged);
  if (joined.code !== 0) throw new Error(`the shards were not joined: ${joined.errors}`);
  const same = ["results.json", "bench-stations.csv"].every((name) =>
    readFileSync(join(whole, name)).equals(readFileSync(join(merged, name))),
  );
  tools.table(
    ["", "wall s"],
    [
      ["without shards, 2 jobs", alone.seconds.toFixed(1)],
      [`${shares} shares on 2 cores, one of them twice`, seconds.toFixed(1)],
      ["joining", joined.seconds.toFixed(1)],
    ],
  );
  console.log(`results ${same ? "equal bit for bit" : "DIFFER"}`);
}
