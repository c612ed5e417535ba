import { existsSync, mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { isotropicRecord } from "../../sample-data/maker/synthesise.mjs";

export const probes = 20;
export const samples = 250_000;
const step = 1 / 10_000;
const viscosity = 1.51e-5;

/** Writes the bench's records, decaying from probe to probe, unless they are there already. */
export function makeProbes(folder) {
  mkdirSync(folder, { recursive: true });
  const places = Array.from({ length: probes }, (_, i) => 0.5 * 1.06 ** i);
  const files = places.map((x) => join(folder, `x${String(Math.round(x * 1000)).padStart(4, "0")}mm.csv`));
  const stamp = join(folder, "made.txt");
  const wanted = `${probes} ${samples} ${step}`;
  if (existsSync(stamp) && readFileSync(stamp, "utf8") === wanted) return files;
  console.log("making the records, once ...");
  for (const [i, x] of places.entries()) {
    const k = 4.7 * ((x - 0.08) / 0.025) ** -1.25;
    const epsilon = (1.25 * 6 * k) / (x - 0.08);
    const wish = { k, epsilon, viscosity, U: 6, step, samples, seed: 700 + i };
    writeFileSync(files[i], text(isotropicRecord(wish)));
  }
  const sheet = {
    case: "bench",
    kinematicViscosity: viscosity,
    layout: "series",
    files: [{ path: "*.csv" }],
  };
  writeFileSync(
    join(folder, "bench.json"),
    JSON.stringify({ ...sheet, reduce: { taylorCorrection: false } }),
  );
  writeFileSync(stamp, wanted);
  return files;
}

function text({ u, v, w }) {
  const lines = ["t,u,v,w"];
  for (let i = 0; i < u.length; i++) {
    lines.push(`${(i * step).toFixed(4)},${u[i].toFixed(6)},${v[i].toFixed(6)},${w[i].toFixed(6)}`);
  }
  return `${lines.join("\n")}\n`;
}
