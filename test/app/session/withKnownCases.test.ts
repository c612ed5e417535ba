import { describe, expect, it } from "vitest";
import type { Argued } from "../../../src/app/session/session.ts";
import { withKnownCases } from "../../../src/app/session/withKnownCases.ts";
import { decayOf, stationAt } from "../fixtures.ts";

const made = (keys: Readonly<Record<string, string>>): Argued => ({
  key: JSON.stringify(keys),
  keys,
  cases: Object.fromEntries(
    Object.keys(keys).map((id) => {
      const stations = [stationAt(0.3), stationAt(0.6)];
      return [id, { stations, decay: decayOf(stations) }];
    }),
  ),
  comparisons: [],
});

describe("an argument made anew", () => {
  it("keeps the cases whose fits follow from the same ground, and takes the others", () => {
    const before = made({ a: "1", b: "1" });
    const now = made({ a: "1", b: "2", c: "1" });
    const kept = withKnownCases(before, now);
    expect(kept.cases.a).toBe(before.cases.a);
    expect(kept.cases.b).toBe(now.cases.b);
    expect(kept.cases.c).toBe(now.cases.c);
    expect(kept.keys).toBe(now.keys);
    expect(kept.comparisons).toBe(now.comparisons);
  });
  it("drops cases that are gone, and is itself where there was none before", () => {
    const now = made({ b: "1" });
    expect(Object.keys(withKnownCases(made({ a: "1", b: "1" }), now).cases)).toEqual(["b"]);
    expect(withKnownCases(null, now)).toBe(now);
  });
});
