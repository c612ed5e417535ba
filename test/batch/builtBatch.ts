import { type ChildProcess, spawn, spawnSync } from "node:child_process";
import { existsSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { build } from "vite";

const top = resolve(import.meta.dirname, "../..");

export interface Ended {
  readonly code: number | null;
  readonly stdout: string;
  readonly stderr: string;
}

/** The batch command, built from the sources as they are now, away from the one that users run. */
export interface BuiltBatch {
  /** thread.js beside main.js: what an engine on threads is started with. */
  readonly thread: URL;
  run(args: readonly string[], from: string, env?: Readonly<Record<string, string>>): Ended;
  /** Begins and does not wait for the end. */
  begin(args: readonly string[], from: string): ChildProcess;
  remove(): void;
}

export async function buildBatch(): Promise<BuiltBatch> {
  const folder = mkdtempSync(join(tmpdir(), "waneline-built-"));
  writeFileSync(join(folder, "package.json"), '{ "type": "module" }');
  await buildInto(join(folder, "dist"));
  const main = join(folder, "dist/main.js");
  return {
    thread: new URL(`file://${join(folder, "dist/thread.js")}`),
    run: (args, from, env = {}) => ended("node", [main, ...args], from, env),
    begin: (args, from) =>
      spawn("node", [main, ...args], { cwd: from, env: withoutCallersFolder(), stdio: "pipe" }),
    remove: () => rmSync(folder, { recursive: true }),
  };
}

async function buildInto(outDir: string) {
  const configFile = join(top, "vite.config.ts");
  await build({ configFile, mode: "batch", logLevel: "error", build: { outDir, emptyOutDir: true } });
}

/** As a user calls it: through npm, from any folder, with what `npm ci` has built. */
export async function runThroughNpm(args: readonly string[], from: string): Promise<Ended> {
  if (!existsSync(join(top, "dist-batch/main.js"))) await buildInto(join(top, "dist-batch"));
  return ended("npm", ["run", "--silent", "--prefix", top, "batch", "--", ...args], from, {});
}

function ended(
  command: string,
  args: readonly string[],
  from: string,
  env: Readonly<Record<string, string>>,
): Ended {
  const options = { cwd: from, env: { ...withoutCallersFolder(), ...env }, encoding: "utf8" as const };
  const { status, stdout, stderr } = spawnSync(command, args, options);
  return { code: status, stdout, stderr };
}

/** npm has set INIT_CWD for the tests themselves. */
function withoutCallersFolder(): NodeJS.ProcessEnv {
  const { INIT_CWD: _own, ...inherited } = process.env;
  return inherited;
}
