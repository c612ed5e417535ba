import { gzipSync } from "node:zlib";
import { describe, expect, it } from "vitest";
import { previewFile } from "../../src/read/previewFile.ts";
import { readRecords } from "../../src/read/readRecords.ts";
import { collect, failureOf, plainSettings, sourceOf } from "./support.ts";

const rows = Array.from(
  { length: 9000 },
  (_, i) => `${(i * 1e-4).toFixed(4)},${(6 + Math.sin(i)).toFixed(6)},${Math.cos(i)}`,
);
const text = `t [s],u [m/s],v [m/s]\n${rows.join("\n")}\n`;
// zlib is the other implementation of RFC 1952
const packed = gzipSync(text);

describe("a gzip file", () => {
  it("gives the numbers of the plain file, wherever its bytes are cut on their way", async () => {
    const plain = await collect(sourceOf("x0200.csv", text));
    for (const sizes of [[packed.length], [1, 1, 7, 1000], [4096]])
      expect((await collect(sourceOf("x0200.csv", packed, sizes))).records).toEqual(plain.records);
  });

  it("of several members is one file (RFC 1952, 2.2)", async () => {
    const half = text.indexOf("\n", text.length / 2) + 1;
    const members = Buffer.concat([gzipSync(text.slice(0, half)), gzipSync(text.slice(half))]);
    const { records } = await collect(sourceOf("x0200.csv.gz", members, [100]));
    expect(records[0].u).toHaveLength(rows.length);
  });

  it("is previewed by its beginning, and its rows are estimated from it", async () => {
    const many = gzipSync(
      `t,u\n${Array.from({ length: 60_000 }, (_, i) => `${i},${Math.sin(i)}`).join("\n")}\n`,
    );
    const preview = await previewFile(sourceOf("x0200.csv.gz", many, [4096]), {});
    expect(preview.columns.map(({ role }) => role)).toEqual(["t", "u"]);
    expect(preview.position).toMatchObject({ x: 0.2, source: "name" });
    expect(Math.abs(preview.estimatedRows / 60_000 - 1)).toBeLessThan(0.1); // later rows have longer numbers
  });

  it("that ends too early, or is damaged, is refused with the place it got to", async () => {
    const cut = await failureOf(collect(sourceOf("x0200.csv.gz", packed.subarray(0, packed.length >> 1))));
    expect(cut).toMatchObject({ code: "unreadable-file", where: { file: "x0200.csv.gz" } });
    expect(cut.message).toMatch(/cannot be expanded, 0\.\d MB into its text/);
    const spoiled = Buffer.from(packed);
    spoiled.fill(0xff, 300, 400);
    expect(await failureOf(collect(sourceOf("x0200.csv.gz", spoiled)))).toMatchObject({
      code: "unreadable-file",
    });
  });

  it("that expands beyond all measure is refused before the memory is full", async () => {
    const bomb = gzipSync(Buffer.alloc(2 ** 27, "6,1\n"));
    const sink = { record: () => ({ add: () => {} }) };
    const settings = { ...plainSettings, x: 1, step: 1, columns: { u: { from: 1, unit: null } } };
    const refused = await failureOf(readRecords(sourceOf("bomb.csv.gz", bomb, [4096]), settings, sink));
    expect(refused).toMatchObject({
      code: "unreadable-file",
      found: expect.stringContaining("expand to more than"),
    });
  });
});
