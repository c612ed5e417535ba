import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { ReductionFailure } from "../../../src/core/failure.ts";
import { reduceStation } from "../../../src/core/station/reduceStation.ts";
import { startRecord } from "../../../src/core/station/startRecord.ts";
import { blockOf, exponential, origin, settings } from "./records.ts";

/** Every number that hangs on a value, however deep. */
function numbersIn(value: unknown, into: number[] = []): number[] {
  if (typeof value === "number") into.push(value);
  else if (ArrayBuffer.isView(value)) into.push(...(value as Float64Array));
  else if (typeof value === "object" && value !== null)
    for (const inner of Object.values(value)) numbersIn(inner, into);
  return into;
}

const u = exponential(900, 8, 3).map((value) => 6 + value);
/** Steps of any kind, most of them the record's: repeated, backward, tiny, long and longer. */
const step = fc.oneof(
  { weight: 30, arbitrary: fc.constant(1) },
  { weight: 2, arbitrary: fc.constantFrom(0, -1, -7, -300, 2, 11, 5000) },
  { weight: 2, arbitrary: fc.double({ min: 1e-9, max: 3, noNaN: true }) },
);

describe("a record with times of any kind", () => {
  it("ends in finite numbers or in a failure that says what to do, however it is cut", () => {
    let reduced = 0;
    fc.assert(
      fc.property(
        fc.array(step, { minLength: 900, maxLength: 900 }),
        fc.integer({ min: 64, max: 1200 }),
        fc.integer({ min: 1, max: 899 }),
        (steps, pilot, cut) => {
          let time = 0;
          const t = Float64Array.from(steps, (one) => {
            time += one * 1e-3;
            return time;
          });
          const read = (cuts: readonly number[]) => {
            let plan = null;
            for (let reading = 1; reading <= 3; reading++) {
              const reducer = startRecord(origin, settings, { pilot, plan });
              const borders = [0, ...cuts, 900];
              for (let i = 0; i + 1 < borders.length; i++)
                reducer.add(blockOf({ u, t }, borders[i], borders[i + 1]));
              const end = reducer.finish();
              if ("part" in end) return end.part;
              plan = end.again;
            }
            throw new Error("a fourth reading was asked for");
          };
          try {
            const part = read([]);
            expect(read([cut])).toEqual(part);
            const station = reduceStation([part], settings);
            expect(numbersIn(part).every(Number.isFinite)).toBe(true);
            reduced++;
            expect(numbersIn(station).every(Number.isFinite)).toBe(true);
          } catch (error) {
            if (!(error instanceof ReductionFailure)) throw error;
            expect(error.facts.remedy.length).toBeGreaterThan(20);
          }
        },
      ),
      { seed: 20261201, numRuns: 60 },
    );
    expect(reduced).toBeGreaterThan(30);
  }, 60_000);
});
