import { describe, expect, it } from "vitest";
import { fitDecay } from "../../../src/core/decay/fitDecay.ts";
import { missing } from "../../../src/core/quantity.ts";
import type { StationResult } from "../../../src/core/stationResult.ts";
import { known, lawStations, plainSettings, spacedFrom } from "../../support/lawStations.ts";

const law = { A: 0.06, x0: 4, n: 1.25, ell: 1, U: 6, nu: 1.5e-5, B: 0.2, m: 0.375 };
const stations = lawStations(law, spacedFrom(4, 20, 80, 10), 0.01);

/** The fifth station, its probes apart in u'. */
function apart(station: StationResult): StationResult {
  const none = missing("no larger part of the 2 probes at this x agrees in u'");
  const reading = { file: "rake.csv", y: 0, z: null, agrees: false, departs: ["u_rms"] } as const;
  const probe = { ...reading, U: known(6, 0.01), u_rms: known(0.3, 0.01) };
  return { ...station, uu: none, vv: none, ww: none, k: none, probes: [probe, { ...probe, y: 1 }] };
}

describe("a station whose probes do not agree", () => {
  const without = stations.filter((_, i) => i !== 4);
  const decay = fitDecay(
    stations.map((one, i) => (i === 4 ? apart(one) : one)),
    plainSettings,
  );

  it("is no point of the law, which is that of the others", () => {
    const alone = fitDecay(without, plainSettings);
    expect(decay.points).toEqual(alone.points);
    expect([decay.n, decay.x0, decay.A]).toEqual([alone.n, alone.x0, alone.A]);
  });
  it("is named by the decay that goes without it", () => {
    const flag = decay.flags.find(({ code }) => code === "inhomogeneous");
    expect(flag?.text).toContain(`x = ${stations[4].x}:`);
    expect(flag?.value).toBe(1);
  });
  it("is not named where the law has its point: set aside were others than these", () => {
    const named = fitDecay(
      stations.map((one, i) => (i === 4 ? { ...one, probes: apart(one).probes ?? [] } : one)),
      plainSettings,
    );
    expect(named.flags.map(({ code }) => code)).not.toContain("inhomogeneous");
  });
  it("is named at the end of the stream too, where the window stops short of it", () => {
    const far = fitDecay(
      stations.map((one, i) => (i === 9 ? apart(one) : one)),
      plainSettings,
    );
    expect(far.window[1]).toBe(stations[8].x);
    expect(far.flags.find(({ code }) => code === "inhomogeneous")?.text).toContain(`x = ${stations[9].x}:`);
  });
});
