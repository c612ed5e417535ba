import { describe, expect, it } from "vitest";
import { stationSettings } from "../../../src/app/sections/stationSettings.ts";
import type { ProbeReading } from "../../../src/core/probeReading.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { defaultCaseSheet } from "../../../src/sheet/defaultCaseSheet.ts";
import { known, stationAt } from "../../support/lawStations.ts";

const probe = (more: Partial<ProbeReading>): ProbeReading => ({
  ...{ file: "rake.csv", y: 0, z: null, U: known(6, 0.01), u_rms: known(0.3, 0.01) },
  ...{ agrees: true, departs: [] },
  ...more,
});
const rowOf = (name: string, key: string, station: Partial<StationResult>) =>
  stationSettings(key, stationAt(1, station), defaultCaseSheet).find(([own]) => own === name)?.[1];

describe("what a number of a station with several probes rests on", () => {
  it.each([
    ["2, averaged: they agree", [probe({}), probe({})]],
    ["2, averaged; whether they agree is not known", [probe({ agrees: null }), probe({ agrees: null })]],
    ["2 that agree; 1 set aside", [probe({}), probe({}), probe({ agrees: false, setAside: true })]],
    ["2, of which not all agree", [probe({ agrees: false }), probe({ agrees: false })]],
  ])("is said: %s", (text, probes) => expect(rowOf("probes", "U", { probes })).toBe(text));
  it("is not said of a single one", () => expect(rowOf("probes", "U", {})).toBeUndefined());
});

describe("how an interval was made", () => {
  const facts = { ...stationAt(1, {}).facts, integralTimes: 500, groups: 25 };
  it("names the choice of the range where an inertial range has one", () => {
    expect(rowOf("interval", "epsilon_inertial", { facts, duration: 3 })).toMatch(
      /25 groups .*choice of the range/,
    );
    expect(rowOf("interval", "epsilon_gradient", { facts, duration: 3 })).not.toMatch(/choice/);
  });
  it("says why there is none for a record whose step is not known, and not that a profile gave it", () => {
    expect(rowOf("interval", "U", { duration: 3 })).toBe("none: the integral time is not known");
    expect(rowOf("interval", "U", {})).toContain("profile");
  });
});
