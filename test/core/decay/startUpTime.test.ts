import { describe, expect, it } from "vitest";
import { startUpTime } from "../../../src/core/decay/startUpTime.ts";
import { missing } from "../../../src/core/quantity.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { expectClose } from "../../support/expectClose.ts";
import { known, stationAt } from "../../support/lawStations.ts";

/** A station in a stream of U, whose record tells of a transient that is over after `steady`. */
const at = (x: number, U: number, steady?: number, more: Partial<StationResult> = {}) =>
  stationAt(x, {
    duration: 100,
    U: known(U, 0),
    flags:
      steady === undefined ? [] : [{ code: "start-up", text: "It begins in a transient.", value: steady }],
    ...more,
  });

describe("the time to leave out of a case's records", () => {
  it("is none where no record begins otherwise than it goes on", () => {
    expect(startUpTime([at(1, 5), at(2, 5)])).toBeNull();
  });
  it("is that after which the flow has cleared the last station, a flight behind the first", () => {
    const found = startUpTime([at(4, 2), at(0, 1, 3), at(2, 2)]);
    // from 0 to 2 at 1/U = 1 and 1/2: 1.5; from 2 to 4 at 1/2: 1
    expectClose(found?.time, 3 + 1.5 + 1, { relative: 1e-12, because: "the trapezoid over 1/U" });
    expect(found?.station.x).toBe(4);
  });
  it("is what a station's own record tells, where it does", () => {
    const found = startUpTime([at(0, 1, 3), at(2, 1, 4), at(4, 1)]);
    expectClose(found?.time, 3 + 4, { relative: 1e-12, because: "3 + 2 reaches x = 2 after 4, and goes on" });
    expect(startUpTime([at(0, 1, 3), at(2, 1, 9)])?.station.x).toBe(2);
  });
  it("is not carried past a station whose U is missing, nor where it would leave no record", () => {
    const unknown = at(2, 1, undefined, { U: missing("its probes do not agree") });
    expect(startUpTime([at(0, 1, 3), unknown, at(4, 1)])?.time).toBe(3);
    expect(startUpTime([at(0, 0.01, 3), at(2, 0.01)])?.time).toBe(3);
  });
});
