// Reads, or reads and reduces, every CSV file of a folder, one after another on one thread:
// node bundle.mjs FOLDER read|all
import { readdirSync, statSync } from "node:fs";
import { join } from "node:path";
import { reduceStation } from "../../src/core/station/reduceStation.ts";
import type { StationResult } from "../../src/core/stationResult.ts";
import { memoryColumnStore } from "../../src/engine/columnStore.ts";
import { reduceFile } from "../../src/engine/reduceFile.ts";
import { fileSource } from "../../src/engine/threadFile.ts";
import { readRecords } from "../../src/read/readRecords.ts";
import { readCaseSheet } from "../../src/sheet/readCaseSheet.ts";
import { readSettings } from "../../src/sheet/readSettings.ts";
import { reduceSettings } from "../../src/sheet/reduceSettings.ts";

const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;

/** The settings of a plain case in series with everything by default, records frozen. */
function plainSettings() {
  const text = JSON.stringify({
    case: "bench",
    kinematicViscosity: 1.51e-5,
    layout: "series",
    files: [{ path: "*.csv" }],
    reduce: { taylorCorrection: false },
  });
  const { sheet } = readCaseSheet(text, "bench.json");
  return { read: readSettings(sheet, { path: "*.csv", x: null }), reduce: reduceSettings(sheet) };
}

async function readAll(folder: string) {
  const settings = plainSettings();
  const start = performance.now();
  let samples = 0;
  for (const name of csvFiles(folder)) {
    const path = join(folder, name);
    const add = (block: { count: number }) => {
      samples += block.count;
    };
    await readRecords(fileSource(name, path, statSync(path).size), settings.read, {
      record: () => ({ add }),
    });
  }
  return { seconds: (performance.now() - start) / 1000, samples };
}

async function reduceAll(folder: string) {
  const { read, reduce } = plainSettings();
  const start = performance.now();
  const stations: StationResult[] = [];
  for (const name of csvFiles(folder)) {
    const path = join(folder, name);
    const bytes = statSync(path).size;
    const file = { name, bytes, fingerprint: name, content: { path } };
    const source = fileSource(name, path, bytes);
    const { parts } = await reduceFile(source, { file, read, reduce }, memoryColumnStore(1 << 27), () => {});
    stations.push(reduceStation(parts, reduce));
  }
  const seconds = (performance.now() - start) / 1000;
  const keys = ["uu", "L11", "lambda", "epsilon"] as const;
  const means = Object.fromEntries(
    keys.map((key) => [key, mean(stations.map((station) => station[key].value ?? Number.NaN))]),
  );
  return { seconds, means };
}

function csvFiles(folder: string): string[] {
  return readdirSync(folder)
    .filter((name) => name.endsWith(".csv"))
    .sort();
}

const [, , folder, what] = process.argv;
const result = what === "read" ? await readAll(folder) : await reduceAll(folder);
console.log(JSON.stringify({ ...result, peakMB: process.resourceUsage().maxRSS / 1024 }));
