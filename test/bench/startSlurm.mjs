import { execFile, spawn, spawnSync } from "node:child_process";
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { availableParallelism, hostname } from "node:os";
import { join } from "node:path";
import { setTimeout as pause } from "node:timers/promises";
import { promisify } from "node:util";

const call = promisify(execFile);
const programs = ["munged", "slurmctld", "slurmd", "sbatch", "squeue", "scancel"];
const packages = ["slurm-wlm", "munge"];

/**
 * A cluster of one node on the loopback address, all its files in one folder; as root on Debian the packages are
 * installed where they are missing.
 * @returns the cluster, or a sentence that says why there is none
 */
export async function startSlurm(folder) {
  const lacking = () => programs.filter((name) => spawnSync("which", [name]).status !== 0);
  if (lacking().length > 0) {
    if (process.getuid?.() !== 0 || !existsSync("/usr/bin/apt-get"))
      return `Slurm cannot be installed here: no ${lacking().join(", ")}.`;
    console.log(`installing ${packages.join(", ")}`);
    spawnSync("apt-get", ["update", "-qq"]);
    spawnSync("apt-get", ["install", "-y", "-qq", "--no-install-recommends", ...packages], {
      env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" },
    });
    if (lacking().length > 0) return `Slurm could not be installed: no ${lacking().join(", ")}.`;
  }
  if (process.getuid?.() !== 0) return "Slurm's daemons need root here.";
  rmSync(folder, { recursive: true, force: true });
  for (const name of ["state", "spool", "munge"])
    mkdirSync(join(folder, name), { recursive: true, mode: 0o700 });
  const conf = join(folder, "slurm.conf");
  writeFileSync(conf, configuration(folder));
  const environment = { ...process.env, SLURM_CONF: conf };
  const children = [
    spawn("munged", ["--foreground", "--force", ...mungeFiles(folder)], { stdio: "ignore" }),
    spawn("slurmctld", ["-D", "-f", conf], { stdio: "ignore", env: environment }),
    spawn("slurmd", ["-D", "-f", conf], { stdio: "ignore", env: environment }),
  ];
  const cluster = clusterOf(folder, environment, children);
  for (let tries = 0; tries < 100; tries++) {
    if (await cluster.up()) return cluster;
    await pause(200);
  }
  await cluster.stop();
  return `Slurm did not come up: ${logEnd(join(folder, "slurmctld.log"))} ${logEnd(join(folder, "slurmd.log"))}`;
}

function clusterOf(folder, environment, children) {
  const ask = async (program, ...args) => (await call(program, args, { env: environment })).stdout.trim();
  return {
    up: () =>
      ask("sinfo", "--noheader", "--format=%t").then(
        (state) => /^(idle|mix|alloc)/.test(state),
        () => false,
      ),
    submit: (array, command) =>
      ask(
        "sbatch",
        "--parsable",
        `--array=${array}`,
        `--output=${join(folder, "job-%A-%a.log")}`,
        "--wrap",
        command,
      ),
    /** Of one task of an array: PENDING, RUNNING, or empty once it has ended. */
    state: (task) => ask("squeue", "--noheader", "--format=%T", `--jobs=${task}`).catch(() => ""),
    cancel: (task) => ask("scancel", task),
    ended: async (job) => {
      while (await ask("squeue", "--noheader", "--format=%T", `--jobs=${job}`).catch(() => ""))
        await pause(200);
    },
    stop: async () => {
      for (const child of children.reverse()) child.kill("SIGTERM");
      await pause(300);
      for (const child of children) child.kill("SIGKILL");
    },
  };
}

const mungeFiles = (folder) => {
  const key = join(folder, "munge/key");
  writeFileSync(key, Buffer.from(Array.from({ length: 128 }, () => Math.floor(Math.random() * 256))), {
    mode: 0o600,
  });
  return [
    `--key-file=${key}`,
    `--socket=${join(folder, "munge/socket")}`,
    `--pid-file=${join(folder, "munge/pid")}`,
    `--log-file=${join(folder, "munge/log")}`,
    `--seed-file=${join(folder, "munge/seed")}`,
  ];
};

/** Ports away from the usual ones, so that a cluster that is here already is left alone. */
function configuration(folder) {
  const host = hostname().split(".")[0];
  return `${[
    "ClusterName=bench",
    `SlurmctldHost=${host}(127.0.0.1)`,
    "SlurmctldPort=16817",
    "SlurmdPort=16818",
    "SlurmUser=root",
    "AuthType=auth/munge",
    `AuthInfo=socket=${join(folder, "munge/socket")}`,
    `StateSaveLocation=${join(folder, "state")}`,
    `SlurmdSpoolDir=${join(folder, "spool")}`,
    `SlurmctldPidFile=${join(folder, "slurmctld.pid")}`,
    `SlurmdPidFile=${join(folder, "slurmd.pid")}`,
    `SlurmctldLogFile=${join(folder, "slurmctld.log")}`,
    `SlurmdLogFile=${join(folder, "slurmd.log")}`,
    "ProctrackType=proctrack/pgid",
    "TaskPlugin=task/none",
    "SelectType=select/cons_tres",
    "SelectTypeParameters=CR_Core",
    "ReturnToService=2",
    `NodeName=${host} NodeAddr=127.0.0.1 CPUs=${availableParallelism()} State=UNKNOWN`,
    `PartitionName=bench Nodes=${host} Default=YES State=UP`,
  ].join("\n")}\n`;
}

function logEnd(path) {
  try {
    return readFileSync(path, "utf8").trim().split("\n").at(-1);
  } catch {
    return "";
  }
}
