import fc from "fast-check";
import { expect, it } from "vitest";
import { ReductionFailure } from "../../src/core/failure.ts";
import { collect, sourceOf } from "./support.ts";

const good = `# x = 0.2\nt;u;v\n${Array.from({ length: 12 }, (_, i) => `0,${i + 10};6,0${i};-0,${i}\n`).join("")}`;

/** Every field of the file as a number, under any separator, either decimal sign, and as Fortran writes it. */
function numbersIn(bytes: Uint8Array): Set<number> {
  const text = new TextDecoder().decode(bytes);
  const ways = [/[\s;,"]+/, /[\s;"]+/, /[;"\r\n]+/, /[,"\r\n]+/, /[\t"\r\n]+/];
  const fields = ways.flatMap((way) => text.split(way)).map((field) => field.trim());
  return new Set(fields.flatMap((field) => [Number(field), Number(pointed(field)), Number(lettered(field))]));
}
const pointed = (field: string) => field.replace(",", ".").replace("\u2212", "-");
const lettered = (field: string) =>
  pointed(field)
    .replace(/[dD]/, "e")
    .replace(/(\.\d+)(-\d{3})$/, "$1e$2");

it("a damaged file ends in numbers that stand in it or in a failure with its place, never in anything else", async () => {
  const edit = fc.record({
    at: fc.integer({ min: 0, max: good.length - 1 }),
    cut: fc.integer({ min: 0, max: 6 }),
    put: fc.oneof(
      fc.string({ unit: fc.constantFrom(..."0123456789.,;:-+eEdD\n\r\t \"'#%nNaAuvtx[]()"), maxLength: 6 }),
      fc.constantFrom("\0", "\ufeff", "NaN", "****", "\u2212", "𝄞", "t;u;v\n", "# x"),
    ),
  });
  await fc.assert(
    fc.asyncProperty(
      fc.array(edit, { minLength: 1, maxLength: 4 }),
      fc.integer({ min: 1, max: 50 }),
      async (edits, size) => {
        let text = good;
        for (const { at, cut, put } of edits) text = text.slice(0, at) + put + text.slice(at + cut);
        const bytes = new TextEncoder().encode(text);
        try {
          const { records } = await collect(sourceOf("a.csv", bytes, [size]));
          const there = numbersIn(bytes);
          for (const { t, u, v } of records) {
            for (const value of [...t, ...u, ...v])
              expect(Number.isFinite(value) && there.has(value), `${value}`).toBe(true);
          }
        } catch (error) {
          if (!(error instanceof ReductionFailure)) throw error;
          expect(error.where.file).toBe("a.csv");
        }
      },
    ),
    { seed: 21, numRuns: 1500 },
  );
}, 30_000);

it("random bytes end in a failure or in finite numbers", async () => {
  await fc.assert(
    fc.asyncProperty(fc.uint8Array({ maxLength: 300 }), async (bytes) => {
      try {
        const { records } = await collect(sourceOf("a.csv", bytes), { x: 0, step: 1 });
        for (const { u } of records) expect(u.every(Number.isFinite)).toBe(true);
      } catch (error) {
        if (!(error instanceof ReductionFailure)) throw error;
      }
    }),
    { seed: 22, numRuns: 500 },
  );
});
