import { readFileSync } from "node:fs";
import { beforeAll, describe, expect, it } from "vitest";
import { reduceStation } from "../../src/core/station/reduceStation.ts";
import type { StationResult } from "../../src/core/stationResult.ts";
import { memoryColumnStore } from "../../src/engine/columnStore.ts";
import { reduceFile } from "../../src/engine/reduceFile.ts";
import { readCaseSheet } from "../../src/sheet/readCaseSheet.ts";
import { readSettings } from "../../src/sheet/readSettings.ts";
import { reduceSettings } from "../../src/sheet/reduceSettings.ts";
import { expectClose } from "../support/expectClose.ts";

// JHTDB channel flow, one point: Graham et al. (2016), J. Turbulence 17, 181; see test/reference/jhtdb/README.md
const name = "jhtdb_channel_point_uvw.csv";
const content = readFileSync(new URL(`../reference/jhtdb/${name}`, import.meta.url));

/** The publisher's own file from its bytes to its station, by a sheet that names no column. */
async function station(): Promise<StationResult> {
  const { sheet } = readCaseSheet(
    JSON.stringify({
      case: "channel",
      units: "nondimensional",
      kinematicViscosity: 5e-5,
      layout: "series",
      files: [{ path: name, x: 1 }],
    }),
    "channel.json",
  );
  async function* stream() {
    for (let from = 0; from < content.length; from += 10_007) yield content.subarray(from, from + 10_007);
  }
  const source = { name, bytes: content.length, stream };
  const file = { name, bytes: content.length, fingerprint: name, content: { path: name } };
  const ask = { file, read: readSettings(sheet, sheet.files[0]), reduce: reduceSettings(sheet) };
  const { parts } = await reduceFile(source, ask, memoryColumnStore(0), () => {});
  return reduceStation(parts, ask.reduce);
}

describe("the file of the JHTDB channel's point record", () => {
  let found: StationResult;
  beforeAll(async () => {
    found = await station();
  });

  it("gives the moments of its data set, columns and time step recognised", () => {
    const published = { relative: 1e-8, because: "the published figures have nine digits" };
    expect(found.samples).toBe(4000);
    expectClose(found.facts.step, 0.0065, { relative: 1e-9, because: "printed so" });
    for (const [key, value] of [
      ["U", 0.445885005763],
      ["uu", 1.81704248e-2],
      ["vv", 4.2836898e-4],
      ["ww", 3.10071592e-3],
      ["uv", -1.20150742e-3],
    ] as const)
      expectClose(found[key].value, value, published);
  });
  it("gives the correlation coefficient published with it, and the integral time to its first zero", () => {
    expectClose(found.routes.rho_uv.value, -0.4307, { relative: 2e-4, because: "four digits" });
    expectClose(found.T_int.value, 0.3608, { relative: 2e-4, because: "four digits" });
  });
  it("carries no doubt of its times, and that it is short", () => {
    const codes = found.flags.map(({ code }) => code);
    expect(codes).toContain("short-record");
    for (const code of ["rounded-times", "unequal-steps", "gap", "backward-time"] as const)
      expect(codes).not.toContain(code);
    expect(found.cuts).toBeUndefined();
  });
});
