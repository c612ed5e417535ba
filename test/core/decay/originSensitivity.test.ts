import { describe, expect, it } from "vitest";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { originSensitivity } from "../../../src/core/decay/originSensitivity.ts";
import { expectClose } from "../../support/expectClose.ts";
import { lawStations, plainSettings, spacedFrom } from "../../support/lawStations.ts";

const law = { A: 0.06, x0: 0.1, n: 1.25, ell: 0.025, U: 6, nu: 1.5e-5, B: 0.005, m: 0.375 };

describe("the sensitivity of n to x0", () => {
  it("is what a fit shows whose origin is held a little farther downstream", () => {
    const xs = spacedFrom(law.x0, 0.6, 2.1, 15);
    const stations = lawStations(law, xs, 0.01);
    const step = 0.005;
    const at = (x0: number) =>
      fitDecay(stations, { ...plainSettings, referenceLength: law.ell, window: [0.6, 2.1], x0 }).law?.n ?? 0;
    const slope = (at(law.x0 + step) - at(law.x0 - step)) / (2 * step);
    expectClose(originSensitivity(law, [0.6, 2.1]) ?? 0, slope, {
      relative: 0.1,
      because: "the centre of the leverage in ln(x - x0) is near the geometric centre, not on it",
    });
  });
  it("has no value where the origin lies at the first station", () => {
    expect(originSensitivity({ n: 1.2, x0: 0.3 }, [0.3, 1])).toBeNull();
  });
});
