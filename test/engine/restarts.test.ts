import { describe, expect, it } from "vitest";
import { seededRandom } from "../../src/core/signal/seededRandom.ts";
import { pilotSamples } from "../../src/core/station/startRecord.ts";
import type { StationPart } from "../../src/core/station/stationPart.ts";
import { memoryColumnStore } from "../../src/engine/columnStore.ts";
import { reduceFile } from "../../src/engine/reduceFile.ts";
import type { ByteSource } from "../../src/read/byteSource.ts";
import type { CaseSheet } from "../../src/sheet/caseSheet.ts";
import { defaultCaseSheet } from "../../src/sheet/defaultCaseSheet.ts";
import { readSettings } from "../../src/sheet/readSettings.ts";
import { reduceSettings } from "../../src/sheet/reduceSettings.ts";

async function partOf(text: string, more: Partial<CaseSheet> = {}, budget = 0): Promise<StationPart> {
  const content = new TextEncoder().encode(text);
  async function* stream() {
    for (let from = 0; from < content.length; from += 1 << 18) yield content.slice(from, from + (1 << 18));
  }
  const source: ByteSource = { name: "run.csv", bytes: content.length, stream };
  const sheet = { ...defaultCaseSheet, ...more };
  const ask = {
    file: { name: "run.csv", bytes: content.length, fingerprint: "run", content: { path: "run.csv" } },
    read: readSettings(sheet, { path: "run.csv", x: 1 }),
    reduce: reduceSettings(sheet),
  };
  const { parts } = await reduceFile(source, ask, memoryColumnStore(budget), () => {});
  return parts[0];
}

/** Rows of t and u; t counts the steps. */
function rowsOf(count: number): string[] {
  const random = seededRandom(3);
  let value = 0;
  return Array.from({ length: count }, (_, i) => {
    value = 0.9 * value + random.gaussian();
    return `${i},${(10 + value).toFixed(3)}`;
  });
}

const textOf = (rows: readonly string[]) => `t,u\n${rows.join("\n")}\n`;
const numbersOf = ({ plan: _plan, flags: _flags, cuts: _cuts, ...numbers }: StationPart) => numbers;
const codes = (part: StationPart) => part.flags.map(({ code }) => code);

describe("a file whose simulation was restarted", () => {
  const rows = rowsOf(4000);
  it("is the clean file, though a stretch and some single rows stand in it twice", async () => {
    const clean = await partOf(textOf(rows));
    const twice = [...rows.slice(0, 1500), ...rows.slice(1200, 2600), ...rows.slice(2599)];
    const part = await partOf(textOf(twice));
    expect(numbersOf(part)).toEqual(numbersOf(clean));
    expect(codes(part)).toEqual(["backward-time"]);
  });
  it("is so too where start-up is left out and a restart goes back into it", async () => {
    const clean = await partOf(textOf(rows), { startup: 300 });
    const part = await partOf(textOf([...rows.slice(0, 700), ...rows.slice(100)]), { startup: 300 });
    expect(numbersOf(part)).toEqual(numbersOf(clean));
    expect(clean.start).toBe(300);
  });
});

describe("a file that is restarted past its pilot, back into what was summed", () => {
  const rows = rowsOf(pilotSamples + 60_000);
  const end = pilotSamples + 40_000;
  it("is read once more and is the clean file, from the file and from kept columns", async () => {
    const clean = await partOf(textOf(rows));
    const spoiled = textOf([...rows.slice(0, end), ...rows.slice(end - 30_000)]);
    for (const budget of [0, 1 << 28]) {
      const part = await partOf(spoiled, {}, budget);
      expect(numbersOf(part)).toEqual(numbersOf(clean));
      expect(part.flags.find(({ code }) => code === "backward-time")?.text).toContain("(30000 older samples");
    }
  }, 60_000);
});
