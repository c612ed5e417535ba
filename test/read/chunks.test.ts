import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { wholeLines } from "../../src/read/wholeLines.ts";
import { collect, sourceOf } from "./support.ts";

const seeded = { seed: 7, numRuns: 60 };

describe("where the bytes of a file are cut on their way", () => {
  const text = `\ufeff# x = 0,2 m, Zeit in s, Größe µ\r\nZeit;u;v\r\n${Array.from({ length: 30 }, (_, i) => `0,${100 + i};6,0${i};-0,${i}\r\n`).join("")}`;
  it("makes no difference to the numbers", async () => {
    const whole = await collect(sourceOf("a.csv", text));
    await fc.assert(
      fc.asyncProperty(fc.array(fc.integer({ min: 1, max: 40 }), { minLength: 1 }), async (sizes) => {
        expect(await collect(sourceOf("a.csv", text, sizes))).toEqual(whole);
      }),
      seeded,
    );
  });
  it("makes no difference to lines and their numbers, whatever ends them", async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.array(fc.constantFrom("a", "ä", "\r", "\n", "\r\n", "", "€"), { maxLength: 30 }),
        fc.array(fc.integer({ min: 1, max: 5 }), { minLength: 1 }),
        async (pieces, sizes) => {
          const content = pieces.join("");
          const expected = content.replace(/\r\n?/g, "\n").split("\n");
          const found: string[] = [];
          for await (const chunk of wholeLines(sourceOf("a.txt", content, sizes))) {
            expect(chunk.firstLine).toBe(found.length + 1);
            found.push(...chunk.text.split("\n"));
          }
          // what follows the last line end is a line only if it is not empty
          expect(found).toEqual(expected.at(-1) === "" ? expected.slice(0, -1) : expected);
        },
      ),
      { seed: 11, numRuns: 300 },
    );
  });
});

describe("a long record", () => {
  it("comes in several blocks that hold all of it, in order", async () => {
    const count = 40_000;
    const text = `t,u\n${Array.from({ length: count }, (_, i) => `${i},${i % 7}`).join("\n")}\n`;
    const { records, summary } = await collect(sourceOf("a_x0.1.csv", text));
    expect(summary.rows).toBe(count);
    expect(records[0].t).toEqual(Array.from({ length: count }, (_, i) => i));
  });
  it("tells how many bytes have been read, each once", async () => {
    const { readRecords } = await import("../../src/read/readRecords.ts");
    const { plainSettings } = await import("./support.ts");
    const source = sourceOf("x0.1.csv", `t,u\n${"0.1,2\n".repeat(1000)}`, [1, 100]);
    let bytes = 0;
    await readRecords(
      source,
      plainSettings,
      { record: () => ({ add: () => {} }) },
      {
        onBytes: (more) => {
          bytes += more;
        },
      },
    );
    expect(bytes).toBe(source.bytes);
  });
});
