import { describe, expect, it } from "vitest";
import { createStillCases } from "../../../src/app/page/stillCases.ts";
import type { CaseView } from "../../../src/app/session/caseView.ts";
import { withBody } from "../../../src/app/session/withBody.ts";
import { arguedCase } from "../../support/arguedCase.ts";
import { decayOf, sheet, stationAt, viewOf, workspaceCase } from "../fixtures.ts";

const { settings, stations, decay } = arguedCase();
if (decay === null) throw new Error("the fixture has a law");
const reduced = { key: "k", stations, sources: [], flags: [], failures: [], complete: true };
/** The case with a body at x, as the page makes its view. */
function viewAt(x: number | null): CaseView {
  const body = x === null ? null : { x, chord: null, Tu: null, L11: null };
  const of = { ...workspaceCase, sheet: { ...sheet, body } };
  return viewOf(stations, {
    of,
    reduced,
    ...withBody({ stations, decay: decay ?? decayOf([]) }, { ...settings, body }),
  });
}

describe("the cases that figures are drawn from", () => {
  it("stay the same list while a body is placed, moved and taken away", () => {
    const still = createStillCases();
    const before = still([viewAt(null)]);
    expect(still([viewAt(0.9)])).toBe(before);
    expect(still([viewAt(1.2)])).toBe(before);
    expect(viewAt(1.2).decay?.argument?.body?.x).toBe(1.2);
  });
  it("are new with a new fit, with other stations, and with anything else of the sheet", () => {
    const still = createStillCases();
    const view = viewAt(0.9);
    const first = still([view]);
    const refitted = [{ ...view, decay: { ...decay, n: { ...decay.n } } }];
    const second = still(refitted);
    expect(second).toBe(refitted);
    const named = [{ ...view, of: { ...view.of, sheet: { ...view.of.sheet, zero: 0.1 } } }];
    expect(still(named)).toBe(named);
    const others = [{ ...view, stations: [stationAt(0.3)] }];
    expect(still(others)).toBe(others);
    expect(still([view])).not.toBe(first);
    expect(still([view, view])).toHaveLength(2);
  });
});
