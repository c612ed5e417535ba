import { describe, expect, it } from "vitest";
import type { ProbeReading } from "../../src/core/probeReading.ts";
import type { RecordCut } from "../../src/core/recordCut.ts";
import { plainRecord } from "../../src/export/plainRecord.ts";
import { known, stationAt } from "../support/lawStations.ts";

const reading = { file: "rake.csv", y: 0.1, z: null, agrees: false, departs: ["U"] } as const;
const probe: ProbeReading = { ...reading, U: known(6, 0.01), u_rms: known(0.3, 0.02) };
const cut: RecordCut = {
  ...{ file: "run.csv", y: null, z: null, at: 701 },
  ...{ kind: "backward", from: 0.7, to: 0.3, samples: 400 },
};

describe("the records of a station in the results", () => {
  it("carry each probe with U and u', plain and with their intervals", () => {
    const { probes } = plainRecord(stationAt(1, { probes: [probe] }));
    const ends = ({ value, low, high }: { value: number | null; low?: unknown; high?: unknown }) => ({
      value,
      low,
      high,
    });
    expect(probes).toEqual([{ ...reading, U: ends(probe.U), u_rms: ends(probe.u_rms) }]);
  });
  it("carry each cut, and how many more there were", () => {
    const plain = plainRecord(stationAt(1, { cuts: [cut], cuts_more: 3 }));
    expect(plain).toEqual({ cuts: [cut], cuts_more: 3 });
  });
  it("have no such keys where there is nothing to tell", () => {
    expect(plainRecord(stationAt(1, {}))).toEqual({});
  });
});
