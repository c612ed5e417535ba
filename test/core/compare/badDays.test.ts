import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { argueCases } from "../../../src/core/compare/argueCases.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { missing } from "../../../src/core/quantity.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { known, plainSettings, stationAt } from "../../support/lawStations.ts";

const value = fc.oneof(
  fc.constant(missing("not measured")),
  fc
    .tuple(
      fc.oneof(fc.double({ min: 1e-9, max: 1e9, noNaN: true }), fc.constantFrom(0, 1, -1)),
      fc.constantFrom(0, 1e-6, 0.02, 3),
    )
    .map(([at, error]) => known(at, error)),
);
const keys = [
  "U",
  "uu",
  "vv",
  "k",
  "q",
  "Tu",
  "L11",
  "lambda",
  "eta",
  "Re_lambda",
  "epsilon",
  "epsilon_gradient",
] as const;
const station: fc.Arbitrary<StationResult> = fc
  .tuple(
    fc.oneof(fc.integer({ min: -3, max: 12 }), fc.double({ min: -2, max: 50, noNaN: true })),
    fc.tuple(...keys.map(() => value)),
    fc.constantFrom(null, 0.5, 10),
  )
  .map(([x, values, duration]) =>
    stationAt(x, { duration, ...Object.fromEntries(keys.map((key, i) => [key, values[i]])) }),
  );
const settings: fc.Arbitrary<DecaySettings> = fc
  .record({
    quantity: fc.constantFrom("auto" as const, "k" as const, "uu" as const, "q" as const),
    window: fc.constantFrom<DecaySettings["window"]>("auto", [0, 5], [40, 3], [2, 60]),
    x0: fc.constantFrom(null, 0, 4),
    n: fc.constantFrom(null, 1.2),
    residuals: fc.constantFrom("log" as const, "linear" as const),
    weights: fc.constantFrom("sampling" as const, "equal" as const),
    along: fc.constantFrom("x" as const, "t" as const),
    referenceLength: fc.constantFrom(null, 0.025),
    referenceSpeed: fc.constantFrom(null, 6),
    kinematicViscosity: fc.constantFrom(null, 1.5e-5),
    kind: fc.constantFrom(null, "les" as const),
    extent: fc.constantFrom(null, 0.3),
    body: fc.constantFrom(
      null,
      { x: 4, chord: null, Tu: null, L11: null },
      { x: 7, chord: 1, Tu: 0.05, L11: 0.3 },
      { x: -9, chord: 40, Tu: 1e-4, L11: 1e3 },
    ),
  })
  .map((choice) => ({ ...plainSettings, ...choice }));
const aCase = fc.record({
  name: fc.constantFrom("a", "b"),
  stations: fc.array(station, { maxLength: 9 }),
  settings,
});

/** Every number anywhere in a result, by its path. */
function badNumbers(found: unknown, path = ""): string[] {
  if (typeof found === "number") return Number.isFinite(found) ? [] : [`${path}: ${found}`];
  if (found === null || typeof found !== "object") return [];
  return Object.entries(found).flatMap(([key, inner]) => badNumbers(inner, `${path}.${key}`));
}

describe("stations of any kind", () => {
  it("never throw and never leave a number that is not finite", () => {
    fc.assert(
      fc.property(
        fc.array(aCase, { maxLength: 2 }),
        fc.constantFrom("x0" as const, "x" as const, "Tu" as const),
        (cases, align) => {
          expect(badNumbers(argueCases(cases, { align, tolerance: 0.1 }))).toEqual([]);
        },
      ),
      { seed: 20261201, numRuns: 400 },
    );
  });
});
