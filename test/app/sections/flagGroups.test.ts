import { describe, expect, it } from "vitest";
import { flagGroups } from "../../../src/app/sections/flagGroups.ts";
import { stationAt, viewOf } from "../fixtures.ts";

const flagged = (x: number, text: string) =>
  stationAt(x, { flags: [{ code: "resolution", text, value: 1 }] });

describe("doubts that stations share", () => {
  it("are alike where every station says the same", () => {
    const [group] = flagGroups([viewOf([flagged(0.1, "resolved motion"), flagged(0.2, "resolved motion")])]);
    expect(group).toMatchObject({ xs: [0.1, 0.2], text: "resolved motion", alike: true });
  });
  it("are not alike where the figure of one station differs: the first one's speaks for itself alone", () => {
    const [group] = flagGroups([viewOf([flagged(0.1, "is 0.39"), flagged(0.2, "is 0.43")])]);
    expect(group).toMatchObject({ xs: [0.1, 0.2], text: "is 0.39", alike: false });
  });
});
