import { readFileSync } from "node:fs";
import { join } from "node:path";
import { expect, it } from "vitest";
import { simulatedText } from "../../sample-data/maker/recordText.mjs";
import { simulation } from "../../sample-data/maker/scenario.mjs";
import { stationTruth } from "../../sample-data/maker/stationTruth.mjs";
import { synthesiseRecord } from "../../sample-data/maker/synthesise.mjs";
import { sampleFolder } from "./reduceSheet.ts";

it("a record of the sample data is made again from its seed, byte for byte", () => {
  const station = 3;
  const x = simulation.x[station];
  const { spectra, truth } = stationTruth(simulation, x);
  const step = simulation.step(x);
  const record = synthesiseRecord({
    spectra,
    U: truth.U,
    step,
    samples: simulation.samples,
    seed: simulation.seed + station,
    skewness: truth.S_dudx,
  });
  const kept = readFileSync(join(sampleFolder, "simulation/probe-04.csv"), "utf8");
  expect(simulatedText(record, { x, step }) === kept).toBe(true);
}, 60_000);
