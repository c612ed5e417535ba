import { readdirSync, readFileSync, statSync } from "node:fs";
import { join, relative, resolve } from "node:path";
import { reduceLines } from "../../src/core/station/lines/reduceLines.ts";
import { reduceStation } from "../../src/core/station/reduceStation.ts";
import type { StationResult } from "../../src/core/stationResult.ts";
import { memoryColumnStore } from "../../src/engine/columnStore.ts";
import { reduceFile } from "../../src/engine/reduceFile.ts";
import { reduceLineFile } from "../../src/engine/reduceLineFile.ts";
import { reduceProfile } from "../../src/engine/reduceProfile.ts";
import { fileSource } from "../../src/engine/threadFile.ts";
import type { CaseSheet } from "../../src/sheet/caseSheet.ts";
import { readCaseSheet } from "../../src/sheet/readCaseSheet.ts";
import { readSettings } from "../../src/sheet/readSettings.ts";
import { reduceSettings } from "../../src/sheet/reduceSettings.ts";
import { sheetFiles } from "../../src/sheet/sheetFiles.ts";

export const sampleFolder = resolve(import.meta.dirname, "../../sample-data");

/** A case of the sample data, read and reduced as the program does it, one file after another. */
export async function reduceSheet(
  name: string,
  folder = sampleFolder,
): Promise<{ sheet: CaseSheet; stations: StationResult[] }> {
  const { sheet } = readCaseSheet(readFileSync(join(folder, name), "utf8"), name);
  const { files, names } = sheetFiles(sheet, name, csvFiles(folder));
  const reduce = reduceSettings(sheet);
  const stations: StationResult[] = [];
  for (const [i, file] of files.entries()) {
    const path = join(folder, names[i]);
    const bytes = statSync(path).size;
    const source = fileSource(names[i], path, bytes);
    const content = { name: names[i], bytes, fingerprint: names[i], content: { path } };
    const ask = { file: content, read: readSettings(sheet, file), reduce };
    if (sheet.layout === "profile") {
      stations.push(...(await reduceProfile(source, ask, () => {})).stations);
    } else if (sheet.layout === "lines") {
      const { lineParts = [] } = await reduceLineFile(source, ask, () => {});
      stations.push(reduceLines(lineParts, reduce));
    } else {
      const { parts } = await reduceFile(source, ask, memoryColumnStore(1 << 27), () => {});
      stations.push(reduceStation(parts, reduce));
    }
  }
  return { sheet, stations: stations.sort((a, b) => a.x - b.x) };
}

function csvFiles(folder: string): string[] {
  return readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && entry.name.endsWith(".csv"))
    .map((entry) => relative(folder, join(entry.parentPath, entry.name)).replaceAll("\\", "/"));
}
