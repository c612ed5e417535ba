import { describe, expect, it } from "vitest";
import { fitKey } from "../../../src/app/session/caseViews.ts";
import { withBody } from "../../../src/app/session/withBody.ts";
import { argueDecay } from "../../../src/core/decay/argueDecay.ts";
import { deriveStations } from "../../../src/core/decay/deriveStations.ts";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import type { DecaySettings } from "../../../src/core/decayResult.ts";
import { lawStations, plainSettings, spacedFrom } from "../../support/lawStations.ts";

const law = { A: 0.06, x0: 0.075, n: 1.25, ell: 0.025, U: 6, nu: 1.5e-5, B: 0.005, m: 0.375 };
const reduced = lawStations(law, spacedFrom(law.x0, 0.2, 2, 14), 0.01);
const plain: DecaySettings = {
  ...plainSettings,
  referenceLength: 0.025,
  kinematicViscosity: law.nu,
  window: [0, 9],
  developmentTolerance: 0.1,
  body: null,
};
/** As the worker, and the batch command, argue it. */
function argued(settings: DecaySettings) {
  const decay = fitDecay(reduced, settings);
  const stations = deriveStations(reduced, decay, settings);
  return { stations, decay: { ...decay, argument: argueDecay(stations, decay, settings) } };
}
const body = { x: 0.9, chord: 0.1, Tu: 0.03, L11: 0.2 };

describe("a body placed after the case was argued", () => {
  const before = argued(plain);
  it("gives the very numbers of a run that knew of it from the start", () => {
    const wanted = { ...plain, body, developmentTolerance: 0.05 };
    expect(withBody(before, wanted)).toEqual(argued(wanted));
  });
  it("leaves the argument itself where it was about that body already, and makes one but once", () => {
    expect(withBody(before, plain)).toBe(before);
    const wanted = { ...plain, body };
    expect(withBody(before, wanted)).toBe(withBody(before, { ...wanted }));
    expect(withBody(argued(wanted), plain).decay.argument?.body).toBeNull();
  });
  it("asks for no new fit", () => {
    const of = { key: "k", stations: reduced, sources: [], flags: [], failures: [], complete: true };
    expect(fitKey(of, { ...plain, body, developmentTolerance: 0.05 })).toBe(fitKey(of, plain));
    expect(fitKey(of, { ...plain, n: 1.2 })).not.toBe(fitKey(of, plain));
  });
});
