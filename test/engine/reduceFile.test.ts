import { describe, expect, it } from "vitest";
import type { RoundedTimes } from "../../src/core/records.ts";
import { seededRandom } from "../../src/core/signal/seededRandom.ts";
import { reduceStation } from "../../src/core/station/reduceStation.ts";
import { pilotSamples } from "../../src/core/station/startRecord.ts";
import type { ColumnStore } from "../../src/engine/columnStore.ts";
import { memoryColumnStore } from "../../src/engine/columnStore.ts";
import type { ReduceAsk } from "../../src/engine/protocol.ts";
import { reduceFile } from "../../src/engine/reduceFile.ts";
import type { ByteSource } from "../../src/read/byteSource.ts";
import { defaultCaseSheet } from "../../src/sheet/defaultCaseSheet.ts";
import { readSettings } from "../../src/sheet/readSettings.ts";
import { reduceSettings } from "../../src/sheet/reduceSettings.ts";
import { expectClose } from "../support/expectClose.ts";

/** A file in memory that counts how often it is read from its beginning to its end. */
function fileOf(name: string, text: string) {
  const content = new TextEncoder().encode(text);
  const counts = { whole: 0 };
  async function* stream() {
    const chunk = 1 << 18;
    for (let from = 0; from < content.length; from += chunk) yield content.slice(from, from + chunk);
    counts.whole++;
  }
  return { source: { name, bytes: content.length, stream } satisfies ByteSource, counts };
}

function askOf(source: ByteSource, x: number | null): ReduceAsk {
  const { name, bytes } = source;
  return {
    file: { name, bytes, fingerprint: name, content: { path: name } },
    read: readSettings(defaultCaseSheet, { path: name, x }),
    reduce: reduceSettings(defaultCaseSheet),
  };
}

const reduced = (source: ByteSource, columns: ColumnStore = memoryColumnStore(0), x: number | null = 1) => {
  let bytes = 0;
  const count = (more: number) => {
    bytes += more;
  };
  return reduceFile(source, askOf(source, x), columns, count).then((reduction) => ({ ...reduction, bytes }));
};

/** Noise about 5 whose memory, in samples, is given for every sample. */
function noise(samples: number, memory: (i: number) => number, rms: (i: number) => number): number[] {
  const random = seededRandom(5);
  let value = 0;
  return Array.from({ length: samples }, (_, i) => {
    const keep = Math.exp(-1 / memory(i));
    value = keep * value + Math.sqrt(1 - keep * keep) * random.gaussian();
    return 5 + rms(i) * value;
  });
}

describe("a record whose pilot does not stand for the whole", () => {
  const late = (i: number) => i >= pilotSamples;
  const u = noise(
    pilotSamples + (1 << 18),
    (i) => (late(i) ? 60 : 6),
    (i) => (late(i) ? 1 : 0.2),
  );
  const text = `# dt = 1e-4\nu\n${u.map((value) => value.toFixed(4)).join("\n")}\n`;

  it("is read once more, with the same numbers from kept columns as from the file", async () => {
    const [fromFile, fromColumns] = [fileOf("a.csv", text), fileOf("a.csv", text)];
    const plain = await reduced(fromFile.source);
    const kept = await reduced(fromColumns.source, memoryColumnStore(1 << 25));
    expect(fromFile.counts.whole).toBe(2);
    expect(fromColumns.counts.whole).toBe(1);
    expect(kept).toEqual(plain);
    expect(kept.parts[0].samples).toBe(u.length);
    expect(kept.bytes).toBe(fromColumns.source.bytes);
  }, 60_000);
});

describe("a file whose time stamps have too few digits", () => {
  const u = noise(
    6000,
    () => 12,
    () => 1,
  );
  const rows = u.map((value, i) => `${(i / 300).toFixed(3)},${value.toFixed(4)}`);
  const { source } = fileOf("few.csv", `t,u\n${rows.join("\n")}\n`);
  const taken = async (times: RoundedTimes) => {
    const sheet = { ...defaultCaseSheet, read: { ...defaultCaseSheet.read, times } };
    const ask = { ...askOf(source, 1), read: readSettings(sheet, { path: "few.csv", x: 1 }) };
    const { parts } = await reduceFile(source, ask, memoryColumnStore(0), () => {});
    return reduceStation(parts, ask.reduce);
  };

  it("is read as the sheet says: asked about, even, or as written", async () => {
    expect((await taken("ask")).T_int).toMatchObject({ value: null });
    const even = await taken("even");
    expectClose(even.facts.step, 1 / 300, { relative: 1e-6, because: "a line through 6000 stamps" });
    expectClose(even.T_int.value, 12 / 300, { relative: 0.15, because: "500 integral times" });
    const written = await taken("written");
    expect(written.flags.map(({ code }) => code)).toContain("unequal-steps");
    expectClose(written.T_int.value, even.T_int.value ?? 0, { relative: 0.1, because: "the same record" });
  });
});

describe("a file of several probes", () => {
  const samples = 4000;
  const columns = [0.2, 0.4, 0.6].map((x, i) => ({
    x,
    u:
      i === 1
        ? new Array<number>(samples).fill(5)
        : noise(
            samples,
            () => 5,
            () => 0.3,
          ),
  }));
  const rows = columns.flatMap(({ x, u }) =>
    u.map((value, i) => `${x},${(i * 1e-4).toFixed(4)},${value.toFixed(5)}`),
  );
  const { source } = fileOf("table.csv", `x,t,u\n${rows.join("\n")}\n`);

  it("leaves out a probe that cannot be reduced, says which, and keeps the others", async () => {
    const { parts, failures, sources } = await reduced(source, memoryColumnStore(0), null);
    expect(parts.map(({ origin }) => origin.x)).toEqual([0.2, 0.6]);
    expect(failures).toMatchObject([{ code: "constant-signal", where: { file: "table.csv" } }]);
    expect(failures?.[0].message).toMatch(/at x = 0\.4/);
    expect(sources.map(({ x }) => x)).toEqual([0.2, 0.4, 0.6]);
  });
});

describe("a file without a usable probe", () => {
  const rising = (samples: number, time: (i: number) => number) =>
    Array.from({ length: samples }, (_, i) => `${((i * 7) % 11) + 5},${time(i)}`).join("\n# pause\n");

  it.each([
    [
      "constant.csv",
      `w,t,u\n${Array.from({ length: 200 }, (_, i) => `0,${i},5`).join("\n")}\n`,
      "constant-signal",
      { line: 2, column: 3 },
    ],
    ["one.csv", "t,u,v,w\n0,5.9,0.1,0.1\n", "too-few-samples", { line: 2 }],
    ["short.csv", "t,u\n0,1\n# pause\n1,2\n", "too-few-samples", { line: 4 }],
    ["same.csv", `u,t\n${rising(100, () => 3)}\n`, "no-time", { line: 2, column: 2 }],
  ])("says where: %s", async (name, text, code, place) => {
    await expect(reduced(fileOf(name, text).source)).rejects.toMatchObject({
      code,
      where: { file: name, ...place },
    });
  });

  it.each([
    [
      "constant.csv",
      `t,u\n${Array.from({ length: 4000 }, (_, i) => `${i},5`).join("\n")}\n`,
      "constant-signal",
    ],
    ["short.csv", "t,u\n0,1\n1,2\n", "too-few-samples"],
    ["empty.csv", "", "empty-file"],
    ["heading.csv", "t,u\n", "heading-only"],
    ["word.csv", "t,u\n0,1\n1,two\n2,3\n", "not-a-number"],
  ])("fails as a whole: %s", async (name, text, code) => {
    await expect(reduced(fileOf(name, text).source)).rejects.toMatchObject({ code, where: { file: name } });
  });
});
