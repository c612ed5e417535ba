// Benches: node test/bench/run.mjs [name ...]. Each is a file NAME.bench.mjs beside this one that exports
// `title` and `run(tools)`; without a name those run that export `byDefault = true`. decayCoverage is asked for as
// decay-coverage.
import { readdirSync } from "node:fs";
import { cpus, loadavg } from "node:os";
import { join } from "node:path";
import { buildBundle } from "./buildBundle.mjs";
import { measured, table } from "./report.mjs";

const here = import.meta.dirname;
const files = new Map(
  readdirSync(here)
    .filter((file) => file.endsWith(".bench.mjs"))
    .sort()
    .map((file) => [kebab(file.slice(0, -".bench.mjs".length)), file]),
);
const known = [...files.keys()];
const asked = process.argv.slice(2).filter((word) => word !== "--");
const unknown = asked.filter((name) => !known.includes(name));
if (unknown.length > 0) {
  console.error(`no bench is called ${unknown.join(", ")}; there are: ${known.join(", ")}`);
  process.exit(2);
}

const tools = {
  /** Ignored by git: data, bundles and results of the benches. */
  generated: join(here, "generated"),
  top: join(here, "../.."),
  /** Path of a TypeScript file of this folder, built with all it imports for Node. */
  bundle: (name) => buildBundle(join(here, `${name}.ts`), join(here, "generated/bundles", name)),
  measured,
  table,
};
const load = loadavg()[0] / cpus().length;
if (load > 0.5)
  console.log(`This machine is busy (load ${load.toFixed(1)} a core): times and ratios are rough.`);
for (const name of asked.length > 0 ? asked : known) {
  const bench = await import(`./${files.get(name)}`);
  if (asked.length === 0 && !bench.byDefault) continue;
  console.log(`\n${bench.title}\n`);
  await bench.run(tools);
}

function kebab(name) {
  return name.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`);
}
